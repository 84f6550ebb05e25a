import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { useTheme } from '../theme/ThemeProvider';
import type { Tone } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Element } from './Element';
import { StackedTable } from './StackedTable';
import { TableHead } from './TableHead';
import { TableRow } from './TableRow';
import { VirtualTable } from './VirtualTable';

export interface TableColumn<Item> {
  key: string;
  /** Words of the head; also the label of the value in stacked rows. */
  head: string;
  /** Drawn instead of the words (an axis); the words stay for ears. */
  headContent?: ReactNode;
  tone?: Tone;
  align?: 'start' | 'end';
  /** px or a CSS width. */
  width?: number | string;
  cell: (item: Item) => ReactNode;
  /** In stacked rows: its own labelled line (default), over the full width, or left out. */
  phone?: 'line' | 'full' | 'hide';
  /** Can be sorted by, see `sort`. */
  sortable?: boolean;
  /** Cells do not break. */
  nowrap?: boolean;
}

export interface TableSort {
  key: string;
  direction: 'ascending' | 'descending';
}

export interface TableProps<Item> {
  /** Names the table for a screen reader. */
  caption: string;
  rows: readonly Item[];
  columns: readonly TableColumn<Item>[];
  rowKey: (item: Item) => string;
  /** The whole row leads there; the link is in the first cell. */
  rowHref?: (item: Item) => Href | null;
  /** The row shown beside or above. */
  currentKey?: string;
  /** Rows of 34 px instead of 40. */
  dense?: boolean;
  /** On a phone: stacked rows (default), or still a table for few narrow columns (`phone: 'hide'` leaves columns out). */
  phoneLayout?: 'stack' | 'table';
  sort?: TableSort;
  onSort?: (sort: TableSort) => void;
  /** Height in px of the scrolling box above 100 rows; shorter tables grow with the page. */
  boxHeight?: number;
}

const MANY_ROWS = 100;

/** A real table, dense on wide screens, stacked rows with the first column kept on a phone, windowed above 100 rows. */
export function Table<Item>(props: TableProps<Item>) {
  const { wide } = useBreakpoint();
  const { colour } = useTheme();
  const stacked = !wide && props.phoneLayout !== 'table';
  if (props.rows.length > MANY_ROWS) return <VirtualTable {...props} stacked={stacked} />;
  if (stacked) return <StackedTable {...props} />;
  const columns = wide ? props.columns : props.columns.filter((column) => column.phone !== 'hide');
  return (
    <Element as="div" css={{ maxWidth: '100%', overflowX: 'auto' }}>
      <Element as="table" css={tableCss} attributes={{ 'aria-label': props.caption }} nativeStyle={{ borderTopColor: colour.ink }}>
        <TableHead columns={columns} sort={props.sort} onSort={props.onSort} />
        <Element as="tbody">
          {props.rows.map((item) => (
            <TableRow key={props.rowKey(item)} item={item} columns={columns} href={props.rowHref?.(item) ?? null} current={props.rowKey(item) === props.currentKey} dense={props.dense} />
          ))}
        </Element>
      </Element>
    </Element>
  );
}

export const tableCss = { width: '100%', borderCollapse: 'collapse', borderSpacing: 0 } as const;
