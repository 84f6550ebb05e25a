import { and, asc, desc, eq, inArray, isNull, lte, notExists, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { FlagKind, FitMethod, Variable } from '../../shared/contracts/vocabulary';
import type { Queryable, Transaction } from '../client';
import { fitResults, fitRuns, flags, recordRevisions, records, standingFits, structures, taxa, versions } from '../schema/index';

export interface StandingFitRow {
  id: string;
  slug: string;
  y: Variable;
  yStructure: string | null;
  x: Variable;
  xStructure: string | null;
  method: FitMethod;
  cladeId: string;
  cladeSlug: string;
  cladeName: string;
  cladePath: string;
}

const definitionColumns = {
  id: standingFits.id,
  slug: standingFits.slug,
  y: standingFits.y,
  yStructure: standingFits.yStructure,
  x: standingFits.x,
  xStructure: standingFits.xStructure,
  method: standingFits.method,
  cladeId: standingFits.cladeId,
  cladeSlug: taxa.slug,
  cladeName: taxa.name,
  cladePath: taxa.path,
};

/** The questions that the register keeps answering, in order of their address. */
export async function findStandingFits(db: Queryable): Promise<StandingFitRow[]> {
  return db.select(definitionColumns).from(standingFits).innerJoin(taxa, eq(taxa.id, standingFits.cladeId)).where(eq(standingFits.active, true)).orderBy(asc(standingFits.slug));
}

export async function insertStandingFits(tx: Transaction, values: readonly (typeof standingFits.$inferInsert)[]): Promise<void> {
  if (values.length > 0) await tx.insert(standingFits).values([...values]).onConflictDoNothing({ target: standingFits.slug });
}

/** Asks for a computation; the row without `finishedAt` is the request. */
export async function insertFitRun(tx: Transaction, run: { set: 'working' | 'version'; versionId: string | null; reason: string; touches: readonly string[]; createdAt?: Date }): Promise<string> {
  const [row] = await tx.insert(fitRuns).values({ ...run, touches: [...run.touches] }).returning({ id: fitRuns.id });
  if (row === undefined) throw new Error('The request for a computation was not written.');
  return row.id;
}

/** Held until the transaction ends by the one computation of the working set that may run. */
export async function lockFitRefresh(tx: Transaction): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtext('allokarya fits of the working set'))`);
}

/** Locks a run, so that two workers do not store it twice. */
export async function lockFitRun(tx: Transaction, runId: string) {
  const [row] = await tx.select().from(fitRuns).where(eq(fitRuns.id, runId)).for('update');
  return row ?? null;
}

/** Requests for the working set that nobody has worked on yet, oldest first. */
export async function findUnfinishedFitRuns(db: Queryable, limit: number): Promise<string[]> {
  const rows = await db
    .select({ id: fitRuns.id })
    .from(fitRuns)
    .where(and(eq(fitRuns.set, 'working'), isNull(fitRuns.finishedAt)))
    .orderBy(asc(fitRuns.createdAt))
    .limit(limit);
  return rows.map((row) => row.id);
}

/** Records whose embargo has ended and that no computation of the working set has looked at since. */
export async function findRecordsOutOfEmbargo(db: Queryable, today: string): Promise<string[]> {
  const since = db
    .select({ one: sql`1` })
    .from(fitRuns)
    .where(and(eq(fitRuns.set, 'working'), sql`(${fitRuns.createdAt} at time zone 'UTC')::date >= ${recordRevisions.embargoUntil}`));
  const rows = await db
    .selectDistinct({ recordId: recordRevisions.recordId })
    .from(recordRevisions)
    .where(and(lte(recordRevisions.embargoUntil, today), notExists(since)));
  return rows.map((row) => row.recordId);
}

export async function finishFitRun(tx: Transaction, runId: string, at: Date): Promise<void> {
  await tx.update(fitRuns).set({ finishedAt: at }).where(eq(fitRuns.id, runId));
}

/** Takes the mark `latest` from the working results of these fits, before newer ones are stored. */
export async function retireLatest(tx: Transaction, standingFitIds: readonly string[]): Promise<void> {
  if (standingFitIds.length === 0) return;
  await tx
    .update(fitResults)
    .set({ latest: false })
    .where(and(eq(fitResults.latest, true), inArray(fitResults.standingFitId, [...standingFitIds])));
}

export async function insertFitResults(tx: Transaction, values: readonly (typeof fitResults.$inferInsert)[]): Promise<{ id: string; standingFitId: string }[]> {
  if (values.length === 0) return [];
  return tx.insert(fitResults).values([...values]).returning({ id: fitResults.id, standingFitId: fitResults.standingFitId });
}

export async function insertFlags(tx: Transaction, values: readonly (typeof flags.$inferInsert)[]): Promise<void> {
  if (values.length > 0) await tx.insert(flags).values([...values]);
}

const storedColumns = { ...definitionColumns, inputs: fitResults.inputs, exclusions: fitResults.exclusions, result: fitResults.result };

/** Standing fits as frozen with one version. */
export async function findVersionFits(db: Queryable, number: number) {
  return db
    .select(storedColumns)
    .from(fitResults)
    .innerJoin(standingFits, eq(standingFits.id, fitResults.standingFitId))
    .innerJoin(taxa, eq(taxa.id, standingFits.cladeId))
    .innerJoin(versions, eq(versions.id, fitResults.versionId))
    .where(eq(versions.number, number))
    .orderBy(asc(standingFits.slug));
}

/** Standing fits of the working set, each by its newest computation. */
export async function findLatestWorkingFits(db: Queryable) {
  return db
    .select(storedColumns)
    .from(fitResults)
    .innerJoin(standingFits, eq(standingFits.id, fitResults.standingFitId))
    .innerJoin(taxa, eq(taxa.id, standingFits.cladeId))
    .where(and(eq(fitResults.latest, true), eq(fitResults.set, 'working')))
    .orderBy(asc(standingFits.slug));
}

export type FlagFilter = { recordIds?: readonly string[] } & ({ set: 'version'; version: number } | { set: 'working' });

const speciesTaxa = alias(taxa, 'species_taxa');

/** Flags of one version, or of the newest computation of the working set; newest first. */
export async function findFlags(db: Queryable, filter: FlagFilter) {
  if (filter.recordIds?.length === 0) return [];
  return db
    .select({
      ...definitionColumns,
      id: flags.id,
      kind: sql<Exclude<FlagKind, 'none'>>`${flags.kind}`,
      set: fitResults.set,
      version: versions.number,
      studentised: flags.studentised,
      bonferroniP: flags.bonferroniP,
      reasons: flags.reasons,
      recordId: flags.recordId,
      record: records.number,
      species: speciesTaxa.name,
      structure: structures.key,
      at: flags.createdAt,
    })
    .from(flags)
    .innerJoin(fitResults, eq(fitResults.id, flags.fitResultId))
    .innerJoin(standingFits, eq(standingFits.id, fitResults.standingFitId))
    .innerJoin(taxa, eq(taxa.id, standingFits.cladeId))
    .innerJoin(records, eq(records.id, flags.recordId))
    .innerJoin(speciesTaxa, eq(speciesTaxa.id, records.taxonId))
    .innerJoin(structures, eq(structures.id, records.structureId))
    .leftJoin(versions, eq(versions.id, fitResults.versionId))
    .where(
      and(
        filter.set === 'version' ? eq(versions.number, filter.version) : and(eq(fitResults.set, 'working'), eq(fitResults.latest, true)),
        filter.recordIds === undefined ? undefined : inArray(flags.recordId, [...filter.recordIds]),
      ),
    )
    .orderBy(desc(flags.createdAt), asc(records.number), asc(standingFits.slug));
}
