import { and, asc, desc, eq, inArray, isNull, lt, ne, or } from 'drizzle-orm';
import type { SetAsideScope } from '../../shared/contracts/records';
import type { Queryable, Transaction } from '../client';
import { records, rechecks, setAsides, structures, taxa, users } from '../schema/index';

const recordColumns = { id: records.id, number: records.number, labId: records.labId, withdrawnAt: records.withdrawnAt, species: taxa.name, structure: structures.key };

/** A record by its serial number with what a set-aside needs of it. */
export async function findRecordToSetAside(db: Queryable, serial: number) {
  const [row] = await db
    .select(recordColumns)
    .from(records)
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .where(eq(records.number, serial));
  return row ?? null;
}

const viewColumns = {
  id: setAsides.id,
  recordId: setAsides.recordId,
  number: records.number,
  labId: records.labId,
  species: taxa.name,
  structure: structures.key,
  scope: setAsides.scope,
  reason: setAsides.reason,
  by: users.name,
  at: setAsides.createdAt,
  liftedAt: setAsides.liftedAt,
};

const selectSetAsides = (db: Queryable) =>
  db
    .select(viewColumns)
    .from(setAsides)
    .innerJoin(records, eq(records.id, setAsides.recordId))
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .innerJoin(users, eq(users.id, setAsides.decidedBy));
export type SetAsideRow = Awaited<ReturnType<typeof selectSetAsides>>[number];

export async function findSetAside(db: Queryable, id: string): Promise<SetAsideRow | null> {
  const [row] = await selectSetAsides(db).where(eq(setAsides.id, id));
  return row ?? null;
}

/** Set-asides, lifted ones too, newest first, after the given place. */
export function findSetAsides(db: Queryable, before: { at: Date; id: string } | null, limit: number): Promise<SetAsideRow[]> {
  return selectSetAsides(db)
    .where(before === null ? undefined : or(lt(setAsides.createdAt, before.at), and(eq(setAsides.createdAt, before.at), lt(setAsides.id, before.id))))
    .orderBy(desc(setAsides.createdAt), desc(setAsides.id))
    .limit(limit);
}

/** Set-asides in force of one record. Locks the record, so that the same one is not written twice at once. */
export async function lockSetAsidesOf(tx: Transaction, recordId: string): Promise<{ id: string; scope: SetAsideScope }[]> {
  await tx.select({ id: records.id }).from(records).where(eq(records.id, recordId)).for('update');
  return tx.select({ id: setAsides.id, scope: setAsides.scope }).from(setAsides).where(and(eq(setAsides.recordId, recordId), isNull(setAsides.liftedAt)));
}

export async function insertSetAside(tx: Transaction, values: { recordId: string; scope: SetAsideScope; reason: string; decidedBy: string; createdAt: Date }): Promise<string> {
  const [row] = await tx.insert(setAsides).values(values).returning({ id: setAsides.id });
  if (row === undefined) throw new Error('The set-aside was not written.');
  return row.id;
}

/** Lifts a set-aside that is in force; false where somebody did so already. */
export async function liftSetAsideRow(tx: Transaction, id: string, by: { liftedBy: string; liftedReason: string; liftedAt: Date }): Promise<boolean> {
  const rows = await tx.update(setAsides).set(by).where(and(eq(setAsides.id, id), isNull(setAsides.liftedAt))).returning({ id: setAsides.id });
  return rows.length > 0;
}

export async function findStructureKeys(db: Queryable, keys: readonly string[]): Promise<Set<string>> {
  if (keys.length === 0) return new Set();
  const rows = await db.select({ key: structures.key }).from(structures).where(inArray(structures.key, [...keys]));
  return new Set(rows.map((row) => row.key));
}

/** Re-checks that are not closed, oldest first. */
export function findOpenRechecks(db: Queryable) {
  return db
    .select({ id: rechecks.id, number: records.number, species: taxa.name, structure: structures.key, status: rechecks.status, at: rechecks.createdAt })
    .from(rechecks)
    .innerJoin(records, eq(records.id, rechecks.recordId))
    .innerJoin(taxa, eq(taxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .where(ne(rechecks.status, 'closed'))
    .orderBy(asc(rechecks.createdAt), asc(rechecks.id));
}
