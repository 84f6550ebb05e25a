import { and, asc, eq, inArray, isNull, lte, ne, or, sql } from 'drizzle-orm';
import type { overlapKinds } from '../../shared/contracts/vocabulary';
import type { Queryable, Transaction } from '../client';
import { recordRevisions, records, rechecks, sourceOverlaps, sources, structures, submissions, versionRows, versions } from '../schema/index';

export type StoredRow = (typeof recordRevisions.$inferSelect)['row'];

/** Records of a submission with their revision in force. */
export function findRecordsOfSubmission(db: Queryable, submissionId: string) {
  return db
    .select({
      id: records.id,
      number: records.number,
      entryId: records.entryId,
      structure: structures.key,
      currentRevision: records.currentRevision,
      withdrawnAt: records.withdrawnAt,
      row: recordRevisions.row,
      embargoUntil: recordRevisions.embargoUntil,
    })
    .from(records)
    .innerJoin(structures, eq(structures.id, records.structureId))
    .innerJoin(recordRevisions, and(eq(recordRevisions.recordId, records.id), eq(recordRevisions.revision, records.currentRevision)))
    .where(eq(records.submissionId, submissionId))
    .orderBy(asc(records.number));
}

/** Gives numbers to new records, in the order given. */
export async function insertRecords(tx: Transaction, values: (typeof records.$inferInsert)[]) {
  if (values.length === 0) return [];
  return tx.insert(records).values(values).returning({ id: records.id, number: records.number, entryId: records.entryId });
}

const revisionsAtOnce = 500;

export async function insertRecordRevisions(tx: Transaction, values: (typeof recordRevisions.$inferInsert)[]): Promise<void> {
  for (let start = 0; start < values.length; start += revisionsAtOnce) await tx.insert(recordRevisions).values(values.slice(start, start + revisionsAtOnce));
}

/** Puts a newer revision in force; a record once left out by a revision and given again is no longer withdrawn. */
export async function putRevisionInForce(tx: Transaction, recordId: string, values: { currentRevision: number; taxonId: string; structureId: string; sourceId: string; demonstration: boolean }): Promise<void> {
  await tx.update(records).set({ ...values, withdrawnAt: null, withdrawnReason: '' }).where(eq(records.id, recordId));
}

export async function withdrawRecords(tx: Transaction, recordIds: readonly string[], reason: string, at: Date): Promise<void> {
  if (recordIds.length === 0) return;
  await tx.update(records).set({ withdrawnAt: at, withdrawnReason: reason }).where(and(inArray(records.id, [...recordIds]), isNull(records.withdrawnAt)));
}

/** Which records somebody may be told of: apart from one submission, not under embargo on the day, and outside the working set only published ones or those of the own laboratory. */
export interface HeldScope {
  exceptSubmissionId: string | null;
  day: string;
  /** `all`: the whole working set; else what a frozen version holds, and the records of this laboratory. */
  workingOf: 'all' | { labId: string | null };
}

function isHeld(db: Queryable, { exceptSubmissionId, day, workingOf }: HeldScope) {
  const published = db.select({ id: versionRows.recordRevisionId }).from(versionRows).innerJoin(versions, and(eq(versions.id, versionRows.versionId), eq(versions.status, 'frozen')));
  return and(
    isNull(records.withdrawnAt),
    or(isNull(recordRevisions.embargoUntil), lte(recordRevisions.embargoUntil, day)),
    exceptSubmissionId === null ? undefined : ne(records.submissionId, exceptSubmissionId),
    workingOf === 'all' ? undefined : or(inArray(recordRevisions.id, published), workingOf.labId === null ? undefined : eq(records.labId, workingOf.labId)),
  );
}

/** What the register holds of a species, in force. */
export function findRowsOfTaxon(db: Queryable, taxonId: string, scope: HeldScope) {
  return db
    .select({ row: recordRevisions.row })
    .from(records)
    .innerJoin(recordRevisions, and(eq(recordRevisions.recordId, records.id), eq(recordRevisions.revision, records.currentRevision)))
    .where(and(eq(records.taxonId, taxonId), isHeld(db, scope)))
    .orderBy(asc(records.number));
}

/** Criteria by which the register's records of structures are bounded, by structure key. */
export async function findDelineations(db: Queryable, structureKeys: readonly string[], scope: HeldScope): Promise<Record<string, string[]>> {
  if (structureKeys.length === 0) return {};
  const rows = await db
    .selectDistinct({ structure: structures.key, delineation: sql<string[]>`${recordRevisions.row} -> 'delineation'` })
    .from(records)
    .innerJoin(structures, eq(structures.id, records.structureId))
    .innerJoin(recordRevisions, and(eq(recordRevisions.recordId, records.id), eq(recordRevisions.revision, records.currentRevision)))
    .where(and(inArray(structures.key, [...structureKeys]), isHeld(db, scope)));
  const found: Record<string, string[]> = {};
  for (const { structure, delineation } of rows) found[structure] = [...new Set([...(found[structure] ?? []), ...delineation])];
  return found;
}

/** A source by its key, written where it is new; what is known of it stands. */
export async function ensureSource(tx: Transaction, values: typeof sources.$inferInsert) {
  await tx.insert(sources).values(values).onConflictDoNothing({ target: sources.key });
  const [row] = await tx.select().from(sources).where(eq(sources.key, values.key));
  return row!;
}

export async function findSourceIds(db: Queryable, keys: readonly string[]): Promise<Map<string, string>> {
  if (keys.length === 0) return new Map();
  const rows = await db.select({ id: sources.id, key: sources.key }).from(sources).where(inArray(sources.key, [...keys]));
  return new Map(rows.map((row) => [row.key, row.id]));
}

/** Notes that two sources share animals, both ways; the newest word stands. */
export async function putSourceOverlap(tx: Transaction, sourceId: string, otherSourceId: string, overlap: (typeof overlapKinds)[number]): Promise<void> {
  for (const [one, other] of [[sourceId, otherSourceId], [otherSourceId, sourceId]] as const) {
    await tx.insert(sourceOverlaps).values({ sourceId: one, otherSourceId: other, overlap }).onConflictDoUpdate({ target: [sourceOverlaps.sourceId, sourceOverlaps.otherSourceId], set: { overlap } });
  }
}

/** Re-checks that are not closed, of the records of submissions. */
export function findOpenRechecks(db: Queryable, submissionIds: readonly string[]) {
  if (submissionIds.length === 0) return Promise.resolve([]);
  return db
    .select({ id: rechecks.id, submissionId: submissions.id, question: rechecks.question, status: rechecks.status, askedBy: rechecks.askedBy })
    .from(rechecks)
    .innerJoin(records, eq(records.id, rechecks.recordId))
    .innerJoin(submissions, eq(submissions.id, records.submissionId))
    .where(and(inArray(submissions.id, [...submissionIds]), ne(rechecks.status, 'closed')))
    .orderBy(asc(rechecks.createdAt));
}

export async function findRecheckOfSubmission(db: Queryable, recheckId: string) {
  const [row] = await db
    .select({ id: rechecks.id, submissionId: records.submissionId, question: rechecks.question, status: rechecks.status, askedBy: rechecks.askedBy })
    .from(rechecks)
    .innerJoin(records, eq(records.id, rechecks.recordId))
    .where(eq(rechecks.id, recheckId));
  return row ?? null;
}
