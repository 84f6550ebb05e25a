import { eq, inArray } from 'drizzle-orm';
import type { Queryable } from '../client';
import { structureDefinitions, structures, taxa, taxonSynonyms } from '../schema/index';

/** A species with the nodes above it, root first. */
export interface TaxonInPlace {
  id: string;
  slug: string;
  name: string;
  rank: string;
  named: boolean;
  demonstration: boolean;
  status: string;
  lineage: { name: string; slug: string; rank: string }[];
}

const separator = ' > ';

/** Paths of the nodes above a node, root first. */
function pathsAbove(path: string): string[] {
  const names = path.split(separator);
  return names.slice(0, -1).map((_, index) => names.slice(0, index + 1).join(separator));
}

/** Taxa by the slugs asked for; a synonym's slug answers its taxon. Unknown slugs are absent. */
export async function findTaxaInPlace(db: Queryable, slugs: readonly string[]): Promise<Map<string, TaxonInPlace>> {
  const wanted = [...new Set(slugs)].filter((slug) => slug !== '');
  if (wanted.length === 0) return new Map();
  const direct = (await db.select().from(taxa).where(inArray(taxa.slug, wanted))).map((taxon) => ({ asked: taxon.slug, taxon }));
  const led = (await db.select({ asked: taxonSynonyms.slug, taxon: taxa }).from(taxonSynonyms).innerJoin(taxa, eq(taxa.id, taxonSynonyms.taxonId)).where(inArray(taxonSynonyms.slug, wanted)));
  const found = [...led, ...direct];
  const above = [...new Set(found.flatMap(({ taxon }) => pathsAbove(taxon.path)))];
  const nodes = above.length === 0 ? [] : await db.select({ path: taxa.path, name: taxa.name, slug: taxa.slug, rank: taxa.rank }).from(taxa).where(inArray(taxa.path, above));
  const byPath = new Map(nodes.map((node) => [node.path, node]));
  return new Map(
    found.map(({ asked, taxon }) => {
      const lineage = pathsAbove(taxon.path).flatMap((path) => {
        const node = byPath.get(path);
        return node === undefined ? [] : [{ name: node.name, slug: node.slug, rank: node.rank }];
      });
      const { id, slug, name, rank, named, demonstration, status } = taxon;
      return [asked, { id, slug, name, rank, named, demonstration, status, lineage }];
    }),
  );
}

export interface DefinedStructure {
  id: string;
  key: string;
  name: string;
  animalClass: string | null;
  midline: boolean;
  parentKey: string | null;
  definitions: { version: number; includes: string[]; excludes: string[] }[];
}

/** Every accepted structure with its definitions, by key. */
export async function findDefinedStructures(db: Queryable): Promise<Map<string, DefinedStructure>> {
  const rows = await db.select().from(structures).where(eq(structures.status, 'accepted'));
  const definitions = await db.select().from(structureDefinitions);
  const keyOf = new Map(rows.map((row) => [row.id, row.key]));
  return new Map(
    rows.map((row) => [
      row.key,
      {
        id: row.id,
        key: row.key,
        name: row.name,
        animalClass: row.animalClass,
        midline: row.midline,
        parentKey: row.parentId === null ? null : (keyOf.get(row.parentId) ?? null),
        definitions: definitions.filter((definition) => definition.structureId === row.id).map(({ version, includes, excludes }) => ({ version, includes, excludes })),
      },
    ]),
  );
}
