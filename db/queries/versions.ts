import { desc, eq } from 'drizzle-orm';
import type { Queryable } from '../client';
import { versions } from '../schema/index';

/** Number of the current version: the frozen one with the greatest number; null where nothing is frozen yet. */
export async function findCurrentVersionNumber(db: Queryable): Promise<number | null> {
  const [row] = await db.select({ number: versions.number }).from(versions).where(eq(versions.status, 'frozen')).orderBy(desc(versions.number)).limit(1);
  return row?.number ?? null;
}
