import Papa from 'papaparse';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RecordRow } from '../../shared/contracts/records';
import type { Problem } from '../../shared/contracts/problems';
import type { RecordPage } from '../../shared/contracts/register';
import { startTestApp, type TestApp } from '../support/testApp';

interface RecordList { items: RecordRow[]; nextCursor: string | null }
let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
});
afterAll(() => app.close());

const naked = async () => (await app.anonymous.get<RecordList>('/records?species=heterocephalus-glaber&structure=cerebral_cortex')).body.items[0];

describe('GET /records', () => {
  it('gives every record once over the pages, in order of number', async () => {
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: RecordList = (await app.anonymous.get<RecordList>(`/records?limit=100${cursor === '' ? '' : `&cursor=${cursor}`}`)).body;
      seen.push(...page.items.map(({ number }) => number));
      cursor = page.nextCursor;
    }
    expect(seen).toEqual([...new Set(seen)].sort());
    expect(seen.length).toBeGreaterThan(190);
  });

  it('gives the same records as one table by Accept: text/csv, whatever the limit', async () => {
    const { body } = await app.anonymous.get<RecordList>('/records?clade=primates&structure=cerebral_cortex&limit=200');
    const table = await app.anonymous.get('/records?clade=primates&structure=cerebral_cortex&limit=1', { headers: { accept: 'text/csv' } });
    expect(table.headers.get('content-type')).toContain('text/csv');
    const parsed = Papa.parse<Record<string, string>>(table.bytes.toString('utf8'), { header: true, skipEmptyLines: true }).data;
    expect(parsed.map((row) => row['record'])).toEqual(body.items.map(({ number }) => number));
    expect(parsed.map((row) => Number(row['neurons']))).toEqual(body.items.map(({ neurons }) => neurons));
    expect(parsed.every((row) => row['version'] === '1')).toBe(true);
  });

  it('writes no cell that a spreadsheet would run as a formula', async () => {
    const table = await app.anonymous.get('/records', { headers: { accept: 'text/csv' } });
    const cells = Papa.parse<string[]>(table.bytes.toString('utf8'), { skipEmptyLines: true }).data.flat();
    expect(cells.length).toBeGreaterThan(1000);
    expect(cells.filter((cell) => /^[=+@\t\r]/.test(cell) || /^-\D/.test(cell))).toEqual([]);
  });

  it('names every filter that finds nothing to filter by', async () => {
    const { status, body } = await app.anonymous.get<Problem>('/records?clade=unicorns&structure=horn&species=nobody-here');
    expect(status).toBe(400);
    expect(body.errors.map(({ path }) => path)).toEqual(['clade', 'structure', 'species']);
    expect((await app.anonymous.get('/records?version=99')).status).toBe(404);
  });

  it('carries its entity tag and answers 304 to who has it', async () => {
    const first = await app.anonymous.get('/records?version=1&limit=5');
    expect(first.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect(first.headers.get('vary')).toContain('Accept');
    const again = await app.anonymous.get('/records?version=1&limit=5', { headers: { 'if-none-match': first.headers.get('etag') ?? '', 'cache-control': 'max-age=0' } });
    expect(again.status).toBe(304);
  });
});

describe('GET /records/:number', () => {
  it('shows the naked mole-rat’s cortex as set aside, with its reason, its trail and the version that holds it', async () => {
    const row = await naked();
    const { body } = await app.anonymous.get<RecordPage>(`/records/${row?.number ?? ''}`);
    expect(body).toMatchObject({ version: '1', working: false, withdrawn: null, inVersions: ['1'], rechecks: [], may: { askRecheck: false, setAside: false, revise: null } });
    expect(body.setAside).toHaveLength(1);
    expect(body.setAside[0]?.reason).not.toBe('');
    const trail = body.trail.map(({ what }) => what);
    expect(trail).toEqual(['revision 1 submitted', 'revision 1 approved', 'set aside from fits of mass of the cerebral cortex and neurons of the cerebral cortex', 'frozen in version 1']);
    expect(body.trail.at(-1)).toMatchObject({ current: true });
    expect(body.places[0]).toMatchObject({ clade: 'rodentia', n: 9, inside: false });
  });

  it('lets reviewers and curators ask for a re-check, and a curator set it aside', async () => {
    const number = (await naked())?.number ?? '';
    const may = async (role: 'reviewer' | 'curator' | 'contributor') => (await (await app.as(role)).get<RecordPage>(`/records/${number}`)).body.may;
    expect(await may('reviewer')).toEqual({ askRecheck: true, setAside: false, revise: null });
    expect(await may('curator')).toEqual({ askRecheck: true, setAside: true, revise: null });
    expect(await may('contributor')).toEqual({ askRecheck: false, setAside: false, revise: null });
  });

  it('answers numbers that were never given with 404', async () => {
    for (const number of ['AK-999999', 'AK-1', 'nonsense', '1']) expect((await app.anonymous.get(`/records/${number}`)).status).toBe(404);
    expect((await app.anonymous.get(`/records/${(await naked())?.number ?? ''}?version=9`)).status).toBe(404);
  });
});
