/** Centred sums of paired values, and the limits below which a sum is rounding and not data. */
export interface LineSums {
  n: number;
  meanX: number;
  meanY: number;
  sxx: number;
  sxy: number;
  syy: number;
  /** All x (or all y) agree to within rounding. */
  xAllEqual: boolean;
  yAllEqual: boolean;
  largestX: number;
  largestY: number;
}

/** A spread of log10 values below this, relative to their size, is rounding. */
const SPREAD_FLOOR = 1e-12;

/**
 * Means and centred sums of squares and products in two passes (means first), so that a large
 * common offset costs no digits.
 *
 * @param x log10 values, any length
 * @param y log10 values, as many as x
 * @param members indexes to use; all when absent
 * @throws RangeError on unequal lengths or a value that is not finite
 */
export function lineSums(x: readonly number[], y: readonly number[], members?: readonly number[]): LineSums {
  if (x.length !== y.length) {
    throw new RangeError(`x and y must be equally long, found ${x.length} and ${y.length}`);
  }
  const used = members ?? x.map((_, i) => i);
  const n = used.length;
  let [meanX, meanY] = [0, 0];
  let [minX, maxX, minY, maxY] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const i of used) {
    const [xi, yi] = [x[i]!, y[i]!];
    if (!Number.isFinite(xi) || !Number.isFinite(yi)) {
      throw new RangeError(`x and y must be finite numbers, found ${xi} and ${yi} at position ${i}`);
    }
    meanX += xi / n;
    meanY += yi / n;
    if (xi < minX) minX = xi;
    if (xi > maxX) maxX = xi;
    if (yi < minY) minY = yi;
    if (yi > maxY) maxY = yi;
  }
  let [sxx, sxy, syy] = [0, 0, 0];
  for (const i of used) {
    const dx = x[i]! - meanX;
    const dy = y[i]! - meanY;
    sxx += dx * dx;
    sxy += dx * dy;
    syy += dy * dy;
  }
  const largestX = Math.max(Math.abs(minX), Math.abs(maxX));
  const largestY = Math.max(Math.abs(minY), Math.abs(maxY));
  return {
    n, meanX, meanY, sxx, sxy, syy, largestX, largestY,
    xAllEqual: !(maxX - minX > SPREAD_FLOOR * Math.max(1, largestX)),
    yAllEqual: !(maxY - minY > SPREAD_FLOOR * Math.max(1, largestY)),
  };
}

/**
 * Size below which a residual of a line with this slope is rounding: a few units in the last place
 * of the largest term of y − a − b·x. A residual SD below it is a perfect fit.
 */
export function roundingFloor(sums: LineSums, slope: number): number {
  return 16 * Number.EPSILON * Math.max(1, sums.largestY, Math.abs(slope) * sums.largestX);
}
