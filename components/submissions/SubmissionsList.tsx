import type { Href } from 'expo-router';
import type { SubmissionItem } from '../../shared/contracts/submissions';
import { ageText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { BinomialSpan } from '../marks/Binomial';
import { CladeMark } from '../marks/CladeMark';
import { DemoMark } from '../marks/DemoMark';
import { StateSign } from '../marks/StateSign';
import { Row } from '../ui/Row';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

type Column = TableColumn<SubmissionItem>;

const species: Column = {
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
};
const state: Column = { key: 'state', head: 'state', width: 175, nowrap: true, cell: (item) => <StateSign state={item.status} words={`${item.status.replaceAll('-', ' ')}${item.revision > 1 ? `, revision ${item.revision}` : ''}`} /> };
const revision: Column = { key: 'revision', head: 'revision', align: 'end', cell: (item) => <Text size="table">{String(item.revision)}</Text> };
const structures: Column = { key: 'structures', head: 'structures', cell: (item) => <Text size="table">{structuresText(item)}</Text> };
const recheck: Column = {
  key: 'recheck',
  head: 're-check',
  nowrap: true,
  cell: (item) =>
    item.openRecheck ? (
      <StateSign state="re-check open" words="open" />
    ) : (
      <Text size="table" tone="inkSoft">
        –
      </Text>
    ),
};
const by: Column = { key: 'by', head: 'entered by', cell: (item) => <Text size="table" tone="inkSoft" nowrap>{item.by.name}</Text> };
const age: Column = { key: 'age', head: 'last change', align: 'end', nowrap: true, cell: (item) => <Text size="table" tone="inkSoft">{agoText(item.updatedAt)}</Text> };

const stateAlone: Column = { ...state, cell: (item) => <StateSign state={item.status} /> };

function structuresText({ structures: keys, kind, species: name }: SubmissionItem): string {
  const words = keys.map((key) => key.replaceAll('_', ' '));
  const list = words.length > 4 ? `${words.slice(0, 3).join(', ')} and ${words.length - 3} more` : words.join(', ');
  if (list === '') return 'none yet';
  return kind === 'literature' && name !== '' ? `${name}: ${list}` : list;
}

function agoText(iso: string): string {
  const text = ageText(iso);
  return text === 'today' ? text : `${text} ago`;
}

/** Submissions as a table, or stacked rows on a phone; each row leads to its page. A column that would be empty is left out. */
export function SubmissionsList({ items }: { items: readonly SubmissionItem[] }) {
  const { wide } = useBreakpoint();
  const asked = items.some((item) => item.openRecheck !== null);
  const columns = wide ? [species, stateAlone, revision, structures, ...(asked ? [recheck] : []), by, age] : [species, state, structures, ...(asked ? [recheck] : []), age];
  return <Table caption="Submissions" rows={items} columns={columns} rowKey={(item) => item.id} rowHref={(item) => `/submissions/${item.id}` as Href} />;
}
