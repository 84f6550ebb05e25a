import { View } from 'react-native';
import type { DerivedStructure } from '../../shared/contracts/submissions';
import { useBreakpoint } from '../layout/useBreakpoint';
import { PlaceOnLine, PlaceOnLineShort } from '../marks/PlaceOnLine';
import { Quantity } from '../marks/Quantity';
import { useTheme } from '../theme/ThemeProvider';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';

/** Where each structure lies against its clade's line fitted without this species. */
export function PlacesOfSubmission({ structures }: { structures: readonly DerivedStructure[] }) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const cladeName = structures.find((structure) => structure.place)?.place?.cladeName;
  return (
    <Section title={cladeName ? `Place on the line of ${cladeName}` : 'Place on the line'} look="small" end={<Text size="secondary" tone="inkSoft">the line is fitted without this species</Text>}>
      {structures.map(({ entryId, structure, neurons, place, noPlace }) => {
        const value = place ? { ratio: place.ratio, lower: place.lowerRatio, upper: place.upperRatio } : null;
        return (
          <View key={entryId} style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 16, minHeight: 40, paddingVertical: 6, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
            <View style={{ width: wide ? 130 : '45%' }}>
              <Text size="table">{structure.replaceAll('_', ' ')}</Text>
            </View>
            <View style={{ width: wide ? 130 : '45%', alignItems: 'flex-end' }}>
              <Quantity value={neurons.value} error={neurons.standardError} kind="count" tone="neurons" />
            </View>
            {place ? (
              <>
                <PlaceOnLine clade={place.clade} place={value} dense width={160} flagged={!place.inside} />
                <View style={{ marginLeft: 'auto' }}>
                  <PlaceOnLineShort place={value} />
                </View>
                <Text size="least" tone="inkSoft" style={{ width: '100%' }}>
                  {place.sentence}
                </Text>
              </>
            ) : (
              <Text size="secondary" tone="inkSoft" style={{ flexShrink: 1 }}>
                {noPlace ?? 'No line to compare with.'}
              </Text>
            )}
          </View>
        );
      })}
    </Section>
  );
}
