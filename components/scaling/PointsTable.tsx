import type { Href } from 'expo-router';
import { useState } from 'react';
import { axisValueText } from '../charts/valueText';
import type { FigureAxis } from '../charts/figureTypes';
import { BinomialSpan } from '../marks/Binomial';
import { CladeName } from '../marks/CladeMark';
import { StateSign } from '../marks/StateSign';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Disclosure } from '../ui/Disclosure';
import { Section } from '../ui/Section';
import { Table, type TableColumn, type TableSort } from '../ui/Table';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import type { CladeResult, FittedPoint, SpeciesPoint } from './figureGroups';
import { signed } from './SpeciesPanel';

interface PointRow {
  key: string;
  result: CladeResult;
  species: SpeciesPoint;
  point: FittedPoint | null;
}

interface PointsTableProps {
  results: readonly CladeResult[];
  marks: ReadonlyMap<string, CladeMarkSpec>;
  x: FigureAxis;
  y: FigureAxis;
  selected: string | null;
}

const flagWords = ({ point }: PointRow): string => (point === null ? 'set aside' : point.flags.filter((flag) => flag !== 'none').join(', '));
const figure = (value: number | null | undefined): string => (value == null ? '–' : signed(value));

/** The figure's numbers: every species mean with its residual, influence, flag and the records it is made of. */
export function PointsTable({ results, marks, x, y, selected }: PointsTableProps) {
  const { wide } = useBreakpoint();
  const [sort, setSort] = useState<TableSort>({ key: 'clade', direction: 'ascending' });
  const rows = sorted(rowsOf(results), sort);
  const table = <Table caption="Points of the figure" rows={rows} columns={columnsOf(marks, x, y)} rowKey={({ key }) => key} currentKey={rows.find(({ species }) => species.slug === selected)?.key} dense sort={sort} onSort={setSort} />;
  const title = 'The figure’s numbers';
  if (!wide) {
    return (
      <Disclosure label={title} note={`${rows.length} species`}>
        {table}
      </Disclosure>
    );
  }
  return (
    <Section title={title} bare end={<Text size="secondary" tone="inkSoft">{`${rows.length} species means; residuals on log₁₀`}</Text>}>
      {table}
    </Section>
  );
}

function rowsOf(results: readonly CladeResult[]): PointRow[] {
  return results.flatMap((result) => [
    ...result.fitted.map(({ species, point }) => ({ key: `${result.slug} ${species.slug}`, result, species, point })),
    ...result.aside.map((species) => ({ key: `${result.slug} ${species.slug}`, result, species, point: null })),
  ]);
}

const numberOf: Readonly<Record<string, (row: PointRow) => number | string | null>> = {
  species: ({ species }) => species.species,
  clade: ({ result, species }) => `${result.name} ${species.species}`,
  y: ({ species }) => species.y,
  x: ({ species }) => species.x,
  residual: ({ point }) => point?.residual ?? null,
  studentised: ({ point }) => point?.studentised ?? null,
  leverage: ({ point }) => point?.leverage ?? null,
  cook: ({ point }) => point?.cooksDistance ?? null,
};

function sorted(rows: readonly PointRow[], { key, direction }: TableSort): PointRow[] {
  const of = numberOf[key] ?? (() => null);
  const turn = direction === 'ascending' ? 1 : -1;
  return [...rows].sort((a, b) => {
    const [first, second] = [of(a), of(b)];
    if (first === null || second === null) return Number(first === null) - Number(second === null);
    if (typeof first === 'number' && typeof second === 'number') return (first - second) * turn;
    return String(first).localeCompare(String(second)) * turn;
  });
}

function columnsOf(marks: ReadonlyMap<string, CladeMarkSpec>, x: FigureAxis, y: FigureAxis): TableColumn<PointRow>[] {
  const number = (key: string, head: string, cell: (row: PointRow) => string): TableColumn<PointRow> => ({ key, head, align: 'end', nowrap: true, sortable: true, cell });
  return [
    {
      key: 'species',
      head: 'species',
      sortable: true,
      cell: ({ species }) => (
        <TextLink href={`/species/${species.slug}` as Href} look="plain" size="table">
          <BinomialSpan name={species.species} />
        </TextLink>
      ),
    },
    { key: 'clade', head: 'clade', sortable: true, cell: ({ result }) => <CladeName clade={result.slug} name={result.name} spec={marks.get(result.slug)} /> },
    { ...number('y', y.unit ? `y, ${y.unit}` : 'y', ({ species }) => axisValueText(species.y, { ...y, unit: null })), tone: y.tone === 'ink' ? undefined : y.tone },
    { ...number('x', x.unit ? `x, ${x.unit}` : 'x', ({ species }) => axisValueText(species.x, { ...x, unit: null })), tone: x.tone === 'ink' ? undefined : x.tone },
    number('residual', 'residual', ({ point }) => (point?.residual == null ? '–' : point.residual.toFixed(3).replace('-', '−'))),
    number('studentised', 'studentised', ({ point }) => figure(point?.studentised)),
    number('leverage', 'leverage', ({ point }) => figure(point?.leverage)),
    number('cook', 'Cook’s D', ({ point }) => figure(point?.cooksDistance)),
    {
      key: 'flag',
      head: 'flag',
      cell: (row) => (flagWords(row) === '' ? <Text size="secondary" tone="inkSoft">none</Text> : <StateSign state={row.point === null ? 'set aside' : 'flagged'} words={flagWords(row)} size="secondary" />),
    },
    {
      key: 'records',
      head: 'records and weights',
      phone: 'full',
      cell: ({ species }) => (
        <Text size="secondary" tone="inkSoft">
          {species.contributions.map(({ record, weight }, index) => (
            <Text key={record} size="secondary" tone="inkSoft">
              {index > 0 ? '; ' : ''}
              <TextLink href={`/records/${record}` as Href} look="plain" size="secondary">
                {record}
              </TextLink>
              {species.contributions.length > 1 ? ` × ${Number(weight.toPrecision(3))}` : ''}
            </Text>
          ))}
          {species.n === null ? ', n unknown' : `, n ${species.n}`}
        </Text>
      ),
    },
  ];
}
