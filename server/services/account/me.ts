import { countUnreadNotices } from '../../../db/queries/notices';
import { hasOrcidOfAnother, updateProfile } from '../../../db/queries/people';
import { findCurrentVersionNumber } from '../../../db/queries/versions';
import { countAnsweredRechecks, countOpenRechecks, countSentBack, countToDecide, countUnfrozen } from '../../../db/queries/waiting';
import type { Me } from '../../../shared/contracts/account';
import { parseOrcid } from '../../../shared/domain/identifiers';
import { today, type Actor, type Context } from '../../context';
import { AppError } from '../../errors';

async function waitingFor(context: Context, actor: Actor): Promise<Me['waiting']> {
  const { db } = context;
  const is = { contributor: actor.roles.includes('contributor'), reviewer: actor.roles.includes('reviewer'), curator: actor.roles.includes('curator') };
  const none = Promise.resolve(0);
  const [sentBack, open, toDecide, answered, unfrozen, notices] = await Promise.all([
    is.contributor ? countSentBack(db, actor.id) : none,
    is.contributor && actor.labId !== null ? countOpenRechecks(db, actor.labId) : none,
    is.reviewer ? countToDecide(db, actor.id, actor.labId) : none,
    is.reviewer || is.curator ? countAnsweredRechecks(db, actor.labId) : none,
    is.curator ? countUnfrozen(db, today(context)) : none,
    countUnreadNotices(db, actor.id),
  ]);
  return { submissions: sentBack + open, review: is.reviewer ? toDecide + answered : 0, curate: is.curator ? answered + unfrozen : 0, notices };
}

/**
 * Who asks and what waits for them to act: `submissions` counts own submissions sent back and open re-checks of the own lab;
 * `review` what they may decide or close; `curate` answered re-checks they may close and records that no version holds yet.
 */
export async function describeMe(context: Context, visitor: Actor | null): Promise<Me> {
  const current = await findCurrentVersionNumber(context.db);
  const register = { demo: context.demo, currentVersion: current === null ? null : String(current) };
  if (visitor === null) return { register, person: null, waiting: { submissions: 0, review: 0, curate: 0, notices: 0 } };
  const { id, name, email, emailVerified, orcid, roles, labId, labName } = visitor;
  const lab = labId === null || labName === null ? null : { id: labId, name: labName };
  return { register, person: { id, name, email, emailVerified, orcid, roles, lab }, waiting: await waitingFor(context, visitor) };
}

/**
 * Changes the own name or ORCID iD; what is already submitted keeps the name it was agreed under.
 * @throws AppError `invalid-input` for a malformed iD, `duplicate` for one that another account holds.
 */
export async function changeProfile(context: Context, actor: Actor, patch: { name?: string | undefined; orcid?: string | null | undefined }): Promise<void> {
  const typed = patch.orcid === undefined || patch.orcid === null || patch.orcid === '' ? null : patch.orcid;
  const orcid = typed === null ? null : parseOrcid(typed);
  if (typed !== null && orcid === null) {
    throw new AppError('invalid-input', 'The ORCID iD cannot be used.', { errors: [{ path: 'orcid', message: `An ORCID iD has four groups of four and a check character; found "${typed}"` }] });
  }
  if (orcid !== null && (await hasOrcidOfAnother(context.db, actor.id, orcid))) throw new AppError('duplicate', 'Another account has this ORCID iD.');
  const profile = { ...(patch.name === undefined ? {} : { name: patch.name }), ...(patch.orcid === undefined ? {} : { orcid }) };
  if (Object.keys(profile).length > 0) await updateProfile(context.db, actor.id, profile);
}
