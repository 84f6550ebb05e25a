import { useState } from 'react';
import { View } from 'react-native';
import type { Person } from '../../shared/contracts/people';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { DemoMark } from '../marks/DemoMark';
import { errorInWords } from '../queries/errorInWords';
import { usePeople } from '../queries/people';
import { Button } from '../ui/Button';
import { QueryView } from '../ui/QueryView';
import { Stack } from '../ui/Row';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { SearchField } from '../ui/TextField';
import { AdministrationLinks } from './AdministrationLinks';
import { PersonSheet } from './PersonSheet';

const currentLab = (person: Person): string => person.memberships.find((membership) => membership.untilDay === null)?.lab ?? '–';

const columns = (open: (person: Person) => void): TableColumn<Person>[] => [
  {
    key: 'name',
    head: 'name',
    cell: (person) => (
      <View>
        <Text size="table" weight="semibold">
          {person.name}
        </Text>
        {person.demonstration ? <DemoMark words="invented person" /> : null}
      </View>
    ),
  },
  { key: 'email', head: 'mail address', cell: (person) => <Text size="table">{person.kind === 'system' ? '–' : person.email}</Text> },
  { key: 'roles', head: 'roles', cell: (person) => <Text size="table">{person.kind === 'system' ? 'system' : person.roles.join(', ') || 'none'}</Text> },
  { key: 'lab', head: 'laboratory', cell: (person) => <Text size="table">{currentLab(person)}</Text> },
  {
    key: 'state',
    head: 'account',
    cell: (person) => (
      <Text size="table" tone={person.disabled ? 'flagged' : 'inkSoft'}>
        {person.disabled ? 'disabled' : person.emailVerified || person.kind === 'system' ? 'in use' : 'address not confirmed'}
      </Text>
    ),
  },
  {
    key: 'act',
    head: 'change',
    align: 'end',
    cell: (person) => (person.kind === 'system' ? null : <Button kind="quiet" label="Change" spokenLabel={`Change roles and laboratory of ${person.name}`} onPress={() => open(person)} />),
  },
];

/** Who is in the register: roles, dated laboratory, account. */
export function PeopleScreen() {
  return (
    <RoleGate title="People" roles={['administrator']}>
      <People />
    </RoleGate>
  );
}

function People() {
  const [search, setSearch] = useState('');
  const [openId, setOpenId] = useState<string | null>(null);
  const people = usePeople(search);
  const shown = people.data?.items.find((person) => person.id === openId) ?? null;
  return (
    <Screen title="People" sub="Signing up gives no role; roles are sets of permissions, not a ladder." actions={<AdministrationLinks current="people" />}>
      <Stack gap={16}>
        <SearchField label="Search people by name or mail address" placeholder="name or mail address" value={search} onChangeText={setSearch} />
        <QueryView
          pending={people.isPending}
          error={people.error ? errorInWords(people.error) : null}
          data={people.data}
          isEmpty={(page) => page.items.length === 0}
          empty={{ title: 'Nobody of this name.', text: 'Search by another part of the name or address.' }}
          onRetry={() => void people.refetch()}
        >
          {(page) => <Table caption="People" rows={page.items} columns={columns((person) => setOpenId(person.id))} rowKey={(person) => person.id} />}
        </QueryView>
      </Stack>
      {shown ? <PersonSheet key={shown.id} person={shown} onClose={() => setOpenId(null)} /> : null}
    </Screen>
  );
}
