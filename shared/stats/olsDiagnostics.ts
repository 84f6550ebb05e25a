import type { OlsFit } from './leastSquares';

/** Diagnostics of one point of a least-squares fit; null where the point leaves them undefined. */
export interface OlsDiagnostics {
  leverage: number;
  internallyStudentised: number | null;
  /** Externally studentised residual, t on n − 3. */
  studentised: number | null;
  cooksDistance: number | null;
  dffits: number | null;
}

/** Least number of points for the externally studentised residual to have a degree of freedom. */
export const LEAST_POINTS_FOR_DIAGNOSTICS = 4;

/** A leverage this near 1 means that the point alone holds the line: its residual is 0 by construction. */
const WHOLE_LEVERAGE = 1 - 1e-10;

/**
 * Influence diagnostics in one pass, without refitting.
 *
 * h = 1/n + (x − x̄)²/Sxx; internal r = e/(s√(1 − h)); s₍ᵢ₎² = (RSS − e²/(1 − h))/(n − 3); external
 * t = e/(s₍ᵢ₎√(1 − h)); Cook's D = r²h/(2(1 − h)); DFFITS = t√(h/(1 − h)).
 *
 * Null are: all but leverage where h = 1; the residual measures of a perfect fit; the external ones
 * where the other points lie exactly on a line (s₍ᵢ₎ = 0).
 *
 * @param log10X the x of the fit, in its order
 * @returns one entry per point, in order; null below 4 points
 * @source Belsley, Kuh & Welsch 1980, Regression Diagnostics, ch. 2; Cook 1977, Technometrics 19:15–18
 */
export function diagnoseOls(fit: OlsFit, log10X: readonly number[]): OlsDiagnostics[] | null {
  const { n, residuals, residualSd: s } = fit;
  if (log10X.length !== n) throw new RangeError(`The fit has ${n} points, found ${log10X.length} values of x`);
  if (n < LEAST_POINTS_FOR_DIAGNOSTICS) return null;
  const rss = s * s * fit.df;
  return log10X.map((x, i) => {
    const e = residuals[i]!;
    const leverage = leverageAt(fit, x);
    if (fit.perfect || leverage >= WHOLE_LEVERAGE) {
      return { leverage, internallyStudentised: null, studentised: null, cooksDistance: null, dffits: null };
    }
    const rest = 1 - leverage;
    const internal = e / (s * Math.sqrt(rest));
    const sdWithout = Math.sqrt(Math.max(0, rss - (e * e) / rest) / (n - 3));
    // RSS less nearly all of itself keeps no digits below √ε of s, and nothing below the rounding of y.
    const undefinedWithout = sdWithout <= Math.max(fit.floor, 1e-7 * s);
    const studentised = undefinedWithout ? null : e / (sdWithout * Math.sqrt(rest));
    return {
      leverage,
      internallyStudentised: internal,
      studentised,
      cooksDistance: (internal * internal * leverage) / (2 * rest),
      dffits: studentised === null ? null : studentised * Math.sqrt(leverage / rest),
    };
  });
}

/** Leverage of a fitted point at this log10 x: 1/n + (x − x̄)²/Sxx, at most 1. */
export function leverageAt(fit: OlsFit, log10X: number): number {
  const distance = log10X - fit.meanLog10X;
  return Math.min(1, 1 / fit.n + (distance * distance) / fit.sxx);
}
