import type { CheckResult } from '../../contracts/checks';
import type { ScaleUp } from '../sampleTypes';
import { outcome } from './outcome';

/**
 * What the scale-up does to a sample, and whether it can be: a midline structure has no other side,
 * both sides counted have none left, "none" scales by nothing and a fraction of the mass only up.
 */
export function checkScaleUp(scaleUp: ScaleUp | null, side: string | null, path: string): CheckResult[] {
  if (scaleUp === null) return [];
  const factor = scaleUp.factor ?? 1;
  if (scaleUp.kind === 'other-side') {
    if (side === 'midline') {
      return [outcome('blocks', 'midline-doubled', `${path}.kind`, 'A midline structure has no other side: it cannot be doubled.')];
    }
    if (side === 'both') {
      return [outcome('blocks', 'both-sides-doubled', `${path}.kind`, 'Both sides were counted: the sample cannot be scaled to the other side as well.')];
    }
    if (factor !== 1 && factor !== 2) {
      return [outcome('blocks', 'scale-up-factor', `${path}.factor`, 'Scaling to the other side doubles; for any other factor choose another kind of scale-up.', factor, '2')];
    }
    return [outcome('passes', 'scaled-to-both-sides', path, 'One side was counted and scaled to both: mass, counts and their standard errors × 2; densities are as counted.', '×2')];
  }
  if (scaleUp.kind === 'none') {
    return factor === 1 ? [] : [outcome('blocks', 'scale-up-factor', `${path}.factor`, 'A factor stands without a kind of scale-up.', factor, '1')];
  }
  if (!(factor >= 1)) {
    return [outcome('blocks', 'scale-up-factor', `${path}.factor`, 'A scale-up makes more of a sample, never less: the factor is 1 or above.', factor, '≥ 1')];
  }
  return [
    outcome(
      'passes', 'scaled-up', path,
      `The counts and the mass are scaled up ${scaleUp.kind === 'mass-fraction' ? 'by the fraction of the mass that was counted' : 'from a series of slabs'}; densities are as counted.`,
      `×${Number(factor.toPrecision(4))}`,
    ),
  ];
}
