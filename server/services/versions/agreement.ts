import { insertAudit } from '../../../db/queries/audit';
import { findHoldersOf } from '../../../db/queries/recipients';
import { findPreparingVersion, findVersionEvents, insertVersionEvent, lockVersion, type VersionRow } from '../../../db/queries/versions';
import type { Actor, Context } from '../../context';
import { AppError, notFound } from '../../errors';
import { enqueueMails, tell } from '../notify';

/** Whether a version may be worked on: where the setting asks for two, a second person has agreed; the system actor needs none. */
export async function hasAgreement(context: Context, version: Pick<VersionRow, 'id' | 'startedByKind'>): Promise<boolean> {
  if (context.config.freezeAgreement === 'one' || version.startedByKind === 'system') return true;
  return (await findVersionEvents(context.db, version.id)).some((event) => event.step === 'agreed');
}

/** Tells those who may agree that a version waits for them; each is told once. */
export async function askForAgreement(context: Context, versionId: string, actor: Actor, label: string): Promise<void> {
  if (context.config.freezeAgreement === 'one') return;
  const mailIds = await context.db.transaction(async (tx) => {
    const holders = [...(await findHoldersOf(tx, 'curator')), ...(await findHoldersOf(tx, 'administrator'))];
    const userIds = [...new Set(holders)].filter((id) => id !== actor.id);
    return tell(context, tx, { userIds, kind: 'freeze-agreement', subject: `version ${label} waits for a second agreement`, body: `${actor.name} has begun to freeze version ${label}. It is frozen once a second curator or the administrator agrees.`, href: '/curate/freeze', event: `freeze-agreement:${versionId}` });
  });
  await enqueueMails(context, mailIds);
}

/**
 * A second person's word for the version being prepared; the work begins with it.
 * @throws not-found where none is being prepared · not-allowed for who began it · wrong-state where none is asked for or it is given
 */
export async function agreeToFreeze(context: Context, actor: Actor): Promise<void> {
  const version = await findPreparingVersion(context.db);
  if (version === null) throw notFound('A version being prepared');
  if (version.startedById === actor.id) throw new AppError('not-allowed', 'Somebody else than the one who began it agrees to a freeze.');
  if (await hasAgreement(context, version)) throw new AppError('wrong-state', `Version ${version.number} waits for no agreement.`);
  await context.db.transaction(async (tx) => {
    if ((await lockVersion(tx, version.id)) !== 'preparing' || (await findVersionEvents(tx, version.id)).some((event) => event.step === 'agreed')) throw new AppError('wrong-state', `Version ${version.number} waits for no agreement.`);
    await insertVersionEvent(tx, { versionId: version.id, step: 'agreed', detail: actor.name, actorId: actor.id, createdAt: context.clock() });
    await insertAudit(tx, { actorId: actor.id, action: 'freeze-agreed', targetType: 'version', targetId: String(version.number) });
  });
  await context.jobs.enqueue('freeze-version', { versionId: version.id }, version.id);
}
