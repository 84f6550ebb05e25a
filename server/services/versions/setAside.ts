import { insertAudit } from '../../../db/queries/audit';
import { findRecordToSetAside, findSetAside, findSetAsides, findStructureKeys, insertSetAside, liftSetAsideRow, lockSetAsidesOf, type SetAsideRow } from '../../../db/queries/setAsides';
import type { FieldError } from '../../../shared/contracts/problems';
import type { SetAsideScope } from '../../../shared/contracts/records';
import type { SetAsideView } from '../../../shared/contracts/versions';
import { canonicalJson } from '../../../shared/domain/canonicalJson';
import { recordNumber, recordSerial } from '../../../shared/domain/identifiers';
import type { Actor, Context } from '../../context';
import { AppError, notFound } from '../../errors';
import { requestFitRefresh } from '../dataset/fitRefresh';

const toView = ({ id, number, species, structure, scope, reason, by, at, liftedAt }: SetAsideRow): SetAsideView => ({
  id,
  record: recordNumber(number),
  species,
  structure,
  scope,
  reason,
  by,
  at: at.toISOString(),
  liftedAt: liftedAt?.toISOString() ?? null,
});

/** A pair of variables has no order: either one may stand on x. */
function scopeKey(scope: SetAsideScope): string {
  return scope === 'all' ? 'all' : [canonicalJson(scope.a), canonicalJson(scope.b)].sort().join(' ');
}

async function checkScope(context: Context, scope: SetAsideScope): Promise<void> {
  if (scope === 'all') return;
  const errors: FieldError[] = [];
  const known = await findStructureKeys(context.db, [scope.a.structure, scope.b.structure].filter((key) => key !== null));
  for (const side of ['a', 'b'] as const) {
    const { variable, structure } = scope[side];
    const path = `scope.${side}.structure`;
    if (variable === 'bodyMassG' && structure !== null) errors.push({ path, message: `Body mass belongs to no structure; found "${structure}"` });
    if (variable !== 'bodyMassG' && structure === null) errors.push({ path, message: 'This variable needs its structure; found nothing' });
    if (structure !== null && !known.has(structure)) errors.push({ path, message: `A structure of the register was expected; found "${structure}"` });
  }
  if (canonicalJson(scope.a) === canonicalJson(scope.b)) errors.push({ path: 'scope.b', message: 'A pair needs two different variables; found the same twice' });
  if (errors.length > 0) throw new AppError('invalid-input', `${errors.length === 1 ? 'One entry' : `${errors.length} entries`} of the scope cannot be used.`, { errors });
}

/** A record to be set aside; not-found for a number that the register never gave. */
export async function loadRecordToSetAside(context: Context, number: string) {
  const serial = recordSerial(number);
  const record = serial === null ? null : await findRecordToSetAside(context.db, serial);
  if (record === null) throw notFound(`The record ${number}`);
  return record;
}

/** A curator never judges a record of their own laboratory. */
export function refuseOwnLab(actor: Actor, labId: string | null): void {
  if (labId !== null && labId === actor.labId) throw new AppError('own-lab', 'This record is of your own laboratory: another curator sets it aside or lifts it.');
}

/**
 * Leaves a record out of fits, of all or of those of one pair of variables, from the next version on. It stays listed.
 * @param number record number, AK-000000
 * @param input scope and the reason that everyone will see
 * @returns the set-aside, and the id of the refresh of the working set's fits that it asked for
 * @throws own-lab · duplicate for the same scope in force · wrong-state for a withdrawn record · invalid-input for a scope that names no fit
 */
export async function setAside(context: Context, actor: Actor, number: string, input: { scope: SetAsideScope; reason: string }): Promise<{ view: SetAsideView; runId: string }> {
  const record = await loadRecordToSetAside(context, number);
  refuseOwnLab(actor, record.labId);
  await checkScope(context, input.scope);
  if (record.withdrawnAt !== null) throw new AppError('wrong-state', 'A withdrawn record is in no fit.');
  const { id, runId } = await context.db.transaction(async (tx) => {
    const standing = await lockSetAsidesOf(tx, record.id);
    if (standing.some(({ scope }) => scopeKey(scope) === scopeKey(input.scope))) throw new AppError('duplicate', 'The record is set aside from these fits already.');
    const made = await insertSetAside(tx, { recordId: record.id, scope: input.scope, reason: input.reason, decidedBy: actor.id, createdAt: context.clock() });
    await insertAudit(tx, { actorId: actor.id, action: 'set-aside', targetType: 'record', targetId: number, detail: { scope: input.scope, reason: input.reason } });
    return { id: made, runId: await requestFitRefresh(tx, [record.id], `${number} set aside`) };
  });
  await context.jobs.enqueue('refresh-fits', { runId }, runId);
  return { view: await loadSetAside(context, id).then(toView), runId };
}

/** A set-aside by its id, lifted or not; not-found for another. */
export async function loadSetAside(context: Context, id: string): Promise<SetAsideRow> {
  const found = await findSetAside(context.db, id);
  if (found === null) throw notFound('This set-aside');
  return found;
}

/**
 * Takes a record back into the fits, from the next version on. The set-aside stays listed as lifted.
 * @throws own-lab · wrong-state where it is lifted already
 */
export async function liftSetAside(context: Context, actor: Actor, id: string, reason: string): Promise<SetAsideView> {
  const found = await loadSetAside(context, id);
  refuseOwnLab(actor, found.labId);
  const number = recordNumber(found.number);
  const runId = await context.db.transaction(async (tx) => {
    if (!(await liftSetAsideRow(tx, id, { liftedBy: actor.id, liftedReason: reason, liftedAt: context.clock() }))) throw new AppError('wrong-state', 'This set-aside was lifted before.');
    await insertAudit(tx, { actorId: actor.id, action: 'set-aside-lifted', targetType: 'record', targetId: number, detail: { reason } });
    return requestFitRefresh(tx, [found.recordId], `${number} taken back into the fits`);
  });
  await context.jobs.enqueue('refresh-fits', { runId }, runId);
  return toView(await loadSetAside(context, id));
}

/** Set-asides, newest first; the caller asks for one more than it shows. */
export async function listSetAsides(context: Context, before: { at: Date; id: string } | null, limit: number): Promise<SetAsideView[]> {
  return (await findSetAsides(context.db, before, limit)).map(toView);
}
