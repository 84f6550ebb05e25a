import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { Button } from '../ui/Button';
import { EmptyState } from '../ui/Message';
import { Row } from '../ui/Row';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import type { ScalingChoice } from './scalingChoice';

interface NoLineProps {
  answer: ScalingAnswer;
  change: (part: Partial<ScalingChoice>) => void;
}

const questionsWithData = [
  { label: 'mass of the cerebral cortex on its neurons', href: '/scaling' },
  { label: 'mass of the cerebellum on its neurons', href: '/scaling?yStructure=cerebellum' },
  { label: 'mass of the rest of the brain on its neurons', href: '/scaling?yStructure=rest_of_brain' },
  { label: 'mass of the brain on body mass', href: '/scaling?x=bodyMassG&yStructure=brain_not_specified' },
] as const;

/** No clade is chosen, or none of those chosen holds both values: which do, and which questions have answers. */
export function NoLine({ answer, change }: NoLineProps) {
  const reasons = [...new Set(answer.fits.flatMap(({ unfit }) => (unfit ? [unfit.message] : [])))];
  const able = [...answer.available].sort((a, b) => Number(b.standing) - Number(a.standing) || b.species - a.species).slice(0, 8);
  return (
    <View style={{ gap: 12 }}>
      <EmptyState title="No clade to draw." text={able.length > 0 ? 'Choose one or more clades that hold both values.' : (reasons[0] ?? 'No clade holds three species with both values measured on the same animals.')} />
      {able.length > 0 ? (
        <Row wrap gap={8}>
          {able.map(({ slug, name, species }) => (
            <Button key={slug} label={`${name}, ${species} species`} onPress={() => change({ clades: [slug] })} />
          ))}
        </Row>
      ) : (
        <View>
          <Text size="secondary" tone="inkSoft">
            Questions that have data:
          </Text>
          {questionsWithData.map(({ label, href }) => (
            <TextLink key={href} href={href as Href} style={{ paddingVertical: 8 }}>
              {label}
            </TextLink>
          ))}
        </View>
      )}
    </View>
  );
}
