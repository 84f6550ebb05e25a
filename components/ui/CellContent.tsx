import type { ReactNode } from 'react';
import { Text } from './Text';

/** Plain words and numbers get the table's size; drawn content stands as it is. */
export function CellContent({ children, strong, nowrap }: { children: ReactNode; strong?: boolean; nowrap?: boolean }) {
  if (typeof children !== 'string' && typeof children !== 'number') return children;
  return (
    <Text size="table" weight={strong ? 'semibold' : 'regular'} nowrap={nowrap}>
      {children}
    </Text>
  );
}
