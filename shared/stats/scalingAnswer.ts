import type { PointFlags } from './flags';
import { rangeOfX } from './points';
import type { FitPoint, ScalingFit, Unfit } from './types';

/** Notes that more than one method gives. */
export const SEARCHED_IN_BLOCKS = 'Above 2,000 points the search for outliers admits points in blocks that halve as the limit nears.';
export const HELD_BY_ONE = 'One species alone decides the line: without it the others give none, so the exponent with any one left out is not defined.';

const NO_FLAG: PointFlags = { bonferroniP: null, flag: 'none', flags: [], reasons: [] };

/** The answer for a group that gives no line: every number null, the reason in `unfit`. */
export function unfitGroup(
  group: string | null, method: ScalingFit['method'], points: readonly FitPoint[], level: number, unfit: Unfit,
): ScalingFit {
  return {
    group, n: points.length, df: null, method, level,
    exponent: null, log10Coefficient: null, rSquared: null, residualSd: null,
    logLikelihood: null, aic: null, smearingFactor: null, lambda: null, bootstrap: null,
    tests: [],
    predictions: method === 'ols' ? [] : null,
    points: points.map(({ id, x, y }) => ({
      id, x, y, fittedLog10: null, residual: null, studentised: null, internallyStudentised: null,
      leverage: null, cooksDistance: null, dffits: null, ...NO_FLAG,
    })),
    xRange: rangeOfX(points),
    leaveOneOut: null, design: null, notes: [], unfit,
  };
}
