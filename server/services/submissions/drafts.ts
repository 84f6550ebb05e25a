import { copyAttachmentLinks } from '../../../db/queries/attachments';
import { findRecheckOfSubmission } from '../../../db/queries/records';
import { findLabDemonstration, findRevisions, insertRevision, insertSubmission, insertSubmissionEvent, lockSubmission, updateDraft } from '../../../db/queries/submissions';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import type { Actor, Context } from '../../context';
import { AppError, notAllowed, notFound } from '../../errors';
import { etagOf, isInside, knowSubmission, mayDraftSuccessor, mayWrite, standingRevision, type KnownSubmission } from './access';
import { emptyContent } from './contentFacts';
import { describeSubmission } from './describe';

function refuseOtherKind(kind: SubmissionContent['kind'], content: SubmissionContent): void {
  if (content.kind === kind) return;
  throw new AppError('invalid-input', 'The content is of another kind than the submission.', { errors: [{ path: 'content.kind', message: `Expected "${kind}"; found "${content.kind}"` }] });
}

/**
 * Begins a submission with its first draft. Content may be half-filled or missing.
 * @param input `demonstration` marks it; a demonstration laboratory's is always marked
 */
export async function createSubmission(context: Context, actor: Actor, input: { kind: SubmissionContent['kind']; content?: SubmissionContent | undefined; demonstration?: boolean }): Promise<SubmissionDetail> {
  const content = input.content ?? emptyContent(input.kind);
  refuseOtherKind(input.kind, content);
  const now = context.clock();
  const submissionId = await context.db.transaction(async (tx) => {
    const demonstrationLab = actor.labId !== null && (await findLabDemonstration(tx, actor.labId));
    const id = await insertSubmission(tx, { kind: input.kind, labId: actor.labId, createdBy: actor.id, demonstration: demonstrationLab || input.demonstration === true, createdAt: now });
    const revisionId = await insertRevision(tx, { submissionId: id, revision: 1, content, createdAt: now, updatedAt: now });
    await insertSubmissionEvent(tx, { submissionId: id, revisionId, kind: 'drafted', actorId: actor.id, createdAt: now });
    return id;
  });
  return describeSubmission(context, actor, submissionId);
}

/**
 * Whether the person may write to a submission they know of.
 * @throws not-allowed for colleagues and judges, who read it only
 */
export function refuseUnlessWriter(actor: Actor, known: KnownSubmission): void {
  const answersRecheck = standingRevision(known.revisions).answersRecheckId !== null;
  if (known.inside && mayWrite(actor, known.submission, answersRecheck)) return;
  throw notAllowed('Only the person who entered it changes it; colleagues of the laboratory read it.');
}

/** The 409 of a state that has moved on, with the newer state beside it. */
export async function staleState(context: Context, actor: Actor, submissionId: string, detail: string): Promise<AppError> {
  return new AppError('stale-revision', detail, { extra: { current: await describeSubmission(context, actor, submissionId) } });
}

/**
 * Saves a draft.
 * @param input `ifMatch` is the entity tag of the state that was edited
 * @throws precondition-required without a tag, stale-revision (with `current`) where the state is another,
 *   wrong-state where the newest revision is not a draft
 */
export async function saveDraft(context: Context, actor: Actor, submissionId: string, input: { content: SubmissionContent; ifMatch: string | undefined }): Promise<SubmissionDetail> {
  const known = await knowSubmission(context.db, actor, submissionId);
  refuseUnlessWriter(actor, known);
  refuseOtherKind(known.submission.kind, input.content);
  const tag = input.ifMatch?.trim();
  if (tag === undefined || tag === '' || tag === '*') throw new AppError('precondition-required', 'Send the state you edited as If-Match; it stands in `etag`.');
  const revision = standingRevision(known.revisions);
  if (etagOf(revision) !== tag) throw await staleState(context, actor, submissionId, 'It was changed elsewhere since you opened it. Both states are kept: yours here, the newer one beside it.');
  if (revision.status !== 'draft') throw new AppError('wrong-state', 'A submitted revision never changes; start a new revision.');
  const saved = await context.db.transaction(async (tx) => updateDraft(tx, revision, input.content, context.clock()));
  if (!saved) throw await staleState(context, actor, submissionId, 'It was changed elsewhere at the same moment. Both states are kept: yours here, the newer one beside it.');
  return describeSubmission(context, actor, submissionId);
}

/**
 * Begins the next revision as a draft, copied with its evidence from the one that stands: after changes were
 * requested, or to correct what is approved.
 * @param input `recheckId` names the re-check that the revision will answer; it must be open and of a record of this submission
 */
export async function reviseSubmission(context: Context, actor: Actor, submissionId: string, input: { recheckId?: string | null | undefined }): Promise<SubmissionDetail> {
  const known = await knowSubmission(context.db, actor, submissionId);
  const recheck = input.recheckId == null ? null : await findRecheckOfSubmission(context.db, input.recheckId);
  if (input.recheckId != null && recheck?.submissionId !== submissionId) throw notFound('This re-check');
  if (!isInside(actor, known.submission) || !mayWrite(actor, known.submission, recheck !== null)) throw notAllowed('Only the person who entered it revises it; a re-check may also be answered by a colleague of the laboratory.');
  if (recheck !== null && recheck.status === 'closed') throw new AppError('wrong-state', 'This re-check is closed.');
  const now = context.clock();
  await context.db.transaction(async (tx) => {
    await lockSubmission(tx, submissionId);
    const revisions = await findRevisions(tx, [submissionId]);
    const from = standingRevision(revisions);
    if (!mayDraftSuccessor(revisions)) throw new AppError('wrong-state', from.status === 'draft' || from.status === 'submitted' ? `Revision ${from.revision} is ${from.status === 'draft' ? 'still a draft' : 'under review'}.` : 'What was declined or withdrawn is not revised; enter it anew.');
    const newest = revisions.at(-1)?.revision ?? 0;
    const revisionId = await insertRevision(tx, { submissionId, revision: newest + 1, content: from.content, answersRecheckId: recheck?.id ?? (from.status === 'changes-requested' ? from.answersRecheckId : null), createdAt: now, updatedAt: now });
    await copyAttachmentLinks(tx, from.id, revisionId);
    await insertSubmissionEvent(tx, { submissionId, revisionId, kind: 'drafted', actorId: actor.id, createdAt: now });
  });
  return describeSubmission(context, actor, submissionId);
}
