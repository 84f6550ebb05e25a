import { fQuantileUpper, fUpperTail, tCritical } from './distributions';
import { requireExponent, requireLevel, tooFewPoints, xAllEqual, LEAST_POINTS } from './leastSquares';
import { lineSums, roundingFloor } from './lineSums';
import type { LineSums } from './lineSums';
import type { Estimate, ExponentTest, Unfit } from './types';

/** A standardised major axis on log10–log10. */
export interface SmaFit {
  kind: 'fit';
  n: number;
  df: number;
  level: number;
  exponent: Estimate;
  log10Coefficient: Estimate;
  rSquared: number;
  /** SD of log10 y about the line, vertically, on n − 2. */
  residualSd: number;
  fitted: number[];
  residuals: number[];
  perfect: boolean;
  sums: LineSums;
}

export type SmaResult = SmaFit | { kind: 'unfit'; unfit: Unfit };

/**
 * Standardised (reduced) major axis of log10 y and log10 x.
 *
 * b = sign(r)·√(Syy/Sxx), through the means; limits b·(√(B + 1) ∓ √B) with B = F(level; 1, n − 2)·
 * (1 − r²)/(n − 2); residual variance v = (Syy − 2b·Sxy + b²·Sxx)/(n − 2); coefficient ±
 * t·√(v/n + x̄²·b²(1 − r²)/(n − 2)). The limits are not symmetric, so no standard error is given.
 *
 * @param log10X decimal logarithms of x
 * @param log10Y decimal logarithms of y, as many as x
 * @param level level of the intervals, between 0 and 1
 * @returns the fit, or `unfit`: fewer than 3 points, all x or all y equal, or r = 0, where the sign
 *   of the exponent is not defined
 * @throws RangeError on unequal lengths, a value that is not finite, or a level outside 0…1
 * @source Warton, Wright, Falster & Westoby 2006, Biol. Rev. 81:259–291, Table 4 and Appendix
 */
export function fitSma(log10X: readonly number[], log10Y: readonly number[], level = 0.95): SmaResult {
  requireLevel(level);
  const sums = lineSums(log10X, log10Y);
  const unfit = smaUnfit(sums);
  if (unfit) return { kind: 'unfit', unfit };

  const { n, meanX, meanY, sxx, sxy, syy } = sums;
  const df = n - 2;
  const slope = Math.sign(sxy) * Math.sqrt(syy / sxx);
  const intercept = meanY - slope * meanX;
  const fitted = log10X.map((x) => meanY + slope * (x - meanX));
  const residuals = log10Y.map((y, i) => y - fitted[i]!);
  const rawRss = residuals.reduce((sum, e) => sum + e * e, 0);
  const perfect = Math.sqrt(rawRss / n) <= roundingFloor(sums, slope);
  const rss = perfect ? 0 : rawRss;
  const rSquared = perfect ? 1 : (sxy * sxy) / (sxx * syy);
  const unexplained = perfect ? 0 : 1 - rSquared;

  const B = (fQuantileUpper(1 - level, 1, df) * unexplained) / df;
  const limits = [slope * (Math.sqrt(B + 1) - Math.sqrt(B)), slope * (Math.sqrt(B + 1) + Math.sqrt(B))];
  const half = tCritical(level, df)
    * Math.sqrt(rss / df / n + (meanX * meanX * unexplained * slope * slope) / df);
  return {
    kind: 'fit', n, df, level,
    exponent: { estimate: slope, standardError: null, lower: Math.min(...limits), upper: Math.max(...limits) },
    log10Coefficient: { estimate: intercept, standardError: null, lower: intercept - half, upper: intercept + half },
    rSquared,
    residualSd: Math.sqrt(rss / df),
    fitted, residuals, perfect, sums,
  };
}

/**
 * Test of a stated exponent b0 of a standardised major axis: r between y − b0·x and y + b0·x, F =
 * r²(n − 2)/(1 − r²) on 1 and n − 2.
 *
 * @returns statistic and p null where r = ±1 by construction: a perfect fit, and b0 = 0, an exponent
 *   that no standardised major axis can have
 * @throws RangeError when the exponent is not finite
 * @source Warton et al. 2006, Biol. Rev. 81:259–291 (Pitman's test)
 */
export function testSmaExponent(fit: SmaFit, exponent: number): ExponentTest {
  requireExponent(exponent);
  const none: ExponentTest = { exponent, statistic: null, statisticKind: 'F', df: fit.df, p: null };
  if (fit.perfect || exponent === 0) return none;
  const { sxx, syy } = fit.sums;
  const product = syy - exponent * exponent * sxx;
  // With D = S(y−b0x)·S(y+b0x): r² = product²/D, 1 − r² = 4·b0²(Sxx·Syy − Sxy²)/D, and D cancels.
  const unexplained = 4 * exponent * exponent * sxx * syy * (1 - fit.rSquared);
  if (!(unexplained > 0)) return none;
  const statistic = (product * product * fit.df) / unexplained;
  return { exponent, statistic, statisticKind: 'F', df: fit.df, p: fUpperTail(statistic, 1, fit.df) };
}

function smaUnfit(sums: LineSums): Unfit | null {
  if (sums.n < LEAST_POINTS) return tooFewPoints(sums.n);
  if (sums.xAllEqual) return xAllEqual();
  if (sums.yAllEqual) {
    return { code: 'y-all-equal', message: 'All species have the same y, so the axis has no direction.' };
  }
  const r = sums.sxy / Math.sqrt(sums.sxx * sums.syy);
  if (Math.abs(r) < 1e-12) {
    return { code: 'no-direction', message: 'x and y are not correlated, so the sign of the exponent is not defined.' };
  }
  return null;
}
