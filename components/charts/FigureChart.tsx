import { memo, type ReactElement } from 'react';
import { Text as SvgText } from 'react-native-svg';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { figure, type ThemeName } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { VictoryArea, VictoryAxis, VictoryChart, VictoryContainer, VictoryLine, VictoryScatter } from './charts';
import type { PlacedDiagonal, PlacedLabel } from './figureLayout';
import { FigureMark } from './FigureMark';
import type { FigureMarkProps, MarkLook } from './figureMarkProps';
import { FigureOverlay, FigureSelection } from './FigureOverlay';
import type { FigureAxis, FigureGroup, PlacedPoint } from './figureTypes';
import { bandPoints, lineEnds } from './geometry';
import { xPx, yPx, type Frame } from './logScale';
import { decadeText, logTicks } from './ticks';
import { spokenPoint } from './valueText';

interface FigureChartProps {
  title: string;
  x: FigureAxis;
  y: FigureAxis;
  groups: readonly FigureGroup[];
  showConfidence: boolean;
  showPrediction: boolean;
  width: number;
  height: number;
  layout: { frame: Frame; points: readonly PlacedPoint[]; labels: readonly PlacedLabel[]; diagonals: readonly PlacedDiagonal[]; specs: ReadonlyMap<string, CladeMarkSpec> };
  radius: number;
  fontSize: number;
  themeName: ThemeName;
  selected: PlacedPoint | null;
  idPrefix: string;
  activeKey: string | null;
  onFocusPoint: FigureMarkProps['onFocusPoint'];
  onKey: FigureMarkProps['onKey'];
}

/** A single thing drawn by the chart at its own place, whatever the chart says. */
function Drawn({ content }: { content: ReactElement }) {
  return content;
}

/** The drawing itself. Axes, diagonals, bands, lines and points are the chart's; rings, names and the selection lie over them. */
export const FigureChart = memo(function FigureChart({ title, x, y, groups, showConfidence, showPrediction, width, height, layout, radius, fontSize, themeName, selected, idPrefix, activeKey, onFocusPoint, onKey }: FigureChartProps) {
  const { colour } = useTheme();
  const { frame, points, specs } = layout;
  const domain = { x: ends(frame.x), y: ends(frame.y) };
  const bottom = height - frame.top - frame.height;
  const colourOf = (key: string) => specs.get(key)?.colour[themeName] ?? colour.ink;
  const look = (point: PlacedPoint): MarkLook => {
    const spec = specs.get(point.group.key);
    if (!spec) throw new RangeError(`no mark for ${point.group.key}`);
    const own = spec.colour[themeName];
    return { spec, radius, fill: point.setAside ? colour.sheet : own, stroke: point.setAside ? own : undefined, outline: colour.sheet, spoken: spokenPoint(point, x, y) };
  };
  // Only x and y by these names: the chart would print a datum's `label` beside each mark.
  const marks = points.map((point) => ({ x: point.x, y: point.y, point }));
  const overlay = (
    <>
      {selected ? <FigureSelection frame={frame} point={selected} x={x} y={y} radius={radius} fontSize={fontSize - 1} /> : null}
      <FigureOverlay frame={frame} labels={layout.labels} diagonals={layout.diagonals} flagged={points.filter((point) => point.flag)} specs={specs} radius={radius} fontSize={fontSize} />
      <AxisTitle text={y.unit ? `${y.label}, ${y.unit}` : y.label} fill={colour[y.tone]} x={Math.max(0, frame.left - 58)} y={frame.top - 11} anchor="start" fontSize={fontSize} />
      <AxisTitle text={x.unit ? `${x.label}, ${x.unit}` : x.label} fill={colour[x.tone]} x={frame.left + frame.width} y={frame.top + frame.height + 52} anchor="end" fontSize={fontSize} />
    </>
  );
  return (
    <VictoryChart
      width={width}
      height={height}
      padding={{ left: frame.left, right: width - frame.left - frame.width, top: frame.top, bottom }}
      scale={{ x: 'log', y: 'log' }}
      domain={domain}
      style={{ background: { fill: colour.sheet } }}
      containerComponent={<VictoryContainer responsive={false} role="group" title={title} desc={`${points.length} points in ${groups.length} clades; arrow keys go from point to point`} style={{ touchAction: 'pan-y' }} />}
    >
      {axis(frame.x, false, selected ? (value) => Math.abs(xPx(frame, value) - selected.px) < 52 : keepAll)}
      {axis(frame.y, true, selected ? (value) => Math.abs(yPx(frame, value) - selected.py) < 18 : keepAll)}
      {layout.diagonals.map(({ density, from, to }) => (
        <VictoryLine key={`diagonal ${density}`} data={[from, to].map((place) => fromPx(frame, place))} style={{ data: { stroke: colour.tick, strokeWidth: 1.3, strokeDasharray: '0.1 5', strokeLinecap: 'round' } }} />
      ))}
      {showPrediction ? groups.map((group) => band(group, 'prediction', colourOf(group.key))) : null}
      {showConfidence ? groups.map((group) => band(group, 'confidence', colourOf(group.key))) : null}
      {groups.map((group) =>
        group.fit ? <VictoryLine key={`line ${group.key}`} data={lineEnds(group.fit)} style={{ data: { stroke: colourOf(group.key), strokeWidth: figure.line } }} /> : null,
      )}
      <VictoryScatter data={marks} dataComponent={<FigureMark look={look} idPrefix={idPrefix} activeKey={activeKey} onFocusPoint={onFocusPoint} onKey={onKey} />} />
      <VictoryScatter data={[fromPx(frame, { x: frame.left + 1, y: frame.top + 1 })]} dataComponent={<Drawn content={overlay} />} />
    </VictoryChart>
  );

  function axis(range: Frame['x'], dependent: boolean, isCovered: (value: number) => boolean) {
    const { major, minor } = logTicks(range[0], range[1]);
    const line = { stroke: colour.ink, strokeWidth: 1.4 };
    return [
      <VictoryAxis
        key={`minor ${dependent}`}
        dependentAxis={dependent}
        tickValues={minor}
        tickFormat={() => ''}
        style={{ axis: line, grid: { stroke: 'none' }, ticks: { stroke: colour.tick, strokeWidth: 1, size: figure.minorTick } }}
      />,
      <VictoryAxis
        key={`major ${dependent}`}
        dependentAxis={dependent}
        tickValues={major}
        tickFormat={(value: number) => (isCovered(value) ? '' : decadeText(value))}
        style={{
          axis: line,
          grid: { stroke: colour.hairline, strokeWidth: 1 },
          ticks: { stroke: colour.ink, strokeWidth: 1.4, size: figure.majorTick },
          tickLabels: { fontFamily: fontFamily('sans'), fontSize, fill: colour.ink, padding: 4 },
        }}
      />,
    ];
  }

  function band(group: FigureGroup, kind: 'confidence' | 'prediction', fill: string) {
    const data = group.fit ? bandPoints(group.fit, kind) : [];
    if (data.length === 0) return null;
    const opacity = figure.bandOpacity[themeName] * (kind === 'prediction' ? 0.5 : 1);
    return <VictoryArea key={`${kind} ${group.key}`} data={data.map(({ x: at, lower, upper }) => ({ x: at, y: upper, y0: lower }))} style={{ data: { fill, fillOpacity: opacity, stroke: 'none' } }} />;
  }
});

/** No value stands over the decades' names. */
function keepAll(): boolean {
  return false;
}

function ends([from, to]: readonly [number, number]): [number, number] {
  return [10 ** from, 10 ** to];
}

function fromPx(frame: Frame, place: { x: number; y: number }): { x: number; y: number } {
  return {
    x: 10 ** (frame.x[0] + (place.x - frame.left) / frame.pxPerDecade),
    y: 10 ** (frame.y[0] + (frame.top + frame.height - place.y) / frame.pxPerDecade),
  };
}

const AxisTitle = memo(function AxisTitle({ text, fill, x, y, anchor, fontSize }: { text: string; fill: string; x: number; y: number; anchor: 'start' | 'end'; fontSize: number }) {
  return (
    <SvgText x={x} y={y} textAnchor={anchor} fontFamily={fontFamily('sansSemibold')} fontSize={fontSize} fill={fill}>
      {text}
    </SvgText>
  );
});
