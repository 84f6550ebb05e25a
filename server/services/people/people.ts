import { insertAudit } from '../../../db/queries/audit';
import { hasLab } from '../../../db/queries/labs';
import { endMembership, findMembershipsOf, findPeople, findPerson, findRolesOf, insertMembership, lockMembership, lockOtherAdministrators, replaceRoles, setDisabled, type FoundPerson } from '../../../db/queries/people';
import type { Queryable } from '../../../db/client';
import type { Person } from '../../../shared/contracts/people';
import { roles as allRoles, type Role } from '../../../shared/contracts/vocabulary';
import type { Actor, Context } from '../../context';
import { AppError, notFound } from '../../errors';

const kindOf = (kind: string): Person['kind'] => (kind === 'system' ? 'system' : 'person');

async function describe(db: Queryable, found: readonly FoundPerson[]): Promise<Person[]> {
  const ids = found.map((person) => person.id);
  const [given, memberships] = [await findRolesOf(db, ids), await findMembershipsOf(db, ids)];
  return found.map(({ disabledAt, createdAt, kind, ...person }) => ({
    ...person,
    kind: kindOf(kind),
    disabled: disabledAt !== null,
    createdAt: createdAt.toISOString(),
    roles: allRoles.filter((role) => given.some((row) => row.userId === person.id && row.role === role)),
    memberships: memberships.filter((row) => row.userId === person.id).map(({ id, labId, lab, fromDay, untilDay }) => ({ id, labId, lab, fromDay, untilDay })),
  }));
}

/** A page of people by name, with roles and memberships of all times. */
export async function listPeople(context: Context, filter: { query: string; after: { name: string; id: string } | null; limit: number }): Promise<Person[]> {
  return describe(context.db, await findPeople(context.db, filter));
}

/** One person; throws `not-found`. */
export async function readPerson(db: Queryable, userId: string): Promise<Person> {
  const found = await findPerson(db, userId);
  const [person] = found === null ? [] : await describe(db, [found]);
  if (person === undefined) throw notFound('This person');
  return person;
}

/** Roles and power belong to people; the named actor of the register's own loading has neither. */
export async function loadPerson(context: Context, userId: string): Promise<Person> {
  const person = await readPerson(context.db, userId);
  if (person.kind === 'system') throw notFound('This person');
  return person;
}

async function keepAnAdministrator(tx: Parameters<typeof lockOtherAdministrators>[0], userId: string): Promise<void> {
  if ((await lockOtherAdministrators(tx, userId)) === 0) throw new AppError('wrong-state', 'This is the last administrator: give the role to somebody else first.');
}

/**
 * Sets a person's roles to exactly those given, and notes it.
 * @throws AppError `wrong-state` where the last administrator would lose the role.
 */
export async function setRoles(context: Context, actor: Actor, person: Person, given: readonly Role[]): Promise<Person> {
  const next = allRoles.filter((role) => given.includes(role));
  return context.db.transaction(async (tx) => {
    if (person.roles.includes('administrator') && !next.includes('administrator')) await keepAnAdministrator(tx, person.id);
    const before = (await findRolesOf(tx, [person.id])).map((row) => row.role);
    await replaceRoles(tx, person.id, next, actor.id);
    await insertAudit(tx, { actorId: actor.id, action: 'roles-set', targetType: 'person', targetId: person.id, detail: { before: allRoles.filter((role) => before.includes(role)), after: next } });
    return readPerson(tx, person.id);
  });
}

/**
 * Disables an account, which ends its sessions, or lets it in again; noted.
 * @throws AppError `wrong-state` for the last administrator.
 */
export async function setAccess(context: Context, actor: Actor, person: Person, disabled: boolean): Promise<Person> {
  return context.db.transaction(async (tx) => {
    if (disabled && person.roles.includes('administrator')) await keepAnAdministrator(tx, person.id);
    await setDisabled(tx, person.id, disabled ? context.clock() : null);
    await insertAudit(tx, { actorId: actor.id, action: disabled ? 'account-disabled' : 'account-enabled', targetType: 'person', targetId: person.id });
    return readPerson(tx, person.id);
  });
}

/**
 * Makes a person a member of a lab from a day on. A membership that still runs ends the day before.
 * @throws AppError `invalid-input` for an unknown lab; `wrong-state` where a running membership began on that day or later.
 */
export async function addMembership(context: Context, actor: Actor, person: Person, input: { labId: string; fromDay: string }): Promise<Person> {
  if (!(await hasLab(context.db, input.labId))) {
    throw new AppError('invalid-input', 'There is no such laboratory.', { errors: [{ path: 'labId', message: `Expected is the id of a laboratory; found "${input.labId}"` }] });
  }
  return context.db.transaction(async (tx) => {
    const running = (await findMembershipsOf(tx, [person.id])).filter((row) => row.untilDay === null || row.untilDay >= input.fromDay);
    for (const { id, fromDay, lab } of running) {
      if (fromDay >= input.fromDay) throw new AppError('wrong-state', `The membership in ${lab} began on ${fromDay}: choose a later day.`);
      await endMembership(tx, id, dayBefore(input.fromDay));
    }
    await insertMembership(tx, { userId: person.id, ...input, grantedBy: actor.id });
    await insertAudit(tx, { actorId: actor.id, action: 'membership-begun', targetType: 'person', targetId: person.id, detail: { ...input } });
    return readPerson(tx, person.id);
  });
}

/**
 * Ends a membership on a day, the last of it; noted.
 * @throws AppError `invalid-input` where that day is before its first.
 */
export async function closeMembership(context: Context, actor: Actor, membershipId: string, untilDay: string): Promise<Person> {
  return context.db.transaction(async (tx) => {
    const membership = await lockMembership(tx, membershipId);
    if (membership === null) throw notFound('This membership');
    if (untilDay < membership.fromDay) {
      throw new AppError('invalid-input', 'A membership ends after it began.', { errors: [{ path: 'untilDay', message: `Expected is ${membership.fromDay} or later; found "${untilDay}"` }] });
    }
    await endMembership(tx, membershipId, untilDay);
    await insertAudit(tx, { actorId: actor.id, action: 'membership-ended', targetType: 'person', targetId: membership.userId, detail: { labId: membership.labId, untilDay } });
    return readPerson(tx, membership.userId);
  });
}

function dayBefore(day: string): string {
  const date = new Date(`${day}T00:00:00.000Z`);
  date.setUTCDate(date.getUTCDate() - 1);
  return date.toISOString().slice(0, 10);
}
