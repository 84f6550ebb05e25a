import { bandAt, powerOfTen, rawInterval } from './bands';
import { fitOls, lineSummary } from './leastSquares';
import { tTwoSidedP } from './distributions';
import { logPoints, rangeOfX } from './points';
import type { Estimate, FitPoint, Interval, RawInterval, Unfit } from './types';

export interface PlaceOnLine {
  kind: 'placed';
  /** Species that the line is fitted to; the one placed is not among them. */
  n: number;
  /** n − 2: with the placed species counted, its number less 3. */
  df: number;
  level: number;
  exponent: Estimate;
  /** y of the line at the species' x; null beyond the largest double. */
  expected: number | null;
  /** y divided by the line. */
  ratio: number | null;
  log10Ratio: number;
  /** Where the ratio of one new species, or one specimen, is expected. */
  lowerRatio: number | null;
  upperRatio: number | null;
  /** The same in units of y. */
  prediction: RawInterval;
  /** y lies within the prediction interval. */
  inside: boolean;
  side: 'above' | 'below' | 'on';
  /** log10 ratio in prediction standard errors; null where the line has no error. */
  studentised: number | null;
  p: number | null;
  /** x lies outside the fitted species' range. */
  extrapolated: boolean;
  xRange: Interval;
  /** Variance on log10 within a species that entered the interval; null when none did. */
  withinSpeciesVariance: number | null;
}

export type PlaceResult = PlaceOnLine | { kind: 'unfit'; n: number; unfit: Unfit };

/**
 * Place of one species against the least-squares line that is fitted without it.
 *
 * Points with the species' own id are left out of the fit. The interval is that of a new species:
 * s²(1 + 1/n + (x − x̄)²/Sxx), plus the within-species variance where one specimen is placed; t on
 * n − 2 of the species fitted, that is n − 3 when the placed one is counted.
 *
 * @param species what is placed: raw x and y, above 0
 * @param points the clade's species means, raw; group is ignored
 * @param options level of the interval (0.95), and for a single specimen the variance on log10
 *   between specimens of a species
 * @returns the place, or `unfit` when the others give no line
 * @throws RangeError when a value is not finite and above 0, or the variance is negative
 */
export function placeOnLine(
  species: FitPoint,
  points: readonly FitPoint[],
  options: { level?: number; withinSpeciesVariance?: number | null } = {},
): PlaceResult {
  const { level = 0.95, withinSpeciesVariance = null } = options;
  const others = points.filter((point) => point.id !== species.id);
  const { log10X, log10Y } = logPoints(others);
  const own = logPoints([species]);
  const [x, y] = [own.log10X[0]!, own.log10Y[0]!];
  const fit = fitOls(log10X, log10Y, level);
  if (fit.kind === 'unfit') return { kind: 'unfit', n: others.length, unfit: fit.unfit };

  const line = lineSummary(fit);
  const band = bandAt(line, x, withinSpeciesVariance ?? 0);
  const log10Ratio = y - band.log10Estimate;
  const error = (band.prediction.upper - band.prediction.lower) / 2 / line.tCritical;
  const studentised = error > fit.floor ? log10Ratio / error : null;
  const xRange = rangeOfX(others);
  return {
    kind: 'placed',
    n: fit.n,
    df: fit.df,
    level,
    exponent: fit.exponent,
    expected: powerOfTen(band.log10Estimate),
    ratio: powerOfTen(log10Ratio),
    log10Ratio,
    lowerRatio: powerOfTen(-error * line.tCritical),
    upperRatio: powerOfTen(error * line.tCritical),
    prediction: rawInterval(band.prediction),
    inside: Math.abs(log10Ratio) <= Math.max(error * line.tCritical, fit.floor),
    side: Math.abs(log10Ratio) <= fit.floor ? 'on' : log10Ratio > 0 ? 'above' : 'below',
    studentised,
    p: studentised === null ? null : tTwoSidedP(studentised, fit.df),
    extrapolated: species.x < xRange.lower || species.x > xRange.upper,
    xRange,
    withinSpeciesVariance,
  };
}
