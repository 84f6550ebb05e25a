import type { Transaction } from '../../../db/client';
import { findRecordsOutOfEmbargo, findUnfinishedFitRuns, finishFitRun, insertFitRun, lockFitRefresh, lockFitRun, retireLatest } from '../../../db/queries/fits';
import { today, type Context } from '../../context';
import { loadWorkingRows, type DatasetRow } from './rows';
import { computeStandingFits, ensureStandingFits, storeStandingFits, type FitDefinition } from './standingFits';
import { liesIn } from './taxonomy';

/**
 * Asks, inside the transaction of the act that changes records, for a computation of the working set's standing fits.
 * @param recordIds records whose change asks for it; none asks for every standing fit
 * @param reason what happened, in words
 * @returns id of the run, to be handed to the queue after the commit (`enqueue('refresh-fits', {runId}, runId)`)
 */
export async function requestFitRefresh(tx: Transaction, recordIds: readonly string[], reason: string): Promise<string> {
  return insertFitRun(tx, { set: 'working', versionId: null, reason, touches: recordIds });
}

/** Definitions whose fit a change of these records can move; all of them where a record is no longer in the set. */
function touchedDefinitions(rows: readonly DatasetRow[], definitions: readonly FitDefinition[], touches: readonly string[]): readonly FitDefinition[] {
  const touched = new Set(touches);
  const changed = rows.filter(({ recordId }) => touched.has(recordId));
  if (touched.size === 0 || changed.length < touched.size) return definitions;
  return definitions.filter(({ yStructure, xStructure, cladePath }) =>
    changed.some(({ row }) => (row.structure === yStructure || row.structure === xStructure) && liesIn(row.lineage, { path: cladePath })),
  );
}

/**
 * The job: computes the standing fits that a run touches over the working set as it is now and stores results and
 * flags. Safe to run twice: a finished run is left as it is.
 * @param runId the request
 */
export async function runFitRefresh(context: Context, runId: string): Promise<void> {
  await context.db.transaction(async (tx) => {
    // One computation at a time, so that results of older rows are never stored over newer ones.
    await lockFitRefresh(tx);
    const run = await lockFitRun(tx, runId);
    if (run === null || run.finishedAt !== null || run.set !== 'working') return;
    const rows = await loadWorkingRows(tx, { today: today(context) });
    const definitions = await ensureStandingFits(tx, rows);
    const touched = touchedDefinitions(rows, definitions, run.touches);
    const computed = computeStandingFits(rows, touched);
    context.killPoint('fits:computed');
    await retireLatest(tx, touched.map(({ id }) => id));
    await storeStandingFits(tx, runId, computed, { set: 'working' });
    context.killPoint('fits:stored');
    await finishFitRun(tx, runId, context.clock());
  });
}

/**
 * Finds the computations that nobody has handed to the queue: what a crash left behind, and records that came out of
 * embargo by the passing of a day, which no act of a person announces.
 * @returns ids of the runs to be worked on
 */
export async function findFitRunsToDo(context: Context): Promise<string[]> {
  const { db } = context;
  const freed = await findRecordsOutOfEmbargo(db, today(context));
  if (freed.length > 0) {
    await db.transaction((tx) => insertFitRun(tx, { set: 'working', versionId: null, reason: 'embargo ended', touches: freed, createdAt: context.clock() }));
  }
  return findUnfinishedFitRuns(db, 200);
}
