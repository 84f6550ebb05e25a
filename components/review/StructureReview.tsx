import { View } from 'react-native';
import type { SpecimenContent } from '../../shared/contracts/content';
import type { DerivedStructure } from '../../shared/contracts/submissions';
import { readStructure } from '../../shared/domain/specimenReading';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Quantity } from '../marks/Quantity';
import { Button } from '../ui/Button';
import { KeyValueRows, type KeyValue } from '../ui/KeyValueRows';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { AliquotTable } from './AliquotTable';

interface StructureReviewProps {
  content: SpecimenContent;
  index: number;
  derived: DerivedStructure | undefined;
  /** Opens a comment at a field; absent for who may not comment. */
  onComment?: (path: string) => void;
}

const sideWords = { left: 'left side', right: 'right side', both: 'both sides', midline: 'midline', 'not-stated': 'side not stated' } as const;

/** One structure of a specimen: raw counts per sample, and what follows from them. */
export function StructureReview({ content, index, derived, onComment }: StructureReviewProps) {
  const { wide } = useBreakpoint();
  const entry = content.structures[index];
  if (!entry) return null;
  const path = `structures.${index}`;
  const read = readStructure(entry, path);
  const name = entry.structure.replaceAll('_', ' ') || 'structure not chosen';
  const halves = derived ? split(derivedRows(derived), wide) : [];
  return (
    <Section title={name} end={onComment ? <Button kind="quiet" label="Comment" spokenLabel={`Comment on ${name}`} onPress={() => onComment(path)} /> : null}>
      <View style={{ gap: 16, paddingTop: 10 }}>
        {read.samples.map((sample, at) => {
          const side = entry.samples[at]?.side;
          const label = entry.samples[at]?.label || `sample ${at + 1}`;
          return (
            <View key={entry.samples[at]?.id ?? at} style={{ gap: 4 }}>
              <Row justify="space-between">
                <Text size="table" weight="semibold">
                  {side && sideWords[side] !== label ? `${label}, ${sideWords[side]}` : label}
                </Text>
                {onComment ? <Button kind="quiet" label="Comment" spokenLabel={`Comment on ${label} of ${name}`} onPress={() => onComment(`${path}.samples.${at}`)} /> : null}
              </Row>
              <AliquotTable sample={sample} label={`${label} of ${name}`} />
            </View>
          );
        })}
        {read.samples.length === 0 ? <Text size="table" tone="inkSoft">Weighed, not counted.</Text> : null}
        <View style={{ flexDirection: wide ? 'row' : 'column', gap: wide ? 32 : 0 }}>
          {halves.map((rows, half) => (
            <View key={half} style={{ flex: 1 }}>
              <KeyValueRows rows={rows} />
            </View>
          ))}
        </View>
        {derived?.doubled ? <Text size="secondary" tone="inkSoft">One side counted and scaled to both: mass, counts and their standard errors × 2; per-mg values are those of the tissue counted.</Text> : null}
        {entry.note || entry.delineationNote ? <Text size="secondary">{[entry.delineationNote, entry.note].filter(Boolean).join(' · ')}</Text> : null}
      </View>
    </Section>
  );
}

export type DerivedValues = Pick<DerivedStructure, 'structureMassG' | 'cells' | 'neurons' | 'otherCells' | 'neuronsPerMg' | 'cellsPerMg' | 'doubled'>;

/** Mass, counts and densities of a structure, each in its quantity's colour. */
export function derivedRows({ structureMassG, cells, neurons, otherCells, neuronsPerMg, cellsPerMg, doubled }: DerivedValues): KeyValue[] {
  const count = (key: 'cells' | 'neurons' | 'otherCells', label: string, tone: 'cells' | 'neurons' | 'other', estimate: { value: number | null; standardError: number | null }): KeyValue => ({
    key,
    label,
    tone,
    value: <Quantity value={estimate.value} error={estimate.standardError} kind="count" tone={tone} doubled={doubled} />,
  });
  return [
    { key: 'mass', label: 'mass', tone: 'mass', value: <Quantity value={structureMassG} kind="mass" unit="g" tone="mass" doubled={doubled} /> },
    count('cells', 'cells', 'cells', cells),
    count('neurons', 'neurons', 'neurons', neurons),
    count('otherCells', 'other cells', 'other', otherCells),
    { key: 'neuronsPerMg', label: 'neurons per mg', value: <Quantity value={neuronsPerMg.value} error={neuronsPerMg.standardError} kind="density" /> },
    { key: 'cellsPerMg', label: 'cells per mg', value: <Quantity value={cellsPerMg.value} error={cellsPerMg.standardError} kind="density" /> },
  ];
}

function split(rows: KeyValue[], wide: boolean): KeyValue[][] {
  const half = Math.ceil(rows.length / 2);
  return wide ? [rows.slice(0, half), rows.slice(half)] : [rows];
}
