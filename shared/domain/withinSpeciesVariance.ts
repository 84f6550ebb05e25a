import type { Variable } from '../contracts/vocabulary';
import type { MeanInput } from './meanInput';

export interface WithinSpeciesVariance {
  /** Pooled variance of log10 values between specimens of a species. */
  variance: number;
  df: number;
  species: { taxonSlug: string; specimens: number }[];
}

/**
 * Variance between specimens of one species on log10, pooled over the species that have two or more
 * specimens of the structure: Σ squares ÷ Σ(k − 1), naming them.
 *
 * Pooled samples (n above 1) and records set aside for all are no independent specimens. Null where no
 * species has two: the interval of a single specimen then says that it lacks it.
 */
export function withinSpeciesVariance(records: readonly MeanInput[], variable: Variable, structure: string): WithinSpeciesVariance | null {
  const bySpecies = new Map<string, Map<string, number>>();
  for (const record of records) {
    const value = record.values[variable];
    const isSpecimen = record.specimenKey !== null && record.n === 1 && record.speciesName !== '';
    const isSetAside = record.setAside.some((entry) => entry.scope === 'all');
    if (!isSpecimen || isSetAside || record.structure !== structure || value === null || !(value > 0)) continue;
    const specimens = bySpecies.get(record.taxonSlug) ?? new Map<string, number>();
    const key = JSON.stringify([record.sourceKey, record.specimenKey]);
    bySpecies.set(record.taxonSlug, specimens.set(key, Math.log10(value)));
  }
  let squares = 0;
  let df = 0;
  const species: WithinSpeciesVariance['species'] = [];
  for (const [taxonSlug, specimens] of [...bySpecies.entries()].sort(([a], [b]) => (a < b ? -1 : 1))) {
    if (specimens.size < 2) continue;
    const values = [...specimens.values()];
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    squares += values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    df += values.length - 1;
    species.push({ taxonSlug, specimens: values.length });
  }
  return df === 0 ? null : { variance: squares / df, df, species };
}
