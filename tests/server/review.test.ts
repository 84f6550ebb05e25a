import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RecordRow } from '../../shared/contracts/records';
import type { Problem } from '../../shared/contracts/problems';
import type { Notice } from '../../shared/contracts/account';
import type { ReviewView, SubmissionDetail, SubmissionItem } from '../../shared/contracts/submissions';
import type { SpecimenContent } from '../../shared/contracts/content';
import type { TestClient } from '../support/client';
import { makePerson } from '../support/factories';
import { soundLiterature, soundSample, soundSpecimen, wholeChecklist } from '../support/submissionContent';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let contributor: TestClient;
let colleague: TestClient;
let reviewer: TestClient;
let secondReviewer: TestClient;
let ownReviewer: TestClient;
let now = new Date('2026-06-15T10:00:00.000Z');

beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies', clock: () => now });
  contributor = await app.as('contributor');
  reviewer = await app.as('reviewer');
  const { db } = app.context;
  colleague = await app.as(await makePerson(db, { name: 'Colleague', roles: ['contributor'], labId: app.labs.first.id }));
  secondReviewer = await app.as(await makePerson(db, { name: 'Second reviewer', roles: ['reviewer'], labId: null }));
  ownReviewer = await app.as(await makePerson(db, { name: 'Own reviewer', roles: ['reviewer'], labId: app.labs.first.id }));
});
afterAll(() => app.close());

async function submitted(code: string, change?: (content: SpecimenContent) => void): Promise<string> {
  const { body } = await contributor.post<SubmissionDetail>('/submissions', { kind: 'specimen', content: soundSpecimen(code, change) });
  const answer = await contributor.post<Problem>(`/submissions/${body.id}/submit`);
  expect(answer.body.errors ?? []).toEqual([]);
  expect(answer.status).toBe(200);
  return body.id;
}

const decide = (client: TestClient, id: string, decision: string, revision = 1) =>
  client.post<SubmissionDetail & Pick<Problem, 'code' | 'detail'> & { current: SubmissionDetail; changes: { path: string }[] }>(`/submissions/${id}/decisions`, { revision, decision, comment: 'Looked at.', checklist: wholeChecklist });

/** Begins the next revision, changes it and submits it. */
async function nextRevision(id: string, change: (content: SpecimenContent) => void, client = contributor, recheckId: string | null = null): Promise<SubmissionDetail> {
  const begun = await client.post<SubmissionDetail>(`/submissions/${id}/revisions`, { recheckId });
  expect(begun.status).toBe(201);
  const content = begun.body.content as SpecimenContent;
  change(content);
  expect((await client.request('PATCH', `/submissions/${id}`, { content }, { headers: { 'if-match': begun.body.etag } })).status).toBe(200);
  const answer = await client.post<SubmissionDetail>(`/submissions/${id}/submit`);
  expect(answer.status).toBe(200);
  return answer.body;
}

async function rowsOf(id: string): Promise<{ number: number; current: number; revision: number; row: RecordRow; withdrawn_at: string | null }[]> {
  const found = await app.context.db.execute<{ number: number; current: number; revision: number; row: RecordRow; withdrawn_at: string | null }>(
    `select r.number, r.current_revision as current, v.revision, v.row, r.withdrawn_at from records r join record_revisions v on v.record_id = r.id where r.submission_id = '${id}' order by r.number, v.revision`,
  );
  return found.rows;
}
const subjects = async (client: TestClient) => (await client.get<{ items: Notice[] }>('/notices')).body.items.map((notice) => notice.subject);

describe('the queue and the review view', () => {
  it('shows what waits to reviewers and curators only, the longest waiting first', async () => {
    const first = await submitted('Q-1');
    now = new Date(now.getTime() + 60_000);
    const second = await submitted('Q-2');
    const queue = await reviewer.get<{ items: SubmissionItem[] }>('/review/queue');
    const ids = queue.body.items.map((item) => item.id);
    expect(ids.indexOf(first)).toBeLessThan(ids.indexOf(second));
    expect(queue.body.items.find((item) => item.id === first)).toMatchObject({ species: 'Rattus norvegicus', code: 'Q-1', clade: 'rodentia', cladeName: 'Rodentia', lab: app.labs.first.name, status: 'submitted' });
    expect((await (await app.as('curator')).get('/review/queue')).status).toBe(200);
    expect((await contributor.get('/review/queue')).status).toBe(403);
    expect((await (await app.as('administrator')).get('/review/queue')).status).toBe(403);
    const page = await reviewer.get<{ items: SubmissionItem[]; nextCursor: string }>('/review/queue?limit=1');
    const next = await reviewer.get<{ items: SubmissionItem[] }>(`/review/queue?limit=1&cursor=${page.body.nextCursor}`);
    expect([...page.body.items, ...next.body.items].map((item) => item.id)).toEqual(ids.slice(0, 2));
  });

  it('shows what the register holds for the species and what a revision changes, never a draft', async () => {
    const held = await submitted('HELD');
    await decide(reviewer, held, 'approve');
    const id = await submitted('V-1');
    await decide(reviewer, id, 'request-changes');
    const begun = await contributor.post<SubmissionDetail>(`/submissions/${id}/revisions`, {});
    expect((await reviewer.get<ReviewView>(`/review/submissions/${id}`)).body).toMatchObject({ revision: 1, status: 'changes-requested' });
    const content = begun.body.content as SpecimenContent;
    content.specimen.bodyMass.text = '310';
    await contributor.request('PATCH', `/submissions/${id}`, { content }, { headers: { 'if-match': begun.body.etag } });
    await contributor.post(`/submissions/${id}/submit`);
    const view = (await reviewer.get<ReviewView>(`/review/submissions/${id}`)).body;
    expect(view).toMatchObject({ revision: 2, status: 'submitted', answered: true, changes: [{ path: 'specimen.bodyMass.text', before: '300', after: '310' }], may: { decide: true } });
    expect(view.held).toEqual(expect.arrayContaining([expect.objectContaining({ structure: 'cerebral_cortex', source: `${app.labs.first.name}, HELD` })]));
    expect(view.preview.structures[0]?.noPlace).toEqual(expect.any(String));
  });
});

describe('comments', () => {
  it('stand at a field of a revision, from reviewers and the person who entered it', async () => {
    const id = await submitted('C-1');
    const comment = (client: TestClient, text: string, revision = 1) => client.post<SubmissionDetail>(`/submissions/${id}/comments`, { revision, fieldPath: 'structures.0.samples.0.aliquots.1.nuclei', text });
    expect((await comment(reviewer, 'Is this 388?')).status).toBe(201);
    now = new Date(now.getTime() + 60_000);
    const answered = await comment(contributor, 'Yes.');
    expect(answered.body.comments.map((one) => [one.text, one.revision, one.author.lab])).toEqual([['Is this 388?', 1, app.labs.second.name], ['Yes.', 1, app.labs.first.name]]);
    expect((await comment(colleague, 'Me too.')).status).toBe(403);
    expect((await comment(reviewer, 'No such revision.', 4)).status).toBe(400);
    expect((await comment(reviewer, '   ')).status).toBe(400);
  });
});

describe('decisions', () => {
  it('are refused to the own laboratory with the reason, to curators and to contributors', async () => {
    const id = await submitted('DEC-1');
    const refused = await decide(ownReviewer, id, 'approve');
    expect(refused).toMatchObject({ status: 403, body: { code: 'own-lab', detail: expect.stringContaining(app.labs.first.name) } });
    expect((await ownReviewer.get<ReviewView>(`/review/submissions/${id}`)).body.may).toMatchObject({ decide: false, whyNotDecide: expect.stringContaining(app.labs.first.name) });
    expect((await decide(await app.as('curator'), id, 'approve')).body.code).toBe('not-allowed');
    expect((await decide(contributor, id, 'approve')).status).toBe(403);
    expect((await decide(await app.as('administrator'), id, 'approve')).status).toBe(404);
    expect((await reviewer.post(`/submissions/${id}/decisions`, { revision: 1, decision: 'approve', comment: '', checklist: {} })).status).toBe(400);
  });

  it('are refused to a reviewer who entered it in another laboratory', async () => {
    const both = await makePerson(app.context.db, { roles: ['contributor', 'reviewer'], labId: app.labs.second.id });
    const client = await app.as(both);
    const { body } = await client.post<SubmissionDetail>('/submissions', { kind: 'specimen', content: soundSpecimen('OWN-1') });
    await client.post(`/submissions/${body.id}/submit`);
    expect((await decide(client, body.id, 'approve')).body.code).toBe('own-lab');
    expect((await decide(reviewer, body.id, 'approve')).body.code).toBe('own-lab');
    expect((await decide(secondReviewer, body.id, 'approve')).status).toBe(200);
  });

  it('are made once when two reviewers decide at the same moment', async () => {
    const id = await submitted('DEC-2');
    const answers = await Promise.all([decide(reviewer, id, 'approve'), decide(secondReviewer, id, 'decline')]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(answers.find((answer) => answer.status === 409)?.body.code).toBe('already-decided');
    const counted = await app.context.db.execute(`select count(*)::int as count from decisions d join submission_revisions r on r.id = d.revision_id where r.submission_id = '${id}'`);
    expect(counted.rows).toEqual([{ count: 1 }]);
  });

  it('on a revision that has a successor are refused with what changed', async () => {
    const id = await submitted('DEC-3');
    await decide(reviewer, id, 'request-changes');
    await nextRevision(id, (content) => void (content.specimen.sex = 'male'));
    const stale = await decide(secondReviewer, id, 'approve', 1);
    expect(stale).toMatchObject({ status: 409, body: { code: 'stale-revision', current: { revision: 2 }, changes: [{ path: 'specimen.sex', before: 'female', after: 'male' }] } });
    expect((await decide(secondReviewer, id, 'approve', 2)).status).toBe(200);
    expect((await decide(reviewer, id, 'approve', 2)).body.code).toBe('already-decided');
  });

  it('tell the people who must act, once each', async () => {
    const id = await submitted('TELL');
    const heading = 'Rattus norvegicus, TELL';
    expect((await subjects(secondReviewer)).filter((subject) => subject.includes('TELL'))).toEqual([`To review: ${heading}`]);
    expect((await subjects(ownReviewer)).filter((subject) => subject.includes('TELL'))).toEqual([]);
    await decide(reviewer, id, 'request-changes');
    expect(await subjects(contributor)).toContain(`Changes requested: ${heading}`);
    expect(await subjects(colleague)).toContain(`Changes requested: ${heading}`);
    await nextRevision(id, (content) => void (content.note = 'as asked'));
    expect(await subjects(reviewer)).toContain(`Changes made: ${heading}`);
    expect((await subjects(secondReviewer)).filter((subject) => subject.includes('TELL'))).toEqual([`To review: ${heading}`]);
    await decide(reviewer, id, 'decline', 2);
    expect(await subjects(contributor)).toContain(`Declined: ${heading}`);
    expect((await contributor.post(`/submissions/${id}/revisions`, {})).status).toBe(409);
    const audit = await app.context.db.execute<{ action: string }>(`select action from audit_entries where target_id = '${id}' order by created_at`);
    expect(audit.rows.map((entry) => entry.action)).toEqual(['submission-changes-requested', 'submission-declined']);
  });
});

describe('records', () => {
  const twoStructures = (content: SpecimenContent) =>
    void content.structures.push({ ...structuredClone(content.structures[0]!), id: 'cerebellum', structure: 'cerebellum', samples: [soundSample({ tissueMass: { text: '0.3', unit: 'g' }, neun: [{ positive: '230', total: '260' }, { positive: '228', total: '262' }] })] });

  it('come from an approval, one a structure, with values, source, people and what was done', async () => {
    const id = await submitted('R-1', twoStructures);
    const approved = await decide(reviewer, id, 'approve');
    expect(approved.body).toMatchObject({ status: 'approved', records: [{ structure: 'cerebral_cortex' }, { structure: 'cerebellum' }] });
    const rows = await rowsOf(id);
    expect(rows).toHaveLength(2);
    expect(rows[0]?.row).toMatchObject({
      number: `AK-${String(rows[0]?.number).padStart(6, '0')}`, revision: 1, kind: 'specimen', taxonSlug: 'rattus-norvegicus', species: 'Rattus norvegicus', structure: 'cerebral_cortex',
      composition: 'includes hippocampus, underlying white matter; excludes olfactory bulb, basal ganglia', specimen: 'R-1', n: 1, centre: 'single', bodyMassG: 300, structureMassG: 0.8, lab: app.labs.first.name,
      contributors: [{ name: 'Test contributor', orcid: null }], approvedBy: 'Test reviewer', approval: 'number: AB-12', massState: 'fixed', demonstration: false,
    });
    expect(rows[0]?.row.lineage.at(-1)).toBe('Rattus');
    expect(rows[0]?.row.sourceKey).toBe(`lab:${app.labs.first.id}`);
    expect(rows[0]?.row.cells).toBeCloseTo(12_210_000, 3);
    const runs = await app.context.db.execute<{ touches: string[] }>('select touches from fit_runs order by created_at desc limit 1');
    expect(runs.rows[0]?.touches).toHaveLength(2);
    const attempt = app.context.db.execute('update record_revisions set row = row').then(() => 'done', (error: Error) => (error.cause as { code?: string }).code);
    expect(await attempt).toBe('KA001');
  });

  it('keep their numbers; a correction changes only those it touches, and the approved state stays in force till then', async () => {
    const id = await submitted('R-2', twoStructures);
    await decide(reviewer, id, 'approve');
    const before = await rowsOf(id);
    await nextRevision(id, (content) => void (content.structures[1]!.samples[0]!.tissueMass.text = '0.31'));
    expect(await rowsOf(id)).toEqual(before);
    await decide(secondReviewer, id, 'approve', 2);
    const after = await rowsOf(id);
    expect(after.map(({ number, revision, current }) => [number, revision, current])).toEqual([
      [before[0]!.number, 1, 1],
      [before[1]!.number, 1, 2],
      [before[1]!.number, 2, 2],
    ]);
    expect(after[2]?.row).toMatchObject({ structureMassG: 0.31, revision: 2 });
  });

  it('stay approved when a correction is declined or given up, and can be corrected again', async () => {
    const id = await submitted('R-3');
    await decide(reviewer, id, 'approve');
    await nextRevision(id, (content) => void (content.specimen.bodyMass.text = '400'));
    await decide(reviewer, id, 'decline', 2);
    expect((await contributor.get<SubmissionDetail>(`/submissions/${id}`)).body).toMatchObject({ status: 'approved', revision: 1, may: { revise: true } });
    const third = await contributor.post<SubmissionDetail>(`/submissions/${id}/revisions`, {});
    expect(third.body).toMatchObject({ revision: 3, status: 'draft', content: { specimen: { bodyMass: { text: '300' } } } });
    await contributor.post(`/submissions/${id}/withdraw`, {});
    expect((await contributor.get<SubmissionDetail>(`/submissions/${id}`)).body).toMatchObject({ status: 'approved', revision: 1 });
    expect((await rowsOf(id)).map((row) => row.withdrawn_at)).toEqual([null]);
  });

  it('are withdrawn with a reason that is kept', async () => {
    const id = await submitted('R-4');
    await decide(reviewer, id, 'approve');
    expect((await contributor.post(`/submissions/${id}/withdraw`, {})).status).toBe(400);
    expect((await contributor.post<SubmissionDetail>(`/submissions/${id}/withdraw`, { reason: 'Labels were exchanged.' })).body.status).toBe('withdrawn');
    const found = await app.context.db.execute(`select withdrawn_reason, withdrawn_at is not null as withdrawn from records where submission_id = '${id}'`);
    expect(found.rows).toEqual([{ withdrawn_reason: 'Labels were exchanged.', withdrawn: true }]);
    expect((await contributor.post(`/submissions/${id}/revisions`, {})).status).toBe(409);
  });

  it('of an entry that a correction drops are withdrawn and say so', async () => {
    const id = await submitted('R-5', twoStructures);
    await decide(reviewer, id, 'approve');
    await nextRevision(id, (content) => void content.structures.pop());
    await decide(reviewer, id, 'approve', 2);
    const found = await app.context.db.execute<{ withdrawn_reason: string }>(`select withdrawn_reason from records where submission_id = '${id}' order by number`);
    expect(found.rows.map((row) => row.withdrawn_reason)).toEqual(['', 'Revision 2 of its submission no longer holds it.']);
  });

  it('of a source carry its DOI, the animals and the sources it shares them with', async () => {
    const enter = async (doi: string, shares: string[]) => {
      const content = soundLiterature(doi, (one) => void (one.source.sharesAnimalsWith = shares.map((source) => ({ source, overlap: 'same' }))));
      const { body } = await contributor.post<SubmissionDetail>('/submissions', { kind: 'literature', content });
      expect((await contributor.post(`/submissions/${body.id}/submit`)).status).toBe(200);
      expect((await decide(reviewer, body.id, 'approve')).status).toBe(200);
      return body.id;
    };
    await enter('https://doi.org/10.1234/ABC', []);
    const id = await enter('10.1234/def', ['doi:10.1234/abc', 'A thesis nobody has']);
    const [mine] = await rowsOf(id);
    expect(mine?.row).toMatchObject({ kind: 'literature', sourceKey: 'doi:10.1234/def', sourceDoi: '10.1234/def', sourceYear: 2019, n: 4, centre: 'arithmetic', cells: 77_640_000, cellsError: null, specimen: null, sharesAnimalsWith: [{ source: 'doi:10.1234/abc', overlap: 'same' }, { source: 'A thesis nobody has', overlap: 'same' }] });
    expect(mine?.row.neuronsPerMg).toBeCloseTo(31_020_000 / 770, 9);
    const overlaps = await app.context.db.execute(`select a.key as one, b.key as other from source_overlaps o join sources a on a.id = o.source_id join sources b on b.id = o.other_source_id order by 1`);
    expect(overlaps.rows).toEqual([{ one: 'doi:10.1234/abc', other: 'doi:10.1234/def' }, { one: 'doi:10.1234/def', other: 'doi:10.1234/abc' }]);
  });

  it('under embargo are kept from what others are shown of the species', async () => {
    const id = await submitted('EMB', (content) => void (content.provenance.embargoUntil = '2027-01-01'));
    await decide(reviewer, id, 'approve');
    const other = await submitted('EMB-2');
    expect((await reviewer.get<ReviewView>(`/review/submissions/${other}`)).body.held.some((held) => held.source.endsWith('EMB'))).toBe(false);
    const stored = await app.context.db.execute(`select embargo_until::text as until from record_revisions v join records r on r.id = v.record_id where r.submission_id = '${id}'`);
    expect(stored.rows).toEqual([{ until: '2027-01-01' }]);
  });
});

describe('a re-check', () => {
  it('is answered by the approval of the revision begun for it, also by a colleague of the laboratory', async () => {
    const id = await submitted('RC-1');
    const { body } = await decide(reviewer, id, 'approve');
    const number = body.records[0]!.number;
    const asked = await reviewer.post<{ id: string }>(`/records/${number}/rechecks`, { question: 'Was the dilution noted?' });
    expect(asked.status).toBe(201);
    expect((await contributor.get<SubmissionDetail>(`/submissions/${id}`)).body).toMatchObject({ openRecheck: asked.body.id, recheck: { question: 'Was the dilution noted?', status: 'open' } });
    expect((await colleague.post(`/submissions/${id}/revisions`, {})).status).toBe(403);
    await nextRevision(id, (content) => void (content.structures[0]!.samples[0]!.tissueMass.text = '0.82'), colleague, asked.body.id);
    await decide(reviewer, id, 'approve', 2);
    const events = await app.context.db.execute(`select kind, answer from recheck_events where recheck_id = '${asked.body.id}' order by seq`);
    expect(events.rows).toEqual([{ kind: 'asked', answer: null }, { kind: 'answered', answer: 'corrected' }]);
    expect((await rowsOf(id)).at(-1)?.row.contributors.map((person) => person.name)).toEqual(['Test contributor', 'Colleague']);
  });
});
