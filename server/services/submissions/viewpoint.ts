import { findLabDemonstration, type SubmissionRow } from '../../../db/queries/submissions';
import { findCurrentVersionNumber } from '../../../db/queries/versions';
import type { Queryable } from '../../../db/client';
import { today, type Actor, type Context } from '../../context';
import { loadVersionRows, loadWorkingRows } from '../dataset/rows';
import type { Viewpoint } from './evaluate';

/**
 * The point from which a contributor's entries are looked at: public lines, so the rows of the current version.
 * @param db database or running transaction
 * @param subject the submission, or null where nothing is stored yet (the actor's laboratory then counts)
 */
export async function contributorView(context: Context, db: Queryable, actor: Pick<Actor, 'labId'>, subject: SubmissionRow | null): Promise<Viewpoint> {
  const labId = subject?.labId ?? actor.labId;
  const current = await findCurrentVersionNumber(db);
  return {
    today: today(context),
    submissionId: subject?.id ?? null,
    labId,
    demonstrationLab: subject?.labDemonstration ?? (labId === null ? false : await findLabDemonstration(db, labId)),
    seesWorkingSet: false,
    placing: current === null ? null : { rows: await loadVersionRows(db, current) },
  };
}

/** The point from which a reviewer looks: the lines of the working set. */
export async function reviewerView(context: Context, db: Queryable, submission: SubmissionRow): Promise<Viewpoint> {
  const rows = await loadWorkingRows(db, { today: today(context) });
  return { today: today(context), submissionId: submission.id, labId: submission.labId, demonstrationLab: submission.labDemonstration ?? false, seesWorkingSet: true, placing: { rows } };
}
