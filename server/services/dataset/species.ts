import { z } from 'zod';
import { findStructureNames } from '../../../db/queries/species';
import type { RecordRow } from '../../../shared/contracts/records';
import type { SpeciesItem, SpeciesPage, speciesQuerySchema } from '../../../shared/contracts/register';
import type { Context } from '../../context';
import { AppError, notFound } from '../../errors';
import { entityTag } from '../../frozenAnswer';
import { decodeCursor, encodeCursor } from '../../paging';
import { loadFlagViews } from './flagViews';
import { placeRecord, type PlaceFound } from './places';
import { requirePublished } from './publishedData';
import type { DatasetRow } from './rows';
import { speciesMean, structureMean } from './structureMeans';
import { liesIn, loadTaxonomy, type Taxonomy } from './taxonomy';

type SpeciesQuery = z.infer<typeof speciesQuerySchema>;
const cursorSchema = z.object({ version: z.string(), from: z.number().int().min(0) });
/** Structures that are a brain's mass, the most telling first; masses of two of them are never pooled. */
const brains = ['whole_brain', 'whole_brain_without_olfactory_bulb', 'brain_not_specified'] as const;

function bySpecies(rows: readonly DatasetRow[]): Map<string, RecordRow[]> {
  const found = new Map<string, RecordRow[]>();
  for (const { row } of rows) found.set(row.taxonSlug, [...(found.get(row.taxonSlug) ?? []), row]);
  return found;
}

function meanOf(rows: readonly DatasetRow[], own: readonly RecordRow[], structure: string, variable: 'structureMassG' | 'bodyMassG' | 'neurons'): number | null {
  const held = own.filter((row) => row.structure === structure && row[variable] !== null);
  const [first] = held;
  if (first === undefined) return null;
  return held.length === 1 ? first[variable] : (speciesMean(rows, first.taxonSlug, structure, variable)?.y ?? null);
}

function toItem(rows: readonly DatasetRow[], own: readonly RecordRow[], first: RecordRow, taxonomy: Taxonomy, flagged: ReadonlySet<string>): SpeciesItem {
  const clade = taxonomy.cladeOf(first.lineage);
  const brain = brains.find((key) => meanOf(rows, own, key, 'structureMassG') !== null);
  const bodyFrom = [...brains, ...own.map((row) => row.structure)].find((key) => meanOf(rows, own, key, 'bodyMassG') !== null);
  return {
    slug: first.taxonSlug,
    species: first.species,
    commonNames: taxonomy.bySlug(first.taxonSlug)?.commonNames ?? [],
    clade: clade.slug,
    cladeName: clade.name,
    order: taxonomy.orderOf(first.lineage),
    records: own.length,
    structures: [...new Set(own.map((row) => row.structure))],
    brainMassG: brain === undefined ? null : meanOf(rows, own, brain, 'structureMassG'),
    bodyMassG: bodyFrom === undefined ? null : meanOf(rows, own, bodyFrom, 'bodyMassG'),
    cortexNeurons: meanOf(rows, own, 'cerebral_cortex', 'neurons'),
    flagged: own.some((row) => flagged.has(row.number)),
    demonstration: own.some((row) => row.demonstration),
  };
}

const sortValues: Record<string, (item: SpeciesItem) => number | null> = { records: (item) => item.records, neurons: (item) => item.cortexNeurons, mass: (item) => item.brainMassG };

/** By name, or by a number with what has none last, whichever way the list runs. */
function sortItems(items: readonly SpeciesItem[], sort: SpeciesQuery['sort']): SpeciesItem[] {
  const down = sort.startsWith('-');
  const value = sortValues[sort.replace('-', '')];
  const byName = (a: SpeciesItem, b: SpeciesItem) => (a.species < b.species ? -1 : a.species > b.species ? 1 : 0);
  return [...items].sort((a, b) => {
    if (value === undefined) return down ? byName(b, a) : byName(a, b);
    const [left, right] = [value(a), value(b)];
    if (left === null || right === null) return Number(left === null) - Number(right === null) || byName(a, b);
    return (down ? right - left : left - right) || byName(a, b);
  });
}

function isNamedLike(item: SpeciesItem, taxonomy: Taxonomy, query: string): boolean {
  const wanted = query.trim().toLowerCase();
  if (wanted === '') return true;
  const node = taxonomy.bySlug(item.slug);
  const names = [item.species, ...item.commonNames, ...(node === null ? [] : taxonomy.synonymsOf(node.id))];
  return names.some((name) => name.toLowerCase().includes(wanted));
}

/**
 * Species of a frozen version that match a query.
 * @returns one page; the cursor keeps to the version it began with
 * @throws not-found for an unknown version, invalid-input for an unknown clade, structure or cursor
 */
export async function listSpecies(context: Context, query: SpeciesQuery): Promise<{ page: { items: SpeciesItem[]; nextCursor: string | null }; tag: string; explicit: boolean }> {
  const cursor = query.cursor === undefined ? null : decodeCursor(query.cursor, cursorSchema);
  const published = await requirePublished(context, query.version ?? cursor?.version);
  const taxonomy = await loadTaxonomy(context.db);
  const clade = query.clade === undefined ? null : (taxonomy.resolve(query.clade)?.node ?? null);
  const structureKeys = new Set((await findStructureNames(context.db)).map(({ key }) => key));
  const errors = [
    ...(query.clade !== undefined && clade === null ? [{ path: 'clade', message: `Expected is the address of a clade, such as primates; found "${query.clade}"` }] : []),
    ...(query.structure !== undefined && !structureKeys.has(query.structure) ? [{ path: 'structure', message: `Expected is the key of a structure, such as cerebral_cortex; found "${query.structure}"` }] : []),
  ];
  if (errors.length > 0) throw new AppError('invalid-input', 'The list cannot be filtered in this way.', { errors });
  const flagged = new Set((await loadFlagViews(context.db, { set: 'version', version: published.version.number })).map(({ record }) => record));
  const items = [...bySpecies(published.rows).values()].flatMap((own) => {
    const [first] = own;
    if (first === undefined || (clade !== null && !liesIn(first.lineage, clade, first.species))) return [];
    if (query.structure !== undefined && !own.some((row) => row.structure === query.structure)) return [];
    const item = toItem(published.rows, own, first, taxonomy, flagged);
    return isNamedLike(item, taxonomy, query.query) ? [item] : [];
  });
  const from = cursor?.from ?? 0;
  const sorted = sortItems(items, query.sort);
  const next = from + query.limit;
  const page = { items: sorted.slice(from, next), nextCursor: next < sorted.length ? encodeCursor({ version: published.label, from: next }) : null };
  return { page, tag: entityTag(page), explicit: published.explicit };
}

function placeOf(rows: readonly DatasetRow[], first: RecordRow, mean: SpeciesPage['structures'][number]['mean'], own: readonly RecordRow[]): PlaceFound {
  const animals = new Set(own.map((row) => `${row.sourceKey} ${row.specimen ?? row.number}`));
  return placeRecord(rows, {
    taxonSlug: first.taxonSlug,
    lineage: first.lineage,
    structure: first.structure,
    definitionVersion: first.definitionVersion,
    structureMassG: mean.structureMassG,
    neurons: mean.neurons,
    bodyMassG: mean.bodyMassG,
    isSingleSpecimen: animals.size === 1 && first.kind === 'specimen' && first.pooledWith.length === 0,
  });
}

/**
 * The page of one species in a frozen version. A former name leads on to the species and says so in `from`.
 * @throws not-found for a species of which this version holds no record
 */
export async function describeSpecies(context: Context, slug: string, label: string | undefined): Promise<{ answer: SpeciesPage; tag: string; explicit: boolean }> {
  const published = await requirePublished(context, label);
  const taxonomy = await loadTaxonomy(context.db);
  const led = taxonomy.resolve(slug);
  const own = published.rows.flatMap(({ row }) => (row.taxonSlug === (led?.node.slug ?? slug) ? [row] : []));
  const [first] = own;
  if (first === undefined) throw notFound('This species');
  const { rows } = published;
  const recordIds = rows.flatMap(({ recordId, row }) => (row.taxonSlug === first.taxonSlug ? [recordId] : []));
  const clade = taxonomy.cladeOf(first.lineage);
  const structures = (await findStructureNames(context.db)).flatMap(({ key, name }) => {
    const records = own.filter((row) => row.structure === key);
    const [one] = records;
    if (one === undefined) return [];
    const mean = structureMean(rows, records);
    return [{ key, name, mean, ...placeOf(rows, one, mean, records), records }];
  });
  const sources = new Map(own.map((row) => [row.sourceKey, { key: row.sourceKey, citation: row.sourceCitation, doi: row.sourceDoi, year: row.sourceYear }]));
  const answer: SpeciesPage = {
    version: published.label,
    slug: first.taxonSlug,
    from: led?.from ?? null,
    species: first.species,
    commonNames: led?.node.commonNames ?? [],
    synonyms: led === null ? [] : taxonomy.synonymsOf(led.node.id),
    lineage: taxonomy.ancestors(first.lineage).map(({ name, slug: address }) => ({ name, slug: address })),
    clade: clade.slug,
    cladeName: clade.name,
    named: first.named,
    demonstration: own.some((row) => row.demonstration),
    structures,
    flags: await loadFlagViews(context.db, { set: 'version', version: published.version.number, recordIds }),
    sources: [...sources.values()],
  };
  return { answer, tag: entityTag(answer), explicit: published.explicit };
}
