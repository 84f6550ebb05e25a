import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { listenOnLoopback } from '../../server/fakes/listen';
import type { RunningFake } from '../../server/fakes/listen';
import { buildMailFake } from '../../server/fakes/mail';

const apiKey = 're_right';
const message = { from: 'Register <register@demo.example>', to: ['a@demo.example'], subject: 'A decision', text: 'It was approved.' };
let folder: string;
let fake: RunningFake;
let clock: Date;

async function open() {
  return await listenOnLoopback(await buildMailFake({ folder, apiKey, now: () => clock }), 0);
}

async function post(body: unknown, headers: Record<string, string> = {}) {
  const answer = await fetch(`${fake.url}/emails`, { method: 'POST', headers: { 'content-type': 'application/json', authorization: `Bearer ${apiKey}`, ...headers }, body: JSON.stringify(body) });
  return { status: answer.status, body: (await answer.json()) as { id?: string; name?: string } };
}

async function sent(query = '') {
  const answer = await fetch(`${fake.url}/emails${query}`, { headers: { authorization: `Bearer ${apiKey}` } });
  return (await answer.json()) as { has_more: boolean; data: { id: string; subject: string }[] };
}

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'mail-'));
  clock = new Date('2026-03-01T10:00:00Z');
  fake = await open();
});
afterEach(async () => {
  await fake.close();
  await rm(folder, { recursive: true, force: true });
});

describe('the local mail service', () => {
  it('answers 401 without a key and 403 with a wrong one, and keeps nothing', async () => {
    const without = await fetch(`${fake.url}/emails`, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(message) });
    expect(without.status).toBe(401);
    expect(await post(message, { authorization: 'Bearer re_wrong' })).toMatchObject({ status: 403, body: { name: 'invalid_api_key' } });
    expect((await sent()).data).toEqual([]);
  });

  it.each([
    ['no recipient', { ...message, to: undefined }, 'missing_required_field'],
    ['no text', { ...message, text: undefined }, 'missing_required_field'],
    ['a recipient that is no address', { ...message, to: ['nobody'] }, 'validation_error'],
    ['a sender that is no address', { ...message, from: 'Register' }, 'invalid_from_address'],
    ['a subject of the wrong type', { ...message, subject: 4 }, 'validation_error'],
  ])('answers 422 to %s', async (_what, body, name) => {
    expect(await post(body)).toMatchObject({ status: 422, body: { name } });
  });

  it('sends once for one idempotency key and answers the same id', async () => {
    const first = await post(message, { 'idempotency-key': 'notice-1' });
    expect(await post(message, { 'idempotency-key': 'notice-1' })).toEqual(first);
    expect((await sent()).data).toHaveLength(1);
  });

  it('sends once although two requests with one key arrive together', async () => {
    const answers = await Promise.all([1, 2, 3].map(() => post(message, { 'idempotency-key': 'notice-2' })));
    expect(new Set(answers.map(({ body }) => body.id)).size).toBe(1);
    expect((await sent()).data).toHaveLength(1);
  });

  it('answers 409 when the key comes again with another message', async () => {
    await post(message, { 'idempotency-key': 'notice-1' });
    expect(await post({ ...message, subject: 'Another' }, { 'idempotency-key': 'notice-1' })).toMatchObject({ status: 409, body: { name: 'invalid_idempotent_request' } });
  });

  it('forgets a key after 24 hours, not before', async () => {
    const first = await post(message, { 'idempotency-key': 'notice-1' });
    clock = new Date('2026-03-02T09:59:59Z');
    expect((await post(message, { 'idempotency-key': 'notice-1' })).body.id).toBe(first.body.id);
    clock = new Date('2026-03-02T10:00:01Z');
    expect((await post(message, { 'idempotency-key': 'notice-1' })).body.id).not.toBe(first.body.id);
  });

  it('remembers messages and keys when it starts anew', async () => {
    const first = await post(message, { 'idempotency-key': 'notice-1' });
    await fake.close();
    fake = await open();
    expect(await post(message, { 'idempotency-key': 'notice-1' })).toEqual(first);
    expect((await sent()).data.map(({ id }) => id)).toEqual([first.body.id]);
  });

  it('lists the newest first and in pages', async () => {
    for (const subject of ['one', 'two', 'three']) await post({ ...message, subject });
    const page = await sent('?limit=2');
    expect(page.data.map(({ subject }) => subject)).toEqual(['three', 'two']);
    expect(page.has_more).toBe(true);
    const rest = await sent(`?limit=2&after=${page.data[1]?.id}`);
    expect(rest.data.map(({ subject }) => subject)).toEqual(['one']);
    expect(rest.has_more).toBe(false);
  });
});
