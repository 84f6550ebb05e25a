import { afterAll, beforeAll, expect, test } from 'vitest';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

test('a demonstration register without a frozen version says that it is starting', async () => {
  const answer = await app.anonymous.get('/health');
  expect(answer.status).toBe(503);
  expect(answer.body).toEqual({ status: 'starting', database: 'ok', version: null });
});

test('a person who signs in is known by the session from then on', async () => {
  const contributor = await app.as('contributor');
  const session = await contributor.get<{ user: { email: string } }>('/api/auth/get-session');
  expect(session.body.user.email).toBe('contributor@test.example');
});
