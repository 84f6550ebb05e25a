import type { Href } from 'expo-router';
import { View } from 'react-native';
import { useAccount } from '../queries/account';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

const pages = [
  { key: 'people', label: 'People', href: '/people', roles: ['administrator'], demoOnly: false },
  { key: 'labs', label: 'Laboratories', href: '/labs', roles: ['administrator'], demoOnly: false },
  { key: 'audit', label: 'Audit', href: '/audit', roles: ['administrator', 'curator'], demoOnly: false },
  { key: 'outbox', label: 'Outbox', href: '/outbox', roles: ['administrator'], demoOnly: true },
] as const;
export type AdministrationPage = (typeof pages)[number]['key'];

/** The pages of an administrator, side by side; the one that is open stands in ink. */
export function AdministrationLinks({ current }: { current: AdministrationPage }) {
  const { roles, demo } = useAccount();
  const open = pages.filter((page) => (demo || !page.demoOnly) && page.roles.some((role) => roles.includes(role)));
  return (
    <View role="navigation" aria-label="Administration" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 20 }}>
      {open.map((page) => (
        <View key={page.key} style={{ minHeight: 44, justifyContent: 'center' }}>
          {page.key === current ? <Text weight="semibold">{page.label}</Text> : <TextLink href={page.href as Href}>{page.label}</TextLink>}
        </View>
      ))}
    </View>
  );
}
