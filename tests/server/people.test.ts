import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sessions, userRoles, users } from '../../db/schema/index';
import type { Me } from '../../shared/contracts/account';
import type { Lab, Person } from '../../shared/contracts/people';
import type { Role } from '../../shared/contracts/vocabulary';
import type { TestClient } from '../support/client';
import { makePerson } from '../support/factories';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let administrator: TestClient;
beforeAll(async () => {
  app = await startTestApp({ clock: () => new Date('2026-05-10T08:00:00.000Z') });
  administrator = await app.as('administrator');
});
afterAll(() => app.close());

type Page<Item> = { items: Item[]; nextCursor: string | null };
const me = async (client: TestClient) => (await client.get<Me>('/me')).body;
const setRoles = (id: string, roles: readonly Role[]) => administrator.request<Person>('PUT', `/people/${id}/roles`, { roles });
const newestAct = async () => (await administrator.get<Page<{ action: string; targetId: string; detail: unknown }>>('/audit?limit=1')).body.items[0];

describe('roles', () => {
  test('are given and taken as a set, hold from the next request on, and are noted with before and after', async () => {
    const person = await makePerson(app.context.db);
    const client = await app.as(person);
    expect((await me(client)).person?.roles).toEqual([]);
    expect((await setRoles(person.id, ['reviewer', 'contributor'])).body.roles).toEqual(['contributor', 'reviewer']);
    expect((await me(client)).person?.roles).toEqual(['contributor', 'reviewer']);
    await setRoles(person.id, ['curator']);
    expect((await me(client)).person?.roles).toEqual(['curator']);
    expect(await newestAct()).toMatchObject({ action: 'roles-set', targetId: person.id, detail: { before: ['contributor', 'reviewer'], after: ['curator'] } });
  });

  test('of the last administrator stay, also when two take each other’s away at the same moment', async () => {
    const first = await app.person('administrator');
    expect((await setRoles(first.id, [])).status).toBe(409);
    const second = await makePerson(app.context.db, { roles: ['administrator'] });
    const other = await app.as(second);
    await Promise.all([setRoles(second.id, []), other.request('PUT', `/people/${first.id}/roles`, { roles: [] })]);
    expect(await app.context.db.$count(userRoles, eq(userRoles.role, 'administrator'))).toBe(1);
    await app.context.db.insert(userRoles).values({ userId: first.id, role: 'administrator' }).onConflictDoNothing();
    await app.context.db.delete(userRoles).where(and(eq(userRoles.userId, second.id), eq(userRoles.role, 'administrator')));
  });

  test('are not given to the actor that loads the published tables', async () => {
    const [system] = await app.context.db.insert(users).values({ name: 'Register loader (system)', email: 'system@test.example', kind: 'system' }).returning({ id: users.id });
    expect((await setRoles(system?.id ?? '', ['administrator'])).status).toBe(404);
  });
});

describe('membership', () => {
  test('counts from its first day to its last, and a new one ends the running one the day before', async () => {
    const person = await makePerson(app.context.db, { labId: app.labs.first.id, fromDay: '2025-01-01' });
    const client = await app.as(person);
    expect((await me(client)).person?.lab?.id).toBe(app.labs.first.id);
    const moved = await administrator.post<Person>(`/people/${person.id}/memberships`, { labId: app.labs.second.id, fromDay: '2026-05-10' });
    expect(moved.status).toBe(201);
    expect(moved.body.memberships.map(({ labId, fromDay, untilDay }) => [labId, fromDay, untilDay])).toEqual([
      [app.labs.first.id, '2025-01-01', '2026-05-09'],
      [app.labs.second.id, '2026-05-10', null],
    ]);
    expect((await me(client)).person?.lab?.id).toBe(app.labs.second.id);
    const running = moved.body.memberships[1]?.id ?? '';
    expect((await administrator.request('PATCH', `/memberships/${running}`, { untilDay: '2026-05-09' })).status).toBe(400);
    await administrator.request('PATCH', `/memberships/${running}`, { untilDay: '2026-05-10' });
    expect((await me(client)).person?.lab?.id).toBe(app.labs.second.id);
    expect(await newestAct()).toMatchObject({ action: 'membership-ended', targetId: person.id });
  });

  test('begins in a laboratory that exists', async () => {
    const person = await makePerson(app.context.db);
    const answer = await administrator.post<{ errors: { path: string }[] }>(`/people/${person.id}/memberships`, { labId: person.id, fromDay: '2026-05-10' });
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error) => error.path)).toEqual(['labId']);
  });
});

describe('an account', () => {
  test('that is disabled has no session from that moment, and may be let in again', async () => {
    const person = await makePerson(app.context.db);
    const client = await app.as(person);
    expect((await administrator.request<Person>('PATCH', `/people/${person.id}`, { disabled: true })).body.disabled).toBe(true);
    expect((await me(client)).person).toBeNull();
    expect(await app.context.db.$count(sessions, eq(sessions.userId, person.id))).toBe(0);
    expect(await newestAct()).toMatchObject({ action: 'account-disabled', targetId: person.id });
    expect((await administrator.request<Person>('PATCH', `/people/${person.id}`, { disabled: false })).body.disabled).toBe(false);
  });

  test('of the last administrator is not disabled', async () => {
    const { id } = await app.person('administrator');
    expect((await administrator.request('PATCH', `/people/${id}`, { disabled: true })).status).toBe(409);
  });

  test('changes its own name and ORCID iD, which must be a good one and nobody else’s', async () => {
    const client = await app.as(await makePerson(app.context.db));
    expect((await client.request<Me>('PATCH', '/me', { name: 'Renamed', orcid: 'https://orcid.org/0000-0002-1825-0097' })).body.person).toMatchObject({ name: 'Renamed', orcid: '0000-0002-1825-0097' });
    expect((await client.request('PATCH', '/me', { orcid: '0000-0002-1825-0098' })).status).toBe(400);
    const other = await app.as(await makePerson(app.context.db));
    expect((await other.request('PATCH', '/me', { orcid: '0000-0002-1825-0097' })).status).toBe(409);
    expect((await client.request<Me>('PATCH', '/me', { orcid: null })).body.person).toMatchObject({ name: 'Renamed', orcid: null });
  });
});

describe('lists', () => {
  test('of people are walked by the cursor without gap or repetition, and searched by name or address', async () => {
    for (let index = 0; index < 5; index += 1) await makePerson(app.context.db, { name: 'Same Name', email: `walk_${index}@test.example` });
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { body: Page<Person> } = await administrator.get<Page<Person>>(`/people?limit=2${cursor === '' ? '' : `&cursor=${cursor}`}`);
      seen.push(...page.body.items.map((person) => person.id));
      cursor = page.body.nextCursor;
    }
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen).toHaveLength(await app.context.db.$count(users));
    expect((await administrator.get<Page<Person>>('/people?query=WALK_3')).body.items.map((person) => person.email)).toEqual(['walk_3@test.example']);
    expect((await administrator.get<Page<Person>>('/people?query=%25')).body.items).toEqual([]);
  });

  test('of laboratories hold each once, with its members of today', async () => {
    const made = await administrator.post<Lab>('/labs', { name: 'Third laboratory', place: 'Anywhere' });
    expect(made.status).toBe(201);
    expect((await administrator.post('/labs', { name: 'third LABORATORY' })).status).toBe(409);
    await makePerson(app.context.db, { labId: made.body.id, fromDay: '2026-05-10' });
    await makePerson(app.context.db, { labId: made.body.id, fromDay: '2026-05-11' });
    await makePerson(app.context.db, { labId: made.body.id, fromDay: '2026-01-01', untilDay: '2026-05-09' });
    const { items } = (await administrator.get<{ items: Lab[] }>('/labs')).body;
    expect(items.find((lab) => lab.id === made.body.id)?.members).toBe(1);
  });
});

test('the outbox shows the administrator of a demonstration what was mailed, and is not there outside', async () => {
  await app.anonymous.post('/api/auth/sign-up/email', { name: 'Mailed', email: 'mailed@test.example', password: 'long enough to count' });
  await app.runJobs();
  const { items } = (await administrator.get<{ items: { to: string; text: string }[] }>('/outbox')).body;
  expect(items[0]?.to).toBe('mailed@test.example');
  expect(items[0]?.text).toContain('/api/auth/verify-email?token=');
  const real = await startTestApp({ env: { KARYA_DEMO: 'off' } });
  try {
    expect((await (await real.as('administrator')).get('/outbox')).status).toBe(404);
  } finally {
    await real.close();
  }
});
