import { findVersionFits } from '../../../db/queries/fits';
import type { Queryable } from '../../../db/client';
import { scalingFitSchema, type ScalingFitAnswer } from '../../../shared/contracts/fits';
import type { FitDefinition, FitExclusion, FitInput } from '../dataset/standingFits';

export interface StoredFit {
  definition: FitDefinition;
  inputs: FitInput[];
  exclusions: FitExclusion[];
  result: ScalingFitAnswer;
}

/**
 * Standing fits as stored with a version, in order of their address.
 * @param number the version's number, frozen or being prepared
 */
export async function loadVersionFits(db: Queryable, number: number): Promise<StoredFit[]> {
  const stored = await findVersionFits(db, number);
  // The columns are written by storeStandingFits alone; the result, which answers are made of, is checked besides.
  return stored.map(({ inputs, exclusions, result, ...definition }) => ({
    definition,
    inputs: inputs as FitInput[],
    exclusions: exclusions as FitExclusion[],
    result: scalingFitSchema.parse(result),
  }));
}

/** Results of a version's standing fits by address; empty for none. */
export async function loadVersionResults(db: Queryable, number: number | null): Promise<Map<string, ScalingFitAnswer>> {
  if (number === null) return new Map();
  return new Map((await loadVersionFits(db, number)).map(({ definition, result }) => [definition.slug, result]));
}
