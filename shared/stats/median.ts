import { medianSorted } from 'simple-statistics';

/**
 * Median of the values, the mean of the middle two for an even count (quantile type 7, as R).
 * Sorting is left to a typed array: it is several times faster than comparing by a function.
 *
 * @throws RangeError when there are none
 */
export function median(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError('The median of no values is not defined');
  return medianSorted(Array.from(Float64Array.from(values).sort()));
}
