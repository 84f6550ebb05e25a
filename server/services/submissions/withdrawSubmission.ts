import { findRecordsOfSubmission, withdrawRecords } from '../../../db/queries/records';
import { findRevisions, insertSubmissionEvent, lockSubmission, setRevisionStatus } from '../../../db/queries/submissions';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import { nextRevisionStatus } from '../../../shared/domain/reviewState';
import type { Actor, Context } from '../../context';
import { AppError } from '../../errors';
import { requestFitRefresh } from '../dataset/fitRefresh';
import { knowSubmission, standingRevision } from './access';
import { describeSubmission } from './describe';
import { refuseUnlessWriter } from './drafts';

/**
 * Withdraws the revision that stands: a draft or a submitted one ends, what was approved before stays in force; an
 * approved one takes its records out of every later version, where they stay listed as withdrawn with the reason.
 * @param reason required for what is approved, seen by everyone
 */
export async function withdrawSubmission(context: Context, actor: Actor, submissionId: string, reason: string): Promise<SubmissionDetail> {
  refuseUnlessWriter(actor, await knowSubmission(context.db, actor, submissionId));
  const now = context.clock();
  const runId = await context.db.transaction(async (tx) => {
    await lockSubmission(tx, submissionId);
    const revisions = await findRevisions(tx, [submissionId]);
    const revision = standingRevision(revisions);
    const status = nextRevisionStatus(revision.status, 'withdraw');
    if (status === null) throw new AppError('wrong-state', `Revision ${revision.revision} is ${revision.status}: there is nothing to withdraw.`);
    if (revision.status !== 'approved') {
      await setRevisionStatus(tx, revision.id, status, now, false);
      await insertSubmissionEvent(tx, { submissionId, revisionId: revision.id, kind: 'withdrawn', actorId: actor.id, reason, createdAt: now });
      return null;
    }
    if (reason === '') throw new AppError('invalid-input', 'Give the reason that everyone will see.', { errors: [{ path: 'reason', message: 'An approved record is withdrawn with a reason; found nothing' }] });
    for (const approved of revisions.filter((one) => one.status === 'approved')) {
      await setRevisionStatus(tx, approved.id, 'withdrawn', now, false);
      await insertSubmissionEvent(tx, { submissionId, revisionId: approved.id, kind: 'withdrawn', actorId: actor.id, reason, createdAt: now });
    }
    const recordIds = (await findRecordsOfSubmission(tx, submissionId)).filter((record) => record.withdrawnAt === null).map((record) => record.id);
    await withdrawRecords(tx, recordIds, reason, now);
    return recordIds.length === 0 ? null : requestFitRefresh(tx, recordIds, 'records withdrawn');
  });
  if (runId !== null) await context.jobs.enqueue('refresh-fits', { runId }, runId);
  return describeSubmission(context, actor, submissionId);
}
