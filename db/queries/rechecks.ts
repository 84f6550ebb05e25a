import { and, asc, desc, eq, lt, or, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { RecheckAnswerKind, RecheckStatus } from '../../shared/contracts/vocabulary';
import type { Queryable, Transaction } from '../client';
import { attachments, fitResults, flags, labs, recheckEvents, rechecks, recordRevisions, records, standingFits, structures, submissionRevisions, taxa, versionRows, versions } from '../schema/index';

const clades = alias(taxa, 'clades');

const columns = {
  id: rechecks.id,
  status: rechecks.status,
  question: rechecks.question,
  fieldPath: rechecks.fieldPath,
  askedBy: rechecks.askedBy,
  at: rechecks.createdAt,
  recordId: records.id,
  number: records.number,
  submissionId: records.submissionId,
  labId: records.labId,
  lab: labs.name,
  demonstration: records.demonstration,
  species: taxa.name,
  slug: taxa.slug,
  structure: structures.name,
  flagKind: flags.kind,
  flagReasons: flags.reasons,
  flagFit: { y: standingFits.y, yStructure: standingFits.yStructure, x: standingFits.x, xStructure: standingFits.xStructure, method: standingFits.method },
  flagClade: clades.name,
};

const base = (db: Queryable) =>
  db
    .select(columns)
    .from(rechecks)
    .innerJoin(records, eq(records.id, rechecks.recordId))
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .leftJoin(labs, eq(labs.id, records.labId))
    .leftJoin(flags, eq(flags.id, rechecks.flagId))
    .leftJoin(fitResults, eq(fitResults.id, flags.fitResultId))
    .leftJoin(standingFits, eq(standingFits.id, fitResults.standingFitId))
    .leftJoin(clades, eq(clades.id, standingFits.cladeId));

/** Re-checks, newest first, before the given place; of one lab only where `labId` is given. */
export function findRechecks(db: Queryable, filter: { labId?: string | undefined; status?: RecheckStatus | undefined; before: { at: Date; id: string } | null; limit: number }) {
  const { before } = filter;
  return base(db)
    .where(
      and(
        filter.labId === undefined ? undefined : eq(records.labId, filter.labId),
        filter.status === undefined ? undefined : eq(rechecks.status, filter.status),
        before === null ? undefined : or(lt(rechecks.createdAt, before.at), and(eq(rechecks.createdAt, before.at), lt(rechecks.id, before.id))),
      ),
    )
    .orderBy(desc(rechecks.createdAt), desc(rechecks.id))
    .limit(filter.limit);
}

export async function findRecheck(db: Queryable, recheckId: string) {
  const [row] = await base(db).where(eq(rechecks.id, recheckId));
  return row ?? null;
}
export type FoundRecheck = NonNullable<Awaited<ReturnType<typeof findRecheck>>>;

/** Events of re-checks, oldest first, with the revision of the submission that an answer names. */
export function findRecheckEvents(db: Queryable, recheckIds: readonly string[]) {
  if (recheckIds.length === 0) return Promise.resolve([]);
  return db
    .select({ recheckId: recheckEvents.recheckId, kind: recheckEvents.kind, answer: recheckEvents.answer, text: recheckEvents.text, actorId: recheckEvents.actorId, at: recheckEvents.createdAt, submissionRevision: submissionRevisions.revision, revisionStatus: submissionRevisions.status })
    .from(recheckEvents)
    .leftJoin(submissionRevisions, eq(submissionRevisions.id, recheckEvents.submissionRevisionId))
    .where(sql`${recheckEvents.recheckId} in ${[...recheckIds]}`)
    .orderBy(asc(recheckEvents.seq));
}

/** Takes the status row, so that one act on a re-check at a time goes on. */
export async function lockRecheck(tx: Transaction, recheckId: string): Promise<RecheckStatus | null> {
  const [row] = await tx.select({ status: rechecks.status }).from(rechecks).where(eq(rechecks.id, recheckId)).for('update');
  return row?.status ?? null;
}

export async function insertRecheck(tx: Transaction, values: { recordId: string; flagId: string | null; fieldPath: string; question: string; askedBy: string; createdAt: Date }): Promise<string> {
  const [row] = await tx.insert(rechecks).values(values).returning({ id: rechecks.id });
  if (row === undefined) throw new Error('The re-check was not written.');
  return row.id;
}

export async function setRecheckStatus(tx: Transaction, recheckId: string, status: RecheckStatus, closedAt: Date | null): Promise<void> {
  await tx.update(rechecks).set({ status, closedAt }).where(eq(rechecks.id, recheckId));
}

export async function insertRecheckEvent(
  tx: Transaction,
  event: { recheckId: string; kind: 'asked' | 'answered' | 'reopened' | 'closed'; answer?: RecheckAnswerKind; text: string; actorId: string; attachmentId?: string | null; submissionRevisionId?: string | null; createdAt: Date },
): Promise<string> {
  const [row] = await tx.insert(recheckEvents).values(event).returning({ id: recheckEvents.id });
  if (row === undefined) throw new Error('The event was not written.');
  return row.id;
}

/** A record by its number, as a question about it needs it. */
export async function findQuestionedRecord(db: Queryable, number: number) {
  const inVersion = sql<boolean>`exists (select 1 from ${versionRows} join ${versions} on ${versions.id} = ${versionRows.versionId} where ${versionRows.recordId} = ${records.id} and ${versions.status} = 'frozen')`;
  const [row] = await db
    .select({ id: records.id, number: records.number, labId: records.labId, submissionId: records.submissionId, withdrawnAt: records.withdrawnAt, species: taxa.name, structure: structures.name, embargoUntil: recordRevisions.embargoUntil, inVersion })
    .from(records)
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .innerJoin(recordRevisions, and(eq(recordRevisions.recordId, records.id), eq(recordRevisions.revision, records.currentRevision)))
    .where(eq(records.number, number));
  return row ?? null;
}
export type QuestionedRecord = NonNullable<Awaited<ReturnType<typeof findQuestionedRecord>>>;

export async function isFlagOf(db: Queryable, flagId: string, recordId: string): Promise<boolean> {
  return (await db.$count(flags, and(eq(flags.id, flagId), eq(flags.recordId, recordId)))) > 0;
}

export async function isAttachmentOf(db: Queryable, attachmentId: string, submissionId: string): Promise<boolean> {
  return (await db.$count(attachments, and(eq(attachments.id, attachmentId), eq(attachments.submissionId, submissionId)))) > 0;
}

/** The newest revision of a submission that was begun for a re-check and is in no answer to it yet. */
export async function findAnsweringRevision(db: Queryable, submissionId: string, recheckId: string): Promise<string | null> {
  const [row] = await db
    .select({ id: submissionRevisions.id })
    .from(submissionRevisions)
    .where(and(eq(submissionRevisions.submissionId, submissionId), eq(submissionRevisions.answersRecheckId, recheckId), sql`${submissionRevisions.status} not in ('withdrawn', 'declined') and not exists (select 1 from ${recheckEvents} where ${recheckEvents.submissionRevisionId} = ${submissionRevisions.id})`))
    .orderBy(desc(submissionRevisions.revision))
    .limit(1);
  return row?.id ?? null;
}
