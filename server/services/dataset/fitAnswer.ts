import type { FitsRequest, ScalingFitAnswer } from '../../../shared/contracts/fits';
import { fitScaling } from '../../../shared/stats/fit';
import type { ScalingFit } from '../../../shared/stats/types';

/**
 * One fit in the shape of the public answer.
 * @param fit a fit of shared/stats, raw units, log10–log10
 * @returns the same numbers; without the diagnostics that it does not carry
 */
export function toFitAnswer(fit: ScalingFit): ScalingFitAnswer {
  const { level: _level, ...rest } = fit;
  return {
    ...rest,
    // A group that is empty has no range, and JSON no infinity.
    xRange: fit.n === 0 ? null : fit.xRange,
    tests: fit.tests.map(({ exponent, statistic, df, p }) => ({ exponent, statistic, df, p })),
    predictions: fit.predictions === null ? null : fit.predictions.map(({ log10Estimate: _log10, ...prediction }) => prediction),
    points: fit.points.map(({ internallyStudentised: _internal, dffits: _dffits, ...point }) => point),
  };
}

/**
 * Fits the points of a request, one line a group; nothing is stored.
 * @param request raw points above 0, validated by its contract
 * @returns fits in order of first appearance of their groups; what gives no line carries `unfit` with its reason
 */
export function fitPoints(request: FitsRequest): { fits: ScalingFitAnswer[]; comparison: null; match: null } {
  const { fits, comparison, match } = fitScaling(request);
  return { fits: fits.map(toFitAnswer), comparison, match };
}
