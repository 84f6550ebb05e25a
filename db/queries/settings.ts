import { eq } from 'drizzle-orm';
import type { Queryable } from '../client';
import { registerSettings } from '../schema/index';

/** Keeps the first choice of demo mode for ever; answers what stands. */
export async function chooseDemoMode(db: Queryable, demo: boolean): Promise<boolean> {
  await db.insert(registerSettings).values({ key: 'demo', value: demo, fixed: true }).onConflictDoNothing();
  return (await findSetting(db, 'demo')) === true;
}

export async function findSetting(db: Queryable, key: string): Promise<unknown> {
  const [row] = await db.select({ value: registerSettings.value }).from(registerSettings).where(eq(registerSettings.key, key));
  return row?.value ?? null;
}

export async function putSetting(db: Queryable, key: string, value: unknown): Promise<void> {
  await db.insert(registerSettings).values({ key, value }).onConflictDoUpdate({ target: registerSettings.key, set: { value, updatedAt: new Date() } });
}
