import { fitScaling } from '../../../shared/stats/fit';
import type { FitMethod, FitPoint, FitRequest, ScalingFit } from '../../../shared/stats/types';

/** The one fit of ungrouped points. */
export function fitOne(points: FitPoint[], method: FitMethod = 'ols', more: Partial<FitRequest> = {}): ScalingFit {
  const { fits } = fitScaling({ points, method, ...more });
  if (fits.length !== 1) throw new Error(`expected one fit, found ${fits.length}`);
  return fits[0]!;
}

/** Points named p0, p1, … from two lists of raw values. */
export function pointsOf(xs: readonly number[], ys: readonly number[]): FitPoint[] {
  return xs.map((x, i) => ({ id: `p${i}`, x, y: ys[i]! }));
}

/** Uniform numbers in 0…1 from a fixed seed (a 32-bit mixing generator). */
export function uniforms(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** Standard normal numbers from uniform ones (Box and Muller). */
export function normals(uniform: () => number): () => number {
  return () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
}
