import { insertAudit } from '../../../db/queries/audit';
import { findLabs, insertLab } from '../../../db/queries/labs';
import type { Lab } from '../../../shared/contracts/people';
import { today, type Actor, type Context } from '../../context';
import { AppError } from '../../errors';

/** Every lab by name, with the number of its members today. */
export async function listLabs(context: Context): Promise<Lab[]> {
  return findLabs(context.db, today(context));
}

/**
 * Makes a lab, without members yet; noted. In a demonstration register it is an invented one unless said otherwise.
 * @throws AppError `duplicate` for a name in use.
 */
export async function createLab(context: Context, actor: Actor, input: { name: string; place: string; demonstration?: boolean }): Promise<Lab> {
  const demonstration = input.demonstration ?? context.demo;
  const { name, place } = input;
  return context.db.transaction(async (tx) => {
    if ((await findLabs(tx, today(context))).some((lab) => lab.name.toLowerCase() === name.toLowerCase())) throw new AppError('duplicate', 'A laboratory of this name exists already.');
    const id = await insertLab(tx, { name, place, demonstration });
    await insertAudit(tx, { actorId: actor.id, action: 'lab-made', targetType: 'lab', targetId: id, detail: { name } });
    return { id, name, place, demonstration, members: 0 };
  });
}
