import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Register } from '../../shared/contracts/register';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let empty: TestApp;
beforeAll(async () => {
  [app, empty] = await Promise.all([startTestApp({ seed: 'published' }), startTestApp({ seed: 'vocabularies' })]);
});
afterAll(async () => {
  await app.close();
  await empty.close();
});

describe('GET /register', () => {
  it('shows the exponents of cortex mass on neurons with every species as a stroke, those set aside among them', async () => {
    const { body } = await app.anonymous.get<Register>('/register');
    const rodents = body.exponents.find(({ clade }) => clade === 'rodentia');
    expect([rodents?.exponent?.toFixed(3), rodents?.standardError?.toFixed(3), rodents?.n]).toEqual(['1.692', '0.102', 9]);
    expect(rodents?.strokes.filter(({ setAside }) => setAside).map(({ slug }) => slug)).toEqual(['heterocephalus-glaber']);
    expect(rodents?.strokes).toHaveLength(10);
    expect(rodents?.previous).toBeNull();
    expect(body.exponents.map(({ clade }) => clade)).toEqual(expect.arrayContaining(['primates', 'glires', 'rodentia', 'afrotheria', 'artiodactyla']));
    expect(body.exponents.every(({ method, yStructure }) => method === 'ols' && yStructure === 'cerebral_cortex')).toBe(true);
  });

  it('counts what version 1 holds and says what it brought', async () => {
    const { body } = await app.anonymous.get<Register>('/register');
    expect(body.version).toMatchObject({ label: '1', demonstration: false });
    expect(body.counts.species).toBeGreaterThan(63);
    expect(body.since).toMatchObject({ previous: null, recordsCame: body.counts.records, recordsRevised: 0, withdrawn: 0 });
    expect(body.versions).toEqual([{ label: '1', frozenAt: body.version?.frozenAt, records: body.counts.records, species: body.counts.species }]);
    expect(body.newest.length).toBeGreaterThan(0);
    expect(body.waiting).toEqual([]);
  });

  it('stands empty before the first version, and the pages of versions answer 404', async () => {
    const { status, body } = await empty.anonymous.get<Register>('/register');
    expect(status).toBe(200);
    expect(body).toMatchObject({ version: null, counts: { records: 0 }, exponents: [], newest: [], since: null, versions: [] });
    for (const path of ['/scaling', '/species', '/records', '/species/homo-sapiens']) expect((await empty.anonymous.get(path)).status).toBe(404);
  });

  it('answers people of every role', async () => {
    for (const role of ['contributor', 'reviewer', 'curator', 'administrator'] as const) {
      expect((await (await app.as(role)).get<Register>('/register')).body.waiting).toEqual([]);
    }
  });
});
