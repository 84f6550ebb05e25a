import type { PlacedPoint } from './figureTypes';

/**
 * The point an arrow key leads to: left and right along the group by x, up and down to the nearest in
 * x of the next group, Home and End to the ends of the group. Null where the key means nothing.
 */
export function nextPoint(points: readonly PlacedPoint[], current: PlacedPoint, key: string): PlacedPoint | null {
  const own = points.filter((point) => point.group.key === current.group.key);
  const index = own.findIndex((point) => point.id === current.id);
  const groups = [...new Set(points.map((point) => point.group.key))];
  const groupIndex = groups.indexOf(current.group.key);
  switch (key) {
    case 'ArrowRight':
      return own[Math.min(own.length - 1, index + 1)] ?? null;
    case 'ArrowLeft':
      return own[Math.max(0, index - 1)] ?? null;
    case 'Home':
      return own[0] ?? null;
    case 'End':
      return own.at(-1) ?? null;
    case 'ArrowUp':
    case 'ArrowDown': {
      const step = key === 'ArrowUp' ? groups.length - 1 : 1;
      const group = groups[(groupIndex + step) % groups.length];
      const others = points.filter((point) => point.group.key === group);
      return others.reduce<PlacedPoint | null>((best, point) => (best === null || Math.abs(point.px - current.px) < Math.abs(best.px - current.px) ? point : best), null);
    }
    default:
      return null;
  }
}

/** The key of a point within a figure: one species may stand in two groups. */
export function pointKey(point: PlacedPoint): string {
  return `${point.group.key}/${point.id}`;
}
