import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { Register } from '../../shared/contracts/register';
import { formatBeforeAfter, formatExponent, formatInterval } from '../../shared/domain/quantityText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { CladeName } from '../marks/CladeMark';
import { ExponentWhisker, scaleFor } from '../marks/ExponentWhisker';
import { StrokeAxis, StrokeStrip } from '../marks/StrokeStrip';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

type Exponent = Register['exponents'][number];

/** Decades that hold all strokes, log10. */
function rangeOf(exponents: readonly Exponent[]): readonly [number, number] {
  const logs = exponents.flatMap((exponent) => exponent.strokes.map((stroke) => Math.log10(stroke.x))).filter(Number.isFinite);
  return logs.length === 0 ? [6, 10] : [Math.floor(Math.min(...logs) * 2) / 2, Math.ceil(Math.max(...logs) * 2) / 2];
}

/** Exponents of the current version: mass of the cortex on its neurons, one row a clade. */
export function StandingExponents({ exponents, previous }: { exponents: readonly Exponent[]; previous: string | null }) {
  const { wide, sideBySide, width } = useBreakpoint();
  const range = rangeOf(exponents);
  const scale = scaleFor(exponents.flatMap(({ exponent, lower, upper }) => (exponent === null ? [] : [{ exponent, lower, upper }])));
  const stripWidth = sideBySide ? Math.min(240, Math.max(150, width - 1190)) : 200;
  const columns: TableColumn<Exponent>[] = [
    {
      key: 'clade',
      head: 'clade',
      cell: (row) => <CladeName clade={row.clade} name={row.cladeName} count={wide ? undefined : row.n} />,
    },
    { key: 'n', head: 'species', align: 'end', phone: 'hide', cell: (row) => <Text size="table">{String(row.n)}</Text> },
    {
      key: 'strokes',
      head: 'neurons in the cerebral cortex, each stroke a species',
      headContent: <StrokeAxis range={range} title="neurons in the cerebral cortex" tone="neurons" width={stripWidth} />,
      phone: 'hide',
      cell: (row) => <StrokeStrip clade={row.clade} strokes={row.strokes.map((stroke) => ({ id: stroke.slug, value: stroke.x, isNew: stroke.isNew, setAside: stroke.setAside }))} range={range} width={stripWidth} />,
    },
    {
      key: 'whisker',
      head: 'exponent with its interval',
      headContent: <View />,
      cell: (row) => (row.exponent === null ? null : <ExponentWhisker clade={row.clade} exponent={row.exponent} lower={row.lower} upper={row.upper} scale={scale} width={wide ? 96 : 64} />),
    },
    {
      key: 'exponent',
      head: 'exponent',
      align: 'end',
      cell: (row) => (
        <Text size="table" weight="semibold">
          {row.exponent === null ? '–' : formatExponent(row.exponent)}
        </Text>
      ),
    },
    { key: 'interval', head: '95 % interval', align: 'end', nowrap: true, cell: (row) => <Text size="table">{row.unfit ?? formatInterval(row.lower, row.upper)}</Text> },
    ...(previous === null
      ? []
      : [
          {
            key: 'since',
            head: `since version ${previous}`,
            align: 'end' as const,
            phone: 'hide' as const,
            cell: (row: Exponent) => (
              <Text size="table" tone="inkSoft">
                {row.previous === null || row.exponent === null ? 'new' : formatBeforeAfter(row.previous, row.exponent).difference}
              </Text>
            ),
          },
        ]),
  ];
  return (
    <Section title="Standing exponents" bare end={<Text size="secondary" tone="inkSoft">{wide ? 'mass of the cerebral cortex on its neurons, least squares over species means' : 'cortex on neurons'}</Text>}>
      {exponents.length === 0 ? (
        <Text size="table" tone="inkSoft">
          No clade has five species with both values yet.
        </Text>
      ) : (
        <Table caption="Standing exponents of the cerebral cortex" rows={exponents} columns={columns} rowKey={(row) => row.slug} rowHref={(row) => `/scaling?clades=${row.clade}` as Href} phoneLayout="table" />
      )}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: 16, paddingTop: 8 }}>
        <TextLink href={'/scaling' as Href} size="secondary">
          Every structure, clade and method
        </TextLink>
        {wide ? (
          <Text size="secondary" tone="inkSoft">
            Each stroke is a species; a dot of ink above it: new in this version; broken: set aside from the fit.
          </Text>
        ) : null}
      </View>
    </Section>
  );
}
