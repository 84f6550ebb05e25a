import { useState } from 'react';
import { Pressable } from 'react-native';
import { useAccount } from '../queries/account';
import { target } from '../theme/tokens';
import { Sheet } from '../ui/Dialog';
import { Text } from '../ui/Text';
import { AccountBlock } from './AccountBlock';
import { useBreakpoint } from './useBreakpoint';

/** On a phone, at the top right of the register: who is signed in. Opens account and theme as a sheet. */
export function AccountLink() {
  const { wide } = useBreakpoint();
  const { status, name } = useAccount();
  const [open, setOpen] = useState(false);
  if (wide) return null;
  const words = status === 'in' && name ? name : 'sign in';
  return (
    <>
      <Pressable role="button" aria-haspopup="dialog" aria-label={status === 'in' ? `${words}, account and theme` : 'Sign in and theme'} onPress={() => setOpen(true)} style={{ minHeight: target.phone, justifyContent: 'center', flexShrink: 1 }}>
        <Text size="secondary" weight="semibold" tone="cresyl" lines={1}>
          {words}
        </Text>
      </Pressable>
      <Sheet open={open} title="Account and theme" onClose={() => setOpen(false)}>
        <AccountBlock />
      </Sheet>
    </>
  );
}
