import { findAnsweringRevision, insertRecheckEvent, isAttachmentOf, lockRecheck, setRecheckStatus, type FoundRecheck } from '../../../db/queries/rechecks';
import { withdrawRecords } from '../../../db/queries/records';
import type { Transaction } from '../../../db/client';
import type { Recheck } from '../../../shared/contracts/rechecks';
import type { RecheckAnswerKind } from '../../../shared/contracts/vocabulary';
import { recordNumber } from '../../../shared/domain/identifiers';
import { nextRecheckStatus } from '../../../shared/domain/reviewState';
import type { Actor, Context } from '../../context';
import { AppError, notAllowed } from '../../errors';
import { requestFitRefresh } from '../dataset/fitRefresh';
import { enqueueMails } from '../notify';
import { reviseSubmission } from '../submissions/drafts';
import { knowRecheck, whyNotAnswer } from './access';
import { readRecheck } from './describe';
import { tellAnswered } from './tellings';

interface Answer {
  answer: RecheckAnswerKind;
  text: string;
  attachmentId?: string | null | undefined;
}

/** The revision by which a record is corrected: one begun for this re-check already, or a new draft. */
async function answeringRevision(context: Context, actor: Actor, recheck: FoundRecheck): Promise<string> {
  const begun = await findAnsweringRevision(context.db, recheck.submissionId, recheck.id);
  if (begun !== null) return begun;
  await reviseSubmission(context, actor, recheck.submissionId, { recheckId: recheck.id });
  const made = await findAnsweringRevision(context.db, recheck.submissionId, recheck.id);
  if (made === null) throw new Error('The correcting revision was not begun.');
  return made;
}

/** A withdrawn record comes into no later version; it stays listed, and the fits of the working set are computed without it. */
async function withdrawRecord(context: Context, tx: Transaction, recheck: FoundRecheck, reason: string): Promise<string> {
  await withdrawRecords(tx, [recheck.recordId], reason, context.clock());
  return requestFitRefresh(tx, [recheck.recordId], `${recordNumber(recheck.number)} was withdrawn`);
}

/**
 * Answers an open re-check for the record's laboratory: `confirmed` with words or evidence, `corrected` with the draft of a
 * new revision of the submission (begun here where there is none), `withdrawn` with the record withdrawn at once.
 * @throws AppError `not-allowed` outside the laboratory, `wrong-state` where it is not open, `invalid-input` for evidence of another submission
 */
export async function answerRecheck(context: Context, actor: Actor, recheckId: string, input: Answer): Promise<Recheck> {
  const recheck = await knowRecheck(context.db, actor, recheckId);
  const refusal = whyNotAnswer(actor, recheck);
  if (refusal !== null) throw notAllowed(refusal);
  if (nextRecheckStatus(recheck.status, 'answer') === null) throw new AppError('wrong-state', `This re-check is ${recheck.status}.`);
  const attachmentId = input.attachmentId ?? null;
  if (attachmentId !== null && !(await isAttachmentOf(context.db, attachmentId, recheck.submissionId))) {
    throw new AppError('invalid-input', 'The evidence belongs to another submission.', { errors: [{ path: 'attachmentId', message: `Expected is evidence of this record's submission; found "${attachmentId}"` }] });
  }
  if (input.answer === 'corrected' && recheck.labId === null) {
    throw new AppError('invalid-input', 'A record of a publication is corrected by its loader.', { errors: [{ path: 'answer', message: 'Expected is confirmed or withdrawn; found "corrected"' }] });
  }
  const submissionRevisionId = input.answer === 'corrected' ? await answeringRevision(context, actor, recheck) : null;
  const at = context.clock();
  const { mails, runId } = await context.db.transaction(async (tx) => {
    const status = await lockRecheck(tx, recheckId);
    const next = status === null ? null : nextRecheckStatus(status, 'answer');
    if (next === null) throw new AppError('wrong-state', `This re-check is ${status ?? 'gone'}.`);
    const eventId = await insertRecheckEvent(tx, { recheckId, kind: 'answered', answer: input.answer, text: input.text, actorId: actor.id, attachmentId, submissionRevisionId, createdAt: at });
    await setRecheckStatus(tx, recheckId, next, null);
    const run = input.answer === 'withdrawn' ? await withdrawRecord(context, tx, recheck, input.text) : null;
    return { runId: run, mails: await tellAnswered(context, tx, actor, recheck, input.answer, input.text, eventId) };
  });
  await enqueueMails(context, mails);
  if (runId !== null) await context.jobs.enqueue('refresh-fits', { runId }, runId);
  return readRecheck(context, actor, recheckId);
}
