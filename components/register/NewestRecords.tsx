import type { Href } from 'expo-router';
import type { Register } from '../../shared/contracts/register';
import { dayText } from '../layout/timeText';
import { PlaceOnLine } from '../marks/PlaceOnLine';
import { Quantity } from '../marks/Quantity';
import { SpeciesCell } from '../species/SpeciesCell';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

type Newest = Register['newest'][number];

const columns: TableColumn<Newest>[] = [
  {
    key: 'species',
    head: 'species',
    cell: (row) => <SpeciesCell species={row.species} demonstration={row.demonstration} />,
  },
  { key: 'structure', head: 'structure', cell: (row) => <Text size="table">{row.structure.replaceAll('_', ' ')}</Text> },
  {
    key: 'quantity',
    head: 'neurons or mass',
    align: 'end',
    cell: (row) => (row.neurons === null ? <Quantity value={row.structureMassG} kind="mass" unit="g" tone="mass" /> : <Quantity value={row.neurons} error={row.neuronsError} kind="count" unit="neurons" tone="neurons" />),
  },
  {
    key: 'place',
    head: 'place on the line',
    phone: 'hide',
    width: 150,
    cell: (row) => (row.place ? <PlaceOnLine clade={row.place.clade} place={{ ratio: row.place.ratio, lower: row.place.lowerRatio, upper: row.place.upperRatio }} dense width={140} flagged={!row.place.inside} /> : null),
  },
  { key: 'at', head: 'approved', align: 'end', nowrap: true, cell: (row) => <Text size="table" tone="inkSoft">{dayText(row.at)}</Text> },
];

/** The records that came last into the current version. */
export function NewestRecords({ newest, total }: { newest: readonly Newest[]; total: number }) {
  return (
    <Section title="Newest records" bare end={<TextLink href={'/species' as Href} size="secondary">{`all ${total} records by species`}</TextLink>}>
      <Table caption="Newest records" rows={newest} columns={columns} rowKey={(row) => row.number} rowHref={(row) => `/records/${row.number}` as Href} />
    </Section>
  );
}
