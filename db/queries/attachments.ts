import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import type { Queryable, Transaction } from '../client';
import { attachments, recheckEvents, revisionAttachments, submissionRevisions, users } from '../schema/index';

export async function insertAttachment(tx: Transaction, values: typeof attachments.$inferInsert): Promise<string> {
  const [row] = await tx.insert(attachments).values(values).returning({ id: attachments.id });
  return row!.id;
}

/** Joins evidence to a draft; a trigger refuses any other revision. */
export async function linkAttachment(tx: Transaction, revisionId: string, attachmentId: string): Promise<void> {
  await tx.insert(revisionAttachments).values({ revisionId, attachmentId });
}

/** Takes evidence from a draft; false where it did not belong to it. */
export async function unlinkAttachment(tx: Transaction, revisionId: string, attachmentId: string): Promise<boolean> {
  const rows = await tx
    .delete(revisionAttachments)
    .where(and(eq(revisionAttachments.revisionId, revisionId), eq(revisionAttachments.attachmentId, attachmentId)))
    .returning({ id: revisionAttachments.attachmentId });
  return rows.length > 0;
}

/** Carries the evidence of one revision over to its successor. */
export async function copyAttachmentLinks(tx: Transaction, fromRevisionId: string, toRevisionId: string): Promise<void> {
  const rows = await tx.select({ attachmentId: revisionAttachments.attachmentId }).from(revisionAttachments).where(eq(revisionAttachments.revisionId, fromRevisionId));
  if (rows.length > 0) await tx.insert(revisionAttachments).values(rows.map(({ attachmentId }) => ({ revisionId: toRevisionId, attachmentId })));
}

export function findAttachmentsOfRevision(db: Queryable, revisionId: string) {
  return db
    .select({
      id: attachments.id,
      name: attachments.name,
      caption: attachments.caption,
      mediaType: attachments.mediaType,
      bytes: attachments.bytes,
      sha256: attachments.sha256,
      fieldPath: attachments.fieldPath,
      uploadedBy: users.name,
      createdAt: attachments.createdAt,
    })
    .from(revisionAttachments)
    .innerJoin(attachments, eq(attachments.id, revisionAttachments.attachmentId))
    .innerJoin(users, eq(users.id, attachments.uploadedBy))
    .where(eq(revisionAttachments.revisionId, revisionId))
    .orderBy(asc(attachments.createdAt), asc(attachments.id));
}

/** One file of a submission, with the states of the revisions it belongs to and whether a re-check's answer names it. */
export async function findAttachment(db: Queryable, submissionId: string, attachmentId: string) {
  const [file] = await db.select().from(attachments).where(and(eq(attachments.id, attachmentId), eq(attachments.submissionId, submissionId)));
  if (file === undefined) return null;
  const revisions = await db
    .select({ submittedAt: submissionRevisions.submittedAt })
    .from(revisionAttachments)
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, revisionAttachments.revisionId))
    .where(eq(revisionAttachments.attachmentId, attachmentId));
  const answers = await db.$count(recheckEvents, eq(recheckEvents.attachmentId, attachmentId));
  return { ...file, wasSubmitted: revisions.some((revision) => revision.submittedAt !== null), answersRecheck: answers > 0 };
}

export async function countAttachments(db: Queryable, revisionIds: readonly string[]): Promise<number> {
  if (revisionIds.length === 0) return 0;
  const [row] = await db.select({ count: sql<number>`count(*)::int` }).from(revisionAttachments).where(inArray(revisionAttachments.revisionId, [...revisionIds]));
  return row?.count ?? 0;
}
