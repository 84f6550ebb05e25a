import { drizzleAdapter } from '@better-auth/drizzle-adapter';
import { betterAuth } from 'better-auth';
import { APIError, createAuthMiddleware } from 'better-auth/api';
import { fromNodeHeaders } from 'better-auth/node';
import type { IncomingHttpHeaders } from 'node:http';
import * as schema from '../db/schema/index';
import { findActor } from '../db/queries/people';
import type { Actor, Context } from './context';
import { today } from './context';
import { sendAccountMail } from './services/accountMail';
import { forgetFailures, takeSignInAttempt } from './services/account/signInLimit';

const signInPath = '/sign-in/email';

/** Where the mailed link leads: the address is confirmed on the way, and the client says so (or why not, as `?error=`). */
const verifyAddress = (appUrl: string, token: string) => `${appUrl}/api/auth/verify-email?token=${encodeURIComponent(token)}&callbackURL=${encodeURIComponent('/verified')}`;
const resetAddress = (appUrl: string, token: string) => `${appUrl}/reset-password?token=${encodeURIComponent(token)}`;

function emailIn(body: unknown): string | null {
  const email: unknown = typeof body === 'object' && body !== null ? Reflect.get(body, 'email') : null;
  return typeof email === 'string' ? email : null;
}

/** A name is one line of one to 120 characters. */
const isName = (name: string) => name.trim().length >= 1 && name.length <= 120 && !/\p{Cc}/u.test(name);

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
      sendResetPassword: async ({ user, token }) => sendAccountMail(context, user, 'reset-password', resetAddress(config.appUrl, token)),
      onPasswordReset: async ({ user }) => forgetFailures(context, user.email),
    },
    emailVerification: {
      sendOnSignUp: true,
      sendOnSignIn: true,
      autoSignInAfterVerification: true,
      sendVerificationEmail: async ({ user, token }) => sendAccountMail(context, user, 'verify-address', verifyAddress(config.appUrl, token)),
    },
    user: {
      additionalFields: {
        orcid: { type: 'string', required: false, input: false },
        kind: { type: 'string', required: false, input: false, defaultValue: 'person' },
        disabledAt: { type: 'date', required: false, input: false },
      },
    },
    hooks: {
      before: createAuthMiddleware(async (call) => {
        const email = emailIn(call.body);
        if (call.path !== signInPath || email === null) return;
        const waitSeconds = await takeSignInAttempt(context, email);
        if (waitSeconds === null) return;
        const message = `Too many attempts for this account. Try again in ${Math.ceil(waitSeconds / 60)} minutes, or choose a new password.`;
        throw new APIError('TOO_MANY_REQUESTS', { code: 'TOO_MANY_ATTEMPTS', message }, { 'Retry-After': String(waitSeconds) });
      }),
      after: createAuthMiddleware(async (call) => {
        const session = call.context.newSession;
        if (call.path === signInPath && session !== null) await forgetFailures(context, session.user.email);
      }),
    },
    databaseHooks: {
      user: {
        create: {
          before: async (user) => {
            if (!isName(user.name)) throw new APIError('BAD_REQUEST', { code: 'INVALID_NAME', message: 'A name is one line of 1 to 120 characters.' });
            return { data: { ...user, name: user.name.trim() } };
          },
        },
      },
      session: {
        create: {
          before: async (session) => {
            const actor = await findActor(db, session.userId, today(context));
            if (actor === null) throw new APIError('FORBIDDEN', { code: 'ACCOUNT_DISABLED', message: 'This account has been disabled. Ask the administrator.' });
            return { data: session };
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
