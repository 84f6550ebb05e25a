import { Circle, G, Line, Path, Rect, Text as SvgText } from 'react-native-svg';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { figure } from '../theme/tokens';
import { fontFamily, type FontName } from '../theme/typography';
import type { PlacedDiagonal, PlacedLabel } from './figureLayout';
import type { FigureAxis, PlacedPoint } from './figureTypes';
import { textWidth } from './labels';
import type { Frame } from './logScale';
import { axisValueText } from './valueText';

interface HaloTextProps {
  x: number;
  y: number;
  text: string;
  font: FontName;
  size: number;
  fill: string;
  anchor?: 'start' | 'middle' | 'end';
  rotate?: number;
}

/** Text over marks and lines: drawn twice, first as a halo in the colour of the sheet. */
export function HaloText({ x, y, text, font, size, fill, anchor = 'start', rotate }: HaloTextProps) {
  const { colour } = useTheme();
  const shared = { x, y, fontFamily: fontFamily(font), fontSize: size, textAnchor: anchor, transform: rotate === undefined ? undefined : `rotate(${rotate} ${x} ${y})` };
  return (
    <>
      <SvgText {...shared} fill={colour.sheet} stroke={colour.sheet} strokeWidth={figure.halo} strokeLinejoin="round">
        {text}
      </SvgText>
      <SvgText {...shared} fill={fill}>
        {text}
      </SvgText>
    </>
  );
}

interface FigureOverlayProps {
  frame: Frame;
  labels: readonly PlacedLabel[];
  diagonals: readonly PlacedDiagonal[];
  flagged: readonly PlacedPoint[];
  specs: ReadonlyMap<string, CladeMarkSpec>;
  radius: number;
  fontSize: number;
}

/** Rings, leaders and names over the marks. */
export function FigureOverlay({ labels, diagonals, flagged, specs, radius, fontSize }: FigureOverlayProps) {
  const { colour, name } = useTheme();
  return (
    <G pointerEvents="none" aria-hidden={true}>
      {diagonals.map(({ density, label }) => (label ? <HaloText key={density} x={label.x} y={label.y - 4} text={label.text} font="sans" size={13} fill={colour.inkSoft} anchor="middle" rotate={-45} /> : null))}
      {flagged.map((point) => (
        <Circle key={`${point.group.key}${point.id}`} cx={point.px} cy={point.py} r={radius * figure.flagRing} fill="none" stroke={colour.flagged} strokeWidth={2} />
      ))}
      {labels.map((label) => (
        <FigureLabel key={label.key} label={label} fontSize={fontSize} ring={radius * figure.flagRing} line={specs.get(label.group.key)?.colour[name] ?? colour.ink} />
      ))}
    </G>
  );
}

function FigureLabel({ label, fontSize, ring, line }: { label: PlacedLabel; fontSize: number; ring: number; line: string }) {
  const { colour } = useTheme();
  const { box, kind, text, note, at } = label;
  if (kind === 'clade') {
    return (
      <>
        <HaloText x={box.x} y={box.y + fontSize} text={text} font="sansSemibold" size={fontSize} fill={colour.ink} />
        <Rect x={box.x} y={box.y + fontSize + 4} width={box.width} height={2.2} fill={line} />
      </>
    );
  }
  const towardsRight = at !== null && box.x + box.width / 2 < at.x;
  const anchor = towardsRight ? 'end' : 'start';
  const x = towardsRight ? box.x + box.width : box.x;
  const nameY = kind === 'flagged' && note ? box.y + 2 * fontSize + 4 : box.y + fontSize;
  return (
    <>
      {kind === 'flagged' && at ? <Path d={leader(box, at, ring, nameY - fontSize * 0.35)} stroke={colour.flagged} strokeWidth={1.3} fill="none" /> : null}
      {note ? <HaloText x={x} y={kind === 'flagged' ? box.y + fontSize : box.y + 2 * fontSize + 3} text={note} font="sans" size={fontSize - 1} fill={colour.inkSoft} anchor={anchor} /> : null}
      <HaloText x={x} y={nameY} text={text} font="loraItalic" size={fontSize + 1} fill={colour.ink} anchor={anchor} />
    </>
  );
}

/** From the name's side to the ring. */
function leader(box: { x: number; width: number }, at: { x: number; y: number }, ring: number, y: number): string {
  const left = box.x + box.width / 2 < at.x;
  const startX = Math.abs(at.x - (box.x + box.width / 2)) < box.width / 2 ? at.x + (left ? -8 : 8) : left ? box.x + box.width + 4 : box.x - 4;
  const dx = startX - at.x;
  const dy = y - at.y;
  const length = Math.hypot(dx, dy) || 1;
  if (length <= ring + 3) return '';
  return `M${startX} ${y}L${at.x + (dx / length) * ring} ${at.y + (dy / length) * ring}`;
}

interface SelectionProps {
  frame: Frame;
  point: PlacedPoint;
  x: FigureAxis;
  y: FigureAxis;
  radius: number;
  fontSize: number;
}

/** The selected point: ring in cresyl, hairlines to both axes, its values reversed out on them. */
export function FigureSelection({ frame, point, x, y, radius, fontSize }: SelectionProps) {
  const { colour } = useTheme();
  const bottom = frame.top + frame.height;
  const reach = radius + figure.selectedRing;
  const values = { x: axisValueText(point.x, x), y: axisValueText(point.y, y) };
  const width = { x: textWidth(values.x, fontSize) + 14, y: textWidth(values.y, fontSize) + 14 };
  const height = fontSize + 9;
  const xStart = Math.min(Math.max(point.px - width.x / 2, 2), frame.left + frame.width - width.x);
  const yEnd = frame.left - 8;
  return (
    <G pointerEvents="none" aria-hidden={true}>
      <Line x1={frame.left} x2={point.px - reach} y1={point.py} y2={point.py} stroke={colour.ink} strokeWidth={1} />
      <Line x1={point.px} x2={point.px} y1={point.py + reach} y2={bottom} stroke={colour.ink} strokeWidth={1} />
      <Circle cx={point.px} cy={point.py} r={reach} fill="none" stroke={colour.cresyl} strokeWidth={2} />
      <ReversedValue x={Math.max(0, yEnd - width.y)} y={point.py - height / 2} width={Math.min(width.y, yEnd)} height={height} text={values.y} fontSize={fontSize} />
      <ReversedValue x={xStart} y={bottom + 11} width={width.x} height={height} text={values.x} fontSize={fontSize} />
    </G>
  );
}

function ReversedValue({ x, y, width, height, text, fontSize }: { x: number; y: number; width: number; height: number; text: string; fontSize: number }) {
  const { colour } = useTheme();
  return (
    <>
      <Rect x={x} y={y} width={width} height={height} fill={colour.ink} />
      <SvgText x={x + width / 2} y={y + height / 2 + fontSize * 0.35} textAnchor="middle" fontFamily={fontFamily('sansSemibold')} fontSize={fontSize} fill={colour.ground}>
        {text}
      </SvgText>
    </>
  );
}
