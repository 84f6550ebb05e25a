import type { XY } from './geometry';

export interface Box {
  x: number;
  y: number;
  width: number;
  height: number;
}

export interface LabelRequest {
  key: string;
  width: number;
  height: number;
  /** Top left corners in px, best first. */
  candidates: readonly XY[];
}

/** Area shared by two boxes, px². */
export function overlap(a: Box, b: Box): number {
  const width = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const height = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return width > 0 && height > 0 ? width * height : 0;
}

function outside(box: Box, bounds: Box): number {
  return box.width * box.height - overlap(box, bounds);
}

/**
 * A place for every label: the candidate that covers least of the obstacles, of the labels placed
 * before and of what lies outside the bounds; the earlier candidate wins a tie. Labels are placed in
 * the order given, so the important ones come first.
 */
export function placeLabels(requests: readonly LabelRequest[], obstacles: readonly Box[], bounds: Box): Map<string, Box> {
  const placed = new Map<string, Box>();
  for (const { key, width, height, candidates } of requests) {
    let best: { box: Box; cost: number } | null = null;
    for (const candidate of candidates) {
      const box: Box = { ...candidate, width, height };
      const cost =
        obstacles.reduce((sum, obstacle) => sum + overlap(box, obstacle), 0) +
        4 * [...placed.values()].reduce((sum, other) => sum + overlap(box, other), 0) +
        8 * outside(box, bounds);
      if (!best || cost < best.cost - 0.5) best = { box, cost };
    }
    if (best) placed.set(key, best.box);
  }
  return placed;
}

/** Corners around a point at growing distances: right, left, above, below and between. */
export function cornersAround(point: XY, width: number, height: number, distances: readonly number[]): XY[] {
  return distances.flatMap((distance) => [
    { x: point.x - width - distance, y: point.y - height - distance * 0.6 },
    { x: point.x + distance, y: point.y - height / 2 },
    { x: point.x - width - distance, y: point.y - height / 2 },
    { x: point.x + distance * 0.7, y: point.y + distance * 0.5 },
    { x: point.x - width / 2, y: point.y - height - distance },
    { x: point.x + distance * 0.7, y: point.y - height - distance * 0.5 },
    { x: point.x - width / 2, y: point.y + distance },
    { x: point.x - width - distance, y: point.y + distance * 0.6 },
  ]);
}

/** Boxes along a straight stretch, as obstacles of the size of a line. */
export function boxesAlong(from: XY, to: XY, step = 14, size = 6): Box[] {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const count = Math.max(1, Math.ceil(length / step));
  return Array.from({ length: count + 1 }, (_, index) => ({
    x: from.x + ((to.x - from.x) * index) / count - size / 2,
    y: from.y + ((to.y - from.y) * index) / count - size / 2,
    width: size,
    height: size,
  }));
}

/** Advances of Source Sans 3 Semibold by kind of character, in em; Lora is about as wide. */
const advances: readonly [RegExp, number][] = [
  [/[iljI.,:;'|()]/, 0.28],
  [/[tfr]/, 0.36],
  [/[mw]/, 0.8],
  [/[MW]/, 0.85],
  [/[szcx]/, 0.46],
  [/[A-Z]/, 0.58],
  [/\s/, 0.21],
  [/[⁰-⁹¹²³⁻]/, 0.36],
];

/** Width of a text in px, estimated: labels are placed before the browser has laid them out. */
export function textWidth(text: string, fontSize: number): number {
  const em = [...text].reduce((sum, character) => sum + (advances.find(([kind]) => kind.test(character))?.[1] ?? 0.545), 0);
  return em * fontSize;
}
