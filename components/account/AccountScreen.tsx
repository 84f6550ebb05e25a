import { useState } from 'react';
import { View } from 'react-native';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { AccountBlock } from '../layout/AccountBlock';
import { useAccount, useSaveProfile } from '../queries/account';
import { errorInWords } from '../queries/errorInWords';
import { parseOrcid } from '../../shared/domain/identifiers';
import { Button } from '../ui/Button';
import { KeyValueRows } from '../ui/KeyValueRows';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import { TextLink } from '../ui/TextLink';

/** Own name, ORCID iD, roles, notices, theme and the way out. */
export function AccountScreen() {
  return (
    <RoleGate title="Your account">
      <OwnAccount />
    </RoleGate>
  );
}

function OwnAccount() {
  const account = useAccount();
  return (
    <Screen title="Your account" sub={account.name ?? ''}>
      <View style={{ maxWidth: 560, gap: 24 }}>
        <KeyValueRows
          rows={[
            { key: 'roles', label: 'roles', value: <Text size="table">{account.roles.join(', ') || 'none yet: an administrator gives them'}</Text> },
            { key: 'lab', label: 'laboratory', value: <Text size="table">{account.labName ?? 'none'}</Text> },
            { key: 'notices', label: 'notices', value: <TextLink href="/notices">{account.notices > 0 ? `${account.notices} new` : 'read them'}</TextLink> },
          ]}
        />
        <Profile key={account.id} name={account.name ?? ''} orcid={account.orcid ?? ''} />
        <Section title="Theme and session" look="small">
          <AccountBlock style={{ paddingTop: 8, alignItems: 'flex-start' }} />
        </Section>
      </View>
    </Screen>
  );
}

function Profile({ name: savedName, orcid: savedOrcid }: { name: string; orcid: string }) {
  const [name, setName] = useState(savedName);
  const [orcid, setOrcid] = useState(savedOrcid);
  const save = useSaveProfile();
  const orcidError = orcid.trim() === '' || parseOrcid(orcid) !== null ? undefined : 'An ORCID iD has 16 digits in four groups and ends in a check digit.';
  const changed = name.trim() !== savedName || orcid.trim() !== savedOrcid;
  return (
    <Section title="As you stand in citations" look="small">
      <View style={{ gap: 12, paddingTop: 8 }}>
        <TextField label="Name" value={name} onChangeText={setName} maxLength={120} autoComplete="name" />
        <TextField label="ORCID iD" value={orcid} onChangeText={setOrcid} maxLength={40} error={orcidError} hint="Optional; frozen versions keep what stood at submission." />
        <Row>
          <Button kind="primary" label="Save" disabled={!changed || name.trim() === '' || orcidError !== undefined} working={save.isPending} onPress={() => save.mutate({ name: name.trim(), orcid: orcid.trim() === '' ? null : orcid.trim() })} />
        </Row>
        {save.isSuccess && !changed ? (
          <Text role="status" size="table" tone="settled">
            Saved.
          </Text>
        ) : null}
        {save.error ? (
          <Text role="alert" tone="flagged">
            {errorInWords(save.error).text}
          </Text>
        ) : null}
      </View>
    </Section>
  );
}
