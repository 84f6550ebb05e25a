import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { RecordRow } from '../../shared/contracts/records';
import type { RecordPage } from '../../shared/contracts/register';
import { PropertyList, type Property } from '../marks/PropertyList';
import { Quantity } from '../marks/Quantity';
import { KeyValueRows } from '../ui/KeyValueRows';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

/** The numbers of a record: scaled up to the whole structure, per-mg values of the tissue counted. */
export function RecordValues({ row }: { row: RecordRow }) {
  const errorWords = row.kind === 'specimen' ? '± is the technical standard error: aliquots and NeuN, not weighing' : row.spreadKind === 'none' || row.spreadKind === 'not-stated' ? '' : `± is the ${row.spreadKind} as printed`;
  return (
    <Section title="Values" look="small">
      <KeyValueRows
        rows={[
          { key: 'mass', label: 'mass', tone: 'mass', value: <Quantity value={row.structureMassG} error={row.structureMassError} kind="mass" unit="g" tone="mass" missing="not given" /> },
          { key: 'cells', label: 'cells', tone: 'cells', value: <Quantity value={row.cells} error={row.cellsError} kind="count" tone="cells" missing="not given" /> },
          { key: 'neurons', label: 'neurons', tone: 'neurons', value: <Quantity value={row.neurons} error={row.neuronsError} kind="count" tone="neurons" missing="not given" /> },
          { key: 'other', label: 'other cells', tone: 'other', value: <Quantity value={row.otherCells} error={row.otherCellsError} kind="count" tone="other" missing="not given" /> },
          { key: 'density', label: 'neurons per mg', value: <Quantity value={row.neuronsPerMg} kind="density" missing="not given" /> },
          { key: 'cellDensity', label: 'cells per mg', value: <Quantity value={row.cellsPerMg} kind="density" missing="not given" /> },
          { key: 'ratio', label: 'other cells per neuron', value: <Quantity value={row.otherToNeuronRatio} kind="ratio" missing="not given" /> },
          { key: 'body', label: 'body mass', tone: 'mass', value: <Quantity value={row.bodyMassG} error={row.bodyMassError} kind="mass" unit="g" tone="mass" missing="not given" />, note: row.bodyMassG === null ? undefined : row.bodyMassKind },
        ]}
      />
      <Text size="least" tone="inkSoft" style={{ paddingTop: 6 }}>
        {[errorWords, row.scaledUp].filter(Boolean).join('. ')}
      </Text>
    </Section>
  );
}

const words = (text: string): string => text.replaceAll('-', ' ');

/** Where a record comes from and how it was made. What is not known is left out. */
export function RecordFacts({ page }: { page: RecordPage }) {
  const { row } = page;
  const facts: [string, string][] = [
    ['name as entered', row.nameAsEntered === row.species ? '' : row.nameAsEntered],
    ['origin', row.origin],
    ['sex', row.sex],
    ['age class', row.ageClass],
    ['animals', row.n === null ? 'not stated' : String(row.n)],
    ['pooled with', row.pooledWith.join(', ')],
    ['centre', words(row.centre)],
    ['mass state', row.massState],
    ['fixation', row.fixation],
    ['method of counting', row.method],
    ['composition', row.composition],
    ['delineation', row.delineation.map(words).join(', ')],
    ['laboratory', row.lab ?? ''],
    ['approval', row.approval],
    ['place in the source', row.sourcePlace],
    ['printed differently', row.printedDifferently],
    ['note', row.note],
    ['in versions', page.inVersions.join(', ')],
    ['approved by', row.approvedBy],
  ];
  const properties: Property[] = facts.filter(([, value]) => value.trim() !== '').map(([label, value]) => ({ key: label, label, value }));
  return (
    <Section title="Provenance" look="small" style={{ gap: 10 }}>
      <View style={{ gap: 4 }}>
        <Text science size="table">
          {row.sourceCitation}
        </Text>
        {row.sourceDoi ? (
          <TextLink href={`https://doi.org/${row.sourceDoi}` as Href} outside size="secondary">
            {row.sourceDoi}
          </TextLink>
        ) : null}
        {row.sharesAnimalsWith.map((shared) => (
          <Text key={shared.source} size="secondary" tone="inkSoft">
            {`shares animals with ${shared.source}: ${shared.overlap}`}
          </Text>
        ))}
      </View>
      <PropertyList properties={properties} columnWidth={190} />
    </Section>
  );
}
