import type { Queryable } from '../../../db/client';
import { findRecordsWithOpenRecheck, findRowsInForce, findSetAsidesInForce, findVersionRows } from '../../../db/queries/rows';
import type { RecordRow } from '../../../shared/contracts/records';

/** A row of the dataset with the record and the revision that it stands for. */
export interface DatasetRow {
  recordId: string;
  recordRevisionId: string;
  row: RecordRow;
}

/**
 * The working set: the revision in force of every approved record that is not withdrawn, with its set-asides and
 * whether a re-check is open, as of now.
 * @param filter `today` is an ISO day; a record whose embargo ends later is left out unless `embargoedToo`
 * @returns rows in order of record number
 */
export async function loadWorkingRows(db: Queryable, filter: { embargoedToo?: boolean; today: string }): Promise<DatasetRow[]> {
  // One after the other: inside a transaction there is one connection.
  const stored = await findRowsInForce(db, { today: filter.today, embargoedToo: filter.embargoedToo ?? false });
  const aside = new Map<string, RecordRow['setAside']>();
  for (const { recordId, scope, reason, by, at } of await findSetAsidesInForce(db)) {
    const list = aside.get(recordId) ?? [];
    list.push({ scope, reason, by, at: at.toISOString() });
    aside.set(recordId, list);
  }
  const open = await findRecordsWithOpenRecheck(db);
  return stored.map(({ recordId, recordRevisionId, row }) => ({
    recordId,
    recordRevisionId,
    row: { ...row, setAside: aside.get(recordId) ?? [], openRecheck: open.has(recordId) },
  }));
}

/**
 * The rows of one version exactly as they were written into it.
 * @param number the version's number
 * @returns rows in order of record number; empty where there is no such version
 */
export async function loadVersionRows(db: Queryable, number: number): Promise<DatasetRow[]> {
  return findVersionRows(db, number);
}
