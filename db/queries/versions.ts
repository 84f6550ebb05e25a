import { and, asc, count, desc, eq, gt, inArray, lt, max, sql } from 'drizzle-orm';
import type { RecordRow } from '../../shared/contracts/records';
import type { Queryable, Transaction } from '../client';
import { records, recordRevisions, sources, structures, submissions, taxa, users, versionDois, versionEvents, versionFiles, versionRows, versions } from '../schema/index';

/** Number of the current version: the frozen one with the greatest number; null where nothing is frozen yet. */
export async function findCurrentVersionNumber(db: Queryable): Promise<number | null> {
  const [row] = await db.select({ number: versions.number }).from(versions).where(eq(versions.status, 'frozen')).orderBy(desc(versions.number)).limit(1);
  return row?.number ?? null;
}

export async function findNextVersionNumber(db: Queryable): Promise<number> {
  const [row] = await db.select({ greatest: max(versions.number) }).from(versions);
  return (row?.greatest ?? 0) + 1;
}

const versionColumns = {
  id: versions.id,
  number: versions.number,
  status: versions.status,
  title: versions.title,
  note: versions.note,
  demonstration: versions.demonstration,
  licence: versions.licence,
  summary: versions.summary,
  manifestSha256: versions.manifestSha256,
  createdAt: versions.createdAt,
  frozenAt: versions.frozenAt,
  startedById: versions.startedBy,
  startedBy: users.name,
  startedByKind: users.kind,
  doi: versionDois.doi,
};

const selectVersions = (db: Queryable) => db.select(versionColumns).from(versions).innerJoin(users, eq(users.id, versions.startedBy)).leftJoin(versionDois, eq(versionDois.versionId, versions.id));
export type VersionRow = Awaited<ReturnType<typeof selectVersions>>[number];

/** The version that is being prepared; there is at most one. */
export async function findPreparingVersion(db: Queryable): Promise<VersionRow | null> {
  const [row] = await selectVersions(db).where(eq(versions.status, 'preparing'));
  return row ?? null;
}

export async function findVersionById(db: Queryable, versionId: string): Promise<VersionRow | null> {
  const [row] = await selectVersions(db).where(eq(versions.id, versionId));
  return row ?? null;
}

export async function findFrozenVersion(db: Queryable, number: number): Promise<VersionRow | null> {
  const [row] = await selectVersions(db).where(and(eq(versions.number, number), eq(versions.status, 'frozen')));
  return row ?? null;
}

/** The newest version, frozen or being prepared. */
export async function findNewestVersion(db: Queryable): Promise<VersionRow | null> {
  const [row] = await selectVersions(db).orderBy(desc(versions.number)).limit(1);
  return row ?? null;
}

/** Frozen versions below a number, newest first. */
export function findFrozenVersionsBelow(db: Queryable, below: number | null, limit: number): Promise<VersionRow[]> {
  return selectVersions(db)
    .where(and(eq(versions.status, 'frozen'), below === null ? undefined : lt(versions.number, below)))
    .orderBy(desc(versions.number))
    .limit(limit);
}

export async function insertVersion(tx: Transaction, version: { number: number; title: string; note: string; startedBy: string; createdAt: Date }): Promise<string> {
  const [row] = await tx.insert(versions).values(version).returning({ id: versions.id });
  if (row === undefined) throw new Error('The version was not written.');
  return row.id;
}

/** Locks a version, so that two workers do not take the same step; answers its status. */
export async function lockVersion(tx: Transaction, versionId: string): Promise<'preparing' | 'frozen' | null> {
  const [row] = await tx.select({ status: versions.status }).from(versions).where(eq(versions.id, versionId)).for('update');
  return row?.status ?? null;
}

export async function updateVersion(tx: Transaction, versionId: string, set: Partial<Pick<typeof versions.$inferInsert, 'title' | 'demonstration' | 'summary' | 'status' | 'manifestSha256' | 'frozenAt'>>): Promise<void> {
  await tx.update(versions).set(set).where(eq(versions.id, versionId));
}

export async function insertVersionEvent(tx: Transaction, event: { versionId: string; step: string; detail: string; actorId: string | null; createdAt: Date }): Promise<void> {
  await tx.insert(versionEvents).values(event);
}

export function findVersionEvents(db: Queryable, versionId: string) {
  return db
    .select({ step: versionEvents.step, detail: versionEvents.detail, at: versionEvents.createdAt, actorId: versionEvents.actorId })
    .from(versionEvents)
    .where(eq(versionEvents.versionId, versionId))
    .orderBy(asc(versionEvents.seq));
}

/** A statement holds at most 65,535 parameters; a row here takes five. */
const rowsPerInsert = 1_000;

export async function insertVersionRows(tx: Transaction, versionId: string, rows: readonly { recordId: string; recordRevisionId: string; number: number; row: RecordRow }[]): Promise<void> {
  for (let start = 0; start < rows.length; start += rowsPerInsert) {
    await tx.insert(versionRows).values(rows.slice(start, start + rowsPerInsert).map((row) => ({ versionId, ...row })));
  }
}

export interface VersionFileRow {
  name: string;
  mediaType: string;
  bytes: number;
  sha256: string;
  storageKey: string;
  rows: number | null;
  position: number;
}

export async function insertVersionFiles(tx: Transaction, versionId: string, files: readonly VersionFileRow[]): Promise<void> {
  await tx.insert(versionFiles).values(files.map((file) => ({ versionId, ...file })));
}

export async function findVersionFiles(db: Queryable, versionId: string): Promise<VersionFileRow[]> {
  const { name, mediaType, bytes, sha256, storageKey, rows, position } = versionFiles;
  return db.select({ name, mediaType, bytes, sha256, storageKey, rows, position }).from(versionFiles).where(eq(versionFiles.versionId, versionId)).orderBy(asc(versionFiles.position));
}

/** Why records are withdrawn, by record; a record that is not withdrawn is not in the answer. */
export async function findWithdrawnReasons(db: Queryable, recordIds: readonly string[]): Promise<Map<string, string>> {
  if (recordIds.length === 0) return new Map();
  const rows = await db
    .select({ id: records.id, reason: records.withdrawnReason })
    .from(records)
    .where(and(inArray(records.id, [...recordIds]), sql`${records.withdrawnAt} is not null`));
  return new Map(rows.map((row) => [row.id, row.reason]));
}

/** Who entered the records: the people to tell when they come into a version. */
export async function findEnterersOf(db: Queryable, recordIds: readonly string[]): Promise<string[]> {
  if (recordIds.length === 0) return [];
  const rows = await db
    .selectDistinct({ userId: submissions.createdBy })
    .from(records)
    .innerJoin(submissions, eq(submissions.id, records.submissionId))
    .where(inArray(records.id, [...recordIds]));
  return rows.map((row) => row.userId);
}

export function findSourcesByKeys(db: Queryable, keys: readonly string[]) {
  const { key, kind, citation, doi, year, carrier, licence, demonstration } = sources;
  if (keys.length === 0) return Promise.resolve([]);
  return db.select({ key, kind, citation, doi, year, carrier, licence, demonstration }).from(sources).where(inArray(sources.key, [...keys]));
}

/** Approved records whose newest revision is under embargo beyond the day given. */
export function findEmbargoedRecords(db: Queryable, today: string) {
  return db
    .select({ number: records.number, species: taxa.name, structure: structures.key, until: sql<string>`${recordRevisions.embargoUntil}::text` })
    .from(records)
    .innerJoin(recordRevisions, and(eq(recordRevisions.recordId, records.id), eq(recordRevisions.revision, records.currentRevision)))
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .where(and(sql`${records.withdrawnAt} is null`, gt(recordRevisions.embargoUntil, today)))
    .orderBy(asc(records.number));
}

/** Taxa that wait for a curator's word. */
export async function countProposedTaxa(db: Queryable): Promise<number> {
  const [row] = await db.select({ proposed: count() }).from(taxa).where(eq(taxa.status, 'proposed'));
  return row?.proposed ?? 0;
}
