/**
 * Median of the values, the mean of the middle two for an even count (quantile type 7, as R).
 *
 * @throws RangeError when there are none
 */
export function median(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError('The median of no values is not defined');
  const sorted = Float64Array.from(values).sort();
  const upper = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[upper]! : (sorted[upper - 1]! + sorted[upper]!) / 2;
}
