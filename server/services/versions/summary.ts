import type { z } from 'zod';
import { systemActorName } from '../../../db/queries/seed';
import type { RecordRow } from '../../../shared/contracts/records';
import { versionPageSchema } from '../../../shared/contracts/versions';

/** What is kept with a version beside its rows, files and fits; a page of it is read from here. */
export const versionSummarySchema = versionPageSchema.pick({ counts: true, changes: true, contributors: true, setAside: true, standingFits: true, previous: true });
export type VersionSummary = z.infer<typeof versionSummarySchema>;

/** Distinct species, structures, sources and animals of rows; an animal is one laboratory's code. */
export function countRows(rows: readonly RecordRow[]): VersionSummary['counts'] {
  const specimens = rows.flatMap((row) => (row.kind === 'specimen' ? [row.specimen ?? row.number, ...row.pooledWith].map((code) => `${row.sourceKey} ${code}`) : []));
  return {
    species: new Set(rows.map((row) => row.taxonSlug)).size,
    records: rows.length,
    specimens: new Set(specimens).size,
    structures: new Set(rows.map((row) => row.structure)).size,
    sources: new Set(rows.map((row) => row.sourceKey)).size,
  };
}

/** People behind rows with the number of their records, most first, then by name; the system actor is no contributor. */
export function contributorsOf(rows: readonly RecordRow[]): VersionSummary['contributors'] {
  const found = new Map<string, VersionSummary['contributors'][number]>();
  for (const { contributors } of rows) {
    for (const { name, orcid } of contributors) {
      if (name === systemActorName) continue;
      const key = orcid ?? name;
      const known = found.get(key) ?? { name, orcid, records: 0 };
      found.set(key, { ...known, records: known.records + 1 });
    }
  }
  return [...found.values()].sort((a, b) => b.records - a.records || (a.name < b.name ? -1 : 1));
}

export function setAsidesOf(rows: readonly RecordRow[]): VersionSummary['setAside'] {
  return rows.flatMap(({ number, species, structure, setAside }) => setAside.map(({ scope, reason }) => ({ number, species, structure, scope, reason })));
}
