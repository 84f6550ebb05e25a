import { findStandingFits } from '../../../db/queries/fits';
import { findCurrentVersionNumber, findEmbargoedRecords, findNextVersionNumber, findWithdrawnReasons } from '../../../db/queries/versions';
import type { StandingExponent } from '../../../shared/contracts/register';
import type { FreezePreview } from '../../../shared/contracts/versions';
import { recordNumber } from '../../../shared/domain/identifiers';
import { today, type Context } from '../../context';
import { demonstrationSentence, versionTitle } from '../../export/versionFacts';
import { loadFlagViews } from '../dataset/flagViews';
import { fitTitle } from '../dataset/questions';
import { loadVersionRows, loadWorkingRows } from '../dataset/rows';
import { computeStandingFits, type ComputedFit } from '../dataset/standingFits';
import { compareRows } from './changes';
import { loadPreparing } from './readVersions';
import { standingExponents } from './standingExponents';
import { countRows } from './summary';
import { loadVersionResults } from './versionFits';

/** Fits that the version before had and this one would lose. */
const lostFits = (exponents: readonly StandingExponent[]): string[] =>
  exponents.filter((fit) => fit.exponent === null && fit.previous !== null).map((fit) => `${fit.title}: no fit any more. ${fit.unfit ?? ''}`.trim());

/** Outliers that the version before did not flag. */
async function newOutliers(context: Context, current: number | null, fits: readonly ComputedFit[], species: ReadonlyMap<string, string>): Promise<string[]> {
  const known = current === null ? [] : await loadFlagViews(context.db, { set: 'version', version: current });
  const knownKeys = new Set(known.filter(({ kind }) => kind === 'outlier').map(({ fit, record }) => `${fit} ${record}`));
  return fits.flatMap(({ definition, flags }) =>
    flags.flatMap(({ kind, recordId }) => {
      const record = species.get(recordId);
      if (kind !== 'outlier' || record === undefined || knownKeys.has(`${definition.slug} ${record.split(' ')[0] ?? ''}`)) return [];
      return [`New outlier: ${record} in ${fitTitle(definition, definition.cladeName, definition.method)}.`];
    }),
  );
}

/**
 * What a freeze would do now: what comes, changes, goes and waits, how each standing exponent would move, and what a
 * curator should look at first. Nothing is written.
 */
export async function previewFreeze(context: Context): Promise<FreezePreview> {
  const { db } = context;
  const working = await loadWorkingRows(db, { today: today(context) });
  const rows = working.map(({ row }) => row);
  const current = await findCurrentVersionNumber(db);
  const before = current === null ? [] : await loadVersionRows(db, current);
  const standing = new Set(working.map(({ recordId }) => recordId));
  const gone = before.filter(({ recordId }) => !standing.has(recordId));
  const reasons = await findWithdrawnReasons(db, gone.map(({ recordId }) => recordId));
  const whyGone = new Map(gone.flatMap(({ recordId, row }) => (reasons.has(recordId) ? [[row.number, reasons.get(recordId) ?? ''] as const] : [])));
  const fits = computeStandingFits(working, await findStandingFits(db));
  const exponents = standingExponents(fits, await loadVersionResults(db, current));
  const label = String(await findNextVersionNumber(db));
  const underWay = await loadPreparing(context);
  const demonstration = rows.some((row) => row.demonstration);
  const openRechecks = rows.filter((row) => row.openRecheck).map(({ number, species, structure }) => ({ number, species, structure }));
  const counts = countRows(rows);
  const species = new Map(working.map(({ recordId, row }) => [recordId, `${row.number} ${row.species}`]));
  return {
    label: underWay?.label ?? label,
    title: versionTitle(underWay?.label ?? label, demonstration),
    demonstration,
    records: counts.records,
    species: counts.species,
    changes: compareRows(current === null ? null : { label: String(current), rows: before.map(({ row }) => row) }, rows, whyGone),
    embargoed: (await findEmbargoedRecords(db, today(context))).map(({ number, ...rest }) => ({ number: recordNumber(number), ...rest })),
    openRechecks,
    exponents,
    warnings: [
      ...(demonstration ? [demonstrationSentence] : []),
      ...(openRechecks.length === 0 ? [] : [`${openRechecks.length === 1 ? 'One record comes' : `${openRechecks.length} records come`} with an open re-check and will be marked so.`]),
      ...lostFits(exponents),
      ...(await newOutliers(context, current, fits, species)),
    ],
    underWay,
  };
}
