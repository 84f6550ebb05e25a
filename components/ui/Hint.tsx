import type { ReactNode } from 'react';
import { Text } from './Text';

/** A sentence that explains what stands above it. */
export function Hint({ children, id }: { children: ReactNode; id?: string }) {
  return (
    <Text id={id} size="secondary" tone="inkSoft" paragraph style={{ maxWidth: 640 }}>
      {children}
    </Text>
  );
}
