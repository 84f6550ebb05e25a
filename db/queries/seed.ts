import { and, eq, inArray, sql } from 'drizzle-orm';
import type { Queryable } from '../client';
import { delineationCriteria, oneTimeLinks, sources, structureDefinitions, structures, taxa, taxonIdentifiers, taxonSynonyms, userRoles, users } from '../schema/index';

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

export async function hasAdministrator(db: Queryable): Promise<boolean> {
  return (await db.$count(userRoles, eq(userRoles.role, 'administrator'))) > 0;
}

export async function insertOneTimeLink(db: Queryable, link: { tokenHash: string; purpose: string; expiresAt: Date }): Promise<void> {
  // An earlier link of the same purpose that nobody used ends with the new one.
  await db.update(oneTimeLinks).set({ expiresAt: sql`least(${oneTimeLinks.expiresAt}, now())` }).where(eq(oneTimeLinks.purpose, link.purpose));
  await db.insert(oneTimeLinks).values(link);
}
