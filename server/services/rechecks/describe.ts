import { findRecheckEvents, findRechecks, type FoundRecheck } from '../../../db/queries/rechecks';
import { findPersonRefs } from '../../../db/queries/submissions';
import type { Recheck } from '../../../shared/contracts/rechecks';
import type { RecheckStatus } from '../../../shared/contracts/vocabulary';
import { fitTitle } from '../dataset/questions';
import { recordNumber } from '../../../shared/domain/identifiers';
import { today, type Actor, type Context } from '../../context';
import { isJudge } from '../submissions/access';
import { knowRecheck, whyNotAnswer, whyNotClose, whyNotSettled } from './access';

type Events = Awaited<ReturnType<typeof findRecheckEvents>>;

function mayOf(actor: Actor, found: FoundRecheck, events: Events): Recheck['may'] {
  const [notAnswer, notClose] = [whyNotAnswer(actor, found), whyNotClose(actor, found, events)];
  switch (found.status) {
    case 'open':
      return { answer: notAnswer === null, close: false, whyNot: notAnswer };
    case 'answered': {
      const unsettled = whyNotSettled(events);
      return { answer: false, close: notClose === null, whyNot: notClose?.text ?? unsettled };
    }
    case 'closed':
      return { answer: false, close: false, whyNot: 'It is closed.' };
  }
}

const unknown = (id: string) => ({ id, name: 'Unknown', lab: null });

async function describe(context: Context, actor: Actor, found: readonly FoundRecheck[]): Promise<Recheck[]> {
  const events = await findRecheckEvents(context.db, found.map((recheck) => recheck.id));
  const people = await findPersonRefs(context.db, [...new Set([...found.map((recheck) => recheck.askedBy), ...events.map((event) => event.actorId)])], today(context));
  return found.map((recheck) => {
    const { id, number, at, askedBy, flagKind, flagFit, flagClade, flagReasons, species, slug, structure, lab, status, question, fieldPath, submissionId, demonstration } = recheck;
    const own = events.filter((event) => event.recheckId === id);
    return {
      id, species, slug, structure, lab, status, question, fieldPath, submissionId, demonstration,
      record: recordNumber(number),
      flag: flagKind === null ? null : `${flagKind} in ${flagFit === null || flagClade === null ? 'a standing fit' : fitTitle(flagFit, flagClade, flagFit.method)}${flagReasons === null || flagReasons.length === 0 ? '' : `: ${flagReasons.join('; ')}`}`,
      askedBy: people.get(askedBy) ?? unknown(askedBy),
      at: at.toISOString(),
      events: own.map((event) => ({ kind: eventKind(event.kind), answer: event.answer, text: event.text, by: people.get(event.actorId) ?? unknown(event.actorId), at: event.at.toISOString(), submissionRevision: event.submissionRevision })),
      may: mayOf(actor, recheck, own),
    };
  });
}

function eventKind(kind: string): Recheck['events'][number]['kind'] {
  return kind === 'answered' || kind === 'reopened' || kind === 'closed' ? kind : 'asked';
}

/** One re-check with its events and what the person may do; throws `not-found` where they may not know it. */
export async function readRecheck(context: Context, actor: Actor, recheckId: string): Promise<Recheck> {
  const [recheck] = await describe(context, actor, [await knowRecheck(context.db, actor, recheckId)]);
  if (recheck === undefined) throw new Error('A re-check that was found is described.');
  return recheck;
}

/** A page of re-checks, newest first: every one for judges, those of the own laboratory for contributors. */
export async function listRechecks(context: Context, actor: Actor, filter: { status?: RecheckStatus | undefined; before: { at: Date; id: string } | null; limit: number }): Promise<Recheck[]> {
  if (!isJudge(actor) && actor.labId === null) return [];
  const labId = isJudge(actor) ? undefined : (actor.labId ?? undefined);
  return describe(context, actor, await findRechecks(context.db, { ...filter, labId }));
}
