import type { OlsFit } from './leastSquares';
import { LEAST_POINTS_FOR_DIAGNOSTICS, leverageAt } from './olsDiagnostics';
import type { SmaFit } from './standardisedMajorAxis';
import type { LeaveOneOut } from './types';

/** A point that alone spreads x leaves no line behind: less than this share of the sum is rounding. */
const LEFT_SHARE = 1e-10;
/** Moves that differ by less are equal: which rounds up depends on the unit. */
const EQUAL_MOVES = 1e-10;

/**
 * Range of the least-squares exponent when any one point is left out, in one pass:
 * b₍ᵢ₎ = b − (xᵢ − x̄)·eᵢ/(Sxx·(1 − hᵢ)).
 *
 * @param fit the least-squares fit
 * @param ids one per point, in the fit's order
 * @param log10X the fit's x
 * @returns the range and the id that moves the exponent most (the first of equals); null below 4
 *   points, and where leaving one point out leaves all x equal
 * @source Belsley, Kuh & Welsch 1980, Regression Diagnostics, ch. 2 (DFBETA)
 */
export function leaveOneOutOls(fit: OlsFit, ids: readonly string[], log10X: readonly number[]): LeaveOneOut | null {
  const b = fit.exponent.estimate;
  return range(b, ids, log10X.map((x, i) => {
    const rest = 1 - leverageAt(fit, x);
    if (rest <= LEFT_SHARE) return null;
    return b - ((x - fit.meanLog10X) * fit.residuals[i]!) / (fit.sxx * rest);
  }));
}

/**
 * The same for the standardised major axis, from the sums less one point:
 * Sxx₍ᵢ₎ = Sxx − (xᵢ − x̄)²·n/(n − 1), Syy and Sxy likewise.
 *
 * @returns as for least squares; null also where leaving one point out leaves all y equal or r = 0
 */
export function leaveOneOutSma(
  fit: SmaFit, ids: readonly string[], log10X: readonly number[], log10Y: readonly number[],
): LeaveOneOut | null {
  const { n, meanX, meanY, sxx, sxy, syy } = fit.sums;
  const weight = n / (n - 1);
  return range(fit.exponent.estimate, ids, log10X.map((x, i) => {
    const [dx, dy] = [x - meanX, log10Y[i]! - meanY];
    const sxxWithout = sxx - dx * dx * weight;
    const syyWithout = syy - dy * dy * weight;
    const sxyWithout = sxy - dx * dy * weight;
    const spreadless = sxxWithout <= LEFT_SHARE * sxx || syyWithout <= LEFT_SHARE * syy;
    if (spreadless || Math.abs(sxyWithout) <= LEFT_SHARE * Math.sqrt(sxx * syy)) return null;
    return Math.sign(sxyWithout) * Math.sqrt(syyWithout / sxxWithout);
  }));
}

function range(full: number, ids: readonly string[], exponents: (number | null)[]): LeaveOneOut | null {
  if (ids.length !== exponents.length) {
    throw new RangeError(`The fit has ${exponents.length} points, found ${ids.length} ids`);
  }
  if (exponents.length < LEAST_POINTS_FOR_DIAGNOSTICS) return null;
  let [lower, upper, largestMove] = [Infinity, -Infinity, -1];
  let mostMoving = '';
  for (const [i, exponent] of exponents.entries()) {
    if (exponent === null) return null;
    lower = Math.min(lower, exponent);
    upper = Math.max(upper, exponent);
    const move = Math.abs(exponent - full);
    if (move > largestMove + EQUAL_MOVES * Math.abs(full)) {
      largestMove = move;
      mostMoving = ids[i]!;
    }
  }
  return { lower, upper, mostMoving };
}
