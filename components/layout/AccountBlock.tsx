import { Pressable, View, type StyleProp, type ViewStyle } from 'react-native';
import { useAccount, useSignOut } from '../queries/account';
import { useTheme } from '../theme/ThemeProvider';
import { target } from '../theme/tokens';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import { useBreakpoint } from './useBreakpoint';

/** Who is signed in, with role and laboratory, the way out or in, and the theme's switch. */
export function AccountBlock({ style }: { style?: StyleProp<ViewStyle> }) {
  const account = useAccount();
  const signOut = useSignOut();
  const { wide } = useBreakpoint();
  const act = { minHeight: wide ? 24 : target.phone, justifyContent: 'center' } as const;
  return (
    <View style={style}>
      {account.status === 'in' ? (
        <>
          <TextLink href="/account" size="secondary" tone="ink" spokenLabel={`${account.name ?? ''}, your account`} style={{ paddingVertical: wide ? 0 : 12 }}>
            {account.name}
          </TextLink>
          <Text size="secondary" tone="inkSoft" align={wide ? 'right' : 'left'}>
            {[account.roles.join(', ') || 'no role yet', account.labName].filter(Boolean).join(' · ')}
          </Text>
          <Pressable role="button" onPress={() => signOut.mutate()} style={act}>
            <Text size="secondary" tone="cresyl">
              sign out
            </Text>
          </Pressable>
        </>
      ) : null}
      {account.status === 'out' ? (
        <>
          <Text size="secondary" weight="semibold">
            not signed in
          </Text>
          <TextLink href="/sign-in" size="secondary" style={{ paddingVertical: wide ? 2 : 12 }}>
            sign in
          </TextLink>
        </>
      ) : null}
      <ThemeSwitch />
    </View>
  );
}

/** Names the theme in force; a press goes to the other one. */
export function ThemeSwitch() {
  const { name, colour, choose } = useTheme();
  const { wide } = useBreakpoint();
  const other = name === 'brightfield' ? 'darkfield' : 'brightfield';
  return (
    <Pressable role="switch" aria-checked={name === 'darkfield'} aria-label={`Darkfield; now ${name}`} onPress={() => choose(other)} style={{ minHeight: wide ? 24 : target.phone, justifyContent: 'center', alignSelf: wide ? 'flex-end' : 'flex-start' }}>
      <Text size="secondary" tone="inkSoft" style={{ borderBottomWidth: 1, borderBottomColor: colour.tick }}>
        {name}
      </Text>
    </Pressable>
  );
}
