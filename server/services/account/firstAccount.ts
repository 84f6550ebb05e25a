import { createHash, randomBytes } from 'node:crypto';
import { rm, writeFile } from 'node:fs/promises';
import { hashPassword } from 'better-auth/crypto';
import { insertAudit } from '../../../db/queries/audit';
import { hasAdministrator, insertVerifiedPerson, replaceFirstAccountLink, useFirstAccountLink } from '../../../db/queries/firstAccount';
import { insertRole } from '../../../db/queries/people';
import type { Context } from '../../context';
import { AppError } from '../../errors';

const validMs = 7 * 24 * 60 * 60 * 1000;
const hashOf = (token: string) => createHash('sha256').update(token).digest('hex');

/**
 * Makes the one-time link of the first account, where nobody administers the register yet. Only the hash of its token is
 * kept; a further start makes a new link, and the former is void.
 * @returns the address to open (written to KARYA_FIRST_ACCOUNT_FILE too, where that is set), or null where an administrator exists.
 */
export async function offerFirstAccount(context: Context): Promise<string | null> {
  const file = context.config.firstAccountFile;
  if (context.demo || (await hasAdministrator(context.db))) {
    if (file !== undefined) await rm(file, { force: true });
    return null;
  }
  const token = randomBytes(32).toString('base64url');
  const expiresAt = new Date(context.clock().getTime() + validMs);
  await context.db.transaction((tx) => replaceFirstAccountLink(tx, hashOf(token), expiresAt));
  const address = `${context.config.appUrl}/first-account?token=${token}`;
  if (file !== undefined) await writeFile(file, `Open this address once, within seven days, to make the first account:\n${address}\n`, { mode: 0o600 });
  return address;
}

/**
 * Turns the one-time link into a verified administrator, once.
 * @throws AppError `not-found` for a token that is unknown, used or older than seven days; `duplicate` for an address in use.
 */
export async function makeFirstAccount(context: Context, input: { token: string; name: string; email: string; password: string }): Promise<void> {
  const passwordHash = await hashPassword(input.password);
  await context.db.transaction(async (tx) => {
    if (!(await useFirstAccountLink(tx, hashOf(input.token), context.clock()))) {
      throw new AppError('not-found', 'This link has been used or is too old. Start the register again to have a new one.');
    }
    const userId = await insertVerifiedPerson(tx, { name: input.name, email: input.email, passwordHash });
    await insertRole(tx, userId, 'administrator', null);
    await insertAudit(tx, { actorId: userId, action: 'first-account-made', targetType: 'person', targetId: userId });
  });
}
