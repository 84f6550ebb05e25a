import { useTheme } from '../theme/ThemeProvider';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Element } from './Element';
import { StackedTable } from './StackedTable';
import { TableHead } from './TableHead';
import { TableRow } from './TableRow';
import { tableCss, type TableProps } from './tableTypes';
import { VirtualTable } from './VirtualTable';

export type { TableColumn, TableProps, TableSort } from './tableTypes';

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
        <TableHead columns={columns} sort={props.sort} onSort={props.onSort} tight={props.tight} />
        <Element as="tbody">
          {props.rows.map((item) => (
            <TableRow key={props.rowKey(item)} item={item} columns={columns} href={props.rowHref?.(item) ?? null} current={props.rowKey(item) === props.currentKey} dense={props.dense} tight={props.tight} />
          ))}
        </Element>
      </Element>
    </Element>
  );
}
