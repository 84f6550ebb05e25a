import type { Href } from 'expo-router';
import { View } from 'react-native';
import { ratioSentence } from '../../shared/domain/quantityText';
import { Binomial } from '../marks/Binomial';
import { CladeMark } from '../marks/CladeMark';
import { isInside } from '../marks/placeOnLineGeometry';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { Button } from '../ui/Button';
import { Text } from '../ui/Text';
import type { FoundSpecies } from './figureGroups';
import { usePlaceOf } from './SpeciesPanel';

interface SelectedRowProps {
  found: FoundSpecies | null;
  marks: ReadonlyMap<string, CladeMarkSpec>;
  level: number;
}

/** Under the figure of a phone: the selected species with its place in words. */
export function SelectedRow({ found, marks, level }: SelectedRowProps) {
  const { colour } = useTheme();
  const place = usePlaceOf(found, level);
  const frame = { flexDirection: 'row', alignItems: 'center', gap: 10, minHeight: 54, borderTopWidth: 1, borderTopColor: colour.ink } as const;
  if (!found) {
    return (
      <View style={frame}>
        <Text size="secondary" tone="inkSoft">
          Tap a point to see its species and its place on the line.
        </Text>
      </View>
    );
  }
  const { species, result, point } = found;
  const words = place.data ? ratioSentence({ ratio: place.data.ratio, inside: isInside(place.data), level }) : place.isPending ? 'placing it on the line of the others' : 'no line of the others to compare with';
  return (
    <View style={frame} role="group" aria-label={`Selected: ${species.species}`}>
      <CladeMark clade={result.slug} spec={marks.get(result.slug)} hollow={point === null} />
      <View style={{ flex: 1, minWidth: 0 }}>
        <Binomial name={species.species} size="body" />
        <Text size="least" tone="inkSoft" lines={2}>
          {`${point === null ? 'left out; ' : point.flag === 'none' ? '' : `${point.flag}; `}${words}`}
        </Text>
      </View>
      <Button kind="quiet" label="Open" spokenLabel={`Open ${species.species}`} href={`/species/${species.slug}` as Href} style={{ marginRight: -8 }} />
    </View>
  );
}
