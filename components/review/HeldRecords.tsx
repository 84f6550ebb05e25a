import type { Href } from 'expo-router';
import type { ReviewView } from '../../shared/contracts/submissions';
import { Quantity } from '../marks/Quantity';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

type Held = ReviewView['held'][number];

const columns: TableColumn<Held>[] = [
  { key: 'number', head: 'record', nowrap: true, cell: (held) => <Text size="table">{held.number}</Text> },
  { key: 'structure', head: 'structure', cell: (held) => <Text size="table">{held.structure.replaceAll('_', ' ')}</Text> },
  { key: 'mass', head: 'mass, g', tone: 'mass', align: 'end', cell: (held) => <Quantity value={held.structureMassG} kind="mass" tone="mass" /> },
  { key: 'neurons', head: 'neurons', tone: 'neurons', align: 'end', cell: (held) => <Quantity value={held.neurons} error={held.neuronsError} kind="count" tone="neurons" /> },
  { key: 'source', head: 'source', cell: (held) => <Text size="secondary" tone="inkSoft" lines={2}>{held.source}</Text> },
];

/** What the register holds for this species already. */
export function HeldRecords({ held }: { held: readonly Held[] }) {
  return (
    <Section title="The register holds for this species" look="small" bare={held.length > 0}>
      {held.length === 0 ? (
        <Text size="table" tone="inkSoft" style={{ paddingTop: 8 }}>
          Nothing yet: this is its first record.
        </Text>
      ) : (
        <Table caption="Records of this species in the register" rows={held} columns={columns} rowKey={(item) => item.number} rowHref={(item) => `/records/${item.number}` as Href} dense />
      )}
    </Section>
  );
}
