import type { ReactNode } from 'react';
import { Text } from 'react-native';

/** Words for a screen reader only. */
export function VisuallyHidden({ children, live }: { children: ReactNode; live?: boolean }) {
  return (
    <Text
      aria-live={live ? 'polite' : undefined}
      style={{ position: 'absolute', width: 1, height: 1, overflow: 'hidden', opacity: 0.01, margin: -1, pointerEvents: 'none' }}
    >
      {children}
    </Text>
  );
}
