import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { Queryable } from '../client';
import { aliquots, neunCounts, recheckEvents, recordRevisions, records, rechecks, samples, setAsides, structureEstimates, structures, submissionRevisions, users, versionRows, versions } from '../schema/index';

/** A record with what never changes about it, by its serial number. */
export async function findRecord(db: Queryable, serial: number) {
  const [row] = await db
    .select({
      id: records.id,
      number: records.number,
      submissionId: records.submissionId,
      entryId: records.entryId,
      labId: records.labId,
      demonstration: records.demonstration,
      withdrawnAt: records.withdrawnAt,
      withdrawnReason: records.withdrawnReason,
      structureKey: structures.key,
      structureName: structures.name,
    })
    .from(records)
    .innerJoin(structures, eq(structures.id, records.structureId))
    .where(eq(records.number, serial));
  return row ?? null;
}
export type RecordHead = NonNullable<Awaited<ReturnType<typeof findRecord>>>;

/** Revisions of a record with the submission's revision that made each, oldest first. */
export function findRecordRevisions(db: Queryable, recordId: string) {
  return db
    .select({
      id: recordRevisions.id,
      revision: recordRevisions.revision,
      at: recordRevisions.createdAt,
      embargoUntil: recordRevisions.embargoUntil,
      submissionRevisionId: recordRevisions.submissionRevisionId,
      submissionRevision: submissionRevisions.revision,
    })
    .from(recordRevisions)
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, recordRevisions.submissionRevisionId))
    .where(eq(recordRevisions.recordId, recordId))
    .orderBy(asc(recordRevisions.revision));
}

/** Frozen versions that hold a record, newest first, with the row of each. */
export function findFrozenRowsOf(db: Queryable, recordId: string) {
  return db
    .select({ number: versions.number, frozenAt: versions.frozenAt, startedBy: users.name, recordRevisionId: versionRows.recordRevisionId, row: versionRows.row })
    .from(versionRows)
    .innerJoin(versions, eq(versions.id, versionRows.versionId))
    .innerJoin(users, eq(users.id, versions.startedBy))
    .where(and(eq(versionRows.recordId, recordId), eq(versions.status, 'frozen')))
    .orderBy(desc(versions.number));
}

/** Every set-aside of a record, lifted ones too, oldest first. */
export function findSetAsideHistory(db: Queryable, recordId: string) {
  return db
    .select({ scope: setAsides.scope, reason: setAsides.reason, by: users.name, at: setAsides.createdAt, liftedAt: setAsides.liftedAt, liftedBy: setAsides.liftedBy, liftedReason: setAsides.liftedReason })
    .from(setAsides)
    .innerJoin(users, eq(users.id, setAsides.decidedBy))
    .where(eq(setAsides.recordId, recordId))
    .orderBy(asc(setAsides.createdAt));
}

export function findRechecksOf(db: Queryable, recordId: string) {
  return db.select({ id: rechecks.id, status: rechecks.status, question: rechecks.question, at: rechecks.createdAt }).from(rechecks).where(eq(rechecks.recordId, recordId)).orderBy(desc(rechecks.createdAt));
}

/** Events of a record's re-checks, oldest first. */
export function findRecheckEventsOf(db: Queryable, recordId: string) {
  return db
    .select({ kind: recheckEvents.kind, answer: recheckEvents.answer, text: recheckEvents.text, actorId: recheckEvents.actorId, at: recheckEvents.createdAt })
    .from(recheckEvents)
    .innerJoin(rechecks, eq(rechecks.id, recheckEvents.recheckId))
    .where(eq(rechecks.recordId, recordId))
    .orderBy(asc(recheckEvents.seq));
}

/** The samples behind a structure's estimate, with their aliquots and NeuN counts in order. */
export async function findSamplesOf(db: Queryable, submissionRevisionId: string, entryId: string) {
  const found = await db
    .select({ id: samples.id, label: samples.label, side: samples.side, tissueMassG: samples.tissueMassG, suspensionVolumeMl: samples.suspensionVolumeMl, dilution: samples.dilution })
    .from(samples)
    .innerJoin(structureEstimates, eq(structureEstimates.id, samples.structureEstimateId))
    .where(and(eq(structureEstimates.revisionId, submissionRevisionId), eq(structureEstimates.entryId, entryId)))
    .orderBy(asc(samples.entryId));
  if (found.length === 0) return [];
  const ids = found.map(({ id }) => id);
  const loads = await db.select().from(aliquots).where(inArray(aliquots.sampleId, ids)).orderBy(asc(aliquots.position));
  const counts = await db.select().from(neunCounts).where(inArray(neunCounts.sampleId, ids)).orderBy(asc(neunCounts.position));
  return found.map(({ id, ...sample }) => ({
    ...sample,
    aliquots: loads.filter((load) => load.sampleId === id).map(({ nuclei, volumeMl, excluded }) => ({ nuclei, volumeMl, excluded })),
    neun: counts.filter((count) => count.sampleId === id).map(({ positive, total }) => ({ positive, total })),
  }));
}
