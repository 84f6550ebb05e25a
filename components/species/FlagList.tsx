import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { FlagView } from '../../shared/contracts/fits';
import { StateSign } from '../marks/StateSign';
import { useTheme } from '../theme/ThemeProvider';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

/** Flags in words: the fit, the set that raised it, and its reasons. */
export function FlagList({ flags, title = 'Flags', withSpecies }: { flags: readonly FlagView[]; title?: string; withSpecies?: boolean }) {
  const { colour } = useTheme();
  return (
    <Section title={title} look="small">
      <View role="list">
        {flags.map((flag) => (
          <View key={flag.id} role="listitem" style={{ paddingVertical: 10, gap: 2, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
            <Row wrap gap={12}>
              <StateSign state="flagged" words={flag.kind} />
              {withSpecies ? <TextLink href={`/records/${flag.record}` as Href}>{`${flag.species}, ${flag.structure.replaceAll('_', ' ')}, ${flag.record}`}</TextLink> : null}
            </Row>
            {flag.reasons.map((reason) => (
              <Text key={reason} size="table">
                {reason}
              </Text>
            ))}
            <Text size="secondary" tone="inkSoft">
              {`${flag.fitTitle}, ${flag.set === 'working' ? 'working set' : `version ${flag.version ?? ''}`}`}
            </Text>
          </View>
        ))}
      </View>
    </Section>
  );
}
