import { request as rawRequest } from 'node:http';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { labs } from '../../db/schema/index';
import type { Person } from '../../shared/contracts/people';
import type { TestClient } from '../support/client';
import { makePerson } from '../support/factories';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let administrator: TestClient;
let contributor: TestClient;
beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies' });
  administrator = await app.as('administrator');
  contributor = await app.as('contributor');
}, 120_000);
afterAll(() => app.close());

interface Problem {
  type: string;
  title: string;
  status: number;
  code: string;
  detail: string;
  errors: { path: string; message: string }[];
  requestId: string;
}

/** Sends a path as it is; fetch would mend it. */
function raw(path: string): Promise<{ status: number; type: string; body: string }> {
  const { hostname, port } = new URL(app.url);
  return new Promise((resolve, reject) => {
    const sent = rawRequest({ hostname, port, path, method: 'GET' }, (answer) => {
      let body = '';
      answer.on('data', (chunk: Buffer) => (body += chunk.toString('utf8')));
      answer.on('end', () => resolve({ status: answer.statusCode ?? 0, type: answer.headers['content-type'] ?? '', body }));
    });
    sent.on('error', reject);
    sent.end();
  });
}

const hostileTexts = ["'; drop table labs; --", '<script>alert(1)</script>', '"><img src=x onerror=alert(1)>', '${7*7}{{7*7}}', '=HYPERLINK("http://x.example")', '\u202eevil', '../../etc/passwd', 'Zürich 北京 🧠'];

describe('a body', () => {
  test.each([['/labs', 413], ['/api/auth/sign-in/email', 413]])('to %s that is too large answers %i', async (path, status) => {
    const answer = await administrator.post<Problem>(path, { name: 'x'.repeat(3 * 1024 * 1024) });
    expect(answer.status).toBe(status);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    expect(answer.body.code).toBe('too-large');
  });

  test('that is not JSON answers 400 and says nothing of our insides', async () => {
    const answer = await administrator.post<Problem>('/labs', '{"name": ');
    expect(answer.status).toBe(400);
    expect(answer.body.code).toBe('malformed-request');
    expect(JSON.stringify(answer.body)).not.toMatch(/node_modules|at JSON|\.ts:/);
  });

  test('of wrong types names every problem at once, each with its place', async () => {
    const answer = await contributor.post<Problem>('/taxa', { name: 5, rank: null, parent: ['rodentia'], authority: {}, demonstration: 'yes' });
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error) => error.path).sort()).toEqual(['authority', 'demonstration', 'name', 'parent', 'rank']);
    for (const error of answer.body.errors) expect(error.message).toContain('found');
  });

  test.each([['null', 'null'], ['an array', '[]'], ['a number', '5'], ['a text', '"x"']])('that is %s is input like any other', async (_what, body) => {
    expect((await administrator.post('/labs', body)).status).toBe(400);
  });

  test('cannot reach the prototype of our objects', async () => {
    await administrator.post('/labs', '{"name":"Proto","__proto__":{"demonstration":false},"constructor":{"prototype":{"polluted":true}}}');
    expect(Reflect.get({}, 'polluted')).toBeUndefined();
  });
});

describe('a text', () => {
  test.each(hostileTexts)('like %j is kept as it is and runs nowhere', async (text) => {
    const made = await administrator.post<{ name: string; place: string }>('/labs', { name: `Lab ${text}`, place: text });
    expect(made.status).toBe(201);
    expect(made.body).toMatchObject({ name: `Lab ${text}`, place: text });
    const client = await app.as(await makePerson(app.context.db));
    const renamed = await client.request<{ person: { name: string } }>('PATCH', '/me', { name: text });
    expect(renamed.body.person.name).toBe(text);
    expect(renamed.headers.get('content-type')).toContain('application/json');
    expect(renamed.headers.get('x-content-type-options')).toBe('nosniff');
    const found = await administrator.get<{ items: Person[] }>(`/people?query=${encodeURIComponent(text)}`);
    expect(found.body.items.map((person) => person.name)).toContain(text);
    expect((await app.anonymous.get(`/taxa?query=${encodeURIComponent(text)}`)).body).toEqual({ items: [], nextCursor: null });
    expect(await app.context.db.$count(labs)).toBeGreaterThan(2);
  });

  test('with a character that cannot be stored is refused as input', async () => {
    for (const name of ['Nul \u0000 lab', 'Half \ud800 pair', '\udc00 other half']) {
      const answer = await administrator.post<Problem>('/labs', { name });
      expect(answer.status).toBe(400);
      expect(answer.body.errors.map((error) => error.path)).toEqual(['name']);
    }
    expect((await administrator.get('/people?query=%00')).status).toBe(400);
  });
});

describe('an address', () => {
  test.each(['/api/v1/taxa/%E0%A4%A', '/api/v1/species/%E0%A4%A'])('that cannot be decoded, %s, answers 400', async (path) => {
    const answer = await raw(path);
    expect(answer.status).toBe(400);
    expect(answer.type).toContain('application/problem+json');
    expect(answer.body).not.toContain('node_modules');
  });

  test.each(['/api/v1/nowhere', '/api/nowhere', '/api/v2/health', '/api/v1/TAXA'])('that is none of ours, %s, answers 404 as a problem, never the page', async (path) => {
    const answer = await app.anonymous.get<Problem>(path);
    expect(answer.status).toBe(404);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    expect(answer.body).toMatchObject({ code: 'not-found', status: 404 });
    expect(answer.body.requestId).toBe(answer.headers.get('x-request-id'));
  });

  test('with a method it does not have does nothing', async () => {
    for (const [method, path] of [['DELETE', '/labs'], ['PUT', '/taxa/rodentia'], ['PATCH', '/structures']] as const) {
      expect((await administrator.request<Problem>(method, path, {})).body.code).toBe('not-found');
    }
  });

  test.each(['limit=0', 'limit=201', 'limit=many', 'cursor=forged', `cursor=${Buffer.from('{"name":1,"id":"x"}').toString('base64url')}`])('with the query %s answers 400', async (query) => {
    const answer = await administrator.get<Problem>(`/people?${query}`);
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error) => error.path)).toEqual([query.split('=')[0]]);
  });
});

test('a page of another site cannot act with a visitor’s session', async () => {
  const answer = await administrator.post<Problem>('/labs', { name: 'Foreign lab' }, { headers: { origin: 'https://evil.example' } });
  expect(answer.status).toBe(403);
  expect((await administrator.post('/labs', { name: 'Own lab' }, { headers: { origin: app.url } })).status).toBe(201);
});
