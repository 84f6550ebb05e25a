import type { ScalingFitAnswer } from '../../../shared/contracts/fits';
import type { StandingExponent } from '../../../shared/contracts/register';
import { fitTitle } from '../dataset/questions';
import type { FitDefinition } from '../dataset/standingFits';

type Defined = Pick<FitDefinition, 'slug' | 'y' | 'yStructure' | 'x' | 'xStructure' | 'cladeSlug' | 'cladeName' | 'method'>;

/**
 * Standing exponents as tables show them, beside those of the version before.
 * @param fits fits of a version or of the working set, in order of their address
 * @param previous results of the version before, by address
 */
export function standingExponents(fits: readonly { definition: Defined; result: ScalingFitAnswer }[], previous: ReadonlyMap<string, ScalingFitAnswer>): StandingExponent[] {
  return fits.map(({ definition, result }) => {
    const before = previous.get(definition.slug);
    return {
      slug: definition.slug,
      title: fitTitle(definition, definition.cladeName, definition.method),
      y: definition.y,
      yStructure: definition.yStructure,
      x: definition.x,
      xStructure: definition.xStructure,
      clade: definition.cladeSlug,
      cladeName: definition.cladeName,
      method: definition.method,
      n: result.n,
      exponent: result.exponent?.estimate ?? null,
      lower: result.exponent?.lower ?? null,
      upper: result.exponent?.upper ?? null,
      standardError: result.exponent?.standardError ?? null,
      residualSd: result.residualSd,
      rSquared: result.rSquared,
      log10Coefficient: result.log10Coefficient?.estimate ?? null,
      previous: before?.exponent?.estimate ?? null,
      previousN: before?.n ?? null,
      previousLower: before?.exponent?.lower ?? null,
      previousUpper: before?.exponent?.upper ?? null,
      unfit: result.unfit?.message ?? null,
    };
  });
}
