import type { ReactNode } from 'react';
import { View } from 'react-native';
import type { SampleEntry, StructureEntry } from '../../../shared/contracts/content';
import type { DerivedStructure } from '../../../shared/contracts/submissions';
import { readStructure } from '../../../shared/domain/specimenReading';
import { checkName } from '../../marks/checkRows';
import { PlaceOnLine } from '../../marks/PlaceOnLine';
import { derivedRows } from '../../review/StructureReview';
import { useTheme } from '../../theme/ThemeProvider';
import { radius } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { KeyValueRows } from '../../ui/KeyValueRows';
import { Section } from '../../ui/Section';
import { Sign } from '../../ui/Sign';
import { Text } from '../../ui/Text';
import { useDraftContext } from './DraftContext';
import { doubledScaleUp } from './SampleFields';

interface StructureOutcomeProps {
  path: string;
  entry: StructureEntry;
  /** Of the register's preview: its place on the line. */
  derived: DerivedStructure | undefined;
  pending: boolean;
  onSamples: (make: (samples: SampleEntry[]) => SampleEntry[]) => void;
}

/** What follows from a structure's entries, what is doubtful about them, and where it lies on the line. */
export function StructureOutcome({ path, entry, derived, pending, onSamples }: StructureOutcomeProps) {
  const { checks } = useDraftContext();
  const { estimate, structureMassG } = readStructure(entry, path);
  const doubled = entry.samples.some((sample) => sample.scaleUp.kind === 'other-side');
  const doubts = checks.filter((check) => check.level !== 'passes' && check.code !== 'missing' && (check.path === path || check.path === `${path}.samples`));
  const place = derived?.structure === entry.structure ? (derived.place ?? null) : null;
  return (
    <View style={{ gap: 18 }}>
      <Section title="What follows from it" level={3}>
        <KeyValueRows rows={derivedRows({ ...estimate, structureMassG, doubled })} strongLabels />
        {doubled ? (
          <Text size="secondary" tone="inkSoft">
            ×2 where one side was scaled to both.
          </Text>
        ) : null}
      </Section>
      {doubts.map((check) => (
        <Doubt key={`${check.code}@${check.path}`} name={checkName(check.code)} figure={check.figure} text={check.message} impossible={check.level === 'blocks'}>
          {check.code === 'side-not-doubled' ? (
            <>
              <Button label="Double it" onPress={() => onSamples((samples) => samples.map((sample) => (sample.scaleUp.kind === 'none' && sample.side !== 'midline' && sample.side !== 'both' ? { ...sample, scaleUp: doubledScaleUp } : sample)))} grow />
              <Button label="Both were counted" onPress={() => onSamples((samples) => samples.map((sample) => ({ ...sample, side: 'both' })))} grow />
            </>
          ) : null}
        </Doubt>
      ))}
      <Section title={place ? `Place on the line of ${place.cladeName}` : 'Place on the line'} level={3} look="small" end={pending ? <Text size="least" tone="inkSoft">computing</Text> : null}>
        <View style={{ paddingTop: 6, gap: 4 }}>
          {place ? (
            <>
              <PlaceOnLine clade={place.clade} place={{ ratio: place.ratio, lower: place.lowerRatio, upper: place.upperRatio }} dense flagged={!place.inside} />
              <Text size="secondary">
                {place.sentence}
              </Text>
            </>
          ) : (
            <Text size="secondary" tone="inkSoft">
              {derived?.noPlace ?? 'With species, mass and neurons it appears here.'}
            </Text>
          )}
        </View>
      </Section>
    </View>
  );
}

function Doubt({ name, figure, text, impossible, children }: { name: string; figure: string | null; text: string; impossible: boolean; children: ReactNode }) {
  const { colour } = useTheme();
  return (
    <View role="group" aria-label={name} style={{ padding: 14, gap: 10, borderWidth: 1, borderLeftWidth: 4, borderColor: colour.flagged, borderRadius: radius.control, backgroundColor: colour.sheet }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
        <Sign name={impossible ? 'cross' : 'ring'} tone="flagged" />
        <Text size="table" weight="semibold" tone="flagged" style={{ flex: 1 }}>
          {name}
        </Text>
        {figure ? (
          <Text size="secondary" tone="inkSoft">
            {figure}
          </Text>
        ) : null}
      </View>
      <Text size="table">{text}</Text>
      {children ? <View style={{ flexDirection: 'row', gap: 10, flexWrap: 'wrap' }}>{children}</View> : null}
    </View>
  );
}
