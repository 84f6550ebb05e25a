import { predictAt } from './bands';
import { flagPoints } from './flags';
import { leaveOneOutOls } from './leaveOneOut';
import { fitOls, lineSummary, testOlsExponent } from './leastSquares';
import { diagnoseOls } from './olsDiagnostics';
import { logPoints, rangeOfX } from './points';
import { HELD_BY_ONE, SEARCHED_IN_BLOCKS, unfitGroup } from './scalingAnswer';
import type { FitPoint, ScalingFit } from './types';

interface OlsOptions {
  level: number;
  against: readonly number[];
  predictAt: readonly number[];
}

/** One group's least-squares fit in the answer's shape. Throws RangeError as `logPoints`. */
export function fitGroupOls(group: string | null, points: readonly FitPoint[], options: OlsOptions): ScalingFit {
  const { log10X, log10Y } = logPoints(points);
  const fit = fitOls(log10X, log10Y, options.level);
  if (fit.kind === 'unfit') return unfitGroup(group, 'ols', points, options.level, fit.unfit);

  const diagnostics = diagnoseOls(fit, log10X);
  const { points: flags, inBlocks } = flagPoints(fit, log10X, log10Y, diagnostics);
  const leaveOneOut = leaveOneOutOls(fit, points.map(({ id }) => id), log10X);
  const xRange = rangeOfX(points);
  const line = lineSummary(fit);
  const notes: string[] = [];
  if (fit.perfect) {
    notes.push('Every species lies on the line to within rounding: there is no error to test with, and likelihood and residual measures are not defined.');
  }
  if (fit.rSquared === null) notes.push('All species have the same y: R² is not defined.');
  if (inBlocks) notes.push(SEARCHED_IN_BLOCKS);
  if (!leaveOneOut && fit.n >= 4) notes.push(HELD_BY_ONE);
  return {
    group, n: fit.n, df: fit.df, method: 'ols', level: options.level,
    exponent: fit.exponent,
    log10Coefficient: fit.log10Coefficient,
    rSquared: fit.rSquared,
    residualSd: fit.residualSd,
    logLikelihood: fit.logLikelihood,
    aic: fit.aic,
    smearingFactor: fit.smearingFactor,
    lambda: null,
    bootstrap: null,
    tests: options.against.map((exponent) => testOlsExponent(fit, exponent)),
    predictions: options.predictAt.map((x) => predictAt(line, x, xRange)),
    points: points.map(({ id, x, y }, i) => ({
      id, x, y,
      fittedLog10: fit.fitted[i]!,
      residual: fit.residuals[i]!,
      studentised: diagnostics?.[i]?.studentised ?? null,
      internallyStudentised: diagnostics?.[i]?.internallyStudentised ?? null,
      leverage: diagnostics?.[i]?.leverage ?? null,
      cooksDistance: diagnostics?.[i]?.cooksDistance ?? null,
      dffits: diagnostics?.[i]?.dffits ?? null,
      ...flags[i]!,
    })),
    xRange,
    leaveOneOut,
    design: { meanLog10X: line.meanLog10X, sxx: line.sxx, tCritical: line.tCritical, level: line.level },
    notes,
    unfit: null,
  };
}
