import { createHash } from 'node:crypto';
import Papa from 'papaparse';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findFrozenVersion, findVersionFiles } from '../../db/queries/versions';
import { freezeNow } from '../../server/services/versions/freeze';
import { setAside } from '../../server/services/versions/setAside';
import type { VersionPage } from '../../shared/contracts/versions';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
}, 180_000);
afterAll(() => app.close());

const tableOf = async (label: string, name: string) => Papa.parse<Record<string, string>>((await app.anonymous.get(`/versions/${label}/files/${name}`)).bytes.toString('utf8'), { header: true, skipEmptyLines: true }).data;
const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');

describe('version 1', () => {
  it('holds the published tables alone, one record set aside, no demonstration and no minted DOI', async () => {
    const { body } = await app.anonymous.get<VersionPage>('/versions/1');
    expect(body).toMatchObject({ label: '1', doi: null, records: 238, current: true, demonstration: false, previous: null, licence: 'CC BY 4.0' });
    expect(body.title).not.toMatch(/demonstration/);
    expect(body.setAside).toHaveLength(1);
    expect(body.setAside[0]).toMatchObject({ species: 'Heterocephalus glaber', structure: 'cerebral_cortex', scope: { a: { variable: 'structureMassG', structure: 'cerebral_cortex' }, b: { variable: 'neurons', structure: 'cerebral_cortex' } } });
    expect(body.changes.came).toHaveLength(238);
    expect(body.contributors).toEqual([]);
  });

  it('gives back the exponents that the papers print', async () => {
    // Exponent, standard error: tests/reference/reproducible_exponents.csv (rows without an exclusion, or with the naked mole-rat's), to 1e-5.
    const wanted = [
      ['glires', 'cerebral_cortex', 1.699192, 0.095985, 10],
      ['primates', 'cerebral_cortex', 1.086939, 0.073848, 12],
      ['primates', 'cerebellum', 0.975782, 0.03623, 13],
      ['glires', 'rest_of_brain', 1.533535, 0.202707, 11],
      ['primates', 'rest_of_brain', 1.19826, 0.115687, 12],
    ] as const;
    const fits = await tableOf('1', 'standing_fits.csv');
    for (const [clade, structure, exponent, standardError, n] of wanted) {
      const fit = fits.find((row) => row['clade'] === clade && row['y'] === 'structureMassG' && row['y_structure'] === structure && row['x'] === 'neurons' && row['method'] === 'ols');
      expect(Math.abs(Number(fit?.['exponent']) - exponent), `${clade} ${structure}`).toBeLessThan(1e-5);
      expect(Math.abs(Number(fit?.['exponent_standard_error']) - standardError), `${clade} ${structure}`).toBeLessThan(1e-5);
      expect(fit?.['n']).toBe(String(n));
    }
  });

  it('holds its files with a strong tag, for ever, and answers 304 to who has them', async () => {
    const page = await app.anonymous.get<VersionPage>('/versions/1');
    for (const { name, bytes, sha256: expected, mediaType } of page.body.files) {
      const answer = await app.anonymous.get(`/versions/1/files/${name}`);
      expect(sha256(answer.bytes), name).toBe(expected);
      expect(answer.bytes.length).toBe(bytes);
      expect(answer.headers.get('etag')).toBe(`"${expected}"`);
      expect(answer.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
      expect(answer.headers.get('content-type')).toContain(mediaType);
      expect((await app.anonymous.get(`/versions/1/files/${name}`, { headers: { 'if-none-match': `"${expected}"` } })).status).toBe(304);
    }
    expect(page.body.sha256).toBe(page.body.files.find(({ name }) => name === 'CHECKSUMS.sha256')?.sha256);
    expect((await app.anonymous.get('/versions/1/files/..%2Fsecret')).status).toBe(404);
    expect((await app.anonymous.get('/versions/9')).status).toBe(404);
  });

  it('lists every contributing record and its weight with each species mean', async () => {
    const means = await tableOf('1', 'species_means.csv');
    const records = new Set((await tableOf('1', 'records.csv')).map((row) => row['record']));
    expect(means.length).toBeGreaterThan(200);
    for (const row of means) {
      expect(records.has(row['record'])).toBe(true);
      expect(Number(row['weight'])).toBeGreaterThan(0);
    }
  });

  it('gives the same zip on each download, holding the files as they are', async () => {
    const [first, second] = [await app.anonymous.get('/versions/1/bundle'), await app.anonymous.get('/versions/1/bundle')];
    expect(first.headers.get('content-type')).toBe('application/zip');
    expect(sha256(first.bytes)).toBe(sha256(second.bytes));
    const records = (await app.anonymous.get('/versions/1/files/records.csv')).bytes;
    expect(first.bytes.includes(records)).toBe(true);
  });

  it('is cited as text and BibTeX with version and date, and a subset with its primary sources alone', async () => {
    const text = (await app.anonymous.get('/versions/1/citation')).bytes.toString('utf8');
    expect(text).toMatch(/^Allokarya register \(\d{4}\)\. Allokarya: brain-tissue masses and cell counts, version 1\. DOI not minted\. Frozen \d{4}-\d\d-\d\d\. http/);
    const human = (await tableOf('1', 'records.csv')).filter((row) => row['species'] === 'Homo sapiens' && row['structure'] === 'cerebral_cortex');
    const subset = (await app.anonymous.get(`/versions/1/citation?style=bibtex&records=${human[0]?.['record']}`)).bytes.toString('utf8');
    expect(subset.match(/^@/gm)).toHaveLength(2);
    expect(subset).toContain('10.1002/cne.21974');
    expect(subset).not.toContain('10.1126/science.982039');
    const unknown = await app.anonymous.get<{ errors: { path: string }[] }>('/versions/1/citation?records=AK-999999,nonsense');
    expect(unknown.status).toBe(400);
    expect(unknown.body.errors).toHaveLength(2);
  });

  it('writes BibTeX that a parser reads back', async () => {
    // The package brings no types of its own; a name in a variable keeps the compiler from looking for them.
    const [core, bibtex] = ['@citation-js/core', '@citation-js/plugin-bibtex'];
    const { Cite } = (await import(core)) as { Cite: new (text: string) => { data: unknown } };
    await import(bibtex);
    const bibliography = (await app.anonymous.get('/versions/1/files/sources.bib')).bytes.toString('utf8');
    const entries = new Cite(bibliography).data as { DOI?: string; volume?: string; author?: { family: string }[] }[];
    expect(entries).toHaveLength(14);
    expect(entries.find((entry) => entry.DOI === '10.1073/pnas.0604911103')).toMatchObject({ volume: '103', author: [{ family: 'Herculano-Houzel' }, { family: 'Mota' }, { family: 'Lent' }] });
  });
});

describe('a later version', () => {
  beforeAll(async () => {
    const curator = await app.actor('curator');
    await setAside(app.context, curator, 'AK-000001', { scope: 'all', reason: '=HYPERLINK("http://example.org")' });
    await freezeNow(app.context, curator, { label: '2', note: `Only this test writes this: ${process.pid}.` });
  }, 120_000);

  it('stands beside the first, which stays as it was', async () => {
    const { body } = await app.anonymous.get<{ items: { label: string; current: boolean }[]; preparing: unknown }>('/versions');
    expect(body.items.map(({ label, current }) => [label, current])).toEqual([['2', true], ['1', false]]);
    const second = await app.anonymous.get<VersionPage>('/versions/2');
    expect(second.body.previous).toBe('1');
    expect(second.body.changes).toMatchObject({ came: [], revised: [], went: [], setAside: [{ number: 'AK-000001' }] });
    expect(second.body.standingFits.every((fit) => fit.previous !== null)).toBe(true);
    expect((await app.anonymous.get<{ ok: boolean }>('/versions/1/verify')).body.ok).toBe(true);
  });

  it('tells the curator once', async () => {
    const curator = await app.person('curator');
    const notices = await app.context.db.execute<{ subject: string }>(sql`select subject from notices where user_id = ${curator.id} and kind = 'frozen'`);
    expect(notices.rows.map(({ subject }) => subject)).toEqual(['version 2 is frozen']);
  });

  it('writes no cell that a spreadsheet would run', async () => {
    const text = (await app.anonymous.get('/versions/2/files/records.csv')).bytes.toString('utf8');
    expect(text).toContain('HYPERLINK');
    for (const row of Papa.parse<string[]>(text, { skipEmptyLines: true }).data) for (const value of row) expect(value).not.toMatch(/^[=+\-@\t\r]/);
  });

  it('is refused when nothing changed since, or under another number', async () => {
    const curator = await app.as('curator');
    expect((await curator.post<{ code: string }>('/versions', { label: '3' })).body.code).toBe('nothing-to-freeze');
    expect((await curator.post<{ code: string }>('/versions', { label: '7' })).body.code).toBe('invalid-input');
    expect((await (await app.as('reviewer')).post('/versions', { label: '3' })).status).toBe(403);
    expect((await app.anonymous.post('/versions', { label: '3' })).status).toBe(401);
  });

  it('is found out by verify, file by file, when stored bytes are altered, and the altered file is not served', async () => {
    const version = await findFrozenVersion(app.context.db, 2);
    const readme = (await findVersionFiles(app.context.db, version?.id ?? '')).find(({ name }) => name === 'README.md');
    const key = readme?.storageKey ?? '';
    const kept = await app.context.storage.get(key);
    const altered = Buffer.from(kept?.content ?? '');
    altered[10] = 0x21;
    await app.context.storage.put(key, altered, { contentType: 'text/markdown' });
    const { body } = await app.anonymous.get<{ ok: boolean; files: { name: string; ok: boolean }[] }>('/versions/2/verify');
    expect(body.ok).toBe(false);
    expect(body.files.filter(({ ok }) => !ok).map(({ name }) => name)).toEqual(['README.md']);
    expect((await app.anonymous.get('/versions/2/files/README.md')).status).toBe(503);
    await app.context.storage.put(key, kept?.content ?? altered, { contentType: 'text/markdown' });
    expect((await app.anonymous.get<{ ok: boolean }>('/versions/2/verify')).body.ok).toBe(true);
  });
});
