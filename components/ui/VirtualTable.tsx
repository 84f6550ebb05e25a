import { useVirtualizer } from '@tanstack/react-virtual';
import { useRef } from 'react';
import { row as rowHeight } from '../theme/tokens';
import { Element } from './Element';
import { StackedRow } from './StackedTable';
import { tableCss, type TableProps } from './tableTypes';
import { TableHead } from './TableHead';
import { TableRow } from './TableRow';

/** A long table in a box of its own that scrolls; only the rows in sight are in the page. */
export function VirtualTable<Item>(props: TableProps<Item> & { stacked: boolean }) {
  const { caption, rows, columns, rowKey, rowHref, currentKey, dense, stacked, sort, onSort, boxHeight = 560 } = props;
  const box = useRef<HTMLElement>(null);
  const virtual = useVirtualizer({
    count: rows.length,
    getScrollElement: () => box.current,
    estimateSize: () => (stacked ? 44 + 24 * (columns.length - 1) : dense ? rowHeight.dense : rowHeight.table),
    getItemKey: (index) => {
      const item = rows[index];
      return item === undefined ? index : rowKey(item);
    },
    overscan: 8,
  });
  const shown = virtual.getVirtualItems();
  const before = shown[0]?.start ?? 0;
  const after = virtual.getTotalSize() - (shown.at(-1)?.end ?? 0);
  const body = shown.map((place) => {
    const item = rows[place.index];
    if (item === undefined) return null;
    const shared = { item, columns, href: rowHref?.(item) ?? null, current: rowKey(item) === currentKey, rowIndex: place.index + 1, elementRef: virtual.measureElement };
    return stacked ? <StackedRow key={place.key} {...shared} /> : <TableRow key={place.key} {...shared} dense={dense} />;
  });
  return (
    <Element as="div" elementRef={box} attributes={{ tabIndex: 0, role: 'region', 'aria-label': `${caption}, scrolls` }} css={{ maxHeight: boxHeight, overflowY: 'auto', position: 'relative' }}>
      {stacked ? (
        <Element as="div" attributes={{ role: 'table', 'aria-label': caption, 'aria-rowcount': rows.length }}>
          <Element as="div" css={{ height: before }} />
          {body}
          <Element as="div" css={{ height: after }} />
        </Element>
      ) : (
        <Element as="table" css={tableCss} attributes={{ 'aria-label': caption, 'aria-rowcount': rows.length + 1 }}>
          <TableHead columns={columns} sort={sort} onSort={onSort} sticky />
          <Element as="tbody">
            <Element as="tr" attributes={{ 'aria-hidden': true }} css={{ height: before }} />
            {body}
            <Element as="tr" attributes={{ 'aria-hidden': true }} css={{ height: after }} />
          </Element>
        </Element>
      )}
    </Element>
  );
}
