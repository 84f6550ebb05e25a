import { router, useLocalSearchParams, type Href } from 'expo-router';
import { View } from 'react-native';
import type { Recheck } from '../../shared/contracts/rechecks';
import { recheckStatuses } from '../../shared/contracts/vocabulary';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { ageText } from '../layout/timeText';
import { BinomialSpan } from '../marks/Binomial';
import { DemoMark } from '../marks/DemoMark';
import { StateSign } from '../marks/StateSign';
import { errorInWords } from '../queries/errorInWords';
import { useRechecks } from '../queries/rechecks';
import { EmptyState } from '../ui/Message';
import { QueryView } from '../ui/QueryView';
import { SegmentedChoice } from '../ui/SegmentedChoice';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

const who = ['contributor', 'reviewer', 'curator'];

const columns: TableColumn<Recheck>[] = [
  {
    key: 'record',
    head: 'record',
    cell: (item) => (
      <View style={{ gap: 2 }}>
        <Text>
          <BinomialSpan name={item.species} />
        </Text>
        <Text size="secondary" tone="inkSoft">{`${item.record} · ${item.structure.replaceAll('_', ' ')}`}</Text>
        {item.demonstration ? <DemoMark /> : null}
      </View>
    ),
  },
  { key: 'state', head: 'state', nowrap: true, cell: (item) => <StateSign state={item.status} /> },
  { key: 'question', head: 'question', phone: 'full', cell: (item) => <Text size="table" lines={3}>{item.question}</Text> },
  { key: 'lab', head: 'laboratory', cell: (item) => <Text size="table" tone="inkSoft">{item.lab ?? 'none'}</Text> },
  { key: 'age', head: 'asked', align: 'end', nowrap: true, cell: (item) => <Text size="table" tone="inkSoft">{ageText(item.at)}</Text> },
];

const choices = [{ value: 'all' as const, label: 'all' }, ...recheckStatuses.map((status) => ({ value: status, label: status }))];
const emptyWords = { open: 'No re-check is open.', answered: 'No answer waits to be closed.', closed: 'No re-check has been closed.' } as const;

/** Re-checks: questions to a record, answered by its laboratory, closed by a reviewer of another one. */
export function RecheckListScreen() {
  return (
    <RoleGate title="Re-checks" roles={who}>
      <Rechecks />
    </RoleGate>
  );
}

function Rechecks() {
  const params = useLocalSearchParams<{ state?: string }>();
  const state = recheckStatuses.find((status) => status === params.state) ?? null;
  const rechecks = useRechecks();
  return (
    <Screen title="Re-checks" sub="A question to a record: its laboratory answers, a reviewer of another laboratory closes. Nothing is dropped by itself.">
      <View style={{ maxWidth: 480 }}>
        <SegmentedChoice label="State" labelHidden value={state ?? 'all'} options={choices} onChange={(value) => router.setParams({ state: value === 'all' ? '' : value })} />
      </View>
      <QueryView
        pending={rechecks.isPending}
        error={rechecks.error ? errorInWords(rechecks.error) : null}
        data={rechecks.data}
        isEmpty={(page) => page.items.length === 0}
        empty={{ title: 'No re-checks yet.', text: 'A reviewer or curator asks for one at a record, often from a flag; it then appears here and as a notice.' }}
        onRetry={() => void rechecks.refetch()}
      >
        {(page) => {
          const shown = state === null ? page.items : page.items.filter((item) => item.status === state);
          if (shown.length === 0) return <EmptyState title={state === null ? 'No re-checks yet.' : emptyWords[state]} text="Choose another state." />;
          return <Table caption="Re-checks" rows={shown} columns={columns} rowKey={(item) => item.id} rowHref={(item) => `/rechecks/${item.id}` as Href} />;
        }}
      </QueryView>
    </Screen>
  );
}
