import type { RecordRow } from '../../../shared/contracts/records';
import type { VersionChanges } from '../../../shared/contracts/versions';
import { canonicalJson } from '../../../shared/domain/canonicalJson';

const named = ({ number, species, structure }: RecordRow) => ({ number, species, structure });
const setAsideKey = ({ scope, reason }: RecordRow['setAside'][number]): string => canonicalJson({ scope, reason });

/**
 * What came, changed and went between two sets of rows, in order of record number.
 * @param previous label and rows of the version before; null for the first version
 * @param rows rows of the newer set, or of the working set
 * @param whyGone reason of a record that stood before and stands no more, by record number
 */
export function compareRows(previous: { label: string; rows: readonly RecordRow[] } | null, rows: readonly RecordRow[], whyGone: ReadonlyMap<string, string>): VersionChanges {
  const before = new Map((previous?.rows ?? []).map((row) => [row.number, row]));
  const now = new Set(rows.map((row) => row.number));
  const speciesBefore = new Set((previous?.rows ?? []).map((row) => row.taxonSlug));
  return {
    previous: previous?.label ?? null,
    came: rows.filter((row) => !before.has(row.number)).map(named),
    revised: rows.flatMap((row) => {
      const old = before.get(row.number);
      return old === undefined || old.revision === row.revision ? [] : [{ ...named(row), from: old.revision, to: row.revision }];
    }),
    went: [...before.values()].filter((row) => !now.has(row.number)).map((row) => ({ ...named(row), reason: whyGone.get(row.number) ?? 'no longer in force' })),
    setAside: rows.flatMap((row) => {
      const known = new Set((before.get(row.number)?.setAside ?? []).map(setAsideKey));
      return row.setAside.filter((one) => !known.has(setAsideKey(one))).map(({ reason }) => ({ ...named(row), reason }));
    }),
    speciesCame: new Set(rows.filter((row) => !speciesBefore.has(row.taxonSlug)).map((row) => row.taxonSlug)).size,
  };
}

/** Whether two sets of rows, both in order of record number, are the same to the last member. */
export function sameRows(a: readonly RecordRow[], b: readonly RecordRow[]): boolean {
  return a.length === b.length && a.every((row, index) => canonicalJson(row) === canonicalJson(b[index]));
}
