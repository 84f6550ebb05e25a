import { asc, eq } from 'drizzle-orm';
import type { Queryable } from '../client';
import { structures, taxa, taxonSynonyms } from '../schema/index';

export interface TaxonNode {
  id: string;
  parentId: string | null;
  rank: string;
  name: string;
  slug: string;
  path: string;
  commonNames: string[];
  named: boolean;
  demonstration: boolean;
}

/** Every accepted node of the classification, species included. */
export async function findTaxonNodes(db: Queryable): Promise<TaxonNode[]> {
  return db
    .select({
      id: taxa.id,
      parentId: taxa.parentId,
      rank: taxa.rank,
      name: taxa.name,
      slug: taxa.slug,
      path: taxa.path,
      commonNames: taxa.commonNames,
      named: taxa.named,
      demonstration: taxa.demonstration,
    })
    .from(taxa)
    .where(eq(taxa.status, 'accepted'))
    .orderBy(asc(taxa.path));
}

export async function findSynonyms(db: Queryable): Promise<{ taxonId: string; name: string; slug: string }[]> {
  return db.select({ taxonId: taxonSynonyms.taxonId, name: taxonSynonyms.name, slug: taxonSynonyms.slug }).from(taxonSynonyms).orderBy(asc(taxonSynonyms.name));
}

/** Names of the structures by key, in the order in which they are listed. */
export async function findStructureNames(db: Queryable): Promise<{ id: string; key: string; name: string; position: number }[]> {
  return db.select({ id: structures.id, key: structures.key, name: structures.name, position: structures.position }).from(structures).orderBy(asc(structures.position), asc(structures.key));
}
