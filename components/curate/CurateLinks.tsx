import type { Href } from 'expo-router';
import { View } from 'react-native';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

const pages = [
  { key: 'waits', label: 'What waits', href: '/curate' },
  { key: 'taxa', label: 'Taxa', href: '/curate/taxa' },
  { key: 'freeze', label: 'Freeze', href: '/curate/freeze' },
  { key: 'audit', label: 'Audit', href: '/audit' },
] as const;

/** The pages of a curator, side by side. */
export function CurateLinks({ current }: { current: (typeof pages)[number]['key'] }) {
  return (
    <View role="navigation" aria-label="Curate" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 20 }}>
      {pages.map((page) => (
        <View key={page.key} style={{ minHeight: 44, justifyContent: 'center' }}>
          {page.key === current ? <Text weight="semibold">{page.label}</Text> : <TextLink href={page.href as Href}>{page.label}</TextLink>}
        </View>
      ))}
    </View>
  );
}
