import { and, eq, gte, isNull, lte, or, sql } from 'drizzle-orm';
import { roles, type Role } from '../../shared/contracts/vocabulary';
import type { Queryable } from '../client';
import { labMemberships, labs, userRoles, users } from '../schema/index';

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
