import { fQuantileUpper, tCritical, tTwoSidedP } from './distributions';
import { LEAST_POINTS_FOR_FLAGS, searchForward } from './forwardSearch';
import type { OlsFit } from './leastSquares';
import type { OlsDiagnostics } from './olsDiagnostics';
import type { FlagName } from './types';

/** Flags stand at this level, whatever level the intervals are shown at. */
export const FLAG_ALPHA = 0.05;

export interface PointFlags {
  /** Two-sided p of the externally studentised residual times n, at most 1. */
  bonferroniP: number | null;
  flag: 'none' | FlagName;
  flags: FlagName[];
  reasons: string[];
}

export interface FlaggedFit {
  points: PointFlags[];
  /** The forward search admitted points in blocks. */
  inBlocks: boolean;
}

/**
 * Flags of a least-squares fit with their reasons in words, at α = 0.05.
 *
 * `outlier`: outside at the end of the forward search. `watch`: externally studentised |t| beyond
 * t(1 − α/2, n − 3), and no outlier. `influential`: Cook's D above F(0.5; 2, n − 2). A leverage above
 * 4/n is a remark among the reasons and no flag. Below 8 points no flag and no remark is given;
 * the Bonferroni p is, from 4 points on.
 *
 * @param fit the least-squares fit of these points
 * @param log10X its x
 * @param log10Y its y
 * @param diagnostics its diagnostics, null below 4 points
 * @returns one entry per point, in order
 * @source Belsley, Kuh & Welsch 1980; Cook 1977; Hadi & Simonoff 1993
 */
export function flagPoints(
  fit: OlsFit, log10X: readonly number[], log10Y: readonly number[], diagnostics: OlsDiagnostics[] | null,
): FlaggedFit {
  const { n } = fit;
  if (!diagnostics) return { points: log10X.map(() => unflagged(null)), inBlocks: false };
  const bonferroni = diagnostics.map(({ studentised: t }) =>
    t === null ? null : Math.min(1, n * tTwoSidedP(t, n - 3)));
  const search = n < LEAST_POINTS_FOR_FLAGS ? null : searchForward(log10X, log10Y, FLAG_ALPHA);
  if (!search) return { points: bonferroni.map(unflagged), inBlocks: false };

  const watchLimit = tCritical(1 - FLAG_ALPHA, n - 3);
  const bonferroniLimit = tCritical(1 - FLAG_ALPHA / n, n - 3);
  const cookLimit = fQuantileUpper(0.5, 2, n - 2);
  const points = diagnostics.map(({ studentised: t, cooksDistance, leverage }, i): PointFlags => {
    const flags: FlagName[] = [];
    const reasons: string[] = [];
    if (search.outside[i]) {
      const distance = search.distances[i]!;
      flags.push('outlier');
      reasons.push(`Off the line: ${figure(Math.abs(distance))} standard errors ${side(distance)} the line of the points `
        + `that agree with one another, where ${figure(search.limit)} is the limit among ${n}.`);
    }
    if (cooksDistance !== null && cooksDistance > cookLimit) {
      flags.push('influential');
      reasons.push(`Moves the line by itself: Cook's distance ${figure(cooksDistance)} is above ${figure(cookLimit)}.`);
    }
    if (t !== null && Math.abs(t) > watchLimit && !search.outside[i]) {
      flags.push('watch');
      reasons.push(`Far ${side(t)} the line: studentised residual ${figure(t)} is beyond ±${figure(watchLimit)} `
        + `(the limit for the largest of ${n} is ${figure(bonferroniLimit)}).`);
    }
    if (leverage > 4 / n) {
      reasons.push(`Far out in x: leverage ${figure(leverage)} is above 4/n = ${figure(4 / n)}; a remark, no flag.`);
    }
    return { bonferroniP: bonferroni[i] ?? null, flag: flags[0] ?? 'none', flags, reasons };
  });
  return { points, inBlocks: search.inBlocks };
}

function unflagged(bonferroniP: number | null): PointFlags {
  return { bonferroniP, flag: 'none', flags: [], reasons: [] };
}

function side(signed: number): 'above' | 'below' {
  return signed < 0 ? 'below' : 'above';
}

function figure(value: number): string {
  const text = Math.abs(value) >= 1000 ? value.toExponential(1) : value.toFixed(2);
  return text.replace('-', '−');
}
