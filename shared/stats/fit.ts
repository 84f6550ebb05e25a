import { fitGroupOls } from './scalingOls';
import { fitGroupSma } from './scalingSma';
import { requireExponent, requireLevel } from './leastSquares';
import { requirePositive } from './points';
import type { FitPoint, FitRequest, ScalingAnswer } from './types';

/**
 * Fits y = a·x^b as log10 y = log10 a + b·log10 x, one line for each group of points.
 *
 * @param request raw points above 0 (see FitRequest); groups are answered in the order in which they
 *   first appear, points without a group together under `group: null`, points in the order given
 * @returns one fit per group; a group that gives no line carries `unfit` with its reason
 * @throws RangeError when a point, level, stated exponent or x to predict at is not usable
 */
export function fitScaling(request: FitRequest): ScalingAnswer {
  const { points, method, level = 0.95, against = [], predictAt = [] } = request;
  requireLevel(level);
  against.forEach(requireExponent);
  predictAt.forEach((x) => requirePositive(x, 'x to predict at'));
  const groups = new Map<string | null, FitPoint[]>();
  for (const point of points) {
    const group = point.group ?? null;
    const members = groups.get(group);
    if (members) members.push(point);
    else groups.set(group, [point]);
  }
  const fits = [...groups].map(([group, members]) =>
    method === 'sma'
      ? fitGroupSma(group, members, { level, against })
      : fitGroupOls(group, members, { level, against, predictAt }));
  return { fits, comparison: null, match: null };
}
