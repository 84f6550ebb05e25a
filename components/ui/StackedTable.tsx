import type { Href } from 'expo-router';
import type { Ref } from 'react';
import { useTheme } from '../theme/ThemeProvider';
import { row as rowHeight } from '../theme/tokens';
import { CellContent } from './CellContent';
import { Element } from './Element';
import { Sign } from './Sign';
import type { TableColumn, TableProps } from './tableTypes';
import { Text } from './Text';
import { TextLink } from './TextLink';

/** The table on a phone: each row a block, first column on top, then a labelled line for each value. Roles keep it a table to ears. */
export function StackedTable<Item>({ caption, rows, columns, rowKey, rowHref, currentKey }: TableProps<Item>) {
  const { colour } = useTheme();
  return (
    <Element as="div" attributes={{ role: 'table', 'aria-label': caption }} css={{ borderTop: `1px solid ${colour.ink}` }}>
      {rows.map((item) => (
        <StackedRow key={rowKey(item)} item={item} columns={columns} href={rowHref?.(item) ?? null} current={rowKey(item) === currentKey} />
      ))}
    </Element>
  );
}

interface StackedRowProps<Item> {
  item: Item;
  columns: readonly TableColumn<Item>[];
  href: Href | null;
  current?: boolean;
  rowIndex?: number;
  elementRef?: Ref<HTMLElement>;
}

export function StackedRow<Item>({ item, columns, href, current, rowIndex, elementRef }: StackedRowProps<Item>) {
  const { colour } = useTheme();
  const [first, ...rest] = columns;
  if (!first) return null;
  return (
    <Element
      as="div"
      elementRef={elementRef}
      attributes={{ role: 'row', 'data-index': rowIndex === undefined ? undefined : rowIndex - 1, 'aria-rowindex': rowIndex, 'aria-current': current || undefined }}
      css={{ position: 'relative', padding: '8px 0', background: current ? colour.wash : undefined, borderBottom: `1px solid ${colour.hairline}` }}
      nativeStyle={{ paddingVertical: 8 }}
    >
      <Element as="div" attributes={{ role: 'rowheader' }} css={{ display: 'flex', alignItems: 'center', justifyContent: 'space-between', minHeight: href === null ? 28 : rowHeight.phone - 8, gap: 8 }}>
        {href === null ? (
          <CellContent strong>{first.cell(item)}</CellContent>
        ) : (
          <>
            <TextLink href={href} look="plain" coversRow>
              <CellContent strong>{first.cell(item)}</CellContent>
            </TextLink>
            <Element as="span" css={{ transform: 'rotate(-90deg)', display: 'flex' }}>
              <Sign name="chevron" tone="inkSoft" size={12} />
            </Element>
          </>
        )}
      </Element>
      {rest
        .filter((column) => column.phone !== 'hide')
        .map((column) => (
          <Element key={column.key} as="div" attributes={{ role: 'cell' }} css={{ display: 'flex', flexWrap: 'wrap', justifyContent: 'space-between', alignItems: 'baseline', columnGap: 12, padding: '2px 0' }} nativeStyle={{ flexDirection: 'row' }}>
            <Text size="table" tone={column.tone ?? 'inkSoft'}>
              {column.head}
            </Text>
            <Element as="div" css={column.phone === 'full' ? { width: '100%' } : { textAlign: 'right', marginLeft: 'auto' }}>
              <CellContent>{column.cell(item)}</CellContent>
            </Element>
          </Element>
        ))}
    </Element>
  );
}
