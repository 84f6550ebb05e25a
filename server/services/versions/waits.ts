import { findOpenRechecks } from '../../../db/queries/setAsides';
import { countProposedTaxa, findCurrentVersionNumber } from '../../../db/queries/versions';
import type { Waits } from '../../../shared/contracts/versions';
import { recordNumber } from '../../../shared/domain/identifiers';
import { today, type Context } from '../../context';
import { loadFlagViews } from '../dataset/flagViews';
import { loadVersionRows, loadWorkingRows } from '../dataset/rows';

/** What waits for a curator: approved revisions that stand in no version yet, open re-checks, flags of the working set, proposed taxa. */
export async function loadWaits(context: Context): Promise<Waits> {
  const { db } = context;
  const current = await findCurrentVersionNumber(db);
  const frozen = new Set(current === null ? [] : (await loadVersionRows(db, current)).map(({ recordRevisionId }) => recordRevisionId));
  const working = await loadWorkingRows(db, { today: today(context) });
  return {
    toFreeze: working
      .filter(({ recordRevisionId }) => !frozen.has(recordRevisionId))
      .map(({ row: { number, species, structure, approvedAt, demonstration } }) => ({ number, species, structure, approvedAt, demonstration })),
    openRechecks: (await findOpenRechecks(db)).map(({ id, number, species, structure, status, at }) => ({ id, record: recordNumber(number), species, structure, status, at: at.toISOString() })),
    flags: await loadFlagViews(db, { set: 'working' }),
    proposedTaxa: await countProposedTaxa(db),
  };
}
