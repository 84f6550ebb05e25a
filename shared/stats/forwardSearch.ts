import { tCritical } from './distributions';
import { lineSums, roundingFloor } from './lineSums';
import type { LineSums } from './lineSums';
import { fitTheilSen } from './theilSen';

export interface ForwardSearch {
  /** Per point, in the order given: it stayed outside. */
  outside: boolean[];
  /** Signed distance from the final line in its standard errors, in the order given. */
  distances: number[];
  /** The limit that the nearest outside point reached, or the last limit used. */
  limit: number;
  /** Exponent of the line through the points inside. */
  exponent: number;
  /** Points were admitted in blocks that halve as the limit nears. */
  inBlocks: boolean;
}

/** Fewest points at which the search speaks. */
export const LEAST_POINTS_FOR_FLAGS = 8;
/** Above this many points, blocks are admitted. */
const LARGEST_ONE_BY_ONE = 2000;
const STARTING_SHARE = 0.75;
const FIRST_BLOCK_SHARE = 0.1;

/**
 * Forward search for points that do not belong to the line, also where they hide one another.
 *
 * Starts from the ⌈0.75n⌉ points nearest (vertically) the Theil–Sen line and fits least squares to
 * this set S. A point's distance is t = e/(s√(1 − h)) inside S and e/(s√(1 + h)) outside, h its leverage
 * on S. While the smallest outside |t| is below t(1 − α/(2n), |S| − 2), that point is admitted and the
 * line refitted. What stays outside is an outlier. A point once admitted stays.
 *
 * Above 2,000 points a tenth of the outside points is admitted at once while the farthest of them
 * is below the limit; the block is halved each time it is not, down to single points.
 *
 * @param log10X decimal logarithms of x
 * @param log10Y decimal logarithms of y, as many as x
 * @param alpha chance of any false alarm that the limit aims at; 0.05 unless said
 * @returns the search's end, or null below 8 points or when all x are equal
 * @throws RangeError on unequal lengths, a value that is not finite, or alpha outside 0…1
 * @source after Hadi & Simonoff 1993, J. Am. Stat. Assoc. 88:1264–1272
 */
export function searchForward(
  log10X: readonly number[], log10Y: readonly number[], alpha = 0.05,
): ForwardSearch | null {
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, found ${alpha}`);
  const n = log10X.length;
  const all = lineSums(log10X, log10Y);
  const robust = fitTheilSen(log10X, log10Y);
  if (n < LEAST_POINTS_FOR_FLAGS || all.xAllEqual || !robust) return null;

  const nearness = log10Y.map((y, i) => Math.abs(y - robust.log10Coefficient - robust.exponent * log10X[i]!));
  // Ties are broken by the values and not by position: the order given must not matter.
  const order = nearness.map((_, i) => i).sort((a, b) =>
    nearness[a]! - nearness[b]! || log10X[a]! - log10X[b]! || log10Y[a]! - log10Y[b]!);
  let size = Math.ceil(STARTING_SHARE * n);
  while (size < n && lineSums(log10X, log10Y, order.slice(0, size)).xAllEqual) size += 1;
  const inside = order.slice(0, size);
  let outside = order.slice(size);

  const inBlocks = n > LARGEST_ONE_BY_ONE;
  let block = inBlocks ? Math.max(1, Math.ceil(FIRST_BLOCK_SHARE * outside.length)) : 1;
  for (;;) {
    const line = lineThrough(lineSums(log10X, log10Y, inside));
    const limit = tCritical(1 - alpha / n, inside.length - 2);
    const distance = (i: number): number => line.distance(log10X[i]!, log10Y[i]!, 1);
    outside = outside
      .map((i) => ({ i, size: Math.abs(distance(i)) }))
      .sort((a, b) => a.size - b.size || log10X[a.i]! - log10X[b.i]! || log10Y[a.i]! - log10Y[b.i]!)
      .map(({ i }) => i);
    while (block > 1 && !(Math.abs(distance(outside[Math.min(block, outside.length) - 1]!)) < limit)) {
      block = Math.floor(block / 2);
    }
    const nearest = outside[0];
    if (nearest === undefined || !(Math.abs(distance(nearest)) < limit)) {
      return finish(log10X, log10Y, new Set(outside), line, limit, inBlocks);
    }
    inside.push(...outside.splice(0, Math.min(block, outside.length)));
    if (outside.length === 0) block = 1;
  }
}

interface SearchLine {
  exponent: number;
  /** side −1 for a point of the set, +1 for one outside. */
  distance: (x: number, y: number, side: 1 | -1) => number;
}

function lineThrough(sums: LineSums): SearchLine {
  const exponent = sums.yAllEqual ? 0 : sums.sxy / sums.sxx;
  const rss = Math.max(0, sums.syy - exponent * sums.sxy);
  const floor = roundingFloor(sums, exponent);
  // A set that lies exactly on a line has s = 0: rounding must not count as distance.
  const s = Math.max(Math.sqrt(rss / (sums.n - 2)), floor);
  return {
    exponent,
    distance: (x, y, side) => {
      const dx = x - sums.meanX;
      const e = y - sums.meanY - exponent * dx;
      const spread = 1 + side * (1 / sums.n + (dx * dx) / sums.sxx);
      return Math.abs(e) <= floor || spread <= 0 ? 0 : e / (s * Math.sqrt(spread));
    },
  };
}

function finish(
  x: readonly number[], y: readonly number[], outside: Set<number>, line: SearchLine, limit: number, inBlocks: boolean,
): ForwardSearch {
  return {
    outside: x.map((_, i) => outside.has(i)),
    distances: x.map((xi, i) => line.distance(xi, y[i]!, outside.has(i) ? 1 : -1)),
    limit,
    exponent: line.exponent,
    inBlocks,
  };
}
