import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { rateLimits, sessions, userRoles, users } from '../../db/schema/index';
import { createClient, signInCookie } from '../support/client';
import { makePerson, testPassword } from '../support/factories';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let now = new Date();
beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
});
afterAll(() => app.close());

type Me = { person: { email: string; roles: string[] } | null };
const me = async (cookie: string | null) => (await createClient(app.url, cookie).get<Me>('/me')).body.person;
const signIn = (email: string, password: string) => app.anonymous.post<{ code?: string }>('/api/auth/sign-in/email', { email, password });
const signUp = (email: string, more: object = {}) => app.anonymous.post<{ user: object }>('/api/auth/sign-up/email', { name: 'New Person', email, password: 'long enough to count', ...more });
/** The address that the newest mail to somebody asks to open. */
async function mailedAddress(to: string): Promise<string> {
  await app.runJobs();
  const mail = (await app.sentMails()).find((sent) => sent.to.includes(to));
  return /https?:\/\/\S+/.exec(mail?.text ?? '')?.[0] ?? '';
}

describe('signing up', () => {
  test('gives an account without any role, which must confirm its address first', async () => {
    expect((await signUp('new@test.example')).status).toBe(200);
    const refused = await signIn('new@test.example', 'long enough to count');
    expect(refused.status).toBe(403);
    expect(refused.body.code).toBe('EMAIL_NOT_VERIFIED');
    const opened = await fetch(await mailedAddress('new@test.example'), { redirect: 'manual' });
    expect(opened.status).toBe(302);
    expect(opened.headers.get('location')).toBe('/verified');
    const cookie = await signInCookie(app.url, 'new@test.example', 'long enough to count');
    expect(await me(cookie)).toMatchObject({ email: 'new@test.example', roles: [] });
  });

  test('a link that is not good leads to the same page with the reason', async () => {
    const opened = await fetch(`${app.url}/api/auth/verify-email?token=forged&callbackURL=%2Fverified`, { redirect: 'manual' });
    expect(opened.headers.get('location')).toMatch(/^\/verified\?error=/);
  });

  test('with an address in use answers like a new one and changes nothing', async () => {
    const known = await makePerson(app.context.db, { email: 'known@test.example', name: 'Known' });
    const fresh = await signUp('fresh@test.example');
    const taken = await signUp(known.email);
    expect(taken.status).toBe(fresh.status);
    expect(Object.keys(taken.body)).toEqual(Object.keys(fresh.body));
    expect(Object.keys(taken.body.user).sort()).toEqual(Object.keys(fresh.body.user).sort());
    const [row] = await app.context.db.select().from(users).where(eq(users.email, known.email));
    expect(row?.name).toBe('Known');
  });

  test('cannot bring along a role, a kind or a confirmed address', async () => {
    await signUp('sly@test.example', { emailVerified: true, kind: 'system', role: 'administrator', roles: ['administrator'], demonstration: true });
    const [row] = await app.context.db.select().from(users).where(eq(users.email, 'sly@test.example'));
    // Refused altogether or made without them: either way nothing of it stands.
    if (row !== undefined) {
      expect(row).toMatchObject({ emailVerified: false, kind: 'person', demonstration: false });
      expect(await app.context.db.$count(userRoles, eq(userRoles.userId, row.id))).toBe(0);
    }
  });

  test('refuses a name that cannot be stored, as input', async () => {
    const answer = await app.anonymous.post('/api/auth/sign-up/email', { name: 'Nul\u0000l', email: 'nul@test.example', password: 'long enough to count' });
    expect(answer.status).toBe(400);
  });
});

describe('a forgotten password', () => {
  test('is replaced by a link to the page for it, which ends the sessions of before', async () => {
    const person = await makePerson(app.context.db);
    const before = await signInCookie(app.url, person.email);
    await app.anonymous.post('/api/auth/request-password-reset', { email: person.email, redirectTo: '/reset-password' });
    const address = new URL(await mailedAddress(person.email));
    expect(address.pathname).toBe('/reset-password');
    const token = address.searchParams.get('token');
    expect((await app.anonymous.post('/api/auth/reset-password', { token, newPassword: 'quite another one' })).status).toBe(200);
    expect(await me(before)).toBeNull();
    expect((await signIn(person.email, testPassword)).status).toBe(401);
    expect((await signIn(person.email, 'quite another one')).status).toBe(200);
    expect((await app.anonymous.post('/api/auth/reset-password', { token, newPassword: 'a third one again' })).status).toBe(400);
  });

  test('an unknown address gets the same answer as a known one', async () => {
    const person = await makePerson(app.context.db);
    const [known, unknown] = await Promise.all([person.email, 'nobody@test.example'].map((email) => app.anonymous.post('/api/auth/request-password-reset', { email })));
    expect(unknown?.status).toBe(known?.status);
    expect(unknown?.body).toEqual(known?.body);
  });
});

describe('repeated failures', () => {
  test('close one account for the rest of ten minutes, even to the right password, and no other', async () => {
    const [person, other] = [await makePerson(app.context.db), await makePerson(app.context.db)];
    const answers = await Promise.all(Array.from({ length: 12 }, () => signIn(person.email, 'wrong password')));
    expect(answers.filter((answer) => answer.status === 401)).toHaveLength(8);
    const refused = answers.find((answer) => answer.status === 429);
    expect(Number(refused?.headers.get('retry-after'))).toBeGreaterThan(590);
    expect((await signIn(person.email.toUpperCase(), testPassword)).status).toBe(429);
    expect((await signIn(other.email, testPassword)).status).toBe(200);
    now = new Date(now.getTime() + 10 * 60 * 1000 + 1);
    expect((await signIn(person.email, testPassword)).status).toBe(200);
  });

  test('are forgotten by a success', async () => {
    const person = await makePerson(app.context.db);
    const fails = async () => {
      for (let failure = 0; failure < 5; failure += 1) expect((await signIn(person.email, 'wrong password')).status).toBe(401);
    };
    await fails();
    expect((await signIn(person.email, testPassword)).status).toBe(200);
    await fails();
  });

  test('are counted for an account that does not exist just the same, and no address is kept for it', async () => {
    for (let failure = 0; failure < 8; failure += 1) await signIn('ghost@test.example', 'wrong password');
    expect((await signIn('ghost@test.example', 'wrong password')).status).toBe(429);
    const kept = await app.context.db.select({ key: rateLimits.key }).from(rateLimits);
    expect(kept.some(({ key }) => key.includes('ghost'))).toBe(false);
  });

  test('from one address meet the limit by address, with the time to wait', async () => {
    const strict = await startTestApp({ env: { SIGN_IN_CALLS_PER_MINUTE: '30' } });
    try {
      const statuses: number[] = [];
      let last;
      for (let attempt = 0; attempt < 31; attempt += 1) {
        last = await strict.anonymous.post('/api/auth/sign-in/email', { email: `p${attempt}@test.example` });
        statuses.push(last.status);
      }
      expect(statuses.slice(0, 30)).toEqual(Array.from({ length: 30 }, () => 400));
      expect(statuses[30]).toBe(429);
      expect(Number(last?.headers.get('retry-after'))).toBeGreaterThan(0);
    } finally {
      await strict.close();
    }
  });
});

describe('a session is nobody’s', () => {
  test('when it is forged', async () => {
    const cookie = await signInCookie(app.url, (await makePerson(app.context.db)).email);
    expect(await me(cookie)).not.toBeNull();
    const [name = '', value = ''] = cookie.split('=');
    const [token = ''] = decodeURIComponent(value).split('.');
    expect(await me(`${name}=${token}`)).toBeNull();
    expect(await me(`${name}=${encodeURIComponent(`${token}.${Buffer.alloc(32).toString('base64')}`)}`)).toBeNull();
    expect(await me(`${name}=nonsense`)).toBeNull();
  });

  test('when it has expired', async () => {
    const person = await makePerson(app.context.db);
    const cookie = await signInCookie(app.url, person.email);
    await app.context.db.update(sessions).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(sessions.userId, person.id));
    expect(await me(cookie)).toBeNull();
  });

  test('when its account has been disabled, which also cannot sign in again', async () => {
    const person = await makePerson(app.context.db);
    const cookie = await signInCookie(app.url, person.email);
    await app.context.db.update(users).set({ disabledAt: new Date() }).where(eq(users.id, person.id));
    expect(await me(cookie)).toBeNull();
    const refused = await signIn(person.email, testPassword);
    expect(refused.status).toBe(403);
    expect(refused.body.code).toBe('ACCOUNT_DISABLED');
  });
});
