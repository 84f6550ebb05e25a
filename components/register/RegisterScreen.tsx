import { router, type Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { Register } from '../../shared/contracts/register';
import { Screen } from '../layout/Screen';
import { dayText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { VersionStamp } from '../marks/VersionStamp';
import { useAccount } from '../queries/account';
import { errorInWords } from '../queries/errorInWords';
import { useRegister } from '../queries/register';
import { Button } from '../ui/Button';
import { EmptyState } from '../ui/Message';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { SearchField } from '../ui/TextField';
import { TextLink } from '../ui/TextLink';
import { Coverage } from './Coverage';
import { NewestRecords } from './NewestRecords';
import { SincePrevious } from './SincePrevious';
import { StandingExponents } from './StandingExponents';
import { WaitsForYou } from './WaitsForYou';

/** The first screen: which version is current, what is in it, what waits for the person who looks. */
export function RegisterScreen() {
  const register = useRegister();
  const { wide } = useBreakpoint();
  return (
    <Screen title="The register" description="Brain-tissue masses and cell counts of species, reviewed, fitted and frozen into citable versions." accountLink actions={wide ? <FindSpecies /> : undefined}>
      {wide ? null : <FindSpecies />}
      <QueryView pending={register.isPending} error={register.error ? errorInWords(register.error) : null} data={register.data} onRetry={() => void register.refetch()}>
        {(data) => <RegisterView data={data} />}
      </QueryView>
    </Screen>
  );
}

function FindSpecies() {
  const [text, setText] = useState('');
  const { wide } = useBreakpoint();
  const find = () => router.push(`/species${text.trim() ? `?query=${encodeURIComponent(text.trim())}` : ''}` as Href);
  return (
    <View style={{ width: wide ? 340 : '100%' }}>
      <SearchField label="Find a species" placeholder="species, clade or common name" value={text} onChangeText={setText} onSubmit={find} />
    </View>
  );
}

function Acts() {
  const { roles } = useAccount();
  return (
    <Row wrap gap={10}>
      {roles.includes('contributor') ? <Button kind="primary" label="Enter a specimen" href={'/submissions/new' as Href} /> : null}
      <Button label="Calculate a sample" href={'/bench' as Href} />
    </Row>
  );
}

function RegisterView({ data }: { data: Register }) {
  const { wide, sideBySide } = useBreakpoint();
  const { version } = data;
  if (version === null) {
    return (
      <>
        <EmptyState title="No version is frozen yet." text="Records are entered by laboratories, reviewed by others, and frozen by a curator; then they stand here for everyone." />
        {data.waiting.length > 0 ? <WaitsForYou items={data.waiting} /> : null}
        <Acts />
      </>
    );
  }
  const stamp = <VersionStamp label={version.label} sha256={version.sha256} doi={version.doi} frozen={dayText(version.frozenAt)} demo={version.demonstration} />;
  const main = (
    <>
      <StandingExponents exponents={data.exponents} previous={data.since?.previous ?? null} />
      <NewestRecords newest={data.newest} total={data.counts.records} />
    </>
  );
  const aside = (
    <>
      <WaitsForYou items={data.waiting} />
      {data.since ? <SincePrevious since={data.since} /> : null}
      <RecentVersions versions={data.versions} />
      <Acts />
    </>
  );
  return (
    <>
      <View style={{ flexDirection: wide ? 'row' : 'column', gap: wide ? 32 : 16, alignItems: wide ? 'center' : 'stretch' }}>
        <View style={{ flex: wide ? 1 : undefined, maxWidth: 520, width: '100%' }}>{stamp}</View>
        <Coverage counts={data.counts} />
      </View>
      {sideBySide ? (
        <View style={{ flexDirection: 'row', gap: 32 }}>
          <View style={{ flex: 1, minWidth: 0, gap: 28 }}>{main}</View>
          <View style={{ width: 340, gap: 28 }}>{aside}</View>
        </View>
      ) : (
        <>
          {data.waiting.length > 0 ? <WaitsForYou items={data.waiting} /> : null}
          {main}
          {data.since ? <SincePrevious since={data.since} /> : null}
          <RecentVersions versions={data.versions} />
          <Acts />
        </>
      )}
    </>
  );
}

function RecentVersions({ versions }: { versions: Register['versions'] }) {
  return (
    <Row wrap gap={16}>
      {versions.slice(0, 4).map(({ label, records, species, frozenAt }) => (
        <TextLink key={label} href={`/versions/${label}` as Href} size="secondary" style={{ paddingVertical: 8 }}>
          {`version ${label}: ${records} records of ${species} species, ${dayText(frozenAt)}`}
        </TextLink>
      ))}
    </Row>
  );
}
