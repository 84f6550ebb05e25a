import type { Href } from 'expo-router';
import type { Ref } from 'react';
import { useTheme } from '../theme/ThemeProvider';
import { row as rowHeight } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { CellContent } from './CellContent';
import { Element } from './Element';
import { edgePadding, type TableColumn } from './tableTypes';
import { TextLink } from './TextLink';

interface TableRowProps<Item> {
  item: Item;
  columns: readonly TableColumn<Item>[];
  href: Href | null;
  current?: boolean;
  dense?: boolean;
  tight?: boolean;
  /** Place in the whole list, counted from 1, where only part of it is in the page. */
  rowIndex?: number;
  elementRef?: Ref<HTMLElement>;
}

/** One row of a table: first cell is its head and holds the link, a hairline below. */
export function TableRow<Item>({ item, columns, href, current, dense, tight, rowIndex, elementRef }: TableRowProps<Item>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <Element
      as="tr"
      elementRef={elementRef}
      attributes={{ 'data-row': '', 'data-index': rowIndex === undefined ? undefined : rowIndex - 1, 'aria-rowindex': rowIndex === undefined ? undefined : rowIndex + 1, 'aria-current': current || undefined }}
      css={{ height: dense ? rowHeight.dense : rowHeight.table, background: current ? colour.wash : undefined, borderBottom: `1px solid ${colour.hairline}` }}
      nativeStyle={{ flexDirection: 'row', borderBottomWidth: 1, borderBottomColor: colour.hairline }}
    >
      {columns.map((column, index) => {
        const content = <CellContent nowrap={column.nowrap}>{column.cell(item)}</CellContent>;
        return (
          <Element
            key={column.key}
            as={index === 0 ? 'th' : 'td'}
            attributes={index === 0 ? { scope: 'row' } : undefined}
            css={{
              textAlign: column.align === 'end' ? 'right' : 'left',
              verticalAlign: 'middle',
              padding: edgePadding(index, columns.length, 3, wide && !tight),
              fontFamily: fontFamily('sans'),
              fontWeight: 'normal',
              // The cell's own line is that of its text, so that marks, links and numbers stand on one middle.
              fontSize: 15,
              lineHeight: '20px',
              whiteSpace: column.nowrap ? 'nowrap' : undefined,
            }}
          >
            {index === 0 && href !== null ? (
              <TextLink href={href} look="plain" coversRow>
                {content}
              </TextLink>
            ) : (
              content
            )}
          </Element>
        );
      })}
    </Element>
  );
}
