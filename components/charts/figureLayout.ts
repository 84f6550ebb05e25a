import { densityDiagonals, lineEnds, type Diagonal, type XY } from './geometry';
import type { FigureGroup, PlacedPoint } from './figureTypes';
import { boxesAlong, cornersAround, overlap, placeLabels, textWidth, type Box, type LabelRequest } from './labels';
import { equalDecadeFrame, logRange, naturalHeight, xPx, yPx, type Frame, type Margins } from './logScale';
import { powerText } from '../../shared/domain/quantityText';

const PADDING_DECADES = 0.28;
const MOST_NAMED = 8;

/** Ranges of a figure: all points, the ends of lines and of their confidence bands, with a little room. */
export function figureRanges(groups: readonly FigureGroup[]): { x: [number, number]; y: [number, number] } {
  const xs = groups.flatMap((group) => group.points.map((point) => point.x));
  const ys = groups.flatMap((group) => group.points.map((point) => point.y));
  for (const { fit } of groups) {
    if (!fit) continue;
    xs.push(fit.xRange.lower, fit.xRange.upper);
    ys.push(...lineEnds(fit).map((end) => end.y));
  }
  return { x: logRange(xs, PADDING_DECADES), y: logRange(ys, PADDING_DECADES) };
}

/** Frame of a figure in a given width; without a height it takes the one that suits the ranges. */
export function figureFrame(groups: readonly FigureGroup[], width: number, height: number | undefined, margins: Margins): { frame: Frame; height: number } {
  const ranges = figureRanges(groups);
  const full = height ?? naturalHeight(ranges, width, margins, { least: 0.8, most: 1.28 });
  return { frame: equalDecadeFrame(ranges, { width, height: full }, margins), height: full };
}

/** Points with their place in px, in the order the keyboard goes through them: by group, then by x. */
export function placePoints(groups: readonly FigureGroup[], frame: Frame): PlacedPoint[] {
  return groups.flatMap((group) =>
    group.points
      .filter((point) => point.x > 0 && point.y > 0)
      .map((point) => ({ ...point, group, px: xPx(frame, point.x), py: yPx(frame, point.y) }))
      .sort((a, b) => a.px - b.px),
  );
}

export interface PlacedLabel {
  key: string;
  kind: 'clade' | 'flagged' | 'set aside';
  box: Box;
  text: string;
  note: string | null;
  /** What it names, for the leader. */
  at: XY | null;
  group: FigureGroup;
}

/** Names of flagged points first, then of clades' lines, then of what is set aside, each where it covers least. */
export function placeFigureLabels(groups: readonly FigureGroup[], points: readonly PlacedPoint[], frame: Frame, style: { fontSize: number; wide: boolean; radius: number }): PlacedLabel[] {
  const { fontSize, wide, radius } = style;
  const labels: (Omit<PlacedLabel, 'box'> & LabelRequest)[] = [];
  const flagged = points.filter((point) => point.flag).slice(0, MOST_NAMED);
  const setAside = points.filter((point) => point.setAside && !point.flag).slice(0, MOST_NAMED);
  for (const point of flagged) {
    const note = wide ? (point.note ?? 'flagged') : null;
    labels.push(pointLabel('flagged', point, note, fontSize, [26, 44, 66]));
  }
  for (const group of groups) {
    if (!group.fit) continue;
    const [low, high] = lineEnds(group.fit).map((end) => ({ x: xPx(frame, end.x), y: yPx(frame, end.y) }));
    if (!low || !high) continue;
    const width = textWidth(group.label, fontSize) + 2;
    const candidates = [...cornersAround(high, width, fontSize + 8, [12, 24, 40]), ...cornersAround(low, width, fontSize + 8, [14, 28, 44])];
    labels.push({ key: `clade ${group.key}`, kind: 'clade', text: group.label, note: null, at: null, group, width, height: fontSize + 8, candidates });
  }
  if (wide) for (const point of setAside) labels.push(pointLabel('set aside', point, 'set aside', fontSize, [12, 24, 40]));
  const obstacles = [...points.map((point) => boxAround(point, point.flag ? radius * 2.4 : radius + 2)), ...lineBoxes(groups, frame)];
  const bounds = { x: frame.left + 4, y: frame.top + 2, width: frame.width - 8, height: frame.height - 6 };
  const placed = placeLabels(labels, obstacles, bounds);
  return labels.flatMap(({ key, kind, text, note, at, group }) => {
    const box = placed.get(key);
    return box ? [{ key, kind, text, note, at, group, box }] : [];
  });
}

function pointLabel(kind: 'flagged' | 'set aside', point: PlacedPoint, note: string | null, fontSize: number, distances: readonly number[]) {
  const width = Math.max(textWidth(point.label, fontSize + 1), note ? textWidth(note, fontSize - 1) : 0);
  const height = (fontSize + 4) * (note ? 2 : 1);
  const at = { x: point.px, y: point.py };
  return { key: `${kind} ${point.group.key} ${point.id}`, kind, text: point.label, note, at, group: point.group, width, height, candidates: cornersAround(at, width, height, distances) };
}

function boxAround(point: PlacedPoint, reach: number): Box {
  return { x: point.px - reach, y: point.py - reach, width: 2 * reach, height: 2 * reach };
}

function lineBoxes(groups: readonly FigureGroup[], frame: Frame): Box[] {
  return groups.flatMap(({ fit }) => {
    if (!fit) return [];
    const [low, high] = lineEnds(fit).map((end) => ({ x: xPx(frame, end.x), y: yPx(frame, end.y) }));
    return low && high ? boxesAlong(low, high) : [];
  });
}

export interface PlacedDiagonal extends Diagonal {
  /** Middle of its words, and their slope in degrees; null where there is no room. */
  label: { x: number; y: number; text: string } | null;
}

/** Diagonals with their words where they cover least; on a phone without words. */
export function placeDiagonals(frame: Frame, points: readonly XY[], xVariable: string, yVariable: string, what: string, obstacles: readonly Box[], labelled: boolean): PlacedDiagonal[] {
  return densityDiagonals(frame, points, xVariable, yVariable).map((diagonal) => {
    const text = `${powerText(Math.round(Math.log10(diagonal.density)))} ${what} per mg`;
    const half = textWidth(text, 13) / 2;
    const length = Math.hypot(diagonal.to.x - diagonal.from.x, diagonal.to.y - diagonal.from.y);
    if (!labelled || length < 2.6 * half) return { ...diagonal, label: null };
    const margin = (half + 8) / length;
    let best: { share: number; cost: number } | null = null;
    for (let step = 0; step <= 10; step += 1) {
      const share = margin + ((1 - 2 * margin) * step) / 10;
      const middle = along(diagonal, share);
      const cover = boxesAlong(along(diagonal, share - half / length), along(diagonal, share + half / length), 10, 18);
      const cost = cover.reduce((sum, box) => sum + obstacles.reduce((inner, obstacle) => inner + overlap(box, obstacle), 0), 0) + Math.abs(middle.x - frame.left - frame.width * 0.8) * 0.02;
      if (!best || cost < best.cost) best = { share, cost };
    }
    const middle = along(diagonal, best?.share ?? 0.5);
    return { ...diagonal, label: { ...middle, text } };
  });
}

function along(diagonal: Diagonal, share: number): XY {
  return { x: diagonal.from.x + (diagonal.to.x - diagonal.from.x) * share, y: diagonal.from.y + (diagonal.to.y - diagonal.from.y) * share };
}

/** Boxes of points and labels, as obstacles for the diagonals' words. */
export function obstaclesOf(points: readonly PlacedPoint[], labels: readonly PlacedLabel[], groups: readonly FigureGroup[], frame: Frame): Box[] {
  return [...points.map((point) => boxAround(point, 7)), ...labels.map((label) => label.box), ...lineBoxes(groups, frame)];
}

