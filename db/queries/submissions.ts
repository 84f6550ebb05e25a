import { and, asc, desc, eq, gte, inArray, isNotNull, isNull, lte, or, sql } from 'drizzle-orm';
import type { CheckResult } from '../../shared/contracts/checks';
import type { SubmissionContent } from '../../shared/contracts/content';
import type { DecisionKind, RevisionStatus } from '../../shared/contracts/vocabulary';
import type { Queryable, Transaction } from '../client';
import { comments, decisions, labMemberships, labs, submissionEvents, submissionRevisions, submissions, userRoles, users } from '../schema/index';

export type SubmissionRow = NonNullable<Awaited<ReturnType<typeof findSubmission>>>;
export type RevisionRow = typeof submissionRevisions.$inferSelect;

export async function insertSubmission(tx: Transaction, values: typeof submissions.$inferInsert): Promise<string> {
  const [row] = await tx.insert(submissions).values(values).returning({ id: submissions.id });
  return row!.id;
}

export async function insertRevision(tx: Transaction, values: typeof submissionRevisions.$inferInsert): Promise<string> {
  const [row] = await tx.insert(submissionRevisions).values(values).returning({ id: submissionRevisions.id });
  return row!.id;
}

export async function insertSubmissionEvent(tx: Transaction, values: typeof submissionEvents.$inferInsert): Promise<void> {
  await tx.insert(submissionEvents).values(values);
}

/** A submission with the names of its lab and its creator. */
export async function findSubmission(db: Queryable, submissionId: string) {
  const [row] = await db
    .select({
      id: submissions.id,
      kind: submissions.kind,
      labId: submissions.labId,
      labName: labs.name,
      labDemonstration: labs.demonstration,
      createdBy: submissions.createdBy,
      creatorKind: users.kind,
      demonstration: submissions.demonstration,
      createdAt: submissions.createdAt,
    })
    .from(submissions)
    .innerJoin(users, eq(users.id, submissions.createdBy))
    .leftJoin(labs, eq(labs.id, submissions.labId))
    .where(eq(submissions.id, submissionId));
  return row ?? null;
}

/** Takes the submission's row, so that one act on it at a time goes on. */
export async function lockSubmission(tx: Transaction, submissionId: string): Promise<void> {
  await tx.select({ id: submissions.id }).from(submissions).where(eq(submissions.id, submissionId)).for('update');
}

/** All revisions of submissions, oldest first. */
export function findRevisions(db: Queryable, submissionIds: readonly string[]): Promise<RevisionRow[]> {
  if (submissionIds.length === 0) return Promise.resolve([]);
  return db.select().from(submissionRevisions).where(inArray(submissionRevisions.submissionId, [...submissionIds])).orderBy(asc(submissionRevisions.revision));
}

/** Writes a draft's content if nobody wrote since; false where somebody did. */
export async function updateDraft(tx: Transaction, revision: Pick<RevisionRow, 'id' | 'draftVersion'>, content: SubmissionContent, at: Date): Promise<boolean> {
  const rows = await tx
    .update(submissionRevisions)
    .set({ content, draftVersion: revision.draftVersion + 1, updatedAt: at })
    .where(and(eq(submissionRevisions.id, revision.id), eq(submissionRevisions.status, 'draft'), eq(submissionRevisions.draftVersion, revision.draftVersion)))
    .returning({ id: submissionRevisions.id });
  return rows.length === 1;
}

export async function updateSubmission(tx: Transaction, submissionId: string, values: Partial<Pick<typeof submissions.$inferInsert, 'labId' | 'demonstration'>>): Promise<void> {
  await tx.update(submissions).set(values).where(eq(submissions.id, submissionId));
}

export async function markSubmitted(tx: Transaction, revisionId: string, values: { checks: CheckResult[]; submittedBy: string; submittedAt: Date; embargoUntil: string | null }): Promise<void> {
  await tx.update(submissionRevisions).set({ ...values, status: 'submitted', updatedAt: values.submittedAt }).where(eq(submissionRevisions.id, revisionId));
}

export async function setRevisionStatus(tx: Transaction, revisionId: string, status: RevisionStatus, at: Date, decided: boolean): Promise<void> {
  await tx.update(submissionRevisions).set({ status, updatedAt: at, ...(decided ? { decidedAt: at } : {}) }).where(eq(submissionRevisions.id, revisionId));
}

export async function insertDecision(tx: Transaction, values: { revisionId: string; kind: DecisionKind; comment: string; checklist: Record<string, boolean>; decidedBy: string; createdAt: Date }): Promise<void> {
  await tx.insert(decisions).values(values);
}

export function findDecisions(db: Queryable, submissionId: string) {
  return db
    .select({ revisionId: decisions.revisionId, revision: submissionRevisions.revision, kind: decisions.kind, comment: decisions.comment, checklist: decisions.checklist, decidedBy: decisions.decidedBy, createdAt: decisions.createdAt })
    .from(decisions)
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, decisions.revisionId))
    .where(eq(submissionRevisions.submissionId, submissionId))
    .orderBy(asc(decisions.createdAt));
}

export async function insertComment(tx: Transaction, values: typeof comments.$inferInsert): Promise<string> {
  const [row] = await tx.insert(comments).values(values).returning({ id: comments.id });
  return row!.id;
}

export function findComments(db: Queryable, submissionId: string) {
  return db
    .select({ id: comments.id, revision: submissionRevisions.revision, fieldPath: comments.fieldPath, authorId: comments.authorId, text: comments.text, createdAt: comments.createdAt })
    .from(comments)
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, comments.revisionId))
    .where(eq(comments.submissionId, submissionId))
    .orderBy(asc(comments.createdAt));
}

export function findSubmissionEvents(db: Queryable, submissionId: string) {
  return db
    .select({ kind: submissionEvents.kind, revisionId: submissionEvents.revisionId, revision: submissionRevisions.revision, actorId: submissionEvents.actorId, reason: submissionEvents.reason, createdAt: submissionEvents.createdAt })
    .from(submissionEvents)
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, submissionEvents.revisionId))
    .where(eq(submissionEvents.submissionId, submissionId))
    .orderBy(asc(submissionEvents.seq));
}

/** Newest revision of each submission that is not an ended one above an approved one: what stands in lists. */
const standing = sql`(
  select distinct on (r.submission_id) r.submission_id, r.id, r.status, r.updated_at, r.submitted_at
  from ${submissionRevisions} r
  order by r.submission_id, (r.status in ('declined', 'withdrawn') and exists (
    select 1 from ${submissionRevisions} a where a.submission_id = r.submission_id and a.status = 'approved')), r.revision desc
)`;

/** Submissions of a person and of a lab, last changed first; those before the cursor's place are left out. */
export async function findSubmissionPage(
  db: Queryable,
  filter: { createdBy: string; labId: string | null; status?: RevisionStatus | undefined; after: { at: string; id: string } | null; limit: number },
): Promise<{ submissionId: string; revisionId: string; at: Date }[]> {
  const mine = filter.labId === null ? sql`s.created_by = ${filter.createdBy}` : sql`(s.created_by = ${filter.createdBy} or s.lab_id = ${filter.labId})`;
  const result = await db.execute<{ submission_id: string; id: string; updated_at: string }>(sql`
    select n.submission_id, n.id, n.updated_at from ${standing} n join ${submissions} s on s.id = n.submission_id
    where ${mine}
      ${filter.status === undefined ? sql`` : sql`and n.status = ${filter.status}`}
      ${filter.after === null ? sql`` : sql`and (n.updated_at, n.submission_id) < (${filter.after.at}::timestamptz, ${filter.after.id}::uuid)`}
    order by n.updated_at desc, n.submission_id desc limit ${filter.limit}`);
  return result.rows.map((row) => ({ submissionId: row.submission_id, revisionId: row.id, at: new Date(row.updated_at) }));
}

/** Revisions that wait for a decision, the longest waiting first. */
export async function findQueuePage(db: Queryable, filter: { after: { at: string; id: string } | null; limit: number }): Promise<{ submissionId: string; revisionId: string; at: Date }[]> {
  const result = await db.execute<{ submission_id: string; id: string; submitted_at: string }>(sql`
    select r.submission_id, r.id, r.submitted_at from ${submissionRevisions} r
    where r.status = 'submitted'
      ${filter.after === null ? sql`` : sql`and (r.submitted_at, r.id) > (${filter.after.at}::timestamptz, ${filter.after.id}::uuid)`}
    order by r.submitted_at, r.id limit ${filter.limit}`);
  return result.rows.map((row) => ({ submissionId: row.submission_id, revisionId: row.id, at: new Date(row.submitted_at) }));
}

export function findSubmissions(db: Queryable, submissionIds: readonly string[]) {
  if (submissionIds.length === 0) return Promise.resolve([]);
  return db
    .select({ id: submissions.id, kind: submissions.kind, labId: submissions.labId, labName: labs.name, createdBy: submissions.createdBy, demonstration: submissions.demonstration })
    .from(submissions)
    .leftJoin(labs, eq(labs.id, submissions.labId))
    .where(inArray(submissions.id, [...submissionIds]));
}

/** Who asked for changes on the last revision that was sent back; null where none was. */
export async function findWhoAskedForChanges(db: Queryable, submissionId: string): Promise<string | null> {
  const [row] = await db
    .select({ decidedBy: decisions.decidedBy })
    .from(decisions)
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, decisions.revisionId))
    .where(and(eq(submissionRevisions.submissionId, submissionId), eq(decisions.kind, 'request-changes')))
    .orderBy(desc(submissionRevisions.revision))
    .limit(1);
  return row?.decidedBy ?? null;
}

/** Everybody who ever submitted a revision of it, in order of the first one. */
export async function findSubmitters(db: Queryable, submissionId: string): Promise<{ id: string; name: string; orcid: string | null; kind: string }[]> {
  const rows = await db
    .select({ id: users.id, name: users.name, orcid: users.orcid, kind: users.kind })
    .from(submissionRevisions)
    .innerJoin(users, eq(users.id, submissionRevisions.submittedBy))
    .where(and(eq(submissionRevisions.submissionId, submissionId), isNotNull(submissionRevisions.submittedBy)))
    .orderBy(asc(submissionRevisions.revision));
  return rows.filter((row, index) => rows.findIndex((other) => other.id === row.id) === index);
}

/** Contributors who are members of a lab on a day (ISO). */
export async function findContributorsOfLab(db: Queryable, labId: string, day: string): Promise<string[]> {
  const rows = await db
    .selectDistinct({ id: labMemberships.userId })
    .from(labMemberships)
    .innerJoin(userRoles, and(eq(userRoles.userId, labMemberships.userId), eq(userRoles.role, 'contributor')))
    .where(and(eq(labMemberships.labId, labId), lte(labMemberships.fromDay, day), or(isNull(labMemberships.untilDay), gte(labMemberships.untilDay, day))));
  return rows.map((row) => row.id);
}

/** People as others see them: name and lab of the day, by id. */
export async function findPersonRefs(db: Queryable, userIds: readonly string[], day: string): Promise<Map<string, { id: string; name: string; lab: string | null }>> {
  const wanted = [...new Set(userIds)];
  if (wanted.length === 0) return new Map();
  const rows = await db
    .select({ id: users.id, name: users.name, lab: labs.name })
    .from(users)
    .leftJoin(labMemberships, and(eq(labMemberships.userId, users.id), lte(labMemberships.fromDay, day), or(isNull(labMemberships.untilDay), gte(labMemberships.untilDay, day))))
    .leftJoin(labs, eq(labs.id, labMemberships.labId))
    .where(inArray(users.id, wanted))
    .orderBy(asc(labMemberships.fromDay));
  return new Map(rows.map((row) => [row.id, row]));
}

export async function findLabDemonstration(db: Queryable, labId: string): Promise<boolean> {
  const [row] = await db.select({ demonstration: labs.demonstration }).from(labs).where(eq(labs.id, labId));
  return row?.demonstration ?? false;
}
