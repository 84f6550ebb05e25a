import { drizzleAdapter } from '@better-auth/drizzle-adapter';
import { betterAuth } from 'better-auth';
import { fromNodeHeaders } from 'better-auth/node';
import type { IncomingHttpHeaders } from 'node:http';
import * as schema from '../db/schema/index';
import { findActor } from '../db/queries/people';
import type { Actor, Context } from './context';
import { today } from './context';
import { sendAccountMail } from './services/accountMail';

/** Sign-in by mail address and password, with verified addresses; sessions in the database. */
export function createAuth(context: Context) {
  const { config, db } = context;
  return betterAuth({
    appName: 'Allokarya',
    baseURL: config.appUrl,
    basePath: '/api/auth',
    secret: config.authSecret,
    trustedOrigins: [config.appUrl],
    telemetry: { enabled: false },
    logger: { disabled: true },
    database: drizzleAdapter(db, {
      provider: 'pg',
      transaction: true,
      schema: { user: schema.users, session: schema.sessions, account: schema.accounts, verification: schema.verifications, rateLimit: schema.rateLimits },
    }),
    advanced: {
      database: { generateId: 'uuid' },
      ipAddress: { ipAddressHeaders: ['x-client-ip'] },
      useSecureCookies: config.appUrl.startsWith('https://'),
      cookiePrefix: 'allokarya',
    },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 300,
      customRules: {
        '/sign-in/email': { window: 60, max: config.limits.signInPerMinute },
        '/sign-up/email': { window: 60, max: config.limits.signInPerMinute },
        '/request-password-reset': { window: 60, max: 10 },
        '/send-verification-email': { window: 60, max: 10 },
      },
    },
    session: { expiresIn: 60 * 60 * 24 * 14, updateAge: 60 * 60 * 24 },
    emailAndPassword: {
      enabled: true,
      requireEmailVerification: true,
      minPasswordLength: 10,
      maxPasswordLength: 200,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: async ({ user, url }) => sendAccountMail(context, user, 'reset-password', url),
    },
    emailVerification: {
      sendOnSignUp: true,
      autoSignInAfterVerification: true,
      sendVerificationEmail: async ({ user, url }) => sendAccountMail(context, user, 'verify-address', url),
    },
    user: {
      additionalFields: {
        orcid: { type: 'string', required: false, input: false },
        kind: { type: 'string', required: false, input: false, defaultValue: 'person' },
        disabledAt: { type: 'date', required: false, input: false },
      },
    },
    databaseHooks: {
      session: {
        create: {
          before: async (session) => {
            const actor = await findActor(db, session.userId, today(context));
            return actor === null ? false : { data: session };
          },
        },
      },
    },
  });
}
export type Auth = ReturnType<typeof createAuth>;

/** The person behind a request's session, with roles and lab of today; null for none, an expired, a forged or a disabled one. */
export async function readActor(context: Context, auth: Auth, headers: IncomingHttpHeaders): Promise<Actor | null> {
  if (headers.cookie === undefined) return null;
  const session = await auth.api.getSession({ headers: fromNodeHeaders(headers) });
  return session === null ? null : findActor(context.db, session.user.id, today(context));
}
