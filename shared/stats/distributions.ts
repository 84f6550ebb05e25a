import chiSquareQuantileOf from '@stdlib/stats-base-dists-chisquare-quantile';
import fCdf from '@stdlib/stats-base-dists-f-cdf';
import fQuantileOf from '@stdlib/stats-base-dists-f-quantile';
import gammaInc from '@stdlib/math-base-special-gammainc';
import normalQuantileOf from '@stdlib/stats-base-dists-normal-quantile';
import tCdf from '@stdlib/stats-base-dists-t-cdf';
import tQuantileOf from '@stdlib/stats-base-dists-t-quantile';

/**
 * Distributions used by the fits, in the forms that keep their digits in the tails: a tail
 * probability is never formed as 1 − cdf. Every function throws RangeError on a probability outside
 * 0…1, on degrees of freedom that are not above 0, and on NaN.
 */

/** Quantile of Student's t: the value with probability `p` below it, on `df` degrees of freedom. */
export function tQuantile(p: number, df: number): number {
  requireProbability(p);
  requireDf(df);
  return tQuantileOf(p, df);
}

/**
 * Critical value of a two-sided t interval at `level` (0.95 gives the 0.975 quantile). Taken from
 * the lower tail, so that levels near 1 keep their digits.
 */
export function tCritical(level: number, df: number): number {
  return Math.abs(tQuantile((1 - level) / 2, df));
}

/** Two-sided p of a t statistic on `df` degrees of freedom: 2·P(T < −|t|). */
export function tTwoSidedP(t: number, df: number): number {
  requireNumber(t);
  requireDf(df);
  return Math.min(1, 2 * tCdf(-Math.abs(t), df));
}

/** Upper tail P(F > f) on `df1`, `df2`, by the reciprocal: P(F(df2, df1) < 1/f). */
export function fUpperTail(f: number, df1: number, df2: number): number {
  requireNumber(f);
  requireDf(df1);
  requireDf(df2);
  return f <= 0 ? 1 : fCdf(1 / f, df2, df1);
}

/** The value that F exceeds with probability `p` (0.05 gives the 95 % point), by the reciprocal. */
export function fQuantileUpper(p: number, df1: number, df2: number): number {
  requireProbability(p);
  requireDf(df1);
  requireDf(df2);
  // P(F > f) = p is P(1/F < 1/f) = p, and 1/F follows F(df2, df1).
  return 1 / fQuantileOf(p, df2, df1);
}

/** Upper tail P(X > x) of chi-square on `df`: the regularised upper incomplete gamma function. */
export function chiSquareUpperTail(x: number, df: number): number {
  requireNumber(x);
  requireDf(df);
  return x <= 0 ? 1 : gammaInc(x / 2, df / 2, true, true);
}

/** Lower tail P(X < x) of chi-square on `df`: the regularised lower incomplete gamma function. */
export function chiSquareLowerTail(x: number, df: number): number {
  requireNumber(x);
  requireDf(df);
  return x <= 0 ? 0 : gammaInc(x / 2, df / 2, true, false);
}

/** Quantile of chi-square: the value with probability `p` below it. Trusted for df below 1,500: above, the incomplete gamma function beneath it loses digits (1.5e-4 near 1,900). */
export function chiSquareQuantile(p: number, df: number): number {
  requireProbability(p);
  requireDf(df);
  return chiSquareQuantileOf(p, df);
}

/** Quantile of the standard normal distribution: the value with probability `p` below it. */
export function normalQuantile(p: number): number {
  requireProbability(p);
  return normalQuantileOf(p, 0, 1);
}

function requireProbability(p: number): void {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`A probability lies between 0 and 1, found ${p}`);
}

function requireDf(df: number): void {
  if (!(df > 0)) throw new RangeError(`Degrees of freedom lie above 0, found ${df}`);
}

function requireNumber(value: number): void {
  if (Number.isNaN(value)) throw new RangeError('A statistic must be a number, found NaN');
}
