import { findContributorsOf } from '../../../db/queries/labs';
import { findHoldersOf, findReviewersOutside } from '../../../db/queries/recipients';
import type { FoundRecheck } from '../../../db/queries/rechecks';
import type { Transaction } from '../../../db/client';
import type { RecheckAnswerKind } from '../../../shared/contracts/vocabulary';
import { recordNumber } from '../../../shared/domain/identifiers';
import { today, type Actor, type Context } from '../../context';
import { tell } from '../notify';

type Subject = Pick<FoundRecheck, 'id' | 'number' | 'labId' | 'species' | 'structure' | 'askedBy'>;

const titleOf = ({ number, species, structure }: Subject) => `${recordNumber(number)}, ${species}, ${structure.toLowerCase()}`;
const others = (userIds: readonly string[], actor: Actor) => [...new Set(userIds)].filter((id) => id !== actor.id);
/** Who can answer: the contributors of the record's laboratory; curators where it has none. */
const answerers = (context: Context, tx: Transaction, labId: string | null) => (labId === null ? findHoldersOf(tx, 'curator') : findContributorsOf(tx, labId, today(context)));

/** Tells those who can answer. @returns mails to enqueue after the commit */
export async function tellAsked(context: Context, tx: Transaction, actor: Actor, recheck: Subject, question: string): Promise<string[]> {
  const userIds = others(await answerers(context, tx, recheck.labId), actor);
  return tell(context, tx, { userIds, kind: 'recheck-asked', subject: `Re-check asked: ${titleOf(recheck)}`, body: `${actor.name} asks: ${question}`, href: `/rechecks/${recheck.id}`, event: `recheck-asked:${recheck.id}` });
}

const answerWords: Record<RecheckAnswerKind, string> = { confirmed: 'confirms the record', corrected: 'corrects the record by a new revision', withdrawn: 'withdraws the record' };

/** Tells who asked, and the reviewers outside the laboratory, who may close it. @returns mails to enqueue after the commit */
export async function tellAnswered(context: Context, tx: Transaction, actor: Actor, recheck: Subject, answer: RecheckAnswerKind, text: string, eventId: string): Promise<string[]> {
  const userIds = others([recheck.askedBy, ...(await findReviewersOutside(tx, recheck.labId))], actor);
  return tell(context, tx, { userIds, kind: 'recheck-answered', subject: `Re-check answered: ${titleOf(recheck)}`, body: `${actor.name} ${answerWords[answer]}: ${text}`, href: `/rechecks/${recheck.id}`, event: `recheck-answered:${eventId}` });
}

/** Tells the laboratory that it is settled, or that the answer did not settle it. @returns mails to enqueue after the commit */
export async function tellClosed(context: Context, tx: Transaction, actor: Actor, recheck: Subject, outcome: 'close' | 'reopen', text: string, eventId: string): Promise<string[]> {
  const closed = outcome === 'close';
  const userIds = others([recheck.askedBy, ...(await answerers(context, tx, recheck.labId))], actor);
  return tell(context, tx, { userIds, kind: closed ? 'recheck-closed' : 'recheck-reopened', subject: `Re-check ${closed ? 'closed' : 'opened again'}: ${titleOf(recheck)}`, body: `${actor.name} writes: ${text}`, href: `/rechecks/${recheck.id}`, event: `recheck-${closed ? 'closed' : 'reopened'}:${eventId}` });
}
