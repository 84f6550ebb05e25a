import { tCritical, tTwoSidedP } from './distributions';
import { lineSums, roundingFloor } from './lineSums';
import type { Estimate, ExponentTest, LineSummary, Unfit } from './types';

/** An ordinary least-squares line on log10–log10, with what later steps need of it. */
export interface OlsFit {
  kind: 'fit';
  n: number;
  df: number;
  level: number;
  exponent: Estimate & { standardError: number };
  log10Coefficient: Estimate & { standardError: number };
  /** null when all y are equal: there is no variation to explain. */
  rSquared: number | null;
  residualSd: number;
  /** null for a perfect fit, where the likelihood has no bound. */
  logLikelihood: number | null;
  /** −2·logLikelihood + 2·3: exponent, coefficient and σ² are counted. */
  aic: number | null;
  /** Duan's mean of 10^residual; null where it exceeds the largest double. */
  smearingFactor: number | null;
  meanLog10X: number;
  meanLog10Y: number;
  sxx: number;
  fitted: number[];
  residuals: number[];
  /** Every point lies on the line to within rounding. */
  perfect: boolean;
  /** Size below which a residual is rounding. */
  floor: number;
}

export type OlsResult = OlsFit | { kind: 'unfit'; unfit: Unfit };

/** Least number of points for a line with an error of its own. */
export const LEAST_POINTS = 3;

/**
 * Ordinary least squares of log10 y on log10 x.
 *
 * Standard errors and t intervals on n − 2 degrees of freedom; residual SD = √(RSS/(n − 2)); R² =
 * 1 − RSS/Syy; log-likelihood at σ² = RSS/n; AIC counts σ². Smearing factor after Duan (1983).
 *
 * @param log10X decimal logarithms of x
 * @param log10Y decimal logarithms of y, as many as x
 * @param level level of the intervals, between 0 and 1
 * @returns the fit, or `unfit` for fewer than 3 points or when all x are equal
 * @throws RangeError on unequal lengths, a value that is not finite, or a level outside 0…1
 * @source Draper & Smith, Applied Regression Analysis, ch. 1; Duan 1983, J. Am. Stat. Assoc. 78:605–610
 */
export function fitOls(log10X: readonly number[], log10Y: readonly number[], level = 0.95): OlsResult {
  requireLevel(level);
  const sums = lineSums(log10X, log10Y);
  const { n, meanX, meanY, sxx, sxy, syy } = sums;
  if (n < LEAST_POINTS) return { kind: 'unfit', unfit: tooFewPoints(n) };
  if (sums.xAllEqual) return { kind: 'unfit', unfit: xAllEqual() };

  const df = n - 2;
  const slope = sums.yAllEqual ? 0 : sxy / sxx;
  const intercept = meanY - slope * meanX;
  const fitted = log10X.map((x) => meanY + slope * (x - meanX));
  const residuals = log10Y.map((y, i) => y - fitted[i]!);
  const floor = roundingFloor(sums, slope);
  const rawRss = residuals.reduce((sum, e) => sum + e * e, 0);
  const perfect = Math.sqrt(rawRss / n) <= floor;
  const rss = perfect ? 0 : rawRss;
  const residualSd = Math.sqrt(rss / df);
  const t = tCritical(level, df);
  const logLikelihood = perfect ? null : (-n / 2) * (Math.log(2 * Math.PI) + Math.log(rss / n) + 1);
  const smearing = residuals.reduce((sum, e) => sum + 10 ** e, 0) / n;
  return {
    kind: 'fit', n, df, level,
    exponent: estimate(slope, residualSd / Math.sqrt(sxx), t),
    log10Coefficient: estimate(intercept, residualSd * Math.sqrt(1 / n + (meanX * meanX) / sxx), t),
    rSquared: sums.yAllEqual ? null : 1 - rss / syy,
    residualSd,
    logLikelihood,
    aic: logLikelihood === null ? null : -2 * logLikelihood + 2 * 3,
    smearingFactor: perfect ? 1 : Number.isFinite(smearing) ? smearing : null,
    meanLog10X: meanX, meanLog10Y: meanY, sxx, fitted, residuals, perfect, floor,
  };
}

/**
 * Test of a stated exponent: t = (b − b0)/SE on n − 2 degrees of freedom, two-sided.
 *
 * @returns statistic and p null for a perfect fit, which leaves no error to test with
 * @throws RangeError when the exponent is not finite
 * @source Draper & Smith, Applied Regression Analysis, ch. 1
 */
export function testOlsExponent(fit: OlsFit, exponent: number): ExponentTest {
  requireExponent(exponent);
  if (fit.perfect) return { exponent, statistic: null, statisticKind: 't', df: fit.df, p: null };
  const statistic = (fit.exponent.estimate - exponent) / fit.exponent.standardError;
  return { exponent, statistic, statisticKind: 't', df: fit.df, p: tTwoSidedP(statistic, fit.df) };
}

/** The sums that draw this fit's line and bands elsewhere, without refitting (see bands.ts). */
export function lineSummary(fit: OlsFit): LineSummary {
  return {
    n: fit.n,
    meanLog10X: fit.meanLog10X,
    sxx: fit.sxx,
    residualSd: fit.residualSd,
    exponent: fit.exponent.estimate,
    log10Coefficient: fit.log10Coefficient.estimate,
    level: fit.level,
    tCritical: tCritical(fit.level, fit.df),
  };
}

/** The typed non-fit for fewer than three points. */
export function tooFewPoints(n: number): Unfit {
  return { code: 'too-few-points', message: `A line needs at least ${LEAST_POINTS} species, found ${n}.` };
}

/** The typed non-fit for points without spread in x. */
export function xAllEqual(): Unfit {
  return { code: 'x-all-equal', message: 'All species have the same x, so no exponent can be told.' };
}

/** @throws RangeError unless the level lies strictly between 0 and 1 */
export function requireLevel(level: number): void {
  if (!(level > 0 && level < 1)) throw new RangeError(`A level lies between 0 and 1, found ${level}`);
}

/** @throws RangeError unless the stated exponent is a finite number */
export function requireExponent(exponent: number): void {
  if (!Number.isFinite(exponent)) throw new RangeError(`A stated exponent is a finite number, found ${exponent}`);
}

function estimate(value: number, standardError: number, t: number): Estimate & { standardError: number } {
  return { estimate: value, standardError, lower: value - t * standardError, upper: value + t * standardError };
}
