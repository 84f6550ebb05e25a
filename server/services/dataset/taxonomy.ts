import type { Queryable } from '../../../db/client';
import { findSynonyms, findTaxonNodes, type TaxonNode } from '../../../db/queries/species';

/** Joins the names of a lineage into the key of a clade. */
export const pathOf = (lineage: readonly string[]): string => lineage.join(' > ');

export interface CladeName {
  slug: string;
  name: string;
}

/** Clades that the register keeps fits for, where the number of species allows. */
export const standingCladeNames = ['Primates', 'Glires', 'Rodentia', 'Afrotheria', 'Artiodactyla', 'Carnivora', 'Psittaciformes', 'Passeriformes'] as const;
const isStandingName = (name: string): boolean => standingCladeNames.some((known) => known === name);

/** The classification in memory: nodes by address, by path and by former address. */
export interface Taxonomy {
  nodes: readonly TaxonNode[];
  bySlug: (slug: string) => TaxonNode | null;
  byPath: (path: string) => TaxonNode | null;
  /** Node that a slug leads to, also by a synonym; `from` is the slug asked for where it was one. */
  resolve: (slug: string) => { node: TaxonNode; from: string | null } | null;
  synonymsOf: (taxonId: string) => string[];
  /** Nodes of a lineage from the root down; a name without a node is left out. */
  ancestors: (lineage: readonly string[]) => TaxonNode[];
  /** The lowest clade of a lineage with standing fits, else its order, else its lowest node: for colours and lists. */
  cladeOf: (lineage: readonly string[]) => CladeName;
  orderOf: (lineage: readonly string[]) => string;
  /** Nodes with standing fits, in the order in which the register lists them. */
  standing: readonly TaxonNode[];
}

/** Whether a lineage (names from the root to the parent) lies below a node or is the node's own. */
export function liesIn(lineage: readonly string[], clade: { path: string }, species?: string): boolean {
  const path = pathOf(species === undefined ? lineage : [...lineage, species]);
  return path === clade.path || path.startsWith(`${clade.path} > `);
}

/**
 * Builds the classification from its rows.
 * @param nodes accepted nodes with their paths
 * @param synonyms former and alternative names with the taxon that they lead on to
 */
export function buildTaxonomy(nodes: readonly TaxonNode[], synonyms: readonly { taxonId: string; name: string; slug: string }[]): Taxonomy {
  const slugs = new Map(nodes.map((node) => [node.slug, node]));
  const paths = new Map(nodes.map((node) => [node.path, node]));
  const ids = new Map(nodes.map((node) => [node.id, node]));
  const former = new Map(synonyms.map(({ slug, taxonId }) => [slug, taxonId]));
  const names = new Map<string, string[]>();
  for (const { taxonId, name } of synonyms) names.set(taxonId, [...(names.get(taxonId) ?? []), name]);
  const ancestors = (lineage: readonly string[]) =>
    lineage.flatMap((_, index) => {
      const node = paths.get(pathOf(lineage.slice(0, index + 1)));
      return node === undefined ? [] : [node];
    });
  const orderNode = (lineage: readonly string[]) => ancestors(lineage).findLast((node) => node.rank === 'order') ?? null;
  return {
    nodes,
    bySlug: (slug) => slugs.get(slug) ?? null,
    byPath: (path) => paths.get(path) ?? null,
    resolve(slug) {
      const node = slugs.get(slug);
      if (node !== undefined) return { node, from: null };
      const taxonId = former.get(slug);
      const led = taxonId === undefined ? undefined : ids.get(taxonId);
      return led === undefined ? null : { node: led, from: slug };
    },
    synonymsOf: (taxonId) => names.get(taxonId) ?? [],
    ancestors,
    cladeOf(lineage) {
      const known = ancestors(lineage);
      const node = known.findLast(({ name }) => isStandingName(name)) ?? orderNode(lineage) ?? known.at(-1);
      return node === undefined ? { slug: 'unplaced', name: lineage.at(-1) ?? 'unplaced' } : { slug: node.slug, name: node.name };
    },
    orderOf: (lineage) => orderNode(lineage)?.name ?? lineage.at(-1) ?? '',
    standing: standingCladeNames.flatMap((name) => nodes.filter((node) => node.name === name && node.rank !== 'species')),
  };
}

/** Reads the classification as it stands now. */
export async function loadTaxonomy(db: Queryable): Promise<Taxonomy> {
  return buildTaxonomy(await findTaxonNodes(db), await findSynonyms(db));
}
