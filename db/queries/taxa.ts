import { and, asc, eq, gt, ilike, inArray, or, sql, type SQL } from 'drizzle-orm';
import type { Queryable, Transaction } from '../client';
import { sources, structureDefinitions, structures, taxa, taxonIdentifiers, taxonSynonyms, trees } from '../schema/index';

type TaxonStatus = 'proposed' | 'accepted' | 'refused';
const isStatus = (text: string): text is TaxonStatus => text === 'proposed' || text === 'accepted' || text === 'refused';

const columns = {
  id: taxa.id,
  parentId: taxa.parentId,
  slug: taxa.slug,
  name: taxa.name,
  rank: taxa.rank,
  path: taxa.path,
  commonNames: taxa.commonNames,
  authority: taxa.authority,
  named: taxa.named,
  status: taxa.status,
  demonstration: taxa.demonstration,
  proposedBy: taxa.proposedBy,
  species: sql<number>`(select count(*)::int from taxa below where below.rank = 'species' and below.status = 'accepted' and starts_with(below.path, "taxa"."path" || ' > '))`,
};

const withStatus = <Row extends { status: string }>(row: Row) => ({ ...row, status: isStatus(row.status) ? row.status : ('refused' as const) });
const contains = (text: string) => `%${text.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;

/** Taxa by name, after the given place; the search looks at names, common names and synonyms. */
export async function searchTaxa(db: Queryable, filter: { query: string; rank?: string | undefined; statuses: readonly TaxonStatus[]; after: { name: string; id: string } | null; limit: number }) {
  const { query, rank, statuses, after, limit } = filter;
  const like = contains(query);
  const bySynonym = db.select({ id: taxonSynonyms.taxonId }).from(taxonSynonyms).where(ilike(taxonSynonyms.name, like));
  const matches: SQL | undefined = query === '' ? undefined : or(ilike(taxa.name, like), sql`array_to_string(${taxa.commonNames}, ' | ') ilike ${like}`, inArray(taxa.id, bySynonym));
  const rows = await db
    .select(columns)
    .from(taxa)
    .where(
      and(
        matches,
        inArray(taxa.status, [...statuses]),
        rank === undefined ? undefined : eq(taxa.rank, rank),
        after === null ? undefined : or(gt(taxa.name, after.name), and(eq(taxa.name, after.name), gt(taxa.id, after.id))),
      ),
    )
    .orderBy(asc(taxa.name), asc(taxa.id))
    .limit(limit);
  return rows.map(withStatus);
}
export type FoundTaxon = Awaited<ReturnType<typeof searchTaxa>>[number];

/** A taxon by id, address, or the address of one of its synonyms. */
export async function findTaxon(db: Queryable, idOrSlug: string): Promise<FoundTaxon | null> {
  const isId = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(idOrSlug);
  const [direct] = await db.select(columns).from(taxa).where(isId ? eq(taxa.id, idOrSlug) : eq(taxa.slug, idOrSlug));
  if (direct !== undefined || isId) return direct === undefined ? null : withStatus(direct);
  const [led] = await db.select(columns).from(taxonSynonyms).innerJoin(taxa, eq(taxa.id, taxonSynonyms.taxonId)).where(eq(taxonSynonyms.slug, idOrSlug));
  return led === undefined ? null : withStatus(led);
}

export async function lockTaxon(tx: Transaction, taxonId: string) {
  const [row] = await tx.select({ status: taxa.status, proposedBy: taxa.proposedBy, name: taxa.name, slug: taxa.slug }).from(taxa).where(eq(taxa.id, taxonId)).for('update');
  return row ?? null;
}

/** Synonyms and identifiers of taxa, for lists. */
export async function findTaxonNames(db: Queryable, taxonIds: readonly string[]) {
  if (taxonIds.length === 0) return { synonyms: [], identifiers: [] };
  const ids = [...taxonIds];
  return {
    synonyms: await db.select({ taxonId: taxonSynonyms.taxonId, name: taxonSynonyms.name }).from(taxonSynonyms).where(inArray(taxonSynonyms.taxonId, ids)).orderBy(asc(taxonSynonyms.name)),
    identifiers: await db.select().from(taxonIdentifiers).where(inArray(taxonIdentifiers.taxonId, ids)).orderBy(asc(taxonIdentifiers.authority)),
  };
}

/** Whether an address is taken by a taxon or leads on to one. */
export async function isSlugTaken(db: Queryable, slug: string): Promise<boolean> {
  return (await db.$count(taxa, eq(taxa.slug, slug))) + (await db.$count(taxonSynonyms, eq(taxonSynonyms.slug, slug))) > 0;
}

export async function insertTaxon(tx: Transaction, taxon: { parentId: string; rank: string; name: string; slug: string; path: string; authority: string; named: boolean; demonstration: boolean; status: TaxonStatus; proposedBy: string; decidedBy: string | null }): Promise<string> {
  const [row] = await tx.insert(taxa).values(taxon).returning({ id: taxa.id });
  if (row === undefined) throw new Error('The taxon was not written.');
  return row.id;
}

export async function decideTaxon(tx: Transaction, taxonId: string, status: TaxonStatus, decidedBy: string, at: Date): Promise<void> {
  await tx.update(taxa).set({ status, decidedBy, updatedAt: at }).where(eq(taxa.id, taxonId));
}

export async function insertSynonym(tx: Transaction, synonym: { taxonId: string; name: string; slug: string; reason: string }): Promise<void> {
  await tx.insert(taxonSynonyms).values(synonym);
}

/** Structures in the order of their lists, each with its definitions, oldest first. */
export async function findStructures(db: Queryable) {
  const rows = await db.select().from(structures).where(eq(structures.status, 'accepted')).orderBy(asc(structures.position), asc(structures.key));
  const definitions = await db.select().from(structureDefinitions).orderBy(asc(structureDefinitions.version));
  return rows.map((row) => ({ ...row, definitions: definitions.filter((definition) => definition.structureId === row.id), parent: rows.find((other) => other.id === row.parentId)?.key ?? null }));
}

export function findTrees(db: Queryable) {
  return db.select({ id: trees.id, name: trees.name, tips: trees.tips, dated: trees.dated, source: sources.citation }).from(trees).leftJoin(sources, eq(sources.id, trees.sourceId)).orderBy(asc(trees.name));
}
