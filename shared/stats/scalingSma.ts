import { flagPoints } from './flags';
import { leaveOneOutSma } from './leaveOneOut';
import { fitOls } from './leastSquares';
import { diagnoseOls } from './olsDiagnostics';
import { logPoints, rangeOfX } from './points';
import { HELD_BY_ONE, SEARCHED_IN_BLOCKS, unfitGroup } from './scalingAnswer';
import { fitSma, testSmaExponent } from './standardisedMajorAxis';
import type { FitPoint, ScalingFit } from './types';

interface SmaOptions {
  level: number;
  against: readonly number[];
}

const NOT_DEFINED = 'The standardised major axis states how two variables grow together and does not predict one from the other: '
  + 'predictions, leverage, studentised residuals, Cook\'s distance, likelihood, AIC and smearing factor are not defined, and its limits come from no standard error.';
const FLAGS_FROM_OLS = 'Flags and their Bonferroni p are those of the least-squares fit of the same species.';

/** One group's standardised major axis in the answer's shape. Throws RangeError as `logPoints`. */
export function fitGroupSma(group: string | null, points: readonly FitPoint[], options: SmaOptions): ScalingFit {
  const { log10X, log10Y } = logPoints(points);
  const fit = fitSma(log10X, log10Y, options.level);
  if (fit.kind === 'unfit') return unfitGroup(group, 'sma', points, options.level, fit.unfit);
  const ols = fitOls(log10X, log10Y, options.level);
  if (ols.kind === 'unfit') return unfitGroup(group, 'sma', points, options.level, ols.unfit);

  const { points: flags, inBlocks } = flagPoints(ols, log10X, log10Y, diagnoseOls(ols, log10X));
  const leaveOneOut = leaveOneOutSma(fit, points.map(({ id }) => id), log10X, log10Y);
  const notes = [NOT_DEFINED, FLAGS_FROM_OLS];
  if (fit.perfect) notes.push('Every species lies on the line to within rounding: there is no error to test with.');
  if (inBlocks) notes.push(SEARCHED_IN_BLOCKS);
  if (!leaveOneOut && fit.n >= 4) notes.push(HELD_BY_ONE);
  return {
    group, n: fit.n, df: fit.df, method: 'sma', level: options.level,
    exponent: fit.exponent,
    log10Coefficient: fit.log10Coefficient,
    rSquared: fit.rSquared,
    residualSd: fit.residualSd,
    logLikelihood: null, aic: null, smearingFactor: null, lambda: null, bootstrap: null,
    tests: options.against.map((exponent) => testSmaExponent(fit, exponent)),
    predictions: null,
    points: points.map(({ id, x, y }, i) => ({
      id, x, y,
      fittedLog10: fit.fitted[i]!,
      residual: fit.residuals[i]!,
      studentised: null, internallyStudentised: null, leverage: null, cooksDistance: null, dffits: null,
      ...flags[i]!,
    })),
    xRange: rangeOfX(points),
    leaveOneOut,
    design: null,
    notes,
    unfit: null,
  };
}
