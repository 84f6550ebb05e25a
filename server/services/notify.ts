import { insertMail, insertNotice } from '../../db/queries/notices';
import { findPeopleToTell } from '../../db/queries/recipients';
import type { Transaction } from '../../db/client';
import type { Context } from '../context';

export interface Telling {
  /** Everybody who must act or know; each is told once per `event`, in the register and by mail. */
  userIds: readonly string[];
  kind: string;
  subject: string;
  body: string;
  /** Address in the register, beginning with a slash. */
  href: string;
  /** Names the happening, for example `decided:<revision id>`. */
  event: string;
}

/**
 * Writes notices and mails inside the transaction of the act itself.
 * @returns the mails to hand to the queue once the transaction is committed (`enqueueMails`).
 */
export async function tell(context: Context, tx: Transaction, telling: Telling): Promise<string[]> {
  const mailIds: string[] = [];
  for (const person of await findPeopleToTell(tx, telling.userIds)) {
    const key = `${telling.event}:${person.id}`;
    const isNew = await insertNotice(tx, { userId: person.id, kind: telling.kind, subject: telling.subject, body: telling.body, href: telling.href, dedupeKey: key });
    if (!isNew) continue;
    const body = `${person.name},\n\n${telling.body}\n\n${context.config.appUrl}${telling.href}\n`;
    const mailId = await insertMail(tx, { userId: person.id, recipient: person.email, kind: telling.kind, subject: `Allokarya: ${telling.subject}`, body, idempotencyKey: key });
    if (mailId !== null) mailIds.push(mailId);
  }
  return mailIds;
}

/** Hands committed mails to the queue. A crash before this is made good by the sweep. */
export async function enqueueMails(context: Context, mailIds: readonly string[]): Promise<void> {
  for (const mailId of mailIds) await context.jobs.enqueue('send-mail', { mailId }, mailId);
}
