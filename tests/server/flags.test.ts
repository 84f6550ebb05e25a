import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import type { RecordPage, Register } from '../../shared/contracts/register';
import type { Preview, SubmissionDetail } from '../../shared/contracts/submissions';
import type { SpecimenContent } from '../../shared/contracts/content';
import { findUnfinishedFitRuns } from '../../db/queries/fits';
import { runFitRefresh } from '../../server/services/dataset/fitRefresh';
import type { TestClient } from '../support/client';
import { makePerson } from '../support/factories';
import { soundSpecimen, wholeChecklist } from '../support/submissionContent';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let contributor: TestClient;
let reviewer: TestClient;
let now = new Date('2026-12-01T10:00:00.000Z');
const working = '/scaling/working?clades=rodentia&xStructure=cerebral_cortex';

/** A marmot whose cortex is far too heavy for its neurons: approved by a reviewer of another laboratory. */
async function approve(code: string, change: (content: SpecimenContent) => void = () => undefined): Promise<string> {
  const content = soundSpecimen(code, (sound) => {
    sound.specimen.nameAsEntered = 'Marmota flaviventris';
    sound.specimen.taxon = 'marmota-flaviventris';
    sound.explanations = { 'unit-slip': 'Counted twice.', 'few-aliquots': 'Counted twice.', 'second-specimen': 'Counted twice.' };
    change(sound);
  });
  const { body } = await contributor.post<SubmissionDetail>('/submissions', { kind: 'specimen', content });
  const submitted = await contributor.post<{ errors?: unknown }>(`/submissions/${body.id}/submit`);
  expect([submitted.status, submitted.body.errors]).toEqual([200, undefined]);
  const decided = await reviewer.post<SubmissionDetail>(`/submissions/${body.id}/decisions`, { revision: 1, decision: 'approve', comment: 'Looked at.', checklist: wholeChecklist });
  expect(decided.status).toBe(200);
  return decided.body.records[0]?.number ?? '';
}

beforeAll(async () => {
  app = await startTestApp({ seed: 'published', clock: () => now });
  contributor = await app.as('contributor');
  reviewer = await app.as('reviewer');
});
afterAll(() => app.close());

describe('an approved record that no version holds', () => {
  let number = '';
  beforeAll(async () => {
    number = await approve('M-1');
    await app.runJobs();
  });

  it('moves the fit of the working set and leaves every public answer as it was', async () => {
    const inside = (await reviewer.get<ScalingAnswer>(working)).body;
    expect(inside.fits[0]?.n).toBe(10);
    expect(inside.species.find(({ slug }) => slug === 'marmota-flaviventris')?.contributions).toEqual([{ record: number, weight: 1, source: expect.any(String) as string }]);
    const outside = (await app.anonymous.get<ScalingAnswer>('/scaling?clades=rodentia&xStructure=cerebral_cortex')).body;
    expect([outside.fits[0]?.n, outside.fits[0]?.exponent?.estimate.toFixed(3)]).toEqual([9, '1.692']);
    expect(outside.species.map(({ slug }) => slug)).not.toContain('marmota-flaviventris');
  });

  it('is unknown to the public and to other laboratories, known to its own, to reviewers and curators', async () => {
    const stranger = await app.as(await makePerson(app.context.db, { roles: ['contributor'], labId: app.labs.second.id }));
    for (const client of [app.anonymous, stranger, await app.as('administrator')]) expect((await client.get(`/records/${number}`)).status).toBe(404);
    for (const client of [contributor, reviewer, await app.as('curator')]) {
      const { status, body } = await client.get<RecordPage>(`/records/${number}`);
      expect(status).toBe(200);
      expect(body).toMatchObject({ working: true, version: null, inVersions: [], row: { specimen: 'M-1', species: 'Marmota flaviventris' } });
      expect(body.samples[0]?.aliquots).toHaveLength(4);
    }
    expect((await contributor.get<RecordPage>(`/records/${number}`)).body.may.revise).not.toBeNull();
  });

  it('is held against a second specimen of its own laboratory, and not shown to another by such a check', async () => {
    const content = soundSpecimen('M-9', (sound) => Object.assign(sound.specimen, { nameAsEntered: 'Marmota flaviventris', taxon: 'marmota-flaviventris' }));
    const stranger = await app.as(await makePerson(app.context.db, { roles: ['contributor'], labId: app.labs.second.id }));
    const codes = async (client: TestClient) => (await client.post<Preview>('/submissions/preview', { content })).body.checks.map(({ code }) => code);
    expect(await codes(contributor)).toContain('second-specimen');
    expect(await codes(stranger)).not.toContain('second-specimen');
  });

  it('is flagged in the working set, with the fit and the reason named, and tells the curator of what waits', async () => {
    const { flags } = (await reviewer.get<RecordPage>(`/records/${number}`)).body;
    expect(flags.length).toBeGreaterThan(0);
    for (const flag of flags) expect(flag).toMatchObject({ set: 'working', version: null, record: number, species: 'Marmota flaviventris' });
    expect(flags.map(({ fit }) => fit)).toContain('structuremassg-cerebral-cortex--neurons-cerebral-cortex--rodentia--ols');
    expect(flags.every(({ fit }) => fit.endsWith('--ols'))).toBe(true);
    expect(flags[0]?.reasons.join(' ')).not.toBe('');
    const { waiting } = (await (await app.as('curator')).get<Register>('/register')).body;
    expect(waiting.map(({ kind }) => kind)).toContain('to-freeze');
    expect(waiting.some(({ kind, href }) => kind === 'flag' && href === `/records/${number}`)).toBe(true);
  });

  it('is computed once, however often the job runs', async () => {
    const count = async () => (await app.context.db.execute<{ n: number }>('select count(*)::int as n from fit_results')).rows[0]?.n;
    const before = await count();
    const runs = (await app.context.db.execute<{ id: string }>("select id from fit_runs where set = 'working'")).rows;
    expect(runs.length).toBeGreaterThan(0);
    await Promise.all(runs.map(({ id }) => runFitRefresh(app.context, id)));
    expect(await count()).toBe(before);
    expect(await findUnfinishedFitRuns(app.context.db, 10)).toEqual([]);
  });

  it('leaves stored fits and flags as they are, whoever asks the database', async () => {
    await expect(app.context.db.execute("update fit_results set result = '{}'")).rejects.toThrow();
    await expect(app.context.db.execute("update flags set kind = 'watch'")).rejects.toThrow();
    await expect(app.context.db.execute('delete from fit_results')).rejects.toThrow();
  });
});

describe('a record under embargo', () => {
  it('is in no fit before its day, and in the working set from then on', async () => {
    const number = await approve('M-2', (content) => {
      content.provenance.embargoUntil = '2027-01-01';
    });
    await app.runJobs();
    const records = async () => (await reviewer.get<ScalingAnswer>(working)).body.species.flatMap(({ contributions }) => contributions.map(({ record }) => record));
    expect(await records()).not.toContain(number);
    expect((await app.anonymous.get(`/records/${number}`)).status).toBe(404);
    expect((await contributor.get<RecordPage>(`/records/${number}`)).status).toBe(200);
    now = new Date('2027-01-01T00:00:00.000Z');
    expect(await records()).toContain(number);
    // The sweep notices the day: the standing fit of the working set takes the second marmot in, once.
    await app.runJobs();
    const inputs = async () => (await app.context.db.execute<{ n: number }>(`select count(*)::int as n from fit_results where latest and inputs::text like '%${number}%'`)).rows[0]?.n;
    expect(await inputs()).toBeGreaterThan(0);
    const before = (await app.context.db.execute<{ n: number }>('select count(*)::int as n from fit_runs')).rows[0]?.n;
    await app.runJobs();
    expect((await app.context.db.execute<{ n: number }>('select count(*)::int as n from fit_runs')).rows[0]?.n).toBe(before);
    expect((await app.anonymous.get(`/records/${number}`)).status).toBe(404);
  });
});
