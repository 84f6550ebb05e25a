import type { z } from 'zod';
import { insertAudit } from '../../../db/queries/audit';
import { decideTaxon, findTaxon, findTaxonNames, insertSynonym, insertTaxon, isSlugTaken, lockTaxon, searchTaxa, type FoundTaxon } from '../../../db/queries/taxa';
import { findHoldersOf } from '../../../db/queries/recipients';
import type { Queryable } from '../../../db/client';
import type { Taxon, taxonDecisionSchema, taxonProposalSchema } from '../../../shared/contracts/register';
import { speciesSlug } from '../../../shared/domain/identifiers';
import type { Actor, Context } from '../../context';
import { AppError, notFound } from '../../errors';
import { enqueueMails, tell } from '../notify';

async function describe(db: Queryable, found: readonly FoundTaxon[]): Promise<Taxon[]> {
  const { synonyms, identifiers } = await findTaxonNames(db, found.map((taxon) => taxon.id));
  return found.map(({ id, slug, name, rank, path, commonNames, authority, named, status, demonstration, species }) => ({
    id, slug, name, rank, path, commonNames, authority, named, status, demonstration, species,
    synonyms: synonyms.filter((synonym) => synonym.taxonId === id).map((synonym) => synonym.name),
    identifiers: identifiers.filter((row) => row.taxonId === id).map(({ authority: by, identifier }) => ({ authority: by, identifier })),
  }));
}

/** Taxa that are not accepted are seen by those who enter, judge and keep records; the public sees accepted ones. */
const seesProposals = (visitor: Actor | null) => visitor !== null && visitor.roles.some((role) => role === 'contributor' || role === 'reviewer' || role === 'curator');

/** A page of taxa by name; without a status accepted ones and, where the visitor may see them, proposed ones. */
export async function listTaxa(context: Context, visitor: Actor | null, filter: { query: string; rank?: string | undefined; status?: Taxon['status'] | undefined; after: { name: string; id: string } | null; limit: number }): Promise<Taxon[]> {
  const allowed: readonly Taxon['status'][] = seesProposals(visitor) ? (filter.status === undefined ? ['accepted', 'proposed'] : [filter.status]) : ['accepted'];
  if (filter.status !== undefined && !allowed.includes(filter.status)) return [];
  return describe(context.db, await searchTaxa(context.db, { ...filter, statuses: allowed }));
}

/** One taxon by id, address or a synonym's address; throws `not-found`, also for a proposal that the visitor may not see. */
export async function readTaxon(context: Context, visitor: Actor | null, idOrSlug: string): Promise<Taxon> {
  const found = await findTaxon(context.db, idOrSlug);
  if (found === null || (found.status !== 'accepted' && !seesProposals(visitor))) throw notFound('This taxon');
  const [taxon] = await describe(context.db, [found]);
  if (taxon === undefined) throw notFound('This taxon');
  return taxon;
}

const refuse = (path: string, message: string) => new AppError('invalid-input', 'The taxon cannot be entered like this.', { errors: [{ path, message }] });

/** A binomial, with a third name for a subspecies, or a name kept at genus level. */
const speciesForm = /^[A-Z][a-z]+(-[a-z]+)? ([a-z]+(-[a-z]+)*( [a-z]+(-[a-z]+)*)?|sp\.|cf\. [a-z]+(-[a-z]+)*)$/;
const higherForm = /^[A-Z][a-z]+$/;

/**
 * Puts a taxon below an accepted one. A contributor's waits for a curator, a curator's own is accepted at once.
 * @param input `parent` is an address or id; a species is written as a binomial, or as "Genus sp." where it is kept at genus level
 * @throws AppError `invalid-input` with the field, `duplicate` where name or address is taken
 */
export async function proposeTaxon(context: Context, actor: Actor, input: z.output<typeof taxonProposalSchema>): Promise<Taxon> {
  const name = input.name.replace(/\s+/g, ' ');
  const rank = input.rank.toLowerCase();
  const isSpecies = rank === 'species';
  if (!(isSpecies ? speciesForm : higherForm).test(name)) throw refuse('name', isSpecies ? `Expected is a binomial such as "Rattus norvegicus", or "Rattus sp."; found "${name}"` : `Expected is one word with a capital; found "${name}"`);
  const parent = await findTaxon(context.db, input.parent);
  if (parent === null || parent.status !== 'accepted') throw refuse('parent', `Expected is an accepted taxon; found "${input.parent}"`);
  if (parent.rank === 'species') throw refuse('parent', 'A taxon stands below a genus or higher, not below a species');
  if (input.demonstration && !context.demo) throw refuse('demonstration', 'Invented taxa are kept in demonstration registers only');
  const slug = speciesSlug(name);
  if (slug === null) throw refuse('name', 'The name holds no letter');
  const accepted = actor.roles.includes('curator');
  const { id, mails } = await context.db.transaction(async (tx) => {
    if (await isSlugTaken(tx, slug)) throw new AppError('duplicate', `${name} is in the register already, as a taxon or a synonym.`);
    const taxonId = await insertTaxon(tx, { parentId: parent.id, rank, name, slug, path: `${parent.path} > ${name}`, authority: input.authority, named: !/ (sp|cf)\./.test(name), demonstration: input.demonstration, status: accepted ? 'accepted' : 'proposed', proposedBy: actor.id, decidedBy: accepted ? actor.id : null });
    await insertAudit(tx, { actorId: actor.id, action: accepted ? 'taxon-added' : 'taxon-proposed', targetType: 'taxon', targetId: taxonId, detail: { name, parent: parent.name } });
    if (accepted) return { id: taxonId, mails: [] };
    const userIds = await findHoldersOf(tx, 'curator');
    return { id: taxonId, mails: await tell(context, tx, { userIds, kind: 'taxon-proposed', subject: `${name} is proposed as a taxon`, body: `${actor.name} proposes ${name} (${rank}) below ${parent.name}.`, href: '/curate/taxa', event: `taxon-proposed:${taxonId}` }) };
  });
  await enqueueMails(context, mails);
  return readTaxon(context, actor, id);
}

/**
 * Accepts or refuses a proposed taxon, and tells who proposed it.
 * @throws AppError `wrong-state` where it was decided already, `invalid-input` for a refusal without reason
 */
export async function decideOnTaxon(context: Context, actor: Actor, taxonId: string, input: z.output<typeof taxonDecisionSchema>): Promise<Taxon> {
  const refused = input.decision === 'refuse';
  if (refused && input.reason === '') throw new AppError('invalid-input', 'A refusal needs its reason.', { errors: [{ path: 'reason', message: 'Give the reason in a sentence; found nothing' }] });
  const mails = await context.db.transaction(async (tx) => {
    const taxon = await lockTaxon(tx, taxonId);
    if (taxon === null) throw notFound('This taxon');
    if (taxon.status !== 'proposed') throw new AppError('wrong-state', `${taxon.name} is ${taxon.status} already.`);
    await decideTaxon(tx, taxonId, refused ? 'refused' : 'accepted', actor.id, context.clock());
    await insertAudit(tx, { actorId: actor.id, action: refused ? 'taxon-refused' : 'taxon-accepted', targetType: 'taxon', targetId: taxonId, detail: { name: taxon.name, reason: input.reason } });
    const body = refused ? `${actor.name} refused ${taxon.name}: ${input.reason}` : `${taxon.name} stands in the classification now and can be used in submissions.`;
    return tell(context, tx, { userIds: taxon.proposedBy === null ? [] : [taxon.proposedBy], kind: 'taxon-decided', subject: `${taxon.name} was ${refused ? 'refused' : 'accepted'}`, body, href: refused ? '/submissions' : `/species/${taxon.slug}`, event: `taxon-decided:${taxonId}` });
  });
  await enqueueMails(context, mails);
  return readTaxon(context, actor, taxonId);
}

/**
 * Adds a former or alternative name; its address leads on to the taxon from then on.
 * @throws AppError `duplicate` where the name's address is taken
 */
export async function addSynonym(context: Context, actor: Actor, taxon: Taxon, input: { name: string; reason: string }): Promise<Taxon> {
  const name = input.name.replace(/\s+/g, ' ');
  const slug = speciesSlug(name);
  if (slug === null) throw new AppError('invalid-input', 'The name cannot be used.', { errors: [{ path: 'name', message: `Expected is a name with letters; found "${name}"` }] });
  await context.db.transaction(async (tx) => {
    if (await isSlugTaken(tx, slug)) throw new AppError('duplicate', `${name} is in the register already, as a taxon or a synonym.`);
    await insertSynonym(tx, { taxonId: taxon.id, name, slug, reason: input.reason });
    await insertAudit(tx, { actorId: actor.id, action: 'synonym-added', targetType: 'taxon', targetId: taxon.id, detail: { name, reason: input.reason } });
  });
  return readTaxon(context, actor, taxon.id);
}
