import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { axisValueText } from '../charts/valueText';
import type { FigureAxis } from '../charts/figureTypes';
import { BinomialSpan } from '../marks/Binomial';
import { DemoMark } from '../marks/DemoMark';
import { PlaceOnLine } from '../marks/PlaceOnLine';
import { isInside } from '../marks/placeOnLineGeometry';
import { StateSign } from '../marks/StateSign';
import { useAccount } from '../queries/account';
import { usePlaceOnLine } from '../queries/scaling';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { Button } from '../ui/Button';
import { Row } from '../ui/Row';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import type { FoundSpecies } from './figureGroups';
import { RecheckSheet } from './RecheckSheet';
import type { ScalingChoice } from './scalingChoice';

interface SpeciesPanelProps {
  found: FoundSpecies;
  selected: boolean;
  marks: ReadonlyMap<string, CladeMarkSpec>;
  x: FigureAxis;
  y: FigureAxis;
  level: number;
  choice: ScalingChoice;
  change: (part: Partial<ScalingChoice>) => void;
}

/** The place of a species on the line fitted without it: asked for once, kept while the choice stands. */
export function usePlaceOf(found: FoundSpecies | null, level: number) {
  return usePlaceOnLine(found ? { species: found.species, points: found.result.fit.points, level } : null);
}

/** One species that stands out or was chosen: place on the line, why it is flagged, and what can be done. */
export function SpeciesPanel({ found, selected, marks, x, y, level, choice, change }: SpeciesPanelProps) {
  const { colour } = useTheme();
  const { roles } = useAccount();
  const [asking, setAsking] = useState(false);
  const { species, point, result } = found;
  const place = usePlaceOf(found, level);
  const flagged = point !== null && point.flag !== 'none';
  const asksRecheck = roles.includes('reviewer') || roles.includes('curator');
  const state = point === null ? 'set aside' : flagged ? 'flagged' : 'selected';
  const words = [flagged ? point.flags.filter((flag) => flag !== 'none').join(', ') : null, point?.studentised == null ? null : `t = ${signed(point.studentised)}`].filter(Boolean).join(', ');
  return (
    <View style={{ gap: 4, paddingTop: 8, paddingBottom: 12, borderTopWidth: 1, borderTopColor: colour.hairline }} role="group" aria-label={`${species.species}, ${state}`}>
      <Row justify="space-between" gap={12} wrap>
        {state === 'selected' ? (
          <Text size="table" weight="semibold" tone="cresyl">
            selected
          </Text>
        ) : (
          <StateSign state={state} words={selected && state === 'flagged' ? 'flagged, selected' : undefined} />
        )}
        <Text size="secondary" tone="inkSoft">
          {words === '' ? result.name : words}
        </Text>
      </Row>
      <Text style={{ fontSize: 18, lineHeight: 26 }}>
        <BinomialSpan name={species.species} />
      </Text>
      <Text size="secondary" tone="inkSoft">
        {`${axisValueText(species.y, y)}${y.unit ? '' : ` ${y.label}`}; ${axisValueText(species.x, x)}${x.unit ? '' : ` ${x.label}`}; ${species.n === null ? 'number of animals unknown' : `${species.n} ${species.n === 1 ? 'animal' : 'animals'}`}`}
      </Text>
      {place.isPending ? (
        <Text size="secondary" tone="inkSoft">
          Placing it on the line of the others.
        </Text>
      ) : (
        <PlaceOnLine clade={result.slug} spec={marks.get(result.slug)} place={place.data ?? null} level={level} flagged={flagged} noLineWords={place.isError ? 'Its place did not arrive; choose it again.' : 'The others give no line to compare with.'} />
      )}
      {place.data ? (
        <Text size="secondary" tone="inkSoft">
          {`Least-squares line of the ${place.data.n} other species of ${result.name}${place.data.extrapolated ? '; its x lies outside their range' : ''}.`}
        </Text>
      ) : null}
      {point?.reasons.map((reason) => (
        <Text key={reason} size="table">
          {reason}
        </Text>
      ))}
      {species.setAside ? <Text size="table">{species.setAside}</Text> : null}
      {point && !flagged ? (
        <Text size="secondary" tone="inkSoft">
          {[point.studentised === null ? null : `studentised residual ${signed(point.studentised)}`, point.leverage === null ? null : `leverage ${point.leverage.toFixed(2)}`, point.cooksDistance === null ? null : `Cook’s distance ${point.cooksDistance.toFixed(2)}`].filter(Boolean).join(', ')}
        </Text>
      ) : null}
      {species.demonstration ? <DemoMark /> : null}
      <Row wrap gap={16}>
        <TextLink href={`/species/${species.slug}` as Href} size="table" style={{ paddingVertical: 8 }}>
          Open species
        </TextLink>
        {point ? <Button kind="quiet" label="Leave out" spokenLabel={`Leave out ${species.species} of this fit`} onPress={() => change({ without: [...choice.without, species.slug] })} /> : null}
        {choice.without.includes(species.slug) ? <Button kind="quiet" label="Put back" spokenLabel={`Put back ${species.species}`} onPress={() => change({ without: choice.without.filter((slug) => slug !== species.slug) })} /> : null}
        {asksRecheck ? <Button kind="quiet" label="Ask for a re-check" onPress={() => setAsking(true)} /> : null}
        {selected ? <Button kind="quiet" label="Close" spokenLabel="Select no species" onPress={() => change({ species: null })} /> : null}
      </Row>
      {asking ? <RecheckSheet species={species} about={`${y.label} on ${x.label}`} ratio={place.data && isInside(place.data) !== null ? place.data.ratio : null} onClose={() => setAsking(false)} /> : null}
    </View>
  );
}

export function signed(value: number): string {
  return value.toFixed(2).replace('-', '−');
}
