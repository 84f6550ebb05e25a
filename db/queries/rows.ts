import { and, desc, eq, inArray, isNull, lte, ne, or, sql } from 'drizzle-orm';
import type { RecordRow } from '../../shared/contracts/records';
import type { Queryable } from '../client';
import { recordRevisions, records, rechecks, setAsides, users, versionRows, versions } from '../schema/index';

export interface StoredRow {
  recordId: string;
  recordRevisionId: string;
  number: number;
  embargoUntil: string | null;
  row: Omit<RecordRow, 'setAside' | 'openRecheck'>;
}

/**
 * The revision in force of every record that is not withdrawn: the newest that is not under embargo on the day
 * given, so that an embargoed correction leaves its predecessor standing. In order of record number.
 */
export async function findRowsInForce(db: Queryable, filter: { today: string; embargoedToo: boolean }): Promise<StoredRow[]> {
  const rows = await db
    .selectDistinctOn([records.number], {
      recordId: records.id,
      recordRevisionId: recordRevisions.id,
      number: records.number,
      embargoUntil: recordRevisions.embargoUntil,
      row: recordRevisions.row,
    })
    .from(records)
    .innerJoin(recordRevisions, eq(recordRevisions.recordId, records.id))
    .where(
      and(
        isNull(records.withdrawnAt),
        lte(recordRevisions.revision, records.currentRevision),
        filter.embargoedToo ? undefined : or(isNull(recordRevisions.embargoUntil), lte(recordRevisions.embargoUntil, filter.today)),
      ),
    )
    .orderBy(records.number, desc(recordRevisions.revision));
  return rows;
}

/** Set-asides in force, oldest first, with the name of who decided. */
export async function findSetAsidesInForce(db: Queryable) {
  return db
    .select({ recordId: setAsides.recordId, scope: setAsides.scope, reason: setAsides.reason, by: users.name, at: setAsides.createdAt })
    .from(setAsides)
    .innerJoin(users, eq(users.id, setAsides.decidedBy))
    .where(isNull(setAsides.liftedAt))
    .orderBy(setAsides.createdAt, setAsides.id);
}

export async function findRecordsWithOpenRecheck(db: Queryable): Promise<Set<string>> {
  const rows = await db.select({ recordId: rechecks.recordId }).from(rechecks).where(ne(rechecks.status, 'closed'));
  return new Set(rows.map((row) => row.recordId));
}

/** Rows of one version in order of record number, whether it is frozen or being prepared. */
export async function findVersionRows(db: Queryable, number: number) {
  return db
    .select({ recordId: versionRows.recordId, recordRevisionId: versionRows.recordRevisionId, row: versionRows.row })
    .from(versionRows)
    .innerJoin(versions, eq(versions.id, versionRows.versionId))
    .where(eq(versions.number, number))
    .orderBy(versionRows.number);
}

export interface FrozenVersion {
  id: string;
  number: number;
  title: string;
  demonstration: boolean;
  frozenAt: Date;
  manifestSha256: string;
}

/** Frozen versions, newest first. */
export async function findFrozenVersions(db: Queryable): Promise<FrozenVersion[]> {
  const rows = await db
    .select({
      id: versions.id,
      number: versions.number,
      title: versions.title,
      demonstration: versions.demonstration,
      frozenAt: sql<Date>`${versions.frozenAt}`.mapWith(versions.frozenAt),
      manifestSha256: sql<string>`${versions.manifestSha256}`,
    })
    .from(versions)
    .where(eq(versions.status, 'frozen'))
    .orderBy(desc(versions.number));
  return rows;
}

/** Submission, lab and taxon of records, by id. */
export async function findRecordOwners(db: Queryable, recordIds: readonly string[]) {
  if (recordIds.length === 0) return [];
  return db
    .select({ recordId: records.id, submissionId: records.submissionId, labId: records.labId, taxonId: records.taxonId })
    .from(records)
    .where(inArray(records.id, [...recordIds]));
}
