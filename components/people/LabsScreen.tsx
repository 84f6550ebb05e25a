import { useState } from 'react';
import { View } from 'react-native';
import type { Lab } from '../../shared/contracts/people';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { DemoMark } from '../marks/DemoMark';
import { errorInWords } from '../queries/errorInWords';
import { useCreateLab, useLabs } from '../queries/people';
import { Button } from '../ui/Button';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import { AdministrationLinks } from './AdministrationLinks';

const columns: TableColumn<Lab>[] = [
  {
    key: 'name',
    head: 'laboratory',
    cell: (lab) => (
      <View>
        <Text size="table" weight="semibold">
          {lab.name}
        </Text>
        {lab.demonstration ? <DemoMark words="invented laboratory" /> : null}
      </View>
    ),
  },
  { key: 'place', head: 'place', cell: (lab) => <Text size="table">{lab.place || '–'}</Text> },
  { key: 'members', head: 'members', align: 'end', cell: (lab) => <Text size="table">{String(lab.members)}</Text> },
];

/** Laboratories of the register, and a new one. */
export function LabsScreen() {
  return (
    <RoleGate title="Laboratories" roles={['administrator']}>
      <Labs />
    </RoleGate>
  );
}

function Labs() {
  const labs = useLabs();
  return (
    <Screen title="Laboratories" sub="Whose record it is decides who may review it: never the own laboratory." actions={<AdministrationLinks current="labs" />}>
      <QueryView
        pending={labs.isPending}
        error={labs.error ? errorInWords(labs.error) : null}
        data={labs.data}
        isEmpty={(items) => items.length === 0}
        empty={{ title: 'No laboratory yet.', text: 'Make the first one below, then give people their membership.' }}
        onRetry={() => void labs.refetch()}
      >
        {(items) => <Table caption="Laboratories" rows={items} columns={columns} rowKey={(lab) => lab.id} />}
      </QueryView>
      <NewLab />
    </Screen>
  );
}

function NewLab() {
  const create = useCreateLab();
  const [name, setName] = useState('');
  const [place, setPlace] = useState('');
  const save = () => create.mutate({ name, place }, { onSuccess: () => (setName(''), setPlace('')) });
  return (
    <Section title="New laboratory">
      <View style={{ gap: 12, paddingTop: 12, maxWidth: 420 }}>
        <TextField label="Name" value={name} onChangeText={setName} maxLength={200} required error={create.error ? errorInWords(create.error).text : undefined} />
        <TextField label="Place" value={place} onChangeText={setPlace} maxLength={200} onSubmit={save} />
        <Row>
          <Button kind="primary" label="Make the laboratory" disabled={name.trim().length < 2} working={create.isPending} onPress={save} />
        </Row>
      </View>
    </Section>
  );
}
