import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { SubmissionItem } from '../../shared/contracts/submissions';
import { ageText } from '../layout/timeText';
import { BinomialSpan } from '../marks/Binomial';
import { CladeMark } from '../marks/CladeMark';
import { DemoMark } from '../marks/DemoMark';
import { StateSign } from '../marks/StateSign';
import { Row } from '../ui/Row';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

const columns: TableColumn<SubmissionItem>[] = [
  {
    key: 'species',
    head: 'species',
    cell: (item) => (
      <Row gap={8} align="baseline" wrap>
        {item.clade ? <CladeMark clade={item.clade} radius={4.5} /> : null}
        <Text style={{ flexShrink: 1 }}>{item.species && item.kind === 'specimen' ? <BinomialSpan name={item.species} /> : item.title}</Text>
        {item.code ? <Text size="table">{item.code}</Text> : null}
        {item.demonstration ? <DemoMark /> : null}
      </Row>
    ),
  },
  { key: 'state', head: 'state', nowrap: true, cell: (item) => <StateSign state={item.status} /> },
  { key: 'revision', head: 'revision', align: 'end', cell: (item) => <Text size="table">{String(item.revision)}</Text> },
  { key: 'structures', head: 'structures', cell: (item) => <Text size="table">{structuresText(item)}</Text> },
  {
    key: 'recheck',
    head: 're-check',
    cell: (item) =>
      item.openRecheck ? (
        <StateSign state="re-check open" words="open" />
      ) : (
        <Text size="table" tone="inkSoft">
          –
        </Text>
      ),
  },
  { key: 'by', head: 'entered by', phone: 'hide', cell: (item) => <Text size="table" tone="inkSoft">{item.by.name}</Text> },
  { key: 'age', head: 'last change', align: 'end', nowrap: true, cell: (item) => <Text size="table" tone="inkSoft">{agoText(item.updatedAt)}</Text> },
];

function structuresText({ structures, kind, species }: SubmissionItem): string {
  const words = structures.map((key) => key.replaceAll('_', ' '));
  const list = words.length > 4 ? `${words.slice(0, 3).join(', ')} and ${words.length - 3} more` : words.join(', ');
  if (list === '') return 'none yet';
  return kind === 'literature' && species !== '' ? `${species}: ${list}` : list;
}

function agoText(iso: string): string {
  const age = ageText(iso);
  return age === 'today' ? age : `${age} ago`;
}

/** Submissions as a table, or stacked rows on a phone; each row leads to its page. */
export function SubmissionsList({ items }: { items: readonly SubmissionItem[] }) {
  return (
    <View>
      <Table caption="Submissions" rows={items} columns={columns} rowKey={(item) => item.id} rowHref={(item) => `/submissions/${item.id}` as Href} />
    </View>
  );
}
