import { and, eq, inArray } from 'drizzle-orm';
import type { Queryable } from '../client';
import { delineationCriteria, records, setAsides, sources, structureDefinitions, structures, submissions, taxa, taxonIdentifiers, taxonSynonyms, users } from '../schema/index';

/** The named actor that loads published tables; it has no password and cannot sign in. */
export const systemActorName = 'Register loader (system)';
const systemActorAddress = 'register-loader@system.invalid';

export async function findOrMakeSystemActor(db: Queryable): Promise<{ id: string; name: string; email: string }> {
  await db.insert(users).values({ name: systemActorName, email: systemActorAddress, kind: 'system' }).onConflictDoNothing();
  const [row] = await db.select({ id: users.id, name: users.name, email: users.email }).from(users).where(eq(users.email, systemActorAddress));
  if (row === undefined) throw new Error('The system actor was not written.');
  return row;
}

export interface NewTaxon {
  parentId: string | null;
  rank: string;
  name: string;
  slug: string;
  path: string;
  commonNames: string[];
  authority: string;
  named: boolean;
}

/** Writes the nodes that are not there yet and answers the id of every path given. */
export async function putTaxa(db: Queryable, nodes: readonly NewTaxon[]): Promise<Map<string, string>> {
  if (nodes.length === 0) return new Map();
  await db.insert(taxa).values([...nodes]).onConflictDoNothing({ target: taxa.path });
  const rows = await db.select({ id: taxa.id, path: taxa.path }).from(taxa).where(inArray(taxa.path, nodes.map((node) => node.path)));
  return new Map(rows.map((row) => [row.path, row.id]));
}

export async function putSynonyms(db: Queryable, synonyms: readonly { taxonId: string; name: string; slug: string; reason: string }[]): Promise<void> {
  if (synonyms.length > 0) await db.insert(taxonSynonyms).values([...synonyms]).onConflictDoNothing({ target: taxonSynonyms.slug });
}

export async function putIdentifiers(db: Queryable, identifiers: readonly { taxonId: string; authority: string; identifier: string }[]): Promise<void> {
  if (identifiers.length > 0) await db.insert(taxonIdentifiers).values([...identifiers]).onConflictDoNothing();
}

export interface NewStructure {
  key: string;
  name: string;
  parentId: string | null;
  animalClass: string | null;
  midline: boolean;
  byComplement: boolean;
  position: number;
}

export interface NewDefinition {
  version: number;
  includes: string[];
  excludes: string[];
  note: string;
  uberonId: string | null;
  uberonMatch: string | null;
}

/** Writes a structure and its definition where they are not there yet; answers the structure's id. */
export async function putStructure(db: Queryable, structure: NewStructure, definition: NewDefinition): Promise<string> {
  await db.insert(structures).values(structure).onConflictDoNothing({ target: structures.key });
  const [row] = await db.select({ id: structures.id }).from(structures).where(eq(structures.key, structure.key));
  if (row === undefined) throw new Error(`The structure ${structure.key} was not written.`);
  await db.insert(structureDefinitions).values({ ...definition, structureId: row.id }).onConflictDoNothing();
  return row.id;
}

export async function putCriteria(db: Queryable, criteria: readonly { key: string; name: string; note: string; position: number }[]): Promise<void> {
  await db.insert(delineationCriteria).values([...criteria]).onConflictDoNothing();
}

/** Notes from where the values of a publication were read, where the source says nothing of it yet. */
export async function putCarrier(db: Queryable, doi: string, carrier: string, licence: string): Promise<void> {
  await db.update(sources).set({ carrier, licence }).where(and(eq(sources.doi, doi), eq(sources.carrier, '')));
}

/** Keys of the sources whose values the system actor has already loaded. */
export async function findLoadedSourceKeys(db: Queryable): Promise<Set<string>> {
  const rows = await db
    .selectDistinct({ key: sources.key })
    .from(records)
    .innerJoin(sources, eq(sources.id, records.sourceId))
    .innerJoin(submissions, eq(submissions.id, records.submissionId))
    .innerJoin(users, and(eq(users.id, submissions.createdBy), eq(users.kind, 'system')));
  return new Set(rows.map((row) => row.key));
}

/** Serial number of the record that a source holds of a taxon's structure, and whether it was ever set aside. */
export async function findRecordOf(db: Queryable, where: { taxonSlug: string; structure: string; sourceKey: string }): Promise<{ number: number; everSetAside: boolean } | null> {
  const [row] = await db
    .select({ id: records.id, number: records.number })
    .from(records)
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .innerJoin(sources, eq(sources.id, records.sourceId))
    .where(and(eq(taxa.slug, where.taxonSlug), eq(structures.key, where.structure), eq(sources.key, where.sourceKey)));
  if (row === undefined) return null;
  return { number: row.number, everSetAside: (await db.$count(setAsides, eq(setAsides.recordId, row.id))) > 0 };
}
