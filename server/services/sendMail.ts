import { findMail, noteMailFailed, noteMailSent } from '../../db/queries/notices';
import type { Context } from '../context';
import { MailError } from '../integrations/mail';

/**
 * Sends one queued mail and notes it. Where the process dies between sending and noting, the next attempt carries the
 * same idempotency key and the mail API sends nothing a second time.
 */
export async function sendQueuedMail(context: Context, mailId: string): Promise<void> {
  const mail = await findMail(context.db, mailId);
  if (mail === null || mail.status !== 'queued') return;
  try {
    const { id } = await context.mailer.send({ to: mail.recipient, subject: mail.subject, text: mail.body, idempotencyKey: mail.idempotencyKey });
    context.killPoint('mail:sent');
    await noteMailSent(context.db, mailId, id, context.clock());
  } catch (error) {
    const final = error instanceof MailError && !error.retriable;
    await noteMailFailed(context.db, mailId, final);
    if (!final) throw error;
    context.logger.error({ err: error, mailId }, 'mail refused for good');
  }
}
