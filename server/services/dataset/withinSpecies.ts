import type { Variable } from '../../../shared/contracts/vocabulary';
import type { DatasetRow } from './rows';

export interface WithinSpeciesVariance {
  /** Pooled variance of log10 between specimens of one species. */
  variance: number;
  /** Species whose specimens it comes from. */
  species: string[];
}

/**
 * Variance between specimens within a species, pooled over the species with two or more specimens of the structure.
 * @param rows rows of one dataset; only specimens enter, each animal once, pooled samples do not
 * @param variable raw values above 0
 * @returns Σ(nᵢ − 1)sᵢ² / Σ(nᵢ − 1) on log10 with the species' names, or null where no species has two specimens
 */
export function withinSpeciesVariance(rows: readonly DatasetRow[], structure: string, definitionVersion: number, variable: Variable): WithinSpeciesVariance | null {
  const bySpecies = new Map<string, Map<string, number>>();
  for (const { row } of rows) {
    const value = row[variable];
    if (row.kind !== 'specimen' || row.structure !== structure || row.definitionVersion !== definitionVersion) continue;
    if (!row.named || row.pooledWith.length > 0 || value === null || !(value > 0)) continue;
    const specimens = bySpecies.get(row.species) ?? new Map<string, number>();
    specimens.set(`${row.sourceKey} ${row.specimen ?? row.number}`, Math.log10(value));
    bySpecies.set(row.species, specimens);
  }
  let [squares, df] = [0, 0];
  const species: string[] = [];
  for (const [name, specimens] of bySpecies) {
    if (specimens.size < 2) continue;
    const values = [...specimens.values()];
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    squares += values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    df += values.length - 1;
    species.push(name);
  }
  return df === 0 ? null : { variance: squares / df, species: species.sort() };
}
