import { findContributorsOfLab } from '../../../db/queries/submissions';
import { findPeopleToTell, findReviewersOutside } from '../../../db/queries/recipients';
import { findWhoAskedForChanges, type RevisionRow, type SubmissionRow } from '../../../db/queries/submissions';
import type { Transaction } from '../../../db/client';
import type { DecisionKind } from '../../../shared/contracts/vocabulary';
import type { Context } from '../../context';
import { tell } from '../notify';

export const hrefOfSubmission = (submissionId: string): string => `/submissions/${submissionId}`;
export const hrefOfReview = (submissionId: string): string => `/review/${submissionId}`;

/**
 * Tells who must act on a submitted revision: the reviewer who asked for changes where it answers them, else every
 * reviewer outside the laboratory. @returns mails to enqueue after the commit
 */
export async function tellSubmitted(context: Context, tx: Transaction, input: { submission: SubmissionRow; revision: RevisionRow; title: string; actorId: string; answers: boolean }): Promise<string[]> {
  const { submission, revision, title, actorId, answers } = input;
  const asked = answers ? await findWhoAskedForChanges(tx, submission.id) : null;
  const asker = asked === null ? [] : await findPeopleToTell(tx, [asked]);
  const event = { href: hrefOfReview(submission.id), event: `submitted:${revision.id}` };
  if (asker.length > 0) {
    return tell(context, tx, { ...event, userIds: asker.map((person) => person.id), kind: 'answered', subject: `Changes made: ${title}`, body: `Revision ${revision.revision} of ${title} answers the changes that you asked for.` });
  }
  const reviewers = (await findReviewersOutside(tx, submission.labId)).filter((id) => id !== actorId && id !== submission.createdBy);
  const body = `${title}${submission.labName === null ? '' : `, from ${submission.labName},`} waits for a review${revision.revision > 1 ? ` (revision ${revision.revision})` : ''}.`;
  return tell(context, tx, { ...event, userIds: reviewers, kind: 'submitted', subject: `To review: ${title}`, body });
}

const outcomes: Record<DecisionKind, { kind: string; subject: string; body: string }> = {
  approve: { kind: 'decided', subject: 'Approved', body: 'was approved' },
  decline: { kind: 'decided', subject: 'Declined', body: 'was declined' },
  'request-changes': { kind: 'changes-requested', subject: 'Changes requested', body: 'needs changes before it can be approved' },
};

/** Tells the submitter and the contributors of the laboratory what was decided. @returns mails to enqueue after the commit */
export async function tellDecided(context: Context, tx: Transaction, input: { submission: SubmissionRow; revision: RevisionRow; title: string; decision: DecisionKind; comment: string; by: string }): Promise<string[]> {
  const { submission, revision, title, decision, comment, by } = input;
  const lab = submission.labId === null ? [] : await findContributorsOfLab(tx, submission.labId, context.clock().toISOString().slice(0, 10));
  const people = new Set([submission.createdBy, ...(revision.submittedBy === null ? [] : [revision.submittedBy]), ...lab]);
  const outcome = outcomes[decision];
  return tell(context, tx, {
    userIds: [...people],
    kind: outcome.kind,
    subject: `${outcome.subject}: ${title}`,
    body: `Revision ${revision.revision} of ${title} ${outcome.body}. ${by} writes: ${comment}`,
    href: hrefOfSubmission(submission.id),
    event: `decided:${revision.id}`,
  });
}
