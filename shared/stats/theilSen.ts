import { median } from './median';

export interface TheilSenLine {
  exponent: number;
  /** Median of y less exponent times median of x: the line passes through the medians. */
  log10Coefficient: number;
  /** Median of y − b·x, the other definition in use: as many points above as below. */
  log10CoefficientOfResiduals: number;
  /** Pairs of points with different x, whose slopes were ranked. */
  pairs: number;
}

/** Up to here all pairwise slopes are held at once (125,000 numbers). */
const LARGEST_LISTED = 500;

/**
 * Theil–Sen line: the exponent is the median of the slopes of all pairs with different x; the line
 * passes through the medians of x and y.
 *
 * Above 500 points the median is found without listing the pairs: the slopes below a trial value
 * are counted as inversions of y − trial·x in the order of x, O(n log n), and the trial is bisected
 * down to the last digit. Same definition, memory proportional to n, no random choice.
 *
 * @param log10X decimal logarithms of x
 * @param log10Y decimal logarithms of y, as many as x
 * @returns the line, or null when no two points differ in x
 * @throws RangeError on unequal lengths or a value that is not finite
 * @source Sen 1968, J. Am. Stat. Assoc. 63:1379–1389
 */
export function fitTheilSen(log10X: readonly number[], log10Y: readonly number[]): TheilSenLine | null {
  if (log10X.length !== log10Y.length) {
    throw new RangeError(`x and y must be equally long, found ${log10X.length} and ${log10Y.length}`);
  }
  if (![...log10X, ...log10Y].every(Number.isFinite)) throw new RangeError('x and y must be finite numbers');
  const found = log10X.length <= LARGEST_LISTED
    ? medianOfListedSlopes(log10X, log10Y)
    : medianOfCountedSlopes(log10X, log10Y);
  if (!found) return null;
  const { exponent } = found;
  return {
    ...found,
    log10Coefficient: median(log10Y) - exponent * median(log10X),
    log10CoefficientOfResiduals: median(log10Y.map((y, i) => y - exponent * log10X[i]!)),
  };
}

interface MedianSlope {
  exponent: number;
  pairs: number;
}

/** Median slope by listing every pair: O(n²) time and memory. */
export function medianOfListedSlopes(x: readonly number[], y: readonly number[]): MedianSlope | null {
  const slopes: number[] = [];
  for (let i = 0; i < x.length; i += 1) {
    for (let j = i + 1; j < x.length; j += 1) {
      const dx = x[j]! - x[i]!;
      if (dx !== 0) slopes.push((y[j]! - y[i]!) / dx);
    }
  }
  return slopes.length === 0 ? null : { exponent: median(slopes), pairs: slopes.length };
}

/** Median slope by counting inversions and bisection: O(n log n) a trial, memory O(n). */
export function medianOfCountedSlopes(x: readonly number[], y: readonly number[]): MedianSlope | null {
  const order = x.map((_, i) => i).sort((a, b) => x[a]! - x[b]! || y[a]! - y[b]!);
  const xs = Float64Array.from(order, (i) => x[i]!);
  const ys = Float64Array.from(order, (i) => y[i]!);
  const pairs = pairsOfDifferentX(xs);
  if (pairs === 0) return null;
  const below = slopeCounter(xs, ys);
  const lower = slopeOfRank(below, Math.floor((pairs + 1) / 2));
  const exponent = pairs % 2 === 1 ? lower : (lower + slopeOfRank(below, pairs / 2 + 1)) / 2;
  return { exponent, pairs };
}

function pairsOfDifferentX(sorted: Float64Array): number {
  let pairs = 0;
  let firstOfTie = 0;
  for (let i = 1; i < sorted.length; i += 1) {
    if (sorted[i] !== sorted[i - 1]) firstOfTie = i;
    pairs += firstOfTie;
  }
  return pairs;
}

/** A function that counts the pairs whose slope lies below a trial value. */
function slopeCounter(xs: Float64Array, ys: Float64Array): (trial: number) => number {
  const n = xs.length;
  const values = new Float64Array(n);
  const spare = new Float64Array(n);
  return (trial) => {
    for (let i = 0; i < n; i += 1) values[i] = ys[i]! - trial * xs[i]!;
    // Within equal x the order of y never inverts, so these pairs are not counted.
    return countInversions(values, spare);
  };
}

/** Pairs i < j with values[i] > values[j], by merge sort from the bottom up; sorts `values`. */
function countInversions(values: Float64Array, spare: Float64Array): number {
  const n = values.length;
  let inversions = 0;
  let [from, to] = [values, spare];
  for (let width = 1; width < n; width *= 2) {
    for (let start = 0; start < n; start += 2 * width) {
      const middle = Math.min(start + width, n);
      const end = Math.min(start + 2 * width, n);
      let [left, right] = [start, middle];
      for (let k = start; k < end; k += 1) {
        if (right >= end || (left < middle && from[left]! <= from[right]!)) {
          to[k] = from[left]!;
          left += 1;
        } else {
          to[k] = from[right]!;
          right += 1;
          inversions += middle - left;
        }
      }
    }
    [from, to] = [to, from];
  }
  return inversions;
}

/** The slope of this rank (1 is the smallest): the largest trial with fewer than `rank` slopes below. */
function slopeOfRank(below: (trial: number) => number, rank: number): number {
  let width = 1;
  while (below(width) < rank) width *= 2;
  let high = width;
  width = 1;
  while (below(-width) >= rank) width *= 2;
  let low = -width;
  for (;;) {
    const middle = low + (high - low) / 2;
    if (middle <= low || middle >= high) return low;
    if (below(middle) < rank) low = middle;
    else high = middle;
  }
}
