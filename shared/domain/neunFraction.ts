import { chiSquareUpperTail, tQuantile } from '../stats/distributions';
import { NORMAL_975 } from './quantity';
import type { NeunCount, NeunInput, NeuronFraction } from './sampleTypes';

/** The counts of an answer as a list of fields; a single total is one field. */
export function neunFields(neun: NeunInput): readonly NeunCount[] {
  return 'fields' in neun ? neun.fields : [neun];
}

function isPossible(field: NeunCount): boolean {
  return (
    Number.isInteger(field.positive) && Number.isInteger(field.total) &&
    field.positive >= 0 && field.total >= 0 && field.positive <= field.total
  );
}

/** Wilson's (1927) 95 % limits of a fraction positive/total. */
export function wilsonLimits(positive: number, total: number): { lower: number; upper: number } {
  const p = positive / total;
  const z2 = NORMAL_975 ** 2;
  const centre = (p + z2 / (2 * total)) / (1 + z2 / total);
  const half = (NORMAL_975 * Math.sqrt((p * (1 - p)) / total + z2 / (4 * total ** 2))) / (1 + z2 / total);
  // At the ends the limit is exact; the subtraction leaves a rounding error.
  return { lower: positive === 0 ? 0 : centre - half, upper: positive === total ? 1 : centre + half };
}

/**
 * The NeuN-positive fraction with its 95 % limits and the variance that enters the neurons' error.
 *
 * Var(p) = p(1−p)/n; at p = 0 or 1 (Wilson half-width/1.96)². With three or more fields the ratio
 * estimator's variance between fields, m/(m−1)·Σ(yᵢ−p·xᵢ)²/(Σx)² (Cochran 1977, 6.4), replaces it
 * where larger; the limits are then p ± t(m−1)·SE within 0…1, otherwise Wilson's.
 * Returns null where nothing was counted or a count is impossible.
 */
export function estimateNeuronFraction(neun: NeunInput): NeuronFraction | null {
  const fields = neunFields(neun);
  if (!fields.every(isPossible)) return null;
  const counted = fields.filter((field) => field.total > 0);
  const positive = counted.reduce((sum, field) => sum + field.positive, 0);
  const total = counted.reduce((sum, field) => sum + field.total, 0);
  if (total === 0) return null;
  const p = positive / total;
  const wilson = wilsonLimits(positive, total);
  const isAtEnd = positive === 0 || positive === total;
  const binomialVariance = isAtEnd ? ((wilson.upper - wilson.lower) / 2 / NORMAL_975) ** 2 : (p * (1 - p)) / total;

  const m = counted.length;
  const fieldVariance =
    m < 3 ? 0 : ((m / (m - 1)) * counted.reduce((sum, field) => sum + (field.positive - p * field.total) ** 2, 0)) / total ** 2;
  if (fieldVariance > binomialVariance) {
    const standardError = Math.sqrt(fieldVariance);
    const half = tQuantile(0.975, m - 1) * standardError;
    return { value: p, lower: Math.max(0, p - half), upper: Math.min(1, p + half), standardError, varianceKind: 'between-fields', fields: m };
  }
  return { value: p, ...wilson, standardError: Math.sqrt(binomialVariance), varianceKind: 'binomial', fields: m };
}

/** Chi-square of homogeneity of the NeuN-positive fraction over fields, on m−1 df; null where undefined. */
export function neunHomogeneity(neun: NeunInput): { statistic: number; df: number; p: number } | null {
  const fields = neunFields(neun).filter((field) => field.total > 0);
  const positive = fields.reduce((sum, field) => sum + field.positive, 0);
  const total = fields.reduce((sum, field) => sum + field.total, 0);
  if (fields.length < 2 || !fields.every(isPossible) || positive === 0 || positive === total) return null;
  const p = positive / total;
  const statistic = fields.reduce((sum, field) => sum + (field.positive - p * field.total) ** 2 / (field.total * p * (1 - p)), 0);
  if (!Number.isFinite(statistic)) return null;
  return { statistic, df: fields.length - 1, p: chiSquareUpperTail(statistic, fields.length - 1) };
}
