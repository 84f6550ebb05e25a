import { and, asc, eq, gte, isNull, lte, or, sql } from 'drizzle-orm';
import type { Queryable } from '../client';
import { labMemberships, labs, userRoles } from '../schema/index';

/** Every lab by name, with its members of the given day. */
export function findLabs(db: Queryable, day: string) {
  return db
    .select({ id: labs.id, name: labs.name, place: labs.place, demonstration: labs.demonstration, members: sql<number>`count(distinct ${labMemberships.userId})::int` })
    .from(labs)
    .leftJoin(labMemberships, and(eq(labMemberships.labId, labs.id), lte(labMemberships.fromDay, day), or(isNull(labMemberships.untilDay), gte(labMemberships.untilDay, day))))
    .groupBy(labs.id)
    .orderBy(asc(labs.name));
}

export async function hasLab(db: Queryable, labId: string): Promise<boolean> {
  return (await db.$count(labs, eq(labs.id, labId))) > 0;
}

export async function insertLab(db: Queryable, lab: { name: string; place: string; demonstration: boolean }): Promise<string> {
  const [row] = await db.insert(labs).values(lab).returning({ id: labs.id });
  if (row === undefined) throw new Error('The laboratory was not written.');
  return row.id;
}

/** Contributors of a lab on a day: whom a question about its records is put to. */
export async function findContributorsOf(db: Queryable, labId: string, day: string): Promise<string[]> {
  const rows = await db
    .selectDistinct({ userId: labMemberships.userId })
    .from(labMemberships)
    .innerJoin(userRoles, and(eq(userRoles.userId, labMemberships.userId), eq(userRoles.role, 'contributor')))
    .where(and(eq(labMemberships.labId, labId), lte(labMemberships.fromDay, day), or(isNull(labMemberships.untilDay), gte(labMemberships.untilDay, day))));
  return rows.map((row) => row.userId);
}
