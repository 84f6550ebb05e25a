import type { Queryable } from '../../../db/client';
import { findFlags, type FlagFilter } from '../../../db/queries/fits';
import type { FlagView } from '../../../shared/contracts/fits';
import { recordNumber } from '../../../shared/domain/identifiers';
import { fitTitle } from './questions';

/**
 * Flags of one version or of the newest computation of the working set, in words, newest first.
 * @param filter the set, and the records they may speak of
 */
export async function loadFlagViews(db: Queryable, filter: FlagFilter): Promise<FlagView[]> {
  const found = await findFlags(db, filter);
  return found.map((flag) => ({
    id: flag.id,
    kind: flag.kind,
    fit: flag.slug,
    fitTitle: fitTitle(flag, flag.cladeName, flag.method),
    set: flag.set,
    version: flag.version === null ? null : String(flag.version),
    studentised: flag.studentised,
    bonferroniP: flag.bonferroniP,
    reasons: flag.reasons,
    record: recordNumber(flag.record),
    species: flag.species,
    structure: flag.structure,
    at: flag.at.toISOString(),
  }));
}
