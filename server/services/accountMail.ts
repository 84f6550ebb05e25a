import { createHash } from 'node:crypto';
import { insertMail } from '../../db/queries/notices';
import type { Context } from '../context';

const texts = {
  'verify-address': {
    subject: 'Allokarya: confirm your mail address',
    body: (name: string, url: string) => `${name},\n\nopen this address to confirm that this mailbox is yours:\n${url}\n\nIf you did not sign up, do nothing.`,
  },
  'reset-password': {
    subject: 'Allokarya: choose a new password',
    body: (name: string, url: string) => `${name},\n\nopen this address within an hour to choose a new password:\n${url}\n\nIf you did not ask for it, do nothing: your password stays as it is.`,
  },
} as const;

/** Queues a mail about a person's own account. Its key is drawn from the link, so that one link is mailed once. */
export async function sendAccountMail(context: Context, user: { id: string; name: string; email: string }, kind: keyof typeof texts, url: string): Promise<void> {
  const { subject, body } = texts[kind];
  const idempotencyKey = `account:${createHash('sha256').update(url).digest('hex')}`;
  const mailId = await insertMail(context.db, { userId: user.id, recipient: user.email, kind, subject, body: body(user.name, url), idempotencyKey });
  if (mailId !== null) await context.jobs.enqueue('send-mail', { mailId }, mailId);
}
