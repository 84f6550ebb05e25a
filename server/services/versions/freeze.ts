import type { Transaction } from '../../../db/client';
import { insertAudit } from '../../../db/queries/audit';
import { findCurrentVersionNumber, findNextVersionNumber, findPreparingVersion, findVersionById, insertVersion, insertVersionEvent } from '../../../db/queries/versions';
import { today, type Actor, type Context } from '../../context';
import { AppError, postgresError } from '../../errors';
import { versionTitle } from '../../export/versionFacts';
import { loadVersionRows, loadWorkingRows } from '../dataset/rows';
import { sameRows } from './changes';
import { storeFiles, storeFits, storeRows, switchCurrent } from './freezeSteps';
import { askForAgreement, hasAgreement } from './agreement';

export interface FreezeRequest {
  /** The number that the curator was shown and typed to confirm. */
  label: string;
  note: string;
}

/** The refusal of a second freeze: which version, who and since when. */
async function underWay(context: Context): Promise<AppError> {
  const preparing = await findPreparingVersion(context.db);
  if (preparing === null) return new AppError('freeze-under-way', 'A version was being frozen at this moment. Look at it first, then try again.');
  const since = preparing.createdAt.toISOString();
  const label = String(preparing.number);
  return new AppError('freeze-under-way', `${preparing.startedBy} has been freezing version ${label} since ${since}.`, { extra: { underWay: { label, by: preparing.startedBy, since } } });
}

async function refuseNothing(context: Context, tx: Transaction): Promise<void> {
  const working = (await loadWorkingRows(tx, { today: today(context) })).map(({ row }) => row);
  const current = await findCurrentVersionNumber(tx);
  const frozen = current === null ? [] : (await loadVersionRows(tx, current)).map(({ row }) => row);
  if (!sameRows(working, frozen)) return;
  throw new AppError('nothing-to-freeze', current === null ? 'The register holds no approved record yet.' : `Every record stands in version ${current} as it is.`);
}

/**
 * Begins a version: writes it as being prepared and hands the work to the queue. Where the setting asks for a second
 * agreement, the work begins with it.
 * @param request its label must be the next number
 * @returns id of the version
 * @throws freeze-under-way naming who and since when · invalid-input for another label · nothing-to-freeze
 */
export async function startFreeze(context: Context, actor: Actor, request: FreezeRequest): Promise<string> {
  if ((await findPreparingVersion(context.db)) !== null) throw await underWay(context);
  const begin = async (tx: Transaction): Promise<string> => {
    const number = await findNextVersionNumber(tx);
    if (request.label !== String(number)) {
      throw new AppError('invalid-input', `The next version is ${number}.`, { errors: [{ path: 'label', message: `Type ${number} to freeze version ${number}; found "${request.label}"` }] });
    }
    await refuseNothing(context, tx);
    const createdAt = context.clock();
    const versionId = await insertVersion(tx, { number, title: versionTitle(request.label, false), note: request.note, startedBy: actor.id, createdAt });
    await insertVersionEvent(tx, { versionId, step: 'started', detail: '', actorId: actor.id, createdAt });
    await insertAudit(tx, { actorId: actor.id, action: 'freeze-started', targetType: 'version', targetId: request.label, detail: { note: request.note } });
    return versionId;
  };
  const versionId = await context.db.transaction(begin).catch(async (error: unknown) => {
    throw postgresError(error)?.code === '23505' ? await underWay(context) : error;
  });
  await askForAgreement(context, versionId, actor, request.label);
  await context.jobs.enqueue('freeze-version', { versionId }, versionId);
  return versionId;
}

/**
 * The job: takes the steps of a freeze that are still to be taken (rows, fits, files, switch). Each step is one
 * transaction with its event, so that a killed worker's job, taken up again, ends with the same bytes.
 * @param versionId a version being prepared; one that is frozen is left as it is
 */
export async function runFreeze(context: Context, versionId: string): Promise<void> {
  const version = await findVersionById(context.db, versionId);
  if (version === null || version.status === 'frozen') return;
  if (!(await hasAgreement(context, version))) return;
  await storeRows(context, version);
  context.killPoint('freeze:rows-written');
  await storeFits(context, version);
  context.killPoint('freeze:fits-written');
  await storeFiles(context, version);
  context.killPoint('freeze:before-switch');
  await switchCurrent(context, version);
}

/** Begins a version and takes all its steps before answering: the first content's version, and tests. */
export async function freezeNow(context: Context, actor: Actor, request: FreezeRequest): Promise<string> {
  const versionId = await startFreeze(context, actor, request);
  await runFreeze(context, versionId);
  return versionId;
}
