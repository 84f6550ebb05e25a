import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { CladeMark } from '../marks/CladeMark';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { Button } from '../ui/Button';
import { Checkbox } from '../ui/Checkbox';
import { Disclosure } from '../ui/Disclosure';
import { Row } from '../ui/Row';
import { Span, Text } from '../ui/Text';
import type { ScalingChoice } from './scalingChoice';

interface CladeChoiceProps {
  available: ScalingAnswer['available'];
  /** Clades shown now, in their order. */
  chosen: readonly string[];
  marks: ReadonlyMap<string, CladeMarkSpec>;
  change: (part: Partial<ScalingChoice>) => void;
  /** Two columns, in the sheet of a phone. */
  twoColumns?: boolean;
}

/** Clades that hold both values, with their marks and numbers of species; those with standing fits first. */
export function CladeChoice({ available, chosen, marks, change, twoColumns }: CladeChoiceProps) {
  const toggle = (slug: string) => change({ clades: chosen.includes(slug) ? chosen.filter((other) => other !== slug) : [...chosen, slug], species: null });
  const standing = available.filter((clade) => clade.standing || chosen.includes(clade.slug));
  const others = available.filter((clade) => !standing.includes(clade)).sort((a, b) => b.species - a.species || (a.name < b.name ? -1 : 1));
  const box = ({ slug, name, species }: ScalingAnswer['available'][number]) => (
    <View key={slug} style={twoColumns ? { width: '50%', paddingRight: 20 } : undefined}>
      <Checkbox label={name} checked={chosen.includes(slug)} mark={<CladeMark clade={slug} spec={marks.get(slug)} />} end={String(species)} onChange={() => toggle(slug)} />
    </View>
  );
  const list = (clades: ScalingAnswer['available']) => <View style={twoColumns ? { flexDirection: 'row', flexWrap: 'wrap' } : undefined}>{clades.map(box)}</View>;
  return (
    <View role="group" aria-label="Clades">
      <Row justify="space-between">
        <Text size="table" weight="semibold">
          clades <Span weight="regular" tone="inkSoft">{`${chosen.length} of ${available.length}`}</Span>
        </Text>
      </Row>
      {available.length === 0 ? (
        <Text size="secondary" tone="inkSoft">
          No clade holds three species with both values.
        </Text>
      ) : null}
      {list(standing)}
      {others.length > 0 ? (
        <Disclosure label="Other nodes" note={String(others.length)}>
          {list(others)}
          <Text size="least" tone="inkSoft">
            A node above several clades pools lines that differ.
          </Text>
        </Disclosure>
      ) : null}
      {chosen.length > 0 ? <Button kind="quiet" label="Clear clades" onPress={() => change({ clades: [], species: null })} style={{ alignSelf: 'flex-start', marginLeft: -8 }} /> : null}
    </View>
  );
}
