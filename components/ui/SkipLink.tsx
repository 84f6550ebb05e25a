import { useState } from 'react';
import { Platform, Pressable } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Text } from './Text';

/** First stop of the keyboard: leads past the places to the content. Shows only while it has focus. */
export function SkipLink({ targetId }: { targetId: string }) {
  const { colour } = useTheme();
  const [focused, setFocused] = useState(false);
  if (Platform.OS !== 'web') return null;
  return (
    <Pressable
      role="link"
      onFocus={() => setFocused(true)}
      onBlur={() => setFocused(false)}
      onPress={() => document.getElementById(targetId)?.focus()}
      style={{ position: 'absolute', zIndex: 20, top: focused ? 8 : -80, left: 8, paddingHorizontal: 16, paddingVertical: 10, backgroundColor: colour.sheet, borderWidth: 1, borderColor: colour.tick, borderRadius: radius.control }}
    >
      <Text weight="semibold" tone="cresyl">
        Go to the content
      </Text>
    </Pressable>
  );
}
