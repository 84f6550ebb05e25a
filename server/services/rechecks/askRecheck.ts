import { insertAudit } from '../../../db/queries/audit';
import { findQuestionedRecord, insertRecheck, insertRecheckEvent, isFlagOf, type QuestionedRecord } from '../../../db/queries/rechecks';
import type { Recheck } from '../../../shared/contracts/rechecks';
import { recordNumber, recordSerial } from '../../../shared/domain/identifiers';
import type { Actor, Context } from '../../context';
import { AppError, notFound } from '../../errors';
import { enqueueMails } from '../notify';
import { knowsRecord } from './access';
import { readRecheck } from './describe';
import { tellAsked } from './tellings';

/** A record by its printed number as far as the person may know it; throws `not-found`. */
export async function knowQuestionedRecord(context: Context, actor: Actor, printed: string): Promise<QuestionedRecord> {
  const serial = recordSerial(printed);
  const record = serial === null ? null : await findQuestionedRecord(context.db, serial);
  if (record === null || !knowsRecord(actor, record)) throw notFound('This record');
  return record;
}

/**
 * Puts a question about a record to its laboratory, from a flag or by hand.
 * @param printed number of the record, `AK-` and six digits
 * @throws AppError `duplicate` where one is open already, `wrong-state` for a withdrawn record, `invalid-input` for a flag of another record
 */
export async function askRecheck(context: Context, actor: Actor, printed: string, input: { question: string; flagId?: string | null | undefined; fieldPath?: string }): Promise<Recheck> {
  const record = await knowQuestionedRecord(context, actor, printed);
  if (record.withdrawnAt !== null) throw new AppError('wrong-state', `${recordNumber(record.number)} was withdrawn.`);
  const flagId = input.flagId ?? null;
  if (flagId !== null && !(await isFlagOf(context.db, flagId, record.id))) {
    throw new AppError('invalid-input', 'The flag speaks of another record.', { errors: [{ path: 'flagId', message: `Expected is a flag of ${recordNumber(record.number)}; found "${flagId}"` }] });
  }
  const at = context.clock();
  const { id, mails } = await context.db.transaction(async (tx) => {
    const recheckId = await insertRecheck(tx, { recordId: record.id, flagId, fieldPath: input.fieldPath ?? '', question: input.question, askedBy: actor.id, createdAt: at });
    await insertRecheckEvent(tx, { recheckId, kind: 'asked', text: input.question, actorId: actor.id, createdAt: at });
    await insertAudit(tx, { actorId: actor.id, action: 'recheck-asked', targetType: 'record', targetId: recordNumber(record.number), detail: { recheckId } });
    return { id: recheckId, mails: await tellAsked(context, tx, actor, { ...record, id: recheckId, askedBy: actor.id }, input.question) };
  });
  await enqueueMails(context, mails);
  return readRecheck(context, actor, id);
}
