import { and, eq, inArray, ne, sql } from 'drizzle-orm';
import type { Queryable, Transaction } from '../client';
import { aliquots, literatureValues, neunCounts, samples, sampleSpecimens, specimens, specimenStates, structureEstimates, submissionRevisions } from '../schema/index';

/** An animal of a lab by its code, made where it is new. The taxon of the first entry stands; a later one is in the revision. */
export async function ensureSpecimens(tx: Transaction, labId: string, taxonId: string, codes: readonly string[]): Promise<Map<string, string>> {
  const wanted = [...new Set(codes)];
  if (wanted.length === 0) return new Map();
  await tx.insert(specimens).values(wanted.map((code) => ({ labId, code, taxonId }))).onConflictDoNothing({ target: [specimens.labId, specimens.code] });
  const rows = await tx.select({ id: specimens.id, code: specimens.code }).from(specimens).where(and(eq(specimens.labId, labId), inArray(specimens.code, wanted)));
  return new Map(rows.map((row) => [row.code, row.id]));
}

/** Codes that other submissions of the lab gave to an animal of their own. */
export async function findSpecimenCodes(db: Queryable, labId: string, exceptSubmissionId: string | null): Promise<string[]> {
  const rows = await db
    .selectDistinct({ code: specimens.code })
    .from(specimenStates)
    .innerJoin(specimens, eq(specimens.id, specimenStates.specimenId))
    .innerJoin(submissionRevisions, eq(submissionRevisions.id, specimenStates.revisionId))
    .where(and(eq(specimens.labId, labId), sql`${submissionRevisions.status} not in ('withdrawn', 'declined')`, exceptSubmissionId === null ? undefined : ne(submissionRevisions.submissionId, exceptSubmissionId)));
  return rows.map((row) => row.code);
}

/** Takes the lab's codes in turn, so that two submissions with one code cannot both pass the check. */
export async function lockSpecimenCodes(tx: Transaction, labId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtext(${`specimen-codes:${labId}`}))`);
}

export async function insertSpecimenState(tx: Transaction, values: typeof specimenStates.$inferInsert): Promise<void> {
  await tx.insert(specimenStates).values(values);
}

/** Writes estimates and answers their ids by entry. */
export async function insertStructureEstimates(tx: Transaction, values: (typeof structureEstimates.$inferInsert)[]): Promise<Map<string, string>> {
  if (values.length === 0) return new Map();
  const rows = await tx.insert(structureEstimates).values(values).returning({ id: structureEstimates.id, entryId: structureEstimates.entryId });
  return new Map(rows.map((row) => [row.entryId, row.id]));
}

export interface NewSample {
  sample: typeof samples.$inferInsert;
  specimenIds: readonly string[];
  aliquots: Omit<typeof aliquots.$inferInsert, 'sampleId'>[];
  neun: Omit<typeof neunCounts.$inferInsert, 'sampleId'>[];
}

export async function insertSample(tx: Transaction, { sample, specimenIds, aliquots: loads, neun }: NewSample): Promise<void> {
  const [row] = await tx.insert(samples).values(sample).returning({ id: samples.id });
  const sampleId = row!.id;
  if (specimenIds.length > 0) await tx.insert(sampleSpecimens).values([...new Set(specimenIds)].map((specimenId) => ({ sampleId, specimenId })));
  if (loads.length > 0) await tx.insert(aliquots).values(loads.map((load) => ({ ...load, sampleId })));
  if (neun.length > 0) await tx.insert(neunCounts).values(neun.map((field) => ({ ...field, sampleId })));
}

const valuesAtOnce = 500;

export async function insertLiteratureValues(tx: Transaction, values: (typeof literatureValues.$inferInsert)[]): Promise<void> {
  for (let start = 0; start < values.length; start += valuesAtOnce) await tx.insert(literatureValues).values(values.slice(start, start + valuesAtOnce));
}
