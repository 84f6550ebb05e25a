import { and, eq, inArray, isNull, lte, ne, notExists, or, sql, type SQL } from 'drizzle-orm';
import type { Queryable } from '../client';
import { recordRevisions, records, rechecks, submissionRevisions, submissions, versionRows, versions } from '../schema/index';

/** True where a revision is the newest of its submission. */
const isNewest = (db: Queryable) => {
  const later = db
    .select({ one: sql`1` })
    .from(sql`${submissionRevisions} as later`)
    .where(sql`later.submission_id = ${submissionRevisions.submissionId} and later.revision > ${submissionRevisions.revision}`);
  return notExists(later);
};

const isOutside = (column: typeof submissions.labId | typeof records.labId, labId: string | null): SQL | undefined => (labId === null ? undefined : or(isNull(column), ne(column, labId)));

/** Own submissions that were sent back and have no answer yet. */
export async function countSentBack(db: Queryable, userId: string): Promise<number> {
  const [row] = await db
    .select({ count: sql<number>`count(*)::int` })
    .from(submissionRevisions)
    .innerJoin(submissions, eq(submissions.id, submissionRevisions.submissionId))
    .where(and(eq(submissions.createdBy, userId), eq(submissionRevisions.status, 'changes-requested'), isNewest(db)));
  return row?.count ?? 0;
}

/** Revisions in the queue that a reviewer of this lab (null: of none) may decide: neither their own nor their lab's. */
export async function countToDecide(db: Queryable, userId: string, labId: string | null): Promise<number> {
  const [row] = await db
    .select({ count: sql<number>`count(*)::int` })
    .from(submissionRevisions)
    .innerJoin(submissions, eq(submissions.id, submissionRevisions.submissionId))
    .where(and(eq(submissionRevisions.status, 'submitted'), ne(submissions.createdBy, userId), isOutside(submissions.labId, labId)));
  return row?.count ?? 0;
}

/** Open re-checks of a lab's records. */
export async function countOpenRechecks(db: Queryable, labId: string): Promise<number> {
  const [row] = await db
    .select({ count: sql<number>`count(*)::int` })
    .from(rechecks)
    .innerJoin(records, eq(records.id, rechecks.recordId))
    .where(and(eq(rechecks.status, 'open'), eq(records.labId, labId)));
  return row?.count ?? 0;
}

/** Answered re-checks that somebody of this lab (null: of none) may close. */
export async function countAnsweredRechecks(db: Queryable, labId: string | null): Promise<number> {
  const [row] = await db
    .select({ count: sql<number>`count(*)::int` })
    .from(rechecks)
    .innerJoin(records, eq(records.id, rechecks.recordId))
    .where(and(eq(rechecks.status, 'answered'), isOutside(records.labId, labId)));
  return row?.count ?? 0;
}

/** Records in force on the given day whose revision the current version does not hold: what the next version would bring. */
export async function countUnfrozen(db: Queryable, day: string): Promise<number> {
  const current = db.select({ id: versions.id }).from(versions).where(eq(versions.status, 'frozen')).orderBy(sql`${versions.number} desc`).limit(1);
  const held = db
    .select({ one: sql`1` })
    .from(versionRows)
    .where(and(inArray(versionRows.versionId, current), eq(versionRows.recordId, records.id), eq(versionRows.recordRevisionId, recordRevisions.id)));
  const [row] = await db
    .select({ count: sql<number>`count(*)::int` })
    .from(records)
    .innerJoin(recordRevisions, and(eq(recordRevisions.recordId, records.id), eq(recordRevisions.revision, records.currentRevision)))
    .where(and(isNull(records.withdrawnAt), or(isNull(recordRevisions.embargoUntil), lte(recordRevisions.embargoUntil, day)), notExists(held)));
  return row?.count ?? 0;
}
