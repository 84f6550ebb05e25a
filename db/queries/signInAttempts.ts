import { eq, sql } from 'drizzle-orm';
import type { Queryable } from '../client';
import { rateLimits } from '../schema/index';

/**
 * Counts one more attempt under a key, in one statement, so that attempts at the same moment are all counted.
 * A window begins with its first attempt and is forgotten when it is over.
 * @returns attempts in this window with this one, and when the window began (ms).
 */
export async function countAttempt(db: Queryable, key: string, nowMs: number, windowMs: number): Promise<{ count: number; startedMs: number }> {
  const over = sql`${rateLimits.lastRequest} <= ${nowMs - windowMs}`;
  const [row] = await db
    .insert(rateLimits)
    .values({ key, count: 1, lastRequest: nowMs })
    .onConflictDoUpdate({
      target: rateLimits.key,
      set: {
        count: sql`case when ${over} then 1 else ${rateLimits.count} + 1 end`,
        lastRequest: sql`case when ${over} then ${nowMs} else ${rateLimits.lastRequest} end`,
      },
    })
    .returning({ count: rateLimits.count, startedMs: rateLimits.lastRequest });
  if (row === undefined) throw new Error('The attempt was not counted.');
  return row;
}

export async function forgetAttempts(db: Queryable, key: string): Promise<void> {
  await db.delete(rateLimits).where(eq(rateLimits.key, key));
}
