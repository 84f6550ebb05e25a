import { and, eq, gt, isNull } from 'drizzle-orm';
import type { Queryable, Transaction } from '../client';
import { accounts, oneTimeLinks, userRoles, users } from '../schema/index';

const purpose = 'first-account';

export async function hasAdministrator(db: Queryable): Promise<boolean> {
  return (await db.$count(userRoles, eq(userRoles.role, 'administrator'))) > 0;
}

/** One link is good at a time: a new one takes the place of those before. */
export async function replaceFirstAccountLink(tx: Transaction, tokenHash: string, expiresAt: Date): Promise<void> {
  await tx.delete(oneTimeLinks).where(and(eq(oneTimeLinks.purpose, purpose), isNull(oneTimeLinks.usedAt)));
  await tx.insert(oneTimeLinks).values({ tokenHash, purpose, expiresAt });
}

/** Uses up a link in one statement; false where it is unknown, used or too old. */
export async function useFirstAccountLink(tx: Transaction, tokenHash: string, at: Date): Promise<boolean> {
  const used = await tx
    .update(oneTimeLinks)
    .set({ usedAt: at })
    .where(and(eq(oneTimeLinks.tokenHash, tokenHash), eq(oneTimeLinks.purpose, purpose), isNull(oneTimeLinks.usedAt), gt(oneTimeLinks.expiresAt, at)))
    .returning({ id: oneTimeLinks.id });
  return used.length === 1;
}

/** A person with a password, the mail address taken as confirmed. */
export async function insertVerifiedPerson(tx: Transaction, person: { name: string; email: string; passwordHash: string; demonstration?: boolean; orcid?: string | null }): Promise<string> {
  const { name, email, demonstration = false, orcid = null } = person;
  const [row] = await tx.insert(users).values({ name, email: email.toLowerCase(), emailVerified: true, demonstration, orcid }).returning({ id: users.id });
  if (row === undefined) throw new Error('The person was not written.');
  await tx.insert(accounts).values({ userId: row.id, accountId: row.id, providerId: 'credential', password: person.passwordHash });
  return row.id;
}
