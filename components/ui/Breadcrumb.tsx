import type { Href } from 'expo-router';
import { View } from 'react-native';
import { Text } from './Text';
import { TextLink } from './TextLink';

/** The way from the register down to this page; the last step is the page itself. */
export function Breadcrumb({ steps }: { steps: readonly { label: string; href: Href | null }[] }) {
  return (
    <View role="navigation" aria-label="Way to this page" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 8 }}>
      {steps.map(({ label, href }, index) => (
        <View key={label} style={{ flexDirection: 'row', gap: 8, alignItems: 'center' }}>
          {index > 0 ? (
            <Text size="secondary" tone="inkSoft">
              ›
            </Text>
          ) : null}
          {href === null ? (
            <Text size="secondary" tone="inkSoft">
              {label}
            </Text>
          ) : (
            <TextLink href={href} size="secondary" style={{ paddingVertical: 4 }}>
              {label}
            </TextLink>
          )}
        </View>
      ))}
    </View>
  );
}
