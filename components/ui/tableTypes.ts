import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import type { Tone } from '../theme/tokens';

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
  /** Half the room between columns, for many numbers in a narrow place. */
  tight?: boolean;
  /** On a phone: stacked rows (default), or still a table for few narrow columns (`phone: 'hide'` leaves columns out). */
  phoneLayout?: 'stack' | 'table';
  sort?: TableSort;
  onSort?: (sort: TableSort) => void;
  /** Height in px of the scrolling box above 100 rows; shorter tables grow with the page. */
  boxHeight?: number;
}

export const tableCss = { width: '100%', borderCollapse: 'collapse', borderSpacing: 0 } as const;

/** Cell padding: the outer edges of a table stand flush with the text around it. */
export function edgePadding(index: number, count: number, vertical: number, wide: boolean): string {
  const between = wide ? 10 : 5;
  return `${vertical}px ${index === count - 1 ? 0 : between}px ${vertical}px ${index === 0 ? 0 : between}px`;
}
