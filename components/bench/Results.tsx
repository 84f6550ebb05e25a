import { View } from 'react-native';
import { formatInterval, formatQuantity, type QuantityKind } from '../../shared/domain/quantityText';
import type { Quantity as Estimated } from '../../shared/domain/quantity';
import type { SampleEstimate } from '../../shared/domain/sampleTypes';
import { CheckList } from '../marks/CheckList';
import { checkRows } from '../marks/checkRows';
import { Quantity } from '../marks/Quantity';
import type { QuantityName } from '../theme/tokens';
import { KeyValueRows, type KeyValue } from '../ui/KeyValueRows';
import { NumberField } from '../ui/TextField';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { dispersionSentence } from './dispersionSentence';
import type { Bench } from './useBench';

/** What follows from the counts, at once: estimates with their intervals, what is still needed, and every check. */
export function Results({ bench }: { bench: Bench }) {
  const { estimate, missing } = bench.reading;
  return (
    <View style={{ gap: 24 }}>
      <Section title="What follows from it">
        {estimate ? (
          <Numbers estimate={estimate} />
        ) : (
          <Text tone="inkSoft" style={{ paddingTop: 10 }}>
            {missing.length > 0 ? `Still to enter: ${missing.join(', ')}.` : 'The entries give no number yet: see what is said at the fields.'}
          </Text>
        )}
      </Section>
      {estimate ? <Aliquots estimate={estimate} bench={bench} /> : null}
      {estimate && estimate.checks.length > 0 ? (
        <Section title="Checks">
          <CheckList checks={checkRows(estimate.checks)} />
        </Section>
      ) : null}
    </View>
  );
}

function Numbers({ estimate }: { estimate: SampleEstimate }) {
  const doubled = estimate.scaleUpFactor === 2;
  const row = (key: string, label: string, estimated: Estimated, kind: QuantityKind, tone: QuantityName | null, missingWords: string): KeyValue => ({
    key,
    label,
    tone: tone ?? undefined,
    value: <Quantity value={estimated.value} error={estimated.standardError} kind={kind} tone={tone ?? 'ink'} doubled={doubled && kind === 'count' && estimated.value !== null} missing={missingWords} />,
    note: estimated.value === null ? undefined : intervalText(estimated, kind),
  });
  const noNeun = 'enter NeuN counts';
  const noMass = 'enter the tissue mass';
  const { neuronFraction: fraction } = estimate;
  const rows: KeyValue[] = [
    row('cells', 'cells', estimate.cells, 'count', 'cells', 'not defined'),
    row('neurons', 'neurons', estimate.neurons, 'count', 'neurons', noNeun),
    row('other', 'other cells', estimate.otherCells, 'count', 'other', noNeun),
    row('cellsPerMg', 'cells per mg', estimate.cellsPerMg, 'density', null, noMass),
    row('neuronsPerMg', 'neurons per mg', estimate.neuronsPerMg, 'density', null, fraction.value === null ? noNeun : noMass),
    row('otherPerMg', 'other cells per mg', estimate.otherCellsPerMg, 'density', null, fraction.value === null ? noNeun : noMass),
  ];
  if (estimate.structureMassG !== null && estimate.scaleUpFactor !== 1) rows.push({ key: 'mass', label: 'mass, scaled up', tone: 'mass', value: <Quantity value={estimate.structureMassG} kind="mass" unit="g" tone="mass" /> });
  if (fraction.value !== null) {
    rows.push({
      key: 'fraction',
      label: 'NeuN-positive fraction',
      value: <Quantity value={fraction.value} error={fraction.standardError} kind="fraction" />,
      note: `95 % ${formatInterval(fraction.lower, fraction.upper, 3)}; ${fraction.varianceKind === 'between-fields' ? 'error between fields, the larger one' : 'binomial error'}`,
    });
  }
  return (
    <View style={{ gap: 8 }} role="status" aria-live="off">
      <KeyValueRows rows={rows} strongLabels />
      <Text size="secondary" tone="inkSoft">
        ± standard error, with 95 % intervals. The error is technical: weighing, volume and dilution enter only where you give their errors. NeuN misses some neurons, and other cells are not all glia.
      </Text>
      {doubled ? <Text size="secondary">One side was counted and scaled to both: mass, counts and their errors × 2, densities as counted.</Text> : null}
    </View>
  );
}

/** "95 % (1.19 – 1.31) × 10⁸". */
function intervalText({ lower, upper, standardError }: Estimated, kind: QuantityKind): string | undefined {
  if (lower === null || upper === null) return undefined;
  const text = (value: number) => formatQuantity({ value: standardError && kind !== 'fraction' ? Number(value.toPrecision(4)) : value, kind: kind === 'density' ? 'density' : 'count', unit: '' })?.text ?? '–';
  return `95 % ${text(lower)} to ${text(upper)}`;
}

function Aliquots({ estimate, bench }: { estimate: SampleEstimate; bench: Bench }) {
  const cv = (value: number | null) => (value === null ? 'not defined' : value.toFixed(3));
  const sentence = dispersionSentence(estimate);
  const { aliquotsStillNeeded: needed, aliquotsForTargetCv: total, standardErrorKind: kind } = estimate;
  return (
    <Section title="The aliquots">
      <KeyValueRows
        rows={[
          { key: 'cv', label: 'CV between aliquots', value: cv(estimate.aliquotCv) },
          { key: 'poisson', label: 'CV of counting', value: cv(estimate.poissonCv), note: `${estimate.nucleiCounted} nuclei in ${estimate.aliquotsCounted} ${estimate.aliquotsCounted === 1 ? 'aliquot' : 'aliquots'}` },
          { key: 'se', label: 'the standard error is', value: kind === null ? 'not defined' : kind === 'between-aliquots' ? 'that between aliquots, the larger' : 'that of counting, the larger' },
        ]}
      />
      <View style={{ gap: 12, paddingTop: 10 }}>
        {sentence ? <Text size="table">{sentence}</Text> : null}
        <View style={{ flexDirection: 'row', gap: 16, alignItems: 'flex-start' }}>
          <NumberField label="CV aimed at" grow value={bench.entry.targetCv} onChangeText={bench.setTargetCv} hint="of the mean" error={bench.reading.problems['targetCv']} />
          <View style={{ flex: 1, paddingTop: 24 }}>
            <Text size="table" weight="semibold" role="status">
              {needed === null || total === null ? 'Aliquots still needed: not defined' : needed === 0 ? 'Enough aliquots counted' : `${needed} more ${needed === 1 ? 'aliquot' : 'aliquots'} needed`}
            </Text>
            {total === null ? null : (
              <Text size="secondary" tone="inkSoft">
                {`${total} in all, ${estimate.aliquotsCounted} counted`}
              </Text>
            )}
          </View>
        </View>
      </View>
    </Section>
  );
}
