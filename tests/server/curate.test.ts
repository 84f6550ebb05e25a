import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seedPublished } from '../../server/seed/published';
import { seedVocabularies } from '../../server/seed/vocabularies';
import type { FreezePreview, Waits } from '../../shared/contracts/versions';
import { startTestApp, type TestApp } from '../support/testApp';
import { makePerson } from '../support/factories';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
}, 180_000);
afterAll(() => app.close());

const pair = { a: { variable: 'structureMassG', structure: 'cerebral_cortex' }, b: { variable: 'neurons', structure: 'cerebral_cortex' } };
/** Human cortex: in the fits of primates. */
async function humanCortex(): Promise<string> {
  const found = await app.context.db.execute<{ number: string }>(sql`select 'AK-' || lpad(r.number::text, 6, '0') as number from records r join taxa t on t.id = r.taxon_id join structures s on s.id = r.structure_id where t.slug = 'homo-sapiens' and s.key = 'cerebral_cortex'`);
  return found.rows[0]?.number ?? '';
}

describe('setting aside', () => {
  it('leaves the record out from the next version on: previewed, listed, lifted, never twice', async () => {
    const curator = await app.as('curator');
    const number = await humanCortex();
    const made = await curator.post<{ id: string; record: string; reason: string }>(`/records/${number}/set-asides`, { scope: pair, reason: 'To see how far one species decides.' });
    expect(made.status).toBe(201);
    // A pair has no order: the same one the other way round is the same.
    expect((await curator.post(`/records/${number}/set-asides`, { scope: { a: pair.b, b: pair.a }, reason: 'Again.' })).status).toBe(409);
    await app.runJobs();
    const preview = await curator.get<FreezePreview>('/freeze/preview');
    expect(preview.body.changes.setAside.map((item) => item.number)).toEqual([number]);
    const fit = preview.body.exponents.find(({ slug }) => slug === 'structuremassg-cerebral-cortex--neurons-cerebral-cortex--primates--ols');
    // PRODUCT's figures: 1.087 with the human, 0.989 without.
    expect(fit?.previous?.toFixed(3)).toBe('1.087');
    expect(fit?.exponent?.toFixed(3)).toBe('0.989');
    const listed = await curator.get<{ items: { id: string; liftedAt: string | null }[] }>('/set-asides');
    expect(listed.body.items[0]).toMatchObject({ id: made.body.id, liftedAt: null });
    expect((await curator.post(`/set-asides/${made.body.id}/lift`, { reason: '' })).status).toBe(400);
    expect((await curator.post(`/set-asides/${made.body.id}/lift`, { reason: 'Seen.' })).status).toBe(200);
    expect((await curator.post(`/set-asides/${made.body.id}/lift`, { reason: 'Seen.' })).status).toBe(409);
    expect((await curator.get<FreezePreview>('/freeze/preview')).body.changes.setAside).toEqual([]);
  });

  it('names every part of a scope that names no fit', async () => {
    const curator = await app.as('curator');
    const scope = { a: { variable: 'bodyMassG', structure: 'cerebellum' }, b: { variable: 'neurons', structure: 'no_such' } };
    const answer = await curator.post<{ errors: { path: string }[] }>(`/records/${await humanCortex()}/set-asides`, { scope, reason: 'x' });
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map(({ path }) => path)).toEqual(['scope.a.structure', 'scope.b.structure']);
  });

  it('stops at the curator’s own laboratory, before the body is looked at', async () => {
    const number = await humanCortex();
    await app.context.db.execute(sql`update records set lab_id = ${app.labs.first.id} where 'AK-' || lpad(number::text, 6, '0') = ${number}`);
    const own = await app.as(await makePerson(app.context.db, { roles: ['curator'], labId: app.labs.first.id }));
    const answer = await own.post<{ code: string }>(`/records/${number}/set-asides`, { nonsense: true });
    expect([answer.status, answer.body.code]).toEqual([403, 'own-lab']);
    await app.context.db.execute(sql`update records set lab_id = null where 'AK-' || lpad(number::text, 6, '0') = ${number}`);
  });
});

describe('what waits', () => {
  it('names nothing to freeze while every record stands in the current version', async () => {
    const { body, status } = await (await app.as('curator')).get<Waits>('/curate/waits');
    expect(status).toBe(200);
    expect(body).toMatchObject({ toFreeze: [], openRechecks: [], proposedTaxa: 0 });
  });
});

describe('seeding', () => {
  it('adds nothing when it runs again', async () => {
    const count = async () => (await app.context.db.execute<{ n: string }>(sql`select (select count(*) from records) || ' ' || (select count(*) from taxa) || ' ' || (select count(*) from set_asides) || ' ' || (select count(*) from versions) || ' ' || (select count(*) from submissions) as n`)).rows[0]?.n;
    const before = await count();
    await seedVocabularies(app.context);
    await seedPublished(app.context);
    expect(await count()).toBe(before);
  });
});
