import Svg, { Line, Text as SvgText } from 'react-native-svg';
import { cladeMark, type CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import type { QuantityName } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { decadeText, logTicks } from '../charts/ticks';

/** From and to as log10. */
export type LogRange = readonly [number, number];

export interface Stroke {
  id: string;
  value: number;
  /** New in this version: a dot of ink above. */
  isNew?: boolean;
  /** Broken: set aside from the fit. */
  setAside?: boolean;
}

interface StrokeStripProps {
  clade: string;
  spec?: CladeMarkSpec;
  strokes: readonly Stroke[];
  range: LogRange;
  width?: number;
  height?: number;
}

const INSET = 4;

function xOfLog([from, to]: LogRange, width: number): (value: number) => number {
  return (value) => INSET + ((Math.log10(value) - from) / (to - from)) * (width - 2 * INSET);
}

/** Each species of a clade as a stroke on a log axis. */
export function StrokeStrip({ clade, spec = cladeMark(clade), strokes, range, width = 230, height = 30 }: StrokeStripProps) {
  const { colour, name } = useTheme();
  const xOf = xOfLog(range, width);
  const fitted = strokes.filter((stroke) => stroke.value > 0);
  return (
    <Svg width={width} height={height} role="img" aria-label={`${fitted.length} species`}>
      {logTicks(range[0], range[1]).major.map((value) => (
        <Line key={value} x1={xOf(value)} x2={xOf(value)} y1={0} y2={height} stroke={colour.hairline} strokeWidth={1} />
      ))}
      {fitted.map(({ id, value, setAside }) => (
        <Line key={id} x1={xOf(value)} x2={xOf(value)} y1={8} y2={height - 6} stroke={spec.colour[name]} strokeWidth={1.6} strokeDasharray={setAside ? '2 2' : undefined} />
      ))}
      {fitted
        .filter((stroke) => stroke.isNew)
        .map(({ id, value }) => (
          <Line key={id} x1={xOf(value)} x2={xOf(value)} y1={2.5} y2={5} stroke={colour.ink} strokeWidth={2} />
        ))}
    </Svg>
  );
}

interface StrokeAxisProps {
  range: LogRange;
  title: string;
  tone: QuantityName;
  width?: number;
}

/** Head of a column of stroke strips: the axis with its decades and, in the quantity's colour, its title. */
export function StrokeAxis({ range, title, tone, width = 230 }: StrokeAxisProps) {
  const { colour } = useTheme();
  const xOf = xOfLog(range, width);
  const { major, minor } = logTicks(range[0], range[1]);
  return (
    <Svg width={width} height={44} aria-hidden={true}>
      <SvgText x={0} y={13} fontFamily={fontFamily('sansSemibold')} fontSize={14} fill={colour[tone]}>
        {title}
      </SvgText>
      {major.map((value) => (
        <SvgText key={value} x={xOf(value)} y={33} textAnchor="middle" fontFamily={fontFamily('sans')} fontSize={14} fill={colour.inkSoft}>
          {decadeText(value)}
        </SvgText>
      ))}
      {minor.map((value) => (
        <Line key={value} x1={xOf(value)} x2={xOf(value)} y1={41} y2={44} stroke={colour.tick} strokeWidth={1} />
      ))}
      {major.map((value) => (
        <Line key={value} x1={xOf(value)} x2={xOf(value)} y1={37} y2={44} stroke={colour.ink} strokeWidth={1} />
      ))}
    </Svg>
  );
}
