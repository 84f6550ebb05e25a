import { View } from 'react-native';
import { formatExponent, formatInterval, formatP, formatRatio } from '../../shared/domain/quantityText';
import { axisValueText } from '../charts/valueText';
import type { FigureAxis } from '../charts/figureTypes';
import { BinomialSpan } from '../marks/Binomial';
import { CladeName } from '../marks/CladeMark';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { KeyValueRows, type KeyValue } from '../ui/KeyValueRows';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import type { CladeResult } from './figureGroups';

const laws: Readonly<Record<string, string>> = { '1': '1', '0.75': '3/4', '0.6667': '2/3' };

/** What a line rests on: coefficient, R², tests of stated exponents, range of x, and how far one species moves it. */
export function LinesInFull({ results, marks, x }: { results: readonly CladeResult[]; marks: ReadonlyMap<string, CladeMarkSpec>; x: FigureAxis }) {
  return (
    <Section title="What each line rests on">
      <View style={{ gap: 16, paddingTop: 10 }}>
        {results.map((result) => (
          <View key={result.slug} style={{ gap: 2 }}>
            <CladeName clade={result.slug} name={result.name} count={result.fit.n === 1 ? '1 species' : `${result.fit.n} species`} spec={marks.get(result.slug)} />
            {result.fit.unfit ? <Text size="table">{result.fit.unfit.message}</Text> : <KeyValueRows rows={factsOf(result, x)} />}
            {result.fit.notes?.map((note) => (
              <Text key={note} size="secondary" tone="inkSoft">
                {note}
              </Text>
            ))}
          </View>
        ))}
      </View>
    </Section>
  );
}

function factsOf({ fit, fitted }: CladeResult, x: FigureAxis): KeyValue[] {
  const { leaveOneOut, xRange, log10Coefficient, rSquared, residualSd, tests, smearingFactor } = fit;
  const rows: (KeyValue | null)[] = [
    leaveOneOut && {
      key: 'leave',
      label: 'exponent, any one species left out',
      value: formatInterval(leaveOneOut.lower, leaveOneOut.upper),
      note: undefined,
    },
    leaveOneOut && { key: 'most', label: 'moved most by', value: <SpeciesText name={fitted.find(({ species }) => species.slug === leaveOneOut.mostMoving)?.species.species ?? leaveOneOut.mostMoving} /> },
    xRange && { key: 'range', label: 'range of x', value: `${axisValueText(xRange.lower, x)} to ${axisValueText(xRange.upper, x)}, ${formatRatio(xRange.upper / xRange.lower)} times` },
    log10Coefficient && { key: 'coefficient', label: 'log₁₀ coefficient', value: `${formatExponent(log10Coefficient.estimate)} (${formatInterval(log10Coefficient.lower, log10Coefficient.upper)})` },
    residualSd === null ? null : { key: 'sd', label: 'residual SD, log₁₀', value: residualSd.toFixed(3) },
    { key: 'r', label: 'R²', value: rSquared === null ? 'not given' : rSquared.toFixed(3) },
    smearingFactor === null ? null : { key: 'smearing', label: 'smearing factor of the mean', value: smearingFactor.toFixed(3) },
    tests.length === 0
      ? null
      : { key: 'tests', label: 'tests of an exponent', value: tests.map(({ exponent, p }) => `${laws[String(Number(exponent.toPrecision(4)))] ?? formatExponent(exponent)}: ${formatP(p)}`).join('; ') },
  ];
  return rows.filter((row) => row !== null);
}

function SpeciesText({ name }: { name: string }) {
  return (
    <Text size="table">
      <BinomialSpan name={name} />
    </Text>
  );
}
