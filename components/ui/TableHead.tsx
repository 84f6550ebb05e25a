import { Pressable } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { fontFamily } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Element } from './Element';
import { edgePadding, type TableColumn, type TableProps, type TableSort } from './tableTypes';
import { Text } from './Text';
import { VisuallyHidden } from './VisuallyHidden';

interface TableHeadProps<Item> {
  columns: readonly TableColumn<Item>[];
  sort?: TableSort;
  onSort?: TableProps<Item>['onSort'];
  sticky?: boolean;
  tight?: boolean;
}

/** Heads of the columns over a line in ink. */
export function TableHead<Item>({ columns, sort, onSort, sticky, tight }: TableHeadProps<Item>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <Element as="thead" nativeStyle={{ flexDirection: 'row' }}>
      <Element as="tr">
        {columns.map((column, index) => {
          const sorted = sort?.key === column.key ? sort.direction : undefined;
          return (
            <Element
              key={column.key}
              as="th"
              attributes={{ scope: 'col', 'aria-sort': column.sortable ? (sorted ?? 'none') : undefined }}
              css={{
                textAlign: column.align === 'end' ? 'right' : 'left',
                verticalAlign: 'bottom',
                width: column.width,
                padding: edgePadding(index, columns.length, 6, wide && !tight),
                fontFamily: fontFamily('sans'),
                fontWeight: 'normal',
                boxShadow: `inset 0 -1px 0 ${colour.ink}`,
                ...(sticky ? { position: 'sticky', top: 0, zIndex: 2, background: colour.ground } : null),
              }}
            >
              <HeadWords column={column} sorted={sorted} onSort={onSort} wide={wide} />
            </Element>
          );
        })}
      </Element>
    </Element>
  );
}

function HeadWords<Item>({ column, sorted, onSort, wide }: { column: TableColumn<Item>; sorted?: TableSort['direction']; onSort?: TableProps<Item>['onSort']; wide: boolean }) {
  if (column.headContent) {
    return (
      <>
        <VisuallyHidden>{column.head}</VisuallyHidden>
        {column.headContent}
      </>
    );
  }
  const words = (
    <Text size="secondary" tone={column.tone ?? 'inkSoft'} weight={column.tone || sorted ? 'semibold' : 'regular'} align={column.align === 'end' ? 'right' : 'left'} nowrap={column.nowrap && wide}>
      {column.head}
      {sorted ? (sorted === 'ascending' ? ' ↑' : ' ↓') : ''}
    </Text>
  );
  if (!column.sortable || !onSort) return words;
  return (
    <Pressable role="button" style={{ alignItems: column.align === 'end' ? 'flex-end' : 'flex-start' }} onPress={() => onSort({ key: column.key, direction: sorted === 'ascending' ? 'descending' : 'ascending' })}>
      {words}
    </Pressable>
  );
}
