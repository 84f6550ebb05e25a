import { View } from 'react-native';
import Svg, { Line } from 'react-native-svg';
import { cladeMark, type CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Text } from '../ui/Text';
import { MarkPath } from './CladeMark';

/** All whiskers of one table share one scale. */
export interface ExponentScale {
  from: number;
  to: number;
}

export const exponentScale: ExponentScale = { from: 0.6, to: 2 };

interface Interval {
  exponent: number;
  lower: number | null;
  upper: number | null;
}

/** The least scale of the usual one and what the intervals need, in steps of 0.2. */
export function scaleFor(intervals: readonly Interval[]): ExponentScale {
  const ends = intervals.flatMap(({ exponent, lower, upper }) => [exponent, lower ?? exponent, upper ?? exponent]).filter(Number.isFinite);
  return {
    from: Math.min(exponentScale.from, Math.floor(Math.min(...ends) * 5) / 5),
    to: Math.max(exponentScale.to, Math.ceil(Math.max(...ends) * 5) / 5),
  };
}

interface ExponentWhiskerProps extends Interval {
  clade: string;
  spec?: CladeMarkSpec;
  /** The version before: hollow and soft, above. */
  before?: Interval | null;
  scale?: ExponentScale;
  width?: number;
  height?: number;
}

/** An exponent with its interval; thin lines stand at 1 and 1.5. */
export function ExponentWhisker({ clade, spec = cladeMark(clade), before, scale = exponentScale, width: asked, height = 30, ...now }: ExponentWhiskerProps) {
  const width = useWhiskerWidth(asked);
  const { colour, name } = useTheme();
  const xOf = xOfExponent(scale, width);
  const own = spec.colour[name];
  const lower = before ? height / 2 + 5 : height / 2;
  return (
    <Svg width={width} height={height} aria-hidden={true}>
      <Line x1={xOf(1)} x2={xOf(1)} y1={1} y2={height - 1} stroke={colour.hairline} strokeWidth={1} />
      <Line x1={xOf(1.5)} x2={xOf(1.5)} y1={1} y2={height - 1} stroke={colour.hairline} strokeWidth={1} strokeDasharray="2 3" />
      {before ? <Whisker xOf={xOf} interval={before} y={height / 2 - 5} stroke={colour.tick} spec={spec} fill={colour.sheet} hollow /> : null}
      <Whisker xOf={xOf} interval={now} y={lower} stroke={own} spec={spec} fill={own} />
    </Svg>
  );
}

interface WhiskerProps {
  xOf: (exponent: number) => number;
  interval: Interval;
  y: number;
  stroke: string;
  fill: string;
  spec: CladeMarkSpec;
  hollow?: boolean;
}

function Whisker({ xOf, interval, y, stroke, fill, spec, hollow }: WhiskerProps) {
  const { exponent, lower, upper } = interval;
  return (
    <>
      {lower !== null && upper !== null ? (
        <>
          <Line x1={xOf(lower)} x2={xOf(upper)} y1={y} y2={y} stroke={stroke} strokeWidth={1.6} />
          {hollow ? null : [lower, upper].map((end) => <Line key={end} x1={xOf(end)} x2={xOf(end)} y1={y - 4} y2={y + 4} stroke={stroke} strokeWidth={1.6} />)}
        </>
      ) : null}
      <MarkPath spec={spec} radius={4.4} x={xOf(exponent)} y={y} fill={fill} stroke={hollow ? stroke : undefined} />
    </>
  );
}

function xOfExponent({ from, to }: ExponentScale, width: number): (exponent: number) => number {
  const inset = 7;
  return (exponent) => inset + Math.min(1, Math.max(0, (exponent - from) / (to - from))) * (width - 2 * inset);
}

/** Whiskers and their axis share a width: narrower on a phone unless one is asked for. */
function useWhiskerWidth(asked: number | undefined): number {
  const { wide } = useBreakpoint();
  return asked ?? (wide ? 96 : 72);
}

/** Head of a column of whiskers: the words 1 and 1.5 at their lines. */
export function ExponentAxis({ scale = exponentScale, width: asked }: { scale?: ExponentScale; width?: number }) {
  const width = useWhiskerWidth(asked);
  const xOf = xOfExponent(scale, width);
  return (
    <View style={{ width, height: 20 }} aria-hidden={true}>
      {[1, 1.5].filter((exponent) => exponent === 1 || xOf(exponent) - xOf(1) >= 20).map((exponent) => (
        <View key={exponent} style={{ position: 'absolute', left: xOf(exponent) - 20, width: 40 }}>
          <Text size="secondary" tone="inkSoft" align="center">
            {exponent}
          </Text>
        </View>
      ))}
    </View>
  );
}
