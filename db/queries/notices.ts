import { and, asc, desc, eq, isNull, lt, sql } from 'drizzle-orm';
import type { Queryable } from '../client';
import { mails, notices } from '../schema/index';

export interface NewMail {
  userId: string | null;
  recipient: string;
  kind: string;
  subject: string;
  body: string;
  idempotencyKey: string;
}

/** Writes a mail to be sent; null where one with the same key stands already. */
export async function insertMail(db: Queryable, mail: NewMail): Promise<string | null> {
  const [row] = await db.insert(mails).values(mail).onConflictDoNothing({ target: mails.idempotencyKey }).returning({ id: mails.id });
  return row?.id ?? null;
}

export async function findMail(db: Queryable, mailId: string) {
  const [row] = await db.select().from(mails).where(eq(mails.id, mailId));
  return row ?? null;
}

export async function noteMailSent(db: Queryable, mailId: string, providerId: string, at: Date): Promise<void> {
  await db.update(mails).set({ status: 'sent', providerId, sentAt: at, attempts: sql`${mails.attempts} + 1` }).where(eq(mails.id, mailId));
}

export async function noteMailFailed(db: Queryable, mailId: string, final: boolean): Promise<void> {
  await db.update(mails).set({ status: final ? 'failed' : 'queued', attempts: sql`${mails.attempts} + 1` }).where(eq(mails.id, mailId));
}

export async function findQueuedMails(db: Queryable, limit: number): Promise<string[]> {
  const rows = await db.select({ id: mails.id }).from(mails).where(eq(mails.status, 'queued')).orderBy(asc(mails.createdAt)).limit(limit);
  return rows.map((row) => row.id);
}

export interface NewNotice {
  userId: string;
  kind: string;
  subject: string;
  body: string;
  href: string;
  dedupeKey: string;
}

/** Writes a notice; false where the person was told already. */
export async function insertNotice(db: Queryable, notice: NewNotice): Promise<boolean> {
  const rows = await db.insert(notices).values(notice).onConflictDoNothing({ target: notices.dedupeKey }).returning({ id: notices.id });
  return rows.length > 0;
}

/** A person's notices, newest first, before the given time. */
export function findNotices(db: Queryable, userId: string, before: Date | null, limit: number) {
  return db
    .select()
    .from(notices)
    .where(and(eq(notices.userId, userId), before === null ? undefined : lt(notices.createdAt, before)))
    .orderBy(desc(notices.createdAt))
    .limit(limit);
}

export async function countUnreadNotices(db: Queryable, userId: string): Promise<number> {
  return db.$count(notices, and(eq(notices.userId, userId), isNull(notices.readAt)));
}

export async function markNoticesRead(db: Queryable, userId: string, at: Date): Promise<void> {
  await db.update(notices).set({ readAt: at }).where(and(eq(notices.userId, userId), isNull(notices.readAt)));
}
