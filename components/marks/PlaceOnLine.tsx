import { View } from 'react-native';
import Svg, { Circle, Line, Rect } from 'react-native-svg';
import { formatRatio, ratioSentence } from '../../shared/domain/quantityText';
import { cladeMark, type CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { strip } from '../theme/tokens';
import { Span, Text } from '../ui/Text';
import { MarkPath } from './CladeMark';
import { isInside, stripPosition, type PlaceOnLineValue } from './placeOnLineGeometry';
import { useMeasuredWidth } from './useMeasuredWidth';

interface PlaceOnLineProps {
  clade: string;
  spec?: CladeMarkSpec;
  /** null: there is no line; then `noLineWords` says why. */
  place: PlaceOnLineValue | null;
  noLineWords?: string;
  /** Confidence of the interval, as a fraction. */
  level?: number;
  /** Dense: ×¼ to ×4 without words, for tables; else ×⅙ to ×6 with the sentence below. */
  dense?: boolean;
  /** Fixed width in px; otherwise as wide as its place. */
  width?: number;
  flagged?: boolean;
}

/** Prediction interval of the clade's line as a band, the line as the tall tick, the record as its clade's mark. */
export function PlaceOnLine({ clade, spec = cladeMark(clade), place, noLineWords, level = 0.95, dense, width: fixed, flagged }: PlaceOnLineProps) {
  const measured = useMeasuredWidth();
  const width = fixed ?? measured.width;
  const sentence = place ? ratioSentence({ ratio: place.ratio, inside: isInside(place), level }) : (noLineWords ?? 'No line to compare with.');
  return (
    <View onLayout={fixed === undefined ? measured.onLayout : undefined} style={{ width: fixed, gap: 2 }} role={dense ? 'img' : undefined} aria-label={dense ? sentence : undefined}>
      {width > 0 ? <StripDrawing spec={spec} place={place} width={width} range={dense ? strip.rangeDense : strip.rangeStandard} flagged={flagged} /> : <View style={{ height: strip.height }} />}
      {dense ? null : (
        <Text size="secondary" tone={place ? 'ink' : 'inkSoft'}>
          {sentence}
        </Text>
      )}
    </View>
  );
}

/** "× 0.97 inside", for the column after a dense strip. */
export function PlaceOnLineShort({ place }: { place: PlaceOnLineValue | null }) {
  if (!place) return null;
  const inside = isInside(place);
  return (
    <Text size="table">
      × {formatRatio(place.ratio)}
      {inside === null ? null : <Span tone={inside ? 'inkSoft' : 'flagged'}> {inside ? 'inside' : 'outside'}</Span>}
    </Text>
  );
}

interface StripDrawingProps {
  spec: CladeMarkSpec;
  place: PlaceOnLineValue | null;
  width: number;
  range: number;
  flagged?: boolean;
}

function StripDrawing({ spec, place, width, range, flagged }: StripDrawingProps) {
  const { colour, name } = useTheme();
  const inset = 10;
  const middle = strip.height / 2;
  const xOf = (ratio: number) => inset + stripPosition(ratio, range).at * (width - 2 * inset);
  const ticks = Array.from({ length: range - 1 }, (_, index) => index + 2).flatMap((whole) => [whole, 1 / whole]);
  const clade = spec.colour[name];
  return (
    <Svg width={width} height={strip.height} aria-hidden={true}>
      <Line x1={0} x2={width} y1={middle} y2={middle} stroke={place ? colour.hairline : colour.tick} strokeWidth={1} strokeDasharray={place ? undefined : '3 4'} />
      {place && ticks.map((ratio) => <Line key={ratio} x1={xOf(ratio)} x2={xOf(ratio)} y1={middle - 2} y2={middle + 2} stroke={colour.tick} strokeWidth={1} />)}
      {place && place.lower !== null && place.upper !== null ? <Band from={xOf(place.lower)} to={xOf(place.upper)} middle={middle} colour={clade} opacity={name === 'darkfield' ? 0.22 : 0.18} /> : null}
      {place ? (
        <>
          <Line x1={width / 2} x2={width / 2} y1={middle - strip.centreTick / 2} y2={middle + strip.centreTick / 2} stroke={colour.ink} strokeWidth={1.6} />
          {flagged ? <Circle cx={xOf(place.ratio)} cy={middle} r={9.5} fill="none" stroke={colour.flagged} strokeWidth={2} /> : null}
          <MarkPath spec={spec} radius={4.6} x={xOf(place.ratio)} y={middle} fill={clade} />
        </>
      ) : null}
    </Svg>
  );
}

function Band({ from, to, middle, colour, opacity }: { from: number; to: number; middle: number; colour: string; opacity: number }) {
  const half = strip.bandHeight / 2;
  return (
    <>
      <Rect x={from} y={middle - half} width={Math.max(0, to - from)} height={strip.bandHeight} fill={colour} fillOpacity={opacity} />
      {[from, to].map((x, index) => (
        <Line key={index} x1={x} x2={x} y1={middle - half} y2={middle + half} stroke={colour} strokeWidth={1} strokeOpacity={0.6} />
      ))}
    </>
  );
}
