import { and, eq, inArray, isNull, ne, or } from 'drizzle-orm';
import type { Role } from '../../shared/contracts/vocabulary';
import type { Queryable } from '../client';
import { labMemberships, userRoles, users } from '../schema/index';

const active = and(eq(users.kind, 'person'), isNull(users.disabledAt));

/** Name and mail address of people who can be told; unknown, disabled and system accounts fall out. */
export async function findPeopleToTell(db: Queryable, userIds: readonly string[]) {
  if (userIds.length === 0) return [];
  return db
    .select({ id: users.id, name: users.name, email: users.email })
    .from(users)
    .where(and(active, inArray(users.id, [...userIds])));
}

/** Everybody who holds a role. */
export async function findHoldersOf(db: Queryable, role: Role): Promise<string[]> {
  const rows = await db.select({ id: users.id }).from(users).innerJoin(userRoles, eq(userRoles.userId, users.id)).where(and(active, eq(userRoles.role, role)));
  return rows.map((row) => row.id);
}

/** Reviewers who are in no lab, or in another one than `labId`. */
export async function findReviewersOutside(db: Queryable, labId: string | null): Promise<string[]> {
  const rows = await db
    .selectDistinct({ id: users.id, labId: labMemberships.labId })
    .from(users)
    .innerJoin(userRoles, and(eq(userRoles.userId, users.id), eq(userRoles.role, 'reviewer')))
    .leftJoin(labMemberships, and(eq(labMemberships.userId, users.id), isNull(labMemberships.untilDay)))
    .where(and(active, labId === null ? undefined : or(isNull(labMemberships.labId), ne(labMemberships.labId, labId))));
  return [...new Set(rows.map((row) => row.id))];
}
