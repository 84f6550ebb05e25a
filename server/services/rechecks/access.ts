import { findRecheck, type findRecheckEvents, type FoundRecheck, type QuestionedRecord } from '../../../db/queries/rechecks';
import type { Queryable } from '../../../db/client';
import type { Actor } from '../../context';
import { notFound } from '../../errors';
import { isJudge } from '../submissions/access';

type Events = Awaited<ReturnType<typeof findRecheckEvents>>;

const isOwnLab = (actor: Actor, labId: string | null) => labId !== null && actor.labId === labId;

/** A re-check as far as the person may know it: judges know every one, contributors those of their own laboratory. */
export async function knowRecheck(db: Queryable, actor: Actor, recheckId: string): Promise<FoundRecheck> {
  const found = await findRecheck(db, recheckId);
  if (found === null || !(isJudge(actor) || (actor.roles.includes('contributor') && isOwnLab(actor, found.labId)))) throw notFound('This re-check');
  return found;
}

/** Whether a person may know that a record exists: it stands in a version, is their laboratory's, or they judge records. */
export const knowsRecord = (actor: Actor, record: QuestionedRecord): boolean => record.inVersion || isJudge(actor) || (actor.roles.includes('contributor') && isOwnLab(actor, record.labId));

/** Why a person may not answer, or null where they may. A record of a published table has no laboratory: a curator looks into its source. */
export function whyNotAnswer(actor: Actor, recheck: { labId: string | null }): string | null {
  if (recheck.labId === null) return actor.roles.includes('curator') ? null : 'This record comes from a publication: a curator looks into it.';
  return actor.roles.includes('contributor') && isOwnLab(actor, recheck.labId) ? null : 'The laboratory of the record answers.';
}

/** Why a person may not close or reopen, or null where they may: neither their own laboratory's nor what they answered themselves. */
export function whyNotClose(actor: Actor, recheck: { labId: string | null }, events: Events): { code: 'not-allowed' | 'own-lab'; text: string } | null {
  if (!isJudge(actor)) return { code: 'not-allowed', text: 'Re-checks are closed by reviewers and curators.' };
  if (isOwnLab(actor, recheck.labId)) return { code: 'own-lab', text: `This record comes from your own laboratory, ${actor.labName ?? 'the same as yours'}: somebody else closes its re-check.` };
  const answer = events.findLast((event) => event.kind === 'answered');
  return answer?.actorId === actor.id ? { code: 'not-allowed', text: 'You answered it: somebody else closes it.' } : null;
}

/** A correction is settled once its revision was decided or withdrawn; until then the re-check stays. */
export function whyNotSettled(events: Events): string | null {
  const answer = events.findLast((event) => event.kind === 'answered');
  if (answer?.answer !== 'corrected') return null;
  if (answer.revisionStatus === 'draft' || answer.revisionStatus === 'changes-requested') return `The correction, revision ${answer.submissionRevision ?? '?'}, is not submitted yet.`;
  return answer.revisionStatus === 'submitted' ? `The correction, revision ${answer.submissionRevision ?? '?'}, is still under review.` : null;
}
