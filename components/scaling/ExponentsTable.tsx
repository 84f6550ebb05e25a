import { View } from 'react-native';
import { formatExponent, formatInterval } from '../../shared/domain/quantityText';
import { CladeName } from '../marks/CladeMark';
import { ExponentAxis, ExponentWhisker, scaleFor } from '../marks/ExponentWhisker';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import type { CladeResult } from './figureGroups';

interface ExponentsTableProps {
  results: readonly CladeResult[];
  marks: ReadonlyMap<string, CladeMarkSpec>;
  level: number;
}

/** Exponent, interval and residual SD of every clade, with whiskers on one scale. */
export function ExponentsTable({ results, marks, level }: ExponentsTableProps) {
  const { wide, sideBySide, width } = useBreakpoint();
  const drawnWidth = sideBySide && width < 1600 ? 76 : undefined;
  const scale = scaleFor(results.flatMap(({ fit: { exponent } }) => (exponent ? [{ exponent: exponent.estimate, lower: exponent.lower, upper: exponent.upper }] : [])));
  const columns: TableColumn<CladeResult>[] = [
    { key: 'clade', head: 'clade, species', cell: ({ slug, name, fit }) => <CladeName clade={slug} name={name} count={fit.n} spec={marks.get(slug)} /> },
    {
      key: 'whisker',
      head: 'exponent drawn',
      headContent: <ExponentAxis scale={scale} width={drawnWidth} />,
      cell: ({ slug, fit: { exponent } }) =>
        exponent ? (
          <View style={{ height: 30 }}>
            <ExponentWhisker clade={slug} spec={marks.get(slug)} exponent={exponent.estimate} lower={exponent.lower} upper={exponent.upper} scale={scale} width={drawnWidth} />
          </View>
        ) : null,
    },
    {
      key: 'exponent',
      head: 'exponent',
      align: 'end',
      nowrap: true,
      cell: ({ fit: { exponent } }) => (
        <Text size="table" weight="semibold" tone={exponent ? 'ink' : 'inkSoft'}>
          {exponent ? formatExponent(exponent.estimate) : '–'}
        </Text>
      ),
    },
    {
      key: 'interval',
      head: `${Number((level * 100).toPrecision(3))} % interval`,
      align: 'end',
      nowrap: true,
      cell: ({ fit: { exponent } }) => (exponent ? formatInterval(exponent.lower, exponent.upper) : '–'),
    },
    { key: 'sd', head: 'resid. SD', align: 'end', nowrap: true, phone: 'hide', cell: ({ fit: { residualSd } }) => (residualSd === null ? '–' : residualSd.toFixed(3)) },
  ];
  // Wide as drawn: the whiskers close the row.
  const [clade, whisker, ...numbers] = columns;
  const ordered = wide && clade && whisker ? [clade, ...numbers, whisker] : columns;
  return <Table caption="Exponents" rows={results} columns={ordered} rowKey={({ slug }) => slug} dense={!wide} tight phoneLayout="table" />;
}
