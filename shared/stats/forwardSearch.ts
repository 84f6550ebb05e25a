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
/** Distances are ordered in steps of this size. */
const TIE = 1e-9;

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
  const order = nearestFirst(nearness.map((_, i) => i), (i) => nearness[i]!, log10X, log10Y);
  let size = Math.ceil(STARTING_SHARE * n);
  while (size < n && lineSums(log10X, log10Y, order.slice(0, size)).xAllEqual) size += 1;
  const inside = order.slice(0, size);
  let outside = order.slice(size);

  const inBlocks = n > LARGEST_ONE_BY_ONE;
  let block = inBlocks ? Math.max(1, Math.ceil(FIRST_BLOCK_SHARE * outside.length)) : 1;
  for (;;) {
    const line = lineThrough(lineSums(log10X, log10Y, inside));
    const limit = tCritical(1 - alpha / n, inside.length - 2);
    const sizes = new Map(outside.map((i) => [i, Math.abs(line.distance(log10X[i]!, log10Y[i]!, 1))]));
    outside = nearestFirst(outside, (i) => sizes.get(i)!, log10X, log10Y);
    block = Math.min(block, outside.length);
    const admissible = (rank: number): boolean => sizes.get(outside[rank - 1]!)! < limit;
    while (block > 1 && !admissible(block)) block = Math.floor(block / 2);
    if (block === 0 || !admissible(1)) {
      return finish(log10X, log10Y, new Set(outside), line, limit, inBlocks);
    }
    for (const i of outside.splice(0, block)) inside.push(i);
  }
}

/**
 * Indexes by distance. Ties, to within rounding, are broken by the values: neither the order given
 * nor the unit of x and y may decide.
 */
function nearestFirst(
  members: readonly number[], distance: (i: number) => number, x: readonly number[], y: readonly number[],
): number[] {
  const steps = members.map((i) => ({ i, step: Math.round(distance(i) / TIE) }));
  return steps.sort((a, b) => a.step - b.step || x[a.i]! - x[b.i]! || y[a.i]! - y[b.i]!).map(({ i }) => i);
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
