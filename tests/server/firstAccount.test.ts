import { readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { oneTimeLinks } from '../../db/schema/index';
import { offerFirstAccount } from '../../server/services/account/firstAccount';
import { signInCookie, createClient } from '../support/client';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let now = new Date('2026-03-01T12:00:00.000Z');
const file = join(tmpdir(), `first-account-${process.pid}-${Date.now()}`);
beforeAll(async () => {
  app = await startTestApp({ clock: () => now, env: { KARYA_DEMO: 'off', KARYA_FIRST_ACCOUNT_FILE: file } });
});
afterAll(() => app.close());

const person = { name: 'First Administrator', email: 'First@test.example', password: 'a password of its own' };
async function offeredToken(): Promise<string> {
  await offerFirstAccount(app.context);
  return new URL(/https?:\/\/\S+/.exec(await readFile(file, 'utf8'))?.[0] ?? '').searchParams.get('token') ?? '';
}

test('a link of before, a made-up one and one older than seven days make nobody', async () => {
  const former = await offeredToken();
  const token = await offeredToken();
  expect((await app.anonymous.post('/first-account', { ...person, token: former })).status).toBe(404);
  expect((await app.anonymous.post('/first-account', { ...person, token: 'x'.repeat(43) })).status).toBe(404);
  now = new Date(now.getTime() + 7 * 24 * 3600 * 1000 + 1);
  expect((await app.anonymous.post('/first-account', { ...person, token })).status).toBe(404);
});

test('the link makes one verified administrator, once, also when it is opened twice at the same moment', async () => {
  const token = await offeredToken();
  expect(JSON.stringify(await app.context.db.select().from(oneTimeLinks))).not.toContain(token);
  const answers = await Promise.all([person, { ...person, email: 'second@test.example' }].map((input) => app.anonymous.post('/first-account', { ...input, token })));
  expect(answers.map((answer) => answer.status).sort()).toEqual([201, 404]);
  const email = answers[0]?.status === 201 ? 'first@test.example' : 'second@test.example';
  const administrator = createClient(app.url, await signInCookie(app.url, email, person.password));
  expect((await administrator.get<{ person: object }>('/me')).body.person).toMatchObject({ roles: ['administrator'], emailVerified: true });
  expect((await administrator.get<{ items: { action: string }[] }>('/audit')).body.items.map((entry) => entry.action)).toEqual(['first-account-made']);
});

test('where an administrator exists no further link is offered and the file of the former is gone', async () => {
  expect(await offerFirstAccount(app.context)).toBeNull();
  await expect(readFile(file)).rejects.toThrow();
});
