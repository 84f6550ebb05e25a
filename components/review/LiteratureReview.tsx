import type { LiteratureContent, LiteratureNumber, LiteratureValueEntry } from '../../shared/contracts/content';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { BinomialSpan } from '../marks/Binomial';

/** A printed number with its spread and what kinds they are. */
function printed({ text, unit, centre, spreadText, spreadKind, n }: LiteratureNumber): string {
  if (text === '') return '–';
  const spread = spreadText === '' ? '' : ` (${spreadKind} ${spreadText})`;
  return `${text} ${unit === 'count' ? '' : unit}${spread}; ${centre.replaceAll('-', ' ')}${n === '' ? '' : `, n = ${n}`}`;
}

const numberColumn = (key: 'bodyMass' | 'structureMass' | 'cells' | 'neurons' | 'otherCells', head: string, tone: 'mass' | 'cells' | 'neurons' | 'other'): TableColumn<LiteratureValueEntry> => ({
  key,
  head,
  tone,
  cell: (value) => <Text size="table">{printed(value[key])}</Text>,
});

const columns: TableColumn<LiteratureValueEntry>[] = [
  { key: 'species', head: 'species', cell: (value) => <Text size="table"><BinomialSpan name={value.nameAsEntered} /></Text> },
  { key: 'structure', head: 'structure', cell: (value) => <Text size="table">{value.structure.replaceAll('_', ' ')}</Text> },
  numberColumn('structureMass', 'structure mass', 'mass'),
  numberColumn('cells', 'cells', 'cells'),
  numberColumn('neurons', 'neurons', 'neurons'),
  numberColumn('otherCells', 'other cells', 'other'),
  numberColumn('bodyMass', 'body mass', 'mass'),
  { key: 'place', head: 'place in the source', cell: (value) => <Text size="secondary" tone="inkSoft">{[value.place, value.printedDifferently].filter(Boolean).join(' · ') || '–'}</Text> },
];

/** The values of a source, each as printed with its kind of centre and spread. */
export function LiteratureReview({ content }: { content: LiteratureContent }) {
  return (
    <Section title="Values as printed" end={<Text size="secondary" tone="inkSoft">{content.source.citation}</Text>} bare>
      <Table caption="Values as printed" rows={content.values} columns={columns} rowKey={(value) => value.id} />
    </Section>
  );
}
