import { createHash } from 'node:crypto';
import { countAttempt, forgetAttempts } from '../../../db/queries/signInAttempts';
import type { Context } from '../../context';

const allowedFailures = 8;
const windowMs = 10 * 60 * 1000;

// Kept under a hash: the table of counters need not know who has an account, or who was tried.
const keyOf = (email: string) => `account:${createHash('sha256').update(email.trim().toLowerCase()).digest('hex')}`;

/**
 * Counts an attempt to sign in to one account, whether or not there is such an account. It is counted before the password
 * is looked at, so that many attempts at once gain nothing; a success forgets them (`forgetFailures`).
 * @returns seconds to wait after eight attempts without a success within ten minutes, else null.
 */
export async function takeSignInAttempt(context: Context, email: string): Promise<number | null> {
  const nowMs = context.clock().getTime();
  const { count, startedMs } = await countAttempt(context.db, keyOf(email), nowMs, windowMs);
  return count <= allowedFailures ? null : Math.max(1, Math.ceil((startedMs + windowMs - nowMs) / 1000));
}

/** After a sign-in that succeeded, or a new password. */
export async function forgetFailures(context: Context, email: string): Promise<void> {
  await forgetAttempts(context.db, keyOf(email));
}
