import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { RecordRow } from '../../shared/contracts/records';
import type { SpeciesPage } from '../../shared/contracts/register';
import { useBreakpoint } from '../layout/useBreakpoint';
import { PlaceOnLine } from '../marks/PlaceOnLine';
import { Quantity } from '../marks/Quantity';
import { KeyValueRows, type KeyValue } from '../ui/KeyValueRows';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

type Structure = SpeciesPage['structures'][number];

const columns: TableColumn<RecordRow>[] = [
  { key: 'number', head: 'record', nowrap: true, cell: (row) => <Text size="table">{row.number}</Text> },
  { key: 'of', head: 'of', cell: (row) => <Text size="table">{row.specimen ? `specimen ${row.specimen}` : `${row.n === null ? 'n not stated' : `n = ${row.n}`}, ${row.centre.replaceAll('-', ' ')}`}</Text> },
  { key: 'mass', head: 'mass, g', tone: 'mass', align: 'end', cell: (row) => <Quantity value={row.structureMassG} error={row.structureMassError} kind="mass" tone="mass" /> },
  { key: 'neurons', head: 'neurons', tone: 'neurons', align: 'end', cell: (row) => <Quantity value={row.neurons} error={row.neuronsError} kind="count" tone="neurons" /> },
  { key: 'other', head: 'other cells', tone: 'other', align: 'end', cell: (row) => <Quantity value={row.otherCells} error={row.otherCellsError} kind="count" tone="other" /> },
  { key: 'state', head: '', cell: (row) => <Text size="secondary" tone="inkSoft">{[row.setAside.length > 0 ? 'set aside' : '', row.openRecheck ? 're-check open' : ''].filter(Boolean).join(', ')}</Text> },
];

function meanRows({ mean }: Structure): KeyValue[] {
  const rows: KeyValue[] = [
    { key: 'mass', label: 'mass', tone: 'mass', value: <Quantity value={mean.structureMassG} error={mean.structureMassError} kind="mass" unit="g" tone="mass" /> },
    { key: 'cells', label: 'cells', tone: 'cells', value: <Quantity value={mean.cells} error={mean.cellsError} kind="count" tone="cells" /> },
    { key: 'neurons', label: 'neurons', tone: 'neurons', value: <Quantity value={mean.neurons} error={mean.neuronsError} kind="count" tone="neurons" /> },
    { key: 'other', label: 'other cells', tone: 'other', value: <Quantity value={mean.otherCells} error={mean.otherCellsError} kind="count" tone="other" /> },
    { key: 'density', label: 'neurons per mg', value: <Quantity value={mean.neuronsPerMg} kind="density" /> },
    { key: 'body', label: 'body mass', tone: 'mass', value: <Quantity value={mean.bodyMassG} kind="mass" unit="g" tone="mass" /> },
  ];
  const present: Record<string, number | null> = { mass: mean.structureMassG, cells: mean.cells, neurons: mean.neurons, other: mean.otherCells, density: mean.neuronsPerMg, body: mean.bodyMassG };
  return rows.filter((row) => present[row.key] !== null);
}

/** One structure of a species: place on the line, mean, and the records behind it. */
export function StructureOfSpecies({ structure, clade }: { structure: Structure; clade: string }) {
  const { wide } = useBreakpoint();
  const { place, noPlace, mean, records } = structure;
  return (
    <Section title={structure.name}>
      <View style={{ gap: 12, paddingTop: 8 }}>
        <View style={{ flexDirection: wide ? 'row' : 'column-reverse', gap: wide ? 32 : 8 }}>
          <View style={{ flex: wide ? 1 : undefined }}>
            <KeyValueRows rows={meanRows(structure)} />
            {mean.errorKind !== 'none' && mean.errorKind !== 'not-stated' ? <Text size="least" tone="inkSoft">{`± is the ${mean.errorKind}`}</Text> : null}
          </View>
          <View style={{ flex: wide ? 1 : undefined, gap: 4 }}>
            <PlaceOnLine clade={place?.clade ?? clade} place={place ? { ratio: place.ratio, lower: place.lowerRatio, upper: place.upperRatio } : null} noLineWords={noPlace ?? undefined} level={place?.level} flagged={place ? !place.inside : false} />
            {place ? <Text size="secondary" tone="inkSoft">{`line of ${place.cladeName}, ${place.n} species, fitted without this one${place.extrapolated ? '; beyond the range of the line' : ''}`}</Text> : null}
          </View>
        </View>
        <Table caption={`Records of ${structure.name}`} rows={records} columns={columns} rowKey={(row) => row.number} rowHref={(row) => `/records/${row.number}` as Href} dense />
      </View>
    </Section>
  );
}
