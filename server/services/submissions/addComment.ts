import { insertComment } from '../../../db/queries/submissions';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import type { Actor, Context } from '../../context';
import { AppError, notAllowed } from '../../errors';
import { isJudge, knowSubmission, mayWrite, wasSubmitted } from './access';
import { describeSubmission } from './describe';

/**
 * Adds a comment at a field of a submitted revision: by a reviewer or curator, or an answer by its own people.
 * @throws not-found for a revision the person may not know of, wrong-state for a draft, which nobody else reads yet
 */
export async function addComment(context: Context, actor: Actor, submissionId: string, input: { revision: number; fieldPath: string; text: string }): Promise<SubmissionDetail> {
  const known = await knowSubmission(context.db, actor, submissionId);
  if (!isJudge(actor) && !mayWrite(actor, known.submission, known.revisions.some((revision) => revision.answersRecheckId !== null))) throw notAllowed('Comments are answered by the person who entered it.');
  const revision = known.revisions.find((one) => one.revision === input.revision);
  if (revision === undefined) throw new AppError('invalid-input', 'There is no such revision.', { errors: [{ path: 'revision', message: `Expected the number of a submitted revision; found ${input.revision}` }] });
  if (!wasSubmitted(revision)) throw new AppError('wrong-state', 'A draft takes no comments before it is submitted.');
  await context.db.transaction((tx) => insertComment(tx, { submissionId, revisionId: revision.id, fieldPath: input.fieldPath, authorId: actor.id, text: input.text, createdAt: context.clock() }));
  return describeSubmission(context, actor, submissionId);
}
