import { insertAudit } from '../../../db/queries/audit';
import { findRecheckEvents, insertRecheckEvent, lockRecheck, setRecheckStatus } from '../../../db/queries/rechecks';
import type { Recheck } from '../../../shared/contracts/rechecks';
import { recordNumber } from '../../../shared/domain/identifiers';
import { nextRecheckStatus } from '../../../shared/domain/reviewState';
import type { Actor, Context } from '../../context';
import { AppError } from '../../errors';
import { enqueueMails } from '../notify';
import { knowRecheck, whyNotClose, whyNotSettled } from './access';
import { readRecheck } from './describe';
import { tellClosed } from './tellings';

/** Whether the person may close a re-check that they know; throws `own-lab` or `not-allowed`. */
export async function refuseUnlessCloser(context: Context, actor: Actor, recheckId: string): Promise<void> {
  const recheck = await knowRecheck(context.db, actor, recheckId);
  const refusal = whyNotClose(actor, recheck, await findRecheckEvents(context.db, [recheckId]));
  if (refusal !== null) throw new AppError(refusal.code, refusal.text);
}

/**
 * Closes an answered re-check, or opens it again where the answer does not settle it, with the reason.
 * @throws AppError `own-lab` for the own laboratory's record, `wrong-state` where it is not answered or its correction is not decided yet
 */
export async function closeRecheck(context: Context, actor: Actor, recheckId: string, input: { outcome: 'close' | 'reopen'; text: string }): Promise<Recheck> {
  await refuseUnlessCloser(context, actor, recheckId);
  const recheck = await knowRecheck(context.db, actor, recheckId);
  const at = context.clock();
  const mails = await context.db.transaction(async (tx) => {
    const status = await lockRecheck(tx, recheckId);
    const next = status === null ? null : nextRecheckStatus(status, input.outcome);
    if (next === null) throw new AppError('wrong-state', status === 'open' ? 'It waits for an answer.' : 'It is closed already.');
    const unsettled = input.outcome === 'close' ? whyNotSettled(await findRecheckEvents(tx, [recheckId])) : null;
    if (unsettled !== null) throw new AppError('wrong-state', unsettled);
    const eventId = await insertRecheckEvent(tx, { recheckId, kind: input.outcome === 'close' ? 'closed' : 'reopened', text: input.text, actorId: actor.id, createdAt: at });
    await setRecheckStatus(tx, recheckId, next, next === 'closed' ? at : null);
    await insertAudit(tx, { actorId: actor.id, action: input.outcome === 'close' ? 'recheck-closed' : 'recheck-reopened', targetType: 'record', targetId: recordNumber(recheck.number), detail: { recheckId, reason: input.text } });
    return tellClosed(context, tx, actor, recheck, input.outcome, input.text, eventId);
  });
  await enqueueMails(context, mails);
  return readRecheck(context, actor, recheckId);
}
