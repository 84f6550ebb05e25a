import type { FitPoint, Interval } from './types';

/** The points' decimal logarithms, in order. */
export interface LogPoints {
  log10X: number[];
  log10Y: number[];
}

/**
 * Decimal logarithms of raw points.
 *
 * @throws RangeError naming the point, when x or y is not a finite number above 0
 */
export function logPoints(points: readonly FitPoint[]): LogPoints {
  for (const { id, x, y } of points) {
    requirePositive(x, `x of ${id}`);
    requirePositive(y, `y of ${id}`);
  }
  return { log10X: points.map(({ x }) => Math.log10(x)), log10Y: points.map(({ y }) => Math.log10(y)) };
}

/** @throws RangeError unless the value is a finite number above 0 */
export function requirePositive(value: number, name: string): void {
  if (!(value > 0 && value < Infinity)) {
    throw new RangeError(`${name} must be a finite number above 0, found ${value}`);
  }
}

/** Smallest and largest raw x. */
export function rangeOfX(points: readonly FitPoint[]): Interval {
  let [lower, upper] = [Infinity, -Infinity];
  for (const { x } of points) {
    lower = Math.min(lower, x);
    upper = Math.max(upper, x);
  }
  return { lower, upper };
}
