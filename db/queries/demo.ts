import { and, desc, eq, sql } from 'drizzle-orm';
import type { Queryable } from '../client';
import { attachments, comments, labs, rechecks, records, submissionRevisions, submissions, users } from '../schema/index';

export async function findUserIdByEmail(db: Queryable, email: string): Promise<string | null> {
  const [row] = await db.select({ id: users.id }).from(users).where(eq(users.email, email));
  return row?.id ?? null;
}

export async function findLabIdByName(db: Queryable, name: string): Promise<string | null> {
  const [row] = await db.select({ id: labs.id }).from(labs).where(eq(labs.name, name));
  return row?.id ?? null;
}

/** How far a person's submission of a specimen has come, by the code of the specimen. */
export async function findSubmissionByCode(db: Queryable, createdBy: string, code: string) {
  const [row] = await db
    .select({ id: submissions.id, status: submissionRevisions.status, revision: submissionRevisions.revision })
    .from(submissions)
    .innerJoin(submissionRevisions, eq(submissionRevisions.submissionId, submissions.id))
    .where(and(eq(submissions.createdBy, createdBy), sql`${submissionRevisions.content} -> 'specimen' ->> 'code' = ${code}`))
    .orderBy(desc(submissionRevisions.revision))
    .limit(1);
  return row ?? null;
}

/** What has been said and attached to a submission so far. */
export async function countBeside(db: Queryable, submissionId: string): Promise<{ comments: number; attachments: number; rechecks: number }> {
  const [row] = await db.select({ count: sql<number>`count(*)::int` }).from(rechecks).innerJoin(records, eq(records.id, rechecks.recordId)).where(eq(records.submissionId, submissionId));
  return { comments: await db.$count(comments, eq(comments.submissionId, submissionId)), attachments: await db.$count(attachments, eq(attachments.submissionId, submissionId)), rechecks: row?.count ?? 0 };
}

/** Number of the first record of a submission. */
export async function findFirstRecordNumber(db: Queryable, submissionId: string): Promise<number | null> {
  const [row] = await db.select({ number: records.number }).from(records).where(eq(records.submissionId, submissionId)).orderBy(records.number).limit(1);
  return row?.number ?? null;
}
