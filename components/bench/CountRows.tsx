import { View } from 'react-native';
import { exclusionReasons } from '../../shared/contracts/vocabulary';
import type { SampleEntry } from '../../shared/contracts/content';
import { findChamber } from '../../shared/domain/chambers';
import { formatQuantity } from '../../shared/domain/quantityText';
import { parseCount, parseDilution, parseVolumeMl } from '../../shared/domain/units';
import type { Tone } from '../theme/tokens';
import { useTheme } from '../theme/ThemeProvider';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Button } from '../ui/Button';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Select } from '../ui/Select';
import { Text } from '../ui/Text';
import { NumberField } from '../ui/TextField';
import { nextAliquot, nextField } from './benchEntry';
import type { Bench } from './useBench';

type Aliquot = SampleEntry['aliquots'][number];
const included = 'counts';
const densityWidth = 92;
const squaresWidth = 72;
const rowFrame = { flexDirection: 'row', gap: 8, alignItems: 'center' } as const;


/** Density of one load in the original suspension, per mL, or null while it cannot be said. */
function densityPerMl(sample: SampleEntry, aliquot: Aliquot): number | null {
  const nuclei = parseCount(aliquot.nuclei).value;
  const squares = parseCount(aliquot.squares).value;
  const square = findChamber(sample.chamber.key)?.squareVolumeMl ?? parseVolumeMl(sample.chamber.squareVolume).value;
  const dilution = parseDilution(sample.dilution).value ?? 1;
  if (nuclei === null || squares === null || squares <= 0 || square === null || square <= 0) return null;
  return (nuclei * dilution) / (squares * square);
}

/** Chamber loads: nuclei, squares, density, and whether the load counts. An excluded one stays listed with its reason. */
export function AliquotRows({ bench }: { bench: Bench }) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const numberWidth = wide ? 52 : 18;
  const { sample } = bench.entry;
  const { problems } = bench.reading;
  const set = (index: number, part: Partial<Aliquot>) => bench.setSample({ aliquots: sample.aliquots.map((aliquot, place) => (place === index ? { ...aliquot, ...part } : aliquot)) });
  return (
    <Section title="Aliquots" end={<Text size="secondary" tone="inkSoft">one chamber load each</Text>}>
      <View style={[rowFrame, { paddingTop: 8, paddingBottom: 4, alignItems: 'flex-end' }]} aria-hidden={true}>
        <Head width={numberWidth} words={wide ? 'aliquot' : ''} />
        <Head words="nuclei" tone="cells" />
        <Head width={squaresWidth} words="squares" />
        <Head words="use" />
        {wide ? <Head width={densityWidth} words="per mL" end /> : null}
      </View>
      {sample.aliquots.map((aliquot, index) => {
        const density = densityPerMl(sample, aliquot);
        const name = `aliquot ${index + 1}`;
        const densityText = density === null ? '' : (formatQuantity({ value: Number(density.toPrecision(3)), kind: 'count' })?.text ?? '');
        const found = [problems[`aliquots.${index}.nuclei`], problems[`aliquots.${index}.squares`]].filter((text) => text !== undefined);
        return (
          <View key={index} role="group" aria-label={name} style={{ paddingVertical: 6, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
            <View style={rowFrame}>
              <View style={{ width: numberWidth }}>
                <Text size="table" tone={aliquot.excluded ? 'inkSoft' : 'ink'}>
                  {index + 1}
                </Text>
              </View>
              <NumberField label={`nuclei, ${name}`} labelHidden messageHidden tone="cells" whole strong align="right" grow value={aliquot.nuclei} onChangeText={(nuclei) => set(index, { nuclei })} error={problems[`aliquots.${index}.nuclei`]} />
              <View style={{ width: squaresWidth }}>
                <NumberField label={`squares, ${name}`} labelHidden messageHidden whole align="right" value={aliquot.squares} onChangeText={(squares) => set(index, { squares })} error={problems[`aliquots.${index}.squares`]} />
              </View>
              <Select
                label={`use of ${name}`}
                labelHidden
                grow
                value={aliquot.excluded ?? included}
                options={[{ value: included, label: included }, ...exclusionReasons.map((reason) => ({ value: reason, label: wide ? `left out: ${reason}` : `out: ${reason}` }))]}
                onChange={(value) => set(index, { excluded: exclusionReasons.find((reason) => reason === value) ?? null })}
              />
              {wide ? (
                <View style={{ width: densityWidth }}>
                  <Text size="table" tone="inkSoft" align="right">
                    {densityText}
                  </Text>
                </View>
              ) : null}
            </View>
            {wide || densityText === '' ? null : (
              <Text size="least" tone="inkSoft" style={{ paddingLeft: numberWidth + 8, paddingTop: 2 }}>
                {`${densityText} per mL`}
              </Text>
            )}
            {found.map((text) => (
              <Text key={text} size="secondary" tone="flagged">
                {text}
              </Text>
            ))}
          </View>
        );
      })}
      <Row gap={10} wrap style={{ paddingTop: 10 }}>
        <Button label="Add an aliquot" disabled={sample.aliquots.length >= 60} onPress={() => bench.setSample({ aliquots: [...sample.aliquots, nextAliquot(sample)] })} />
        <Button kind="quiet" label="Remove the last" spokenLabel="Remove the last aliquot" disabled={sample.aliquots.length <= 1} onPress={() => bench.setSample({ aliquots: sample.aliquots.slice(0, -1) })} />
      </Row>
    </Section>
  );
}

function Head({ words, width, tone = 'inkSoft', end }: { words: string; width?: number; tone?: Tone; end?: boolean }) {
  return (
    <View style={width === undefined ? { flexGrow: 1, flexShrink: 1, flexBasis: 0 } : { width }}>
      <Text size="secondary" tone={tone} weight={tone === 'inkSoft' ? 'regular' : 'semibold'} align={end ? 'right' : 'left'}>
        {words}
      </Text>
    </View>
  );
}

/** NeuN-positive nuclei of all nuclei scored, field by field. */
export function NeunRows({ bench }: { bench: Bench }) {
  const { sample } = bench.entry;
  const { problems } = bench.reading;
  const set = (index: number, part: Partial<SampleEntry['neun'][number]>) => bench.setSample({ neun: sample.neun.map((field, place) => (place === index ? { ...field, ...part } : field)) });
  return (
    <Section title="NeuN-positive fraction" end={<Text size="secondary" tone="inkSoft">per field or load</Text>}>
      {sample.neun.map((field, index) => (
        <View key={index} role="group" aria-label={`field ${index + 1}`} style={{ flexDirection: 'row', gap: 10, alignItems: 'flex-start', paddingTop: 10 }}>
          <NumberField label={`NeuN-positive, field ${index + 1}`} tone="neurons" whole strong grow value={field.positive} onChangeText={(positive) => set(index, { positive })} error={problems[`neun.${index}.positive`]} />
          <NumberField label="of nuclei scored" tone="cells" whole grow value={field.total} onChangeText={(total) => set(index, { total })} error={problems[`neun.${index}.total`]} />
        </View>
      ))}
      <Row gap={10} wrap style={{ paddingTop: 12 }}>
        <Button label="Add a field" disabled={sample.neun.length >= 200} onPress={() => bench.setSample({ neun: [...sample.neun, nextField()] })} />
        <Button kind="quiet" label="Remove the last" spokenLabel="Remove the last field" disabled={sample.neun.length <= 1} onPress={() => bench.setSample({ neun: sample.neun.slice(0, -1) })} />
      </Row>
    </Section>
  );
}
