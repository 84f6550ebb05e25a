import { useState } from 'react';
import { Platform } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Element } from './Element';
import { Text } from './Text';

/** First stop of the keyboard: leads past the places to the content. Shows only while it has focus. */
export function SkipLink({ targetId }: { targetId: string }) {
  const { colour } = useTheme();
  const [focused, setFocused] = useState(false);
  if (Platform.OS !== 'web') return null;
  return (
    <Element
      as="a"
      attributes={{
        href: `#${targetId}`,
        onFocus: () => setFocused(true),
        onBlur: () => setFocused(false),
        onClick: (event: { preventDefault: () => void }) => {
          // The address stays as it is: it can be shared.
          event.preventDefault();
          document.getElementById(targetId)?.focus();
        },
      }}
      css={{ position: 'absolute', zIndex: 20, top: focused ? 8 : -80, left: 8, padding: '10px 16px', background: colour.sheet, border: `1px solid ${colour.tick}`, borderRadius: radius.control, textDecoration: 'none' }}
    >
      <Text weight="semibold" tone="cresyl">
        Go to the content
      </Text>
    </Element>
  );
}
