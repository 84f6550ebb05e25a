import { findRevisions, findSubmission, insertSubmissionEvent, lockSubmission, markSubmitted, updateSubmission, type RevisionRow } from '../../../db/queries/submissions';
import { lockSpecimenCodes } from '../../../db/queries/specimens';
import type { Transaction } from '../../../db/client';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import { nextRevisionStatus } from '../../../shared/domain/reviewState';
import type { Actor, Context } from '../../context';
import { AppError, notAllowed } from '../../errors';
import { enqueueMails } from '../notify';
import { etagOf, knowSubmission, standingRevision } from './access';
import { headingOf } from './contentFacts';
import { describeSubmission } from './describe';
import { refuseUnlessWriter, staleState } from './drafts';
import { evaluateContent } from './evaluate';
import { refuseUnlessSound } from './refusal';
import { writeRevisionRows } from './revisionRows';
import { tellSubmitted } from './tellings';
import { contributorView } from './viewpoint';

/**
 * Submits the draft inside a transaction: all checks run, then status, event and the rows of the revision are
 * written together, and whoever must act is told.
 *
 * @param options `places` is false for the register's own loader, whose tables make the first lines
 * @returns mails to enqueue after the commit
 */
export async function submitWithin(context: Context, tx: Transaction, actor: Actor, submissionId: string, options: { places: boolean; ifMatch?: string | undefined }): Promise<string[]> {
  await lockSubmission(tx, submissionId);
  const revisions = await findRevisions(tx, [submissionId]);
  const revision = standingRevision(revisions);
  const status = nextRevisionStatus(revision.status, 'submit');
  if (status === null) throw new AppError('wrong-state', `Revision ${revision.revision} is ${revision.status} and cannot be submitted.`);
  if (options.ifMatch !== undefined && options.ifMatch !== etagOf(revision)) throw new AppError('stale-revision', 'The draft was changed elsewhere since you opened it.');
  // The laboratory is that of the day of the first submission, and stays.
  const isFirst = revisions.every((one) => one.submittedAt === null);
  if (isFirst) await updateSubmission(tx, submissionId, { labId: actor.labId });
  const submission = (await findSubmission(tx, submissionId))!;
  if (submission.labId === null && submission.creatorKind !== 'system') throw notAllowed('An administrator first enters you in your laboratory; a submission comes from one.');
  if (submission.labId !== null) await lockSpecimenCodes(tx, submission.labId);

  const view = await contributorView(context, tx, actor, submission);
  const evaluated = await evaluateContent(tx, revision.content, options.places ? view : { ...view, placing: null });
  refuseUnlessSound(evaluated.checks, revision.content.explanations);

  const now = context.clock();
  const demonstration = submission.demonstration || view.demonstrationLab || [...evaluated.vocabulary.taxa.values()].some((taxon) => taxon.demonstration);
  if (demonstration !== submission.demonstration) await updateSubmission(tx, submissionId, { demonstration });
  const until = revision.content.provenance.embargoUntil.trim();
  await markSubmitted(tx, revision.id, { checks: evaluated.checks, submittedBy: actor.id, submittedAt: now, embargoUntil: until === '' ? null : until });
  await insertSubmissionEvent(tx, { submissionId, revisionId: revision.id, kind: 'submitted', actorId: actor.id, createdAt: now });
  context.killPoint('submit:revision-written');
  await writeRevisionRows(tx, revision.content, evaluated.vocabulary, { revisionId: revision.id, labId: submission.labId });
  const mails = submission.creatorKind === 'system' ? [] : await tellSubmitted(context, tx, { submission, revision, title: headingOf(revision.content, evaluated.vocabulary.taxa).title, actorId: actor.id, answers: answersChanges(revisions, revision) });
  context.killPoint('submit:rows-written');
  return mails;
}

const answersChanges = (revisions: readonly RevisionRow[], revision: RevisionRow): boolean => revisions.findLast((one) => one.revision < revision.revision)?.status === 'changes-requested';

/**
 * Submits the newest draft for review.
 * @param options `ifMatch`, where given, is the entity tag of the state that was read
 * @throws checks-block with every impossible entry and every doubtful one without a word, wrong-state where no draft
 *   stands, stale-revision (with `current`) where the draft moved on, not-allowed without a laboratory
 */
export async function submitRevision(context: Context, actor: Actor, submissionId: string, options: { ifMatch?: string | undefined } = {}): Promise<SubmissionDetail> {
  refuseUnlessWriter(actor, await knowSubmission(context.db, actor, submissionId));
  let mails: string[];
  try {
    mails = await context.db.transaction((tx) => submitWithin(context, tx, actor, submissionId, { places: true, ifMatch: options.ifMatch }));
  } catch (error) {
    if (error instanceof AppError && error.code === 'stale-revision') throw await staleState(context, actor, submissionId, error.message);
    throw error;
  }
  await enqueueMails(context, mails);
  return describeSubmission(context, actor, submissionId);
}
