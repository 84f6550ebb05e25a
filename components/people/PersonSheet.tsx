import { useState } from 'react';
import { View } from 'react-native';
import type { Person } from '../../shared/contracts/people';
import { roles as allRoles, type Role } from '../../shared/contracts/vocabulary';
import { errorInWords } from '../queries/errorInWords';
import { useAddMembership, useDisablePerson, useEndMembership, useLabs, useSetRoles } from '../queries/people';
import { Button } from '../ui/Button';
import { Checkbox } from '../ui/Checkbox';
import { ConfirmDialog, Sheet } from '../ui/Dialog';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Select } from '../ui/Select';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';

const meanings: Record<Role, string> = {
  contributor: 'contributor: enters, submits and answers for the own laboratory',
  reviewer: 'reviewer: reads and decides submissions of other laboratories',
  curator: 'curator: taxa, set-asides, re-checks, freezing',
  administrator: 'administrator: people, laboratories, settings',
};

const isoToday = () => new Date().toISOString().slice(0, 10);
const isDay = (text: string) => /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text));

/** Roles, dated laboratory and account of one person. */
export function PersonSheet({ person, onClose }: { person: Person; onClose: () => void }) {
  const [roles, setRoles] = useState<Role[]>(person.roles);
  const saveRoles = useSetRoles();
  const disable = useDisablePerson();
  const [asking, setAsking] = useState(false);
  const changed = [...roles].sort().join() !== [...person.roles].sort().join();
  const failure = saveRoles.error ?? disable.error;
  return (
    <Sheet open title={person.name} onClose={onClose}>
      <Section title="Roles" look="small">
        {allRoles.map((role) => (
          <Checkbox key={role} label={meanings[role]} checked={roles.includes(role)} onChange={(on) => setRoles(on ? [...roles, role] : roles.filter((other) => other !== role))} />
        ))}
        <Row style={{ paddingTop: 8 }}>
          <Button kind="primary" label="Save roles" disabled={!changed} working={saveRoles.isPending} onPress={() => saveRoles.mutate({ id: person.id, roles })} />
        </Row>
      </Section>
      <Memberships person={person} />
      <Section title="Account" look="small">
        <Row style={{ paddingTop: 8 }}>
          {person.disabled ? (
            <Button label="Enable the account" working={disable.isPending} onPress={() => disable.mutate({ id: person.id, disabled: false })} />
          ) : (
            <Button kind="danger" label="Disable the account" onPress={() => setAsking(true)} />
          )}
        </Row>
      </Section>
      {failure ? (
        <Text role="alert" tone="flagged">
          {errorInWords(failure).text}
        </Text>
      ) : null}
      <ConfirmDialog
        open={asking}
        question={`Disable the account of ${person.name}?`}
        consequence="All sessions end at once and the person can no longer sign in. What they submitted or decided stays, with their name."
        confirmLabel="Disable the account"
        cancelLabel="Keep it"
        working={disable.isPending}
        onCancel={() => setAsking(false)}
        onConfirm={() => disable.mutate({ id: person.id, disabled: true }, { onSettled: () => setAsking(false) })}
      />
    </Sheet>
  );
}

/** Laboratories of a person over time; what a submission's laboratory is, is decided on its day. */
function Memberships({ person }: { person: Person }) {
  const labs = useLabs();
  const add = useAddMembership();
  const end = useEndMembership();
  const [labId, setLabId] = useState('');
  const [fromDay, setFromDay] = useState(isoToday);
  const dayError = isDay(fromDay) ? undefined : 'A date as 2026-12-01.';
  const failure = add.error ?? end.error;
  return (
    <Section title="Laboratory" look="small">
      {person.memberships.length === 0 ? <Text size="table" tone="inkSoft" style={{ paddingVertical: 8 }}>In no laboratory yet.</Text> : null}
      {person.memberships.map((membership) => (
        <Row key={membership.id} justify="space-between" style={{ minHeight: 44 }}>
          <Text size="table" style={{ flexShrink: 1 }}>
            {`${membership.lab}, from ${membership.fromDay}${membership.untilDay ? ` until ${membership.untilDay}` : ''}`}
          </Text>
          {membership.untilDay === null ? (
            <Button kind="quiet" label="End today" spokenLabel={`End the membership in ${membership.lab} today`} working={end.isPending} onPress={() => end.mutate({ id: membership.id, untilDay: isoToday() })} />
          ) : null}
        </Row>
      ))}
      <View style={{ gap: 12, paddingTop: 8 }}>
        <Select label="New laboratory" value={labId} placeholder="choose" options={(labs.data ?? []).map((lab) => ({ value: lab.id, label: lab.name }))} onChange={setLabId} />
        <TextField label="From" value={fromDay} onChangeText={setFromDay} error={dayError} hint="The day on which the membership begins." />
        <Row>
          <Button label="Add the membership" disabled={labId === '' || dayError !== undefined} working={add.isPending} onPress={() => add.mutate({ id: person.id, labId, fromDay }, { onSuccess: () => setLabId('') })} />
        </Row>
        {failure ? (
          <Text role="alert" tone="flagged">
            {errorInWords(failure).text}
          </Text>
        ) : null}
      </View>
    </Section>
  );
}
