import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { Register } from '../../shared/contracts/register';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

type Since = NonNullable<Register['since']>;

/** What the current version brought, in five lines. */
export function SincePrevious({ since }: { since: Since }) {
  const lines: readonly [number, string][] = [
    [since.speciesCame, 'species came'],
    [since.recordsCame, 'records came'],
    [since.recordsRevised, 'records revised'],
    [since.setAside, 'records set aside'],
    [since.withdrawn, 'withdrawn'],
  ];
  return (
    <Section title={since.previous === null ? 'In this version' : `Since version ${since.previous}`} end={<TextLink href={'/versions' as Href} size="secondary">all versions</TextLink>}>
      <View style={{ paddingTop: 8, gap: 6 }}>
        {lines.map(([count, words]) => (
          <View key={words} style={{ flexDirection: 'row', gap: 16 }}>
            <Text weight="semibold" align="right" style={{ width: 32 }}>
              {String(count)}
            </Text>
            <Text>{words}</Text>
          </View>
        ))}
      </View>
    </Section>
  );
}
