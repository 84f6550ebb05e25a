import { findRevisions, findSubmission, type RevisionRow, type SubmissionRow } from '../../../db/queries/submissions';
import type { Queryable } from '../../../db/client';
import { mayRevise } from '../../../shared/domain/reviewState';
import type { Actor } from '../../context';
import { notFound } from '../../errors';

/** A submission as one person may know it. */
export interface KnownSubmission {
  submission: SubmissionRow;
  /** Oldest first; only submitted ones for people outside its laboratory. */
  revisions: RevisionRow[];
  /** Creator, or contributor of its laboratory: sees drafts. */
  inside: boolean;
}

/** A revision that was at some time put before reviewers. */
export const wasSubmitted = (revision: RevisionRow): boolean => revision.submittedAt !== null;

/**
 * The revision that a submission's state is read from: the newest one, unless that was declined or withdrawn while
 * an approved one stays in force.
 */
export function standingRevision(revisions: readonly RevisionRow[]): RevisionRow {
  const newest = revisions.at(-1);
  if (newest === undefined) throw new Error('A submission has at least one revision.');
  if (newest.status !== 'declined' && newest.status !== 'withdrawn') return newest;
  return revisions.findLast((revision) => revision.status === 'approved') ?? newest;
}

/** Whether a person sees a submission from inside: its creator, and contributors of its laboratory. */
export function isInside(actor: Actor, submission: Pick<SubmissionRow, 'createdBy' | 'labId'>): boolean {
  if (submission.createdBy === actor.id) return true;
  return actor.labId !== null && actor.labId === submission.labId && actor.roles.includes('contributor');
}

/** Whether a person judges submissions at all. */
export const isJudge = (actor: Actor): boolean => actor.roles.includes('reviewer') || actor.roles.includes('curator');

/**
 * Finds a submission as far as the person may know of it.
 * @throws not-found for an unknown id, for another laboratory's draft (also to reviewers) and, to those who neither
 *   belong to its laboratory nor judge, for everything
 */
export async function knowSubmission(db: Queryable, actor: Actor, submissionId: string): Promise<KnownSubmission> {
  const submission = await findSubmission(db, submissionId);
  if (submission === null) throw notFound('This submission');
  const revisions = await findRevisions(db, [submissionId]);
  if (isInside(actor, submission)) return { submission, revisions, inside: true };
  const shown = revisions.filter(wasSubmitted);
  if (!isJudge(actor) || shown.length === 0) throw notFound('This submission');
  return { submission, revisions: shown, inside: false };
}

/**
 * Whether a person may write to a submission: it is their own, or it answers a re-check put to their laboratory.
 * Reading is wider than writing: colleagues of the laboratory see it and leave it as it is.
 */
export function mayWrite(actor: Actor, submission: Pick<SubmissionRow, 'createdBy' | 'labId'>, answersRecheck: boolean): boolean {
  if (!actor.roles.includes('contributor')) return false;
  return submission.createdBy === actor.id || (answersRecheck && actor.labId !== null && actor.labId === submission.labId);
}

/** Why a person may not decide on a submission, or null where they may: a reviewer never judges their own or their laboratory's work. */
export function whyNotDecide(actor: Actor, submission: Pick<SubmissionRow, 'createdBy' | 'labId'>, submitters: readonly (string | null)[]): { code: 'not-allowed' | 'own-lab'; text: string } | null {
  if (!actor.roles.includes('reviewer')) return { code: 'not-allowed', text: 'Decisions are made by reviewers.' };
  if (submission.createdBy === actor.id || submitters.includes(actor.id)) return { code: 'own-lab', text: 'This is your own submission: a reviewer of another laboratory decides on it.' };
  if (actor.labId !== null && actor.labId === submission.labId) return { code: 'own-lab', text: `This comes from your own laboratory, ${actor.labName ?? 'the same as yours'}: a reviewer of another laboratory decides on it.` };
  return null;
}

/** Whether a successor may be drafted now. */
export const mayDraftSuccessor = (revisions: readonly RevisionRow[]): boolean => mayRevise(standingRevision(revisions).status);

/** Entity tag of a revision's state, for If-Match. */
export const etagOf = (revision: Pick<RevisionRow, 'revision' | 'draftVersion' | 'status'>): string => `"${revision.revision}-${revision.draftVersion}-${revision.status}"`;
