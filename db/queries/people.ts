import { and, asc, eq, gt, gte, ilike, inArray, isNull, lte, ne, or, sql } from 'drizzle-orm';
import { roles, type Role } from '../../shared/contracts/vocabulary';
import type { Queryable, Transaction } from '../client';
import { labMemberships, labs, sessions, userRoles, users } from '../schema/index';

const isRole = (text: string): text is Role => roles.some((role) => role === text);

export interface FoundActor {
  id: string;
  name: string;
  email: string;
  emailVerified: boolean;
  orcid: string | null;
  roles: Role[];
  labId: string | null;
  labName: string | null;
  demonstration: boolean;
}

/** A person with roles and the lab of the given day (ISO); null for an unknown, disabled or system account. */
export async function findActor(db: Queryable, userId: string, day: string): Promise<FoundActor | null> {
  const [user] = await db.select().from(users).where(and(eq(users.id, userId), eq(users.kind, 'person'), isNull(users.disabledAt)));
  if (user === undefined) return null;
  const given = await db.select({ role: userRoles.role }).from(userRoles).where(eq(userRoles.userId, userId));
  const [lab] = await findLabOf(db, userId, day);
  return {
    id: user.id,
    name: user.name,
    email: user.email,
    emailVerified: user.emailVerified,
    orcid: user.orcid,
    roles: roles.filter((role) => given.some((row) => row.role === role && isRole(row.role))),
    labId: lab?.id ?? null,
    labName: lab?.name ?? null,
    demonstration: user.demonstration,
  };
}

/** Lab of a person on a day; the latest membership wins where two overlap. */
export function findLabOf(db: Queryable, userId: string, day: string) {
  return db
    .select({ id: labs.id, name: labs.name })
    .from(labMemberships)
    .innerJoin(labs, eq(labs.id, labMemberships.labId))
    .where(and(eq(labMemberships.userId, userId), lte(labMemberships.fromDay, day), or(isNull(labMemberships.untilDay), gte(labMemberships.untilDay, day))))
    .orderBy(sql`${labMemberships.fromDay} desc`)
    .limit(1);
}

export async function insertRole(db: Queryable, userId: string, role: Role, grantedBy: string | null): Promise<void> {
  await db.insert(userRoles).values({ userId, role, grantedBy }).onConflictDoNothing();
}

/** Takes away the roles that are not among those given, and gives those that are missing; what stays keeps its date and giver. */
export async function replaceRoles(tx: Transaction, userId: string, given: readonly Role[], grantedBy: string): Promise<void> {
  const standing = await tx.select({ role: userRoles.role }).from(userRoles).where(eq(userRoles.userId, userId));
  const gone = standing.map((row) => row.role).filter((role) => !given.some((kept) => kept === role));
  if (gone.length > 0) await tx.delete(userRoles).where(and(eq(userRoles.userId, userId), inArray(userRoles.role, gone)));
  for (const role of given) await insertRole(tx, userId, role, grantedBy);
}

/** Active administrators other than the given person; the rows are locked, so that two cannot take each other's role away. */
export async function lockOtherAdministrators(tx: Transaction, userId: string): Promise<number> {
  const rows = await tx
    .select({ userId: userRoles.userId, disabledAt: users.disabledAt })
    .from(userRoles)
    .innerJoin(users, eq(users.id, userRoles.userId))
    .where(eq(userRoles.role, 'administrator'))
    .orderBy(asc(userRoles.userId))
    .for('update');
  return rows.filter((row) => row.userId !== userId && row.disabledAt === null).length;
}

const personColumns = { id: users.id, name: users.name, email: users.email, emailVerified: users.emailVerified, orcid: users.orcid, kind: users.kind, demonstration: users.demonstration, disabledAt: users.disabledAt, createdAt: users.createdAt };

/** People by name, after the given place; the search looks at name, mail address and ORCID iD. */
export function findPeople(db: Queryable, filter: { query: string; after: { name: string; id: string } | null; limit: number }) {
  const like = `%${filter.query.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
  const { after } = filter;
  return db
    .select(personColumns)
    .from(users)
    .where(
      and(
        filter.query === '' ? undefined : or(ilike(users.name, like), ilike(users.email, like), ilike(users.orcid, like)),
        after === null ? undefined : or(gt(users.name, after.name), and(eq(users.name, after.name), gt(users.id, after.id))),
      ),
    )
    .orderBy(asc(users.name), asc(users.id))
    .limit(filter.limit);
}

export async function findPerson(db: Queryable, userId: string) {
  const [row] = await db.select(personColumns).from(users).where(eq(users.id, userId));
  return row ?? null;
}
export type FoundPerson = NonNullable<Awaited<ReturnType<typeof findPerson>>>;

export async function findRolesOf(db: Queryable, userIds: readonly string[]): Promise<{ userId: string; role: Role }[]> {
  if (userIds.length === 0) return [];
  const rows = await db.select({ userId: userRoles.userId, role: userRoles.role }).from(userRoles).where(inArray(userRoles.userId, [...userIds]));
  return rows.flatMap(({ userId, role }) => (isRole(role) ? [{ userId, role }] : []));
}

const membershipColumns = { id: labMemberships.id, userId: labMemberships.userId, labId: labMemberships.labId, lab: labs.name, fromDay: labMemberships.fromDay, untilDay: labMemberships.untilDay };

export async function findMembershipsOf(db: Queryable, userIds: readonly string[]) {
  if (userIds.length === 0) return [];
  return db.select(membershipColumns).from(labMemberships).innerJoin(labs, eq(labs.id, labMemberships.labId)).where(inArray(labMemberships.userId, [...userIds])).orderBy(asc(labMemberships.fromDay), asc(labs.name));
}

export async function lockMembership(tx: Transaction, membershipId: string) {
  const [row] = await tx.select().from(labMemberships).where(eq(labMemberships.id, membershipId)).for('update');
  return row ?? null;
}

export async function findMembership(db: Queryable, membershipId: string) {
  const [row] = await db.select(membershipColumns).from(labMemberships).innerJoin(labs, eq(labs.id, labMemberships.labId)).where(eq(labMemberships.id, membershipId));
  return row ?? null;
}

export async function insertMembership(tx: Transaction, membership: { userId: string; labId: string; fromDay: string; grantedBy: string | null }): Promise<void> {
  await tx.insert(labMemberships).values(membership);
}

export async function endMembership(tx: Transaction, membershipId: string, untilDay: string): Promise<void> {
  await tx.update(labMemberships).set({ untilDay }).where(eq(labMemberships.id, membershipId));
}

/** Marks an account as disabled, or as working again; its sessions end at once. */
export async function setDisabled(tx: Transaction, userId: string, at: Date | null): Promise<void> {
  await tx.update(users).set({ disabledAt: at }).where(eq(users.id, userId));
  if (at !== null) await tx.delete(sessions).where(eq(sessions.userId, userId));
}

export async function updateProfile(db: Queryable, userId: string, profile: { name?: string; orcid?: string | null }): Promise<void> {
  await db.update(users).set({ ...profile, updatedAt: new Date() }).where(eq(users.id, userId));
}

/** Another account with this ORCID iD. */
export async function hasOrcidOfAnother(db: Queryable, userId: string, orcid: string): Promise<boolean> {
  return (await db.$count(users, and(eq(users.orcid, orcid), ne(users.id, userId)))) > 0;
}
