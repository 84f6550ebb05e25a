import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sessions, users } from '../../db/schema/index';
import { routes } from '../../server/routes/index';
import { createClient, signInCookie, type TestClient } from '../support/client';
import { makePerson } from '../support/factories';
import { makeRoleFixtures, visitors, type Things, type Visitor } from '../support/roleFixtures';
import { startTestApp, type TestApp } from '../support/testApp';

/**
 * Who may do what, written out by hand from the product's table: a status for every visitor and every endpoint. Where an
 * act is allowed it is tried with a body that cannot be used, so that 400 says "allowed, and only then looked at the body".
 *
 * Columns: nobody signed in · an account without roles · the contributor who entered it · a contributor of the same
 * laboratory · a contributor of another one · a reviewer of another laboratory · a reviewer of the same one · curator ·
 * administrator (both of no laboratory).
 */
type Statuses = readonly [number, number, number, number, number, number, number, number, number];
interface Row {
  route: string;
  at?: (things: Things) => string;
  body?: unknown;
  statuses: Statuses;
}

const everybody = (status: number): Statuses => [status, status, status, status, status, status, status, status, status];
const account = (status: number): Statuses => [401, status, status, status, status, status, status, status, status];
const administratorOnly = (status: number): Statuses => [401, 403, 403, 403, 403, 403, 403, 403, status];
const curatorOnly = (status: number): Statuses => [401, 403, 403, 403, 403, 403, 403, status, 403];
const bad = { unusable: true };

const table: readonly Row[] = [
  // Read what is published, calculate, fit, cite
  { route: 'get /health', statuses: everybody(200) },
  { route: 'get /me', statuses: everybody(200) },
  { route: 'get /register', statuses: everybody(200) },
  { route: 'get /structures', statuses: everybody(200) },
  { route: 'get /trees', statuses: everybody(200) },
  { route: 'get /taxa', statuses: everybody(200) },
  { route: 'get /taxa/:id', at: () => '/taxa/rodentia', statuses: everybody(200) },
  { route: 'get /taxa/:id', at: (things) => `/taxa/${things.taxon}`, statuses: [404, 404, 200, 200, 200, 200, 200, 200, 404] },
  { route: 'get /species', statuses: everybody(200) },
  { route: 'get /species/:slug', at: () => '/species/mus-musculus', statuses: everybody(200) },
  { route: 'get /records', statuses: everybody(200) },
  { route: 'get /records/:number', at: () => '/records/AK-000001', statuses: everybody(200) },
  { route: 'get /scaling', at: () => '/scaling?clades=rodentia&xStructure=cerebral_cortex&yStructure=cerebral_cortex', statuses: everybody(200) },
  { route: 'get /versions', statuses: everybody(200) },
  { route: 'get /versions/:label', at: () => '/versions/1', statuses: everybody(200) },
  { route: 'get /versions/:label', at: () => '/versions/2', statuses: everybody(404) },
  { route: 'get /versions/:label/files/:name', at: () => '/versions/1/files/CHECKSUMS.sha256', statuses: everybody(200) },
  { route: 'get /versions/:label/verify', at: () => '/versions/1/verify', statuses: everybody(200) },
  { route: 'get /versions/:label/bundle', at: () => '/versions/1/bundle', statuses: everybody(200) },
  { route: 'get /versions/:label/citation', at: () => '/versions/1/citation', statuses: everybody(200) },
  { route: 'post /samples/estimate', body: bad, statuses: everybody(400) },
  { route: 'post /fits', body: bad, statuses: everybody(400) },
  { route: 'post /first-account', body: bad, statuses: everybody(400) },
  // The own account
  { route: 'patch /me', body: { name: '' }, statuses: account(400) },
  { route: 'get /notices', statuses: account(200) },
  { route: 'post /notices/read', statuses: account(204) },
  // Draft, submit, withdraw, revise; read the own laboratory's
  { route: 'get /submissions', statuses: [401, 403, 200, 200, 200, 403, 403, 403, 403] },
  { route: 'post /submissions', body: bad, statuses: [401, 403, 400, 400, 400, 403, 403, 403, 403] },
  { route: 'post /submissions/preview', body: bad, statuses: [401, 403, 400, 400, 400, 403, 403, 403, 403] },
  { route: 'get /submissions/:id', at: ({ draft }) => `/submissions/${draft}`, statuses: [401, 404, 200, 200, 404, 404, 404, 404, 404] },
  { route: 'get /submissions/:id', at: ({ submitted }) => `/submissions/${submitted}`, statuses: [401, 404, 200, 200, 404, 200, 200, 200, 404] },
  { route: 'patch /submissions/:id', at: ({ draft }) => `/submissions/${draft}`, body: bad, statuses: [401, 404, 400, 403, 404, 404, 404, 404, 404] },
  { route: 'patch /submissions/:id', at: ({ submitted }) => `/submissions/${submitted}`, body: bad, statuses: [401, 404, 400, 403, 404, 403, 403, 403, 404] },
  { route: 'post /submissions/:id/submit', at: ({ draft }) => `/submissions/${draft}/submit`, statuses: [401, 404, 422, 403, 404, 404, 404, 404, 404] },
  { route: 'post /submissions/:id/submit', at: ({ submitted }) => `/submissions/${submitted}/submit`, statuses: [401, 404, 409, 403, 404, 403, 403, 403, 404] },
  { route: 'post /submissions/:id/withdraw', at: ({ draft }) => `/submissions/${draft}/withdraw`, body: { reason: 5 }, statuses: [401, 404, 400, 403, 404, 404, 404, 404, 404] },
  { route: 'post /submissions/:id/withdraw', at: ({ submitted }) => `/submissions/${submitted}/withdraw`, body: { reason: 5 }, statuses: [401, 404, 400, 403, 404, 403, 403, 403, 404] },
  // A colleague may revise where a re-check named in the body asks for it; the body decides.
  { route: 'post /submissions/:id/revisions', at: ({ submitted }) => `/submissions/${submitted}/revisions`, body: { recheckId: 5 }, statuses: [401, 404, 400, 400, 404, 403, 403, 403, 404] },
  { route: 'get /submissions/:id/attachments', at: ({ draft }) => `/submissions/${draft}/attachments`, statuses: [401, 404, 200, 200, 404, 404, 404, 404, 404] },
  { route: 'get /submissions/:id/attachments', at: ({ submitted }) => `/submissions/${submitted}/attachments`, statuses: [401, 404, 200, 200, 404, 200, 200, 200, 404] },
  { route: 'get /submissions/:id/attachments/:attachmentId', at: ({ submitted, evidence }) => `/submissions/${submitted}/attachments/${evidence}`, statuses: [401, 404, 200, 200, 404, 200, 200, 200, 404] },
  { route: 'get /submissions/:id/attachments/:attachmentId', at: ({ draft, evidence }) => `/submissions/${draft}/attachments/${evidence}`, statuses: [401, 404, 404, 404, 404, 404, 404, 404, 404] },
  { route: 'post /submissions/:id/attachments', at: ({ draft }) => `/submissions/${draft}/attachments`, body: bad, statuses: [401, 404, 400, 403, 404, 404, 404, 404, 404] },
  { route: 'post /submissions/:id/attachments', at: ({ submitted }) => `/submissions/${submitted}/attachments`, body: bad, statuses: [401, 404, 409, 403, 404, 403, 403, 403, 404] },
  { route: 'delete /submissions/:id/attachments/:attachmentId', at: ({ submitted, evidence }) => `/submissions/${submitted}/attachments/${evidence}`, statuses: [401, 404, 409, 403, 404, 403, 403, 403, 404] },
  // Queue, review view, comment, decide
  { route: 'get /review/queue', statuses: [401, 403, 403, 403, 403, 200, 200, 200, 403] },
  { route: 'get /review/submissions/:id', at: ({ submitted }) => `/review/submissions/${submitted}`, statuses: [401, 404, 403, 403, 404, 200, 200, 200, 404] },
  { route: 'get /review/submissions/:id', at: ({ draft }) => `/review/submissions/${draft}`, statuses: [401, 404, 404, 404, 404, 404, 404, 404, 404] },
  { route: 'post /submissions/:id/comments', at: ({ submitted }) => `/submissions/${submitted}/comments`, body: bad, statuses: [401, 404, 400, 400, 404, 400, 400, 400, 404] },
  { route: 'post /submissions/:id/decisions', at: ({ submitted }) => `/submissions/${submitted}/decisions`, body: bad, statuses: [401, 404, 403, 403, 404, 400, 403, 403, 404] },
  { route: 'post /submissions/:id/decisions', at: ({ draft }) => `/submissions/${draft}/decisions`, body: bad, statuses: [401, 404, 403, 403, 404, 404, 404, 404, 404] },
  { route: 'get /scaling/working', at: () => '/scaling/working?clades=rodentia&xStructure=cerebral_cortex&yStructure=cerebral_cortex', statuses: [401, 403, 403, 403, 403, 200, 200, 200, 403] },
  // Re-checks
  { route: 'get /rechecks', statuses: [401, 403, 200, 200, 200, 200, 200, 200, 403] },
  { route: 'get /rechecks/:id', at: ({ open }) => `/rechecks/${open}`, statuses: [401, 404, 200, 200, 404, 200, 200, 200, 404] },
  { route: 'post /records/:id/rechecks', at: () => '/records/AK-000001/rechecks', body: bad, statuses: [401, 403, 403, 403, 403, 400, 400, 400, 403] },
  { route: 'post /records/:id/rechecks', at: ({ record }) => `/records/${record}/rechecks`, body: bad, statuses: [401, 404, 403, 403, 404, 400, 400, 400, 404] },
  { route: 'post /rechecks/:id/answers', at: ({ open }) => `/rechecks/${open}/answers`, body: bad, statuses: [401, 404, 400, 400, 404, 403, 403, 403, 404] },
  { route: 'post /rechecks/:id/close', at: ({ answered }) => `/rechecks/${answered}/close`, body: bad, statuses: [401, 404, 403, 403, 404, 400, 403, 400, 404] },
  // Taxa
  { route: 'post /taxa', body: bad, statuses: [401, 403, 400, 400, 400, 403, 403, 400, 403] },
  { route: 'post /taxa/:id/decisions', at: () => '/taxa/rodentia/decisions', body: bad, statuses: curatorOnly(400) },
  { route: 'post /taxa/:id/decisions', at: (things) => `/taxa/${things.taxon}/decisions`, body: bad, statuses: [401, 404, 403, 403, 403, 403, 403, 400, 404] },
  { route: 'post /taxa/:id/synonyms', at: () => '/taxa/rodentia/synonyms', body: bad, statuses: curatorOnly(400) },
  // Set aside, freeze, agree
  { route: 'get /curate/waits', statuses: curatorOnly(200) },
  { route: 'get /set-asides', statuses: curatorOnly(200) },
  { route: 'post /records/:number/set-asides', at: () => '/records/AK-000001/set-asides', body: bad, statuses: curatorOnly(400) },
  { route: 'post /set-asides/:id/lift', at: ({ setAside }) => `/set-asides/${setAside}/lift`, body: bad, statuses: curatorOnly(400) },
  { route: 'get /freeze/preview', statuses: curatorOnly(200) },
  { route: 'get /freeze/progress', statuses: [401, 403, 403, 403, 403, 403, 403, 200, 200] },
  { route: 'post /versions', body: { note: 5 }, statuses: curatorOnly(400) },
  // None is being prepared: the two who may agree find nothing there.
  { route: 'post /versions/preparing/agree', statuses: [401, 403, 403, 403, 403, 403, 403, 404, 404] },
  // Audit, people, laboratories, outbox
  { route: 'get /audit', statuses: [401, 403, 403, 403, 403, 403, 403, 200, 200] },
  { route: 'get /people', statuses: administratorOnly(200) },
  { route: 'put /people/:id/roles', at: ({ person }) => `/people/${person}/roles`, body: bad, statuses: administratorOnly(400) },
  { route: 'patch /people/:id', at: ({ person }) => `/people/${person}`, body: bad, statuses: administratorOnly(400) },
  { route: 'post /people/:id/memberships', at: ({ person }) => `/people/${person}/memberships`, body: bad, statuses: administratorOnly(400) },
  { route: 'patch /memberships/:id', at: ({ membership }) => `/memberships/${membership}`, body: bad, statuses: administratorOnly(400) },
  { route: 'get /labs', statuses: administratorOnly(200) },
  { route: 'post /labs', body: bad, statuses: administratorOnly(400) },
  { route: 'get /outbox', statuses: administratorOnly(200) },
];

let app: TestApp;
let clients: Record<Visitor, TestClient>;
let things: Things;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
  ({ clients, things } = await makeRoleFixtures(app));
}, 180_000);
afterAll(() => app.close());

const partsOf = (route: string) => route.split(' ') as [string, string];

test('every endpoint of the API has a row', () => {
  const covered = new Set(table.map((row) => row.route));
  expect(routes.map(({ method, path }) => `${method} ${path}`).filter((route) => !covered.has(route))).toEqual([]);
});

test('every row is of an endpoint that exists', () => {
  const existing = new Set(routes.map(({ method, path }) => `${method} ${path}`));
  expect(table.map((row) => row.route).filter((route) => !existing.has(route))).toEqual([]);
});

describe('the table', () => {
  test.each(table.map((row, index) => ({ ...row, index })))('$route ($index)', async ({ route, at, body, statuses }) => {
    const [method, path] = partsOf(route);
    const address = at?.(things) ?? path;
    const answers = await Promise.all(visitors.map((visitor) => clients[visitor].request<{ code?: string }>(method.toUpperCase(), address, body)));
    expect(Object.fromEntries(visitors.map((visitor, column) => [visitor, answers[column]?.status]))).toEqual(Object.fromEntries(visitors.map((visitor, column) => [visitor, statuses[column]])));
    // A refusal says which kind it is by its code, and nothing of the thing.
    for (const answer of answers.filter(({ status }) => status === 404)) expect(answer.body.code).toBe('not-found');
  });
});

describe('ids that name nothing', () => {
  test.each([...new Set(table.map(({ route }) => route))].filter((route) => route.includes('/:')))('%s answers 404, or 403 where even that may not be known', async (route) => {
    const [method, path] = partsOf(route);
    for (const id of ['00000000-0000-4000-8000-000000000000', 'AK-999999', 'no-such-thing', '%27%20or%201=1--']) {
      const address = path.replace(/:[A-Za-z]+/g, id);
      for (const visitor of ['reviewer', 'curator', 'administrator'] as const) {
        const { status } = await clients[visitor].request(method.toUpperCase(), address, method === 'get' ? undefined : bad);
        expect([403, 404], `${visitor} ${method} ${address}`).toContain(status);
      }
    }
  });
});

describe('a session that is none', () => {
  const guarded = table.filter(({ statuses }) => statuses[0] === 401);
  const statusesWith = async (cookie: string) => {
    const client = createClient(app.url, cookie);
    const answers = await Promise.all(guarded.map(({ route, at, body }) => client.request(partsOf(route)[0].toUpperCase(), at?.(things) ?? partsOf(route)[1], body)));
    return answers.map((answer) => answer.status);
  };
  const all401 = guarded.map(() => 401);

  test('because it has expired opens nothing', async () => {
    const person = await makePerson(app.context.db, { roles: ['contributor', 'reviewer', 'curator', 'administrator'] });
    const cookie = await signInCookie(app.url, person.email);
    await app.context.db.update(sessions).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(sessions.userId, person.id));
    expect(await statusesWith(cookie)).toEqual(all401);
  });

  test('because it is forged opens nothing', async () => {
    const [name = '', value = ''] = (clients.administrator.cookie ?? '').split('=');
    const [token = ''] = decodeURIComponent(value).split('.');
    expect(await statusesWith(`${name}=${encodeURIComponent(`${token}.${Buffer.alloc(32, 7).toString('base64')}`)}`)).toEqual(all401);
  });

  test('because its account is disabled opens nothing', async () => {
    const person = await makePerson(app.context.db, { roles: ['contributor', 'reviewer', 'curator', 'administrator'] });
    const cookie = await signInCookie(app.url, person.email);
    await app.context.db.update(users).set({ disabledAt: new Date() }).where(eq(users.id, person.id));
    expect(await statusesWith(cookie)).toEqual(all401);
  });
});
