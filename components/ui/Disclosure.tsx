import { useId, useState, type ReactNode } from 'react';
import { Pressable, View } from 'react-native';
import { target } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Sign } from './Sign';
import { Text } from './Text';

interface DisclosureProps {
  label: string;
  /** What is inside, in short, while it is closed. */
  note?: string;
  startsOpen?: boolean;
  children: ReactNode;
}

/** Opens and closes a part of the page. */
export function Disclosure({ label, note, startsOpen = false, children }: DisclosureProps) {
  const { wide } = useBreakpoint();
  const [open, setOpen] = useState(startsOpen);
  const id = useId();
  return (
    <View>
      <Pressable
        role="button"
        aria-expanded={open}
        aria-controls={id}
        onPress={() => setOpen(!open)}
        style={{ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: wide ? target.wide : target.phone }}
      >
        <View style={{ transform: [{ rotate: open ? '0deg' : '-90deg' }] }}>
          <Sign name="chevron" tone="cresyl" size={12} />
        </View>
        <Text weight="semibold" tone="cresyl" size="table">
          {label}
        </Text>
        {note && !open ? (
          <Text size="secondary" tone="inkSoft">
            {note}
          </Text>
        ) : null}
      </Pressable>
      <View id={id} style={{ display: open ? 'flex' : 'none', paddingTop: 4, paddingBottom: 8 }}>
        {open ? children : null}
      </View>
    </View>
  );
}
