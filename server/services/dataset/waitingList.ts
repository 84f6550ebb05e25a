import { countUnfrozen } from '../../../db/queries/waiting';
import { findRechecks } from '../../../db/queries/rechecks';
import type { WaitingItem } from '../../../shared/contracts/account';
import { recordNumber } from '../../../shared/domain/identifiers';
import { today, type Actor, type Context } from '../../context';
import { listReviewQueue, listSubmissions } from '../submissions/items';
import { loadFlagViews } from './flagViews';

const most = 5;
const structureText = (key: string): string => key.replaceAll('_', ' ');

async function ownSubmissions(context: Context, actor: Actor): Promise<WaitingItem[]> {
  const of = async (status: 'changes-requested' | 'draft') => (await listSubmissions(context, actor, { status, limit: most })).items;
  const own = [...(await of('changes-requested')), ...(await of('draft'))].filter(({ by }) => by.id === actor.id);
  return own.map(({ id, status, title, species, structures, updatedAt, demonstration }) => ({
    kind: status === 'draft' ? ('draft' as const) : ('changes-requested' as const),
    title, species, detail: structures.map(structureText).join(', '), href: `/submissions/${id}`, since: updatedAt, demonstration,
  }));
}

async function rechecks(context: Context, status: 'open' | 'answered', labId: string | undefined, exceptLab: string | null): Promise<WaitingItem[]> {
  const found = await findRechecks(context.db, { labId, status, before: null, limit: 50 });
  return found
    .filter((one) => exceptLab === null || one.labId !== exceptLab)
    .slice(0, most)
    .map(({ id, number, species, structure, question, at, demonstration }) => ({
      kind: status === 'open' ? ('recheck-open' as const) : ('recheck-answered' as const),
      title: `${recordNumber(number)}, ${structure}`, species, detail: question, href: `/rechecks/${id}`, since: at.toISOString(), demonstration,
    }));
}

async function toReview(context: Context, actor: Actor): Promise<WaitingItem[]> {
  const { items } = await listReviewQueue(context, { limit: 50 });
  return items
    .filter(({ by, lab }) => by.id !== actor.id && (actor.labName === null || lab !== actor.labName))
    .slice(0, most)
    .map(({ id, title, species, structures, submittedAt, updatedAt, demonstration }) => ({
      kind: 'to-review' as const, title, species, detail: structures.map(structureText).join(', '), href: `/review/${id}`, since: submittedAt ?? updatedAt, demonstration,
    }));
}

async function forCurator(context: Context): Promise<WaitingItem[]> {
  const waiting = await countUnfrozen(context.db, today(context));
  const flags = await loadFlagViews(context.db, { set: 'working' });
  const seen = new Map(flags.filter(({ kind }) => kind !== 'watch').map((flag) => [`${flag.record} ${flag.kind}`, flag]));
  const freeze: WaitingItem[] = waiting === 0 ? [] : [{ kind: 'to-freeze', title: waiting === 1 ? '1 record waits for the next version' : `${waiting} records wait for the next version`, species: '', detail: '', href: '/curate/freeze', since: context.clock().toISOString(), demonstration: false }];
  return [
    ...freeze,
    ...[...seen.values()].slice(0, most).map((flag) => ({ kind: 'flag' as const, title: `${flag.record} is flagged ${flag.kind}`, species: flag.species, detail: flag.fitTitle, href: `/records/${flag.record}`, since: flag.at, demonstration: false })),
  ];
}

/**
 * What waits for a person to act, by role: own submissions and re-checks of the own laboratory, then what they may
 * decide or close, then what a curator keeps an eye on. At most five of a kind.
 */
export async function listWaiting(context: Context, actor: Actor): Promise<WaitingItem[]> {
  const is = (role: Actor['roles'][number]) => actor.roles.includes(role);
  return [
    ...(is('contributor') ? await ownSubmissions(context, actor) : []),
    ...(is('contributor') && actor.labId !== null ? await rechecks(context, 'open', actor.labId, null) : []),
    ...(is('reviewer') ? await toReview(context, actor) : []),
    ...(is('reviewer') || is('curator') ? await rechecks(context, 'answered', undefined, actor.labId) : []),
    ...(is('curator') ? await forCurator(context) : []),
  ];
}
