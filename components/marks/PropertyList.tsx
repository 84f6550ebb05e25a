import type { ReactNode } from 'react';
import { Element } from '../ui/Element';
import { Text } from '../ui/Text';

export interface Property {
  key: string;
  label: string;
  value: ReactNode;
}

/** Small facts about a thing, name above value, as many columns as there is room for. Missing ones are left out by the caller. */
export function PropertyList({ properties, columnWidth = 150 }: { properties: readonly Property[]; columnWidth?: number }) {
  return (
    <Element as="dl" css={{ margin: 0, display: 'grid', gridTemplateColumns: `repeat(auto-fill, minmax(${columnWidth}px, 1fr))`, gap: '12px 16px' }}>
      {properties.map(({ key, label, value }) => (
        <Element key={key} as="div" css={{ minWidth: 0 }}>
          <Element as="dt">
            <Text size="secondary" tone="inkSoft">
              {label}
            </Text>
          </Element>
          <Element as="dd" css={{ margin: 0 }}>
            {typeof value === 'string' || typeof value === 'number' ? <Text size="table">{value}</Text> : value}
          </Element>
        </Element>
      ))}
    </Element>
  );
}
