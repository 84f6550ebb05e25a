import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '../../shared/contracts/problems';
import type { SubmissionDetail, SubmissionItem } from '../../shared/contracts/submissions';
import { soundLiterature, soundSample, soundSpecimen } from '../support/submissionContent';
import { makePerson } from '../support/factories';
import { startTestApp, type TestApp } from '../support/testApp';
import type { TestClient } from '../support/client';

let app: TestApp;
let contributor: TestClient;
let colleague: TestClient;
let reviewer: TestClient;
let stranger: TestClient;

const createWith = async (client: TestClient, content: unknown, kind = 'specimen') => {
  const answer = await client.post<SubmissionDetail>('/submissions', { kind, content });
  expect(answer.status).toBe(201);
  return answer.body;
};
const patch = (client: TestClient, id: string, content: unknown, ifMatch?: string) =>
  client.request<SubmissionDetail & Pick<Problem, 'code' | 'errors'> & { current?: SubmissionDetail }>('PATCH', `/submissions/${id}`, { content }, ifMatch === undefined ? {} : { headers: { 'if-match': ifMatch } });

beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies', clock: () => new Date('2026-06-15T10:00:00.000Z') });
  const member = (labId: string) => makePerson(app.context.db, { roles: ['contributor'], labId });
  contributor = await app.as('contributor');
  reviewer = await app.as('reviewer');
  colleague = await app.as(await member(app.labs.first.id));
  stranger = await app.as(await member(app.labs.second.id));
});
afterAll(() => app.close());

describe('a draft', () => {
  it('begins empty, belongs to the laboratory, and lists derived values and what is missing', async () => {
    const answer = await contributor.post<SubmissionDetail>('/submissions', { kind: 'specimen' });
    expect(answer.status).toBe(201);
    expect(answer.headers.get('etag')).toBe(answer.body.etag);
    expect(answer.body).toMatchObject({ status: 'draft', revision: 1, lab: app.labs.first.name, may: { edit: true, submit: true, withdraw: true, decide: false } });
    expect(answer.body.preview.checks.some((check) => check.level === 'blocks' && check.path === 'specimen.code')).toBe(true);
  });

  it('is unknown to other laboratories, reviewers and administrators, and read-only to a colleague', async () => {
    const { id, etag } = await createWith(contributor, soundSpecimen('D-1'));
    for (const client of [stranger, reviewer, await app.as('curator'), await app.as('administrator')]) expect((await client.get(`/submissions/${id}`)).status).toBe(404);
    expect((await reviewer.get(`/review/submissions/${id}`)).status).toBe(404);
    expect((await colleague.get<SubmissionDetail>(`/submissions/${id}`)).body.may).toMatchObject({ edit: false, submit: false, withdraw: false });
    expect((await patch(colleague, id, soundSpecimen('D-1'), etag)).status).toBe(403);
    expect((await app.anonymous.get(`/submissions/${id}`)).status).toBe(401);
  });

  it('is saved against the state that was edited, and keeps both states where somebody was faster', async () => {
    const { id, etag } = await createWith(contributor, soundSpecimen('D-2'));
    expect((await patch(contributor, id, soundSpecimen('D-2b'))).status).toBe(428);
    const first = await patch(contributor, id, soundSpecimen('D-2c'), etag);
    expect(first.status).toBe(200);
    expect(first.body.etag).not.toBe(etag);
    const second = await patch(contributor, id, soundSpecimen('D-2d'), etag);
    expect(second).toMatchObject({ status: 409, body: { code: 'stale-revision', current: { etag: first.body.etag, content: { specimen: { code: 'D-2c' } } } } });
  });

  it('lets only one of two savings of the same state through', async () => {
    const { id, etag } = await createWith(contributor, soundSpecimen('D-3'));
    const answers = await Promise.all(['a', 'b', 'c', 'd'].map((end) => patch(contributor, id, soundSpecimen(`D-3${end}`), etag)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409, 409]);
  });

  it('keeps its kind and refuses wrong types with every problem at once', async () => {
    const { id, etag } = await createWith(contributor, soundSpecimen('D-4'));
    expect((await patch(contributor, id, soundLiterature('10.1234/kind'), etag)).status).toBe(400);
    const wrong = await patch(contributor, id, { ...soundSpecimen('D-4'), massState: 'frozen', structures: 7 }, etag);
    expect(wrong.status).toBe(400);
    expect(wrong.body.errors.map((error) => error.path).sort()).toEqual(['content.massState', 'content.structures']);
  });

  it('keeps SQL and HTML as the text it is', async () => {
    const hostile = `'; drop table submissions; -- <script>alert(1)</script>`;
    const { id } = await createWith(contributor, soundSpecimen('D-5', (content) => void (content.note = hostile)));
    expect((await contributor.get<SubmissionDetail>(`/submissions/${id}`)).body.content.note).toBe(hostile);
  });

  it('refuses a text that cannot be stored', async () => {
    const answer = await contributor.post<Problem>('/submissions', { kind: 'specimen', content: soundSpecimen('D-\u0000') });
    expect(answer).toMatchObject({ status: 400, body: { code: 'invalid-input' } });
  });
});

describe('entries that are not saved', () => {
  it('are derived and checked as they would be at submission', async () => {
    const answer = await contributor.post<SubmissionDetail['preview']>('/submissions/preview', { content: soundSpecimen('P-1') });
    expect(answer.status).toBe(200);
    // V·Σc/Σe = 12 mL × 1628 / 1.6e-3 mL.
    expect(answer.body.structures[0]).toMatchObject({ entryId: 'cortex', structureMassG: 0.8 });
    expect(answer.body.structures[0]?.cells.value).toBeCloseTo(12_210_000, 3);
    expect(answer.body.checks.filter((check) => check.level !== 'passes')).toEqual([]);
    expect((await reviewer.post('/submissions/preview', { content: soundSpecimen('P-1') })).status).toBe(403);
  });
});

describe('submitting', () => {
  it('writes status, event and rows together and can be done once', async () => {
    const { id } = await createWith(contributor, soundSpecimen('S-1', (content) => content.structures[0]?.samples.splice(0, 1, soundSample({ pooledWith: ['S-1b'] }))));
    const answer = await contributor.post<SubmissionDetail>(`/submissions/${id}/submit`);
    expect(answer).toMatchObject({ status: 200, body: { status: 'submitted', answered: false, may: { edit: false, withdraw: true } } });
    expect(answer.body.events.map((event) => event.kind)).toEqual(['drafted', 'submitted']);
    const rows = await app.context.db.execute<Record<string, unknown>>(
      `select s.code, e.cells, e.mass_g, (select count(*)::int from aliquots a where a.sample_id = m.id) aliquots, (select count(*)::int from neun_counts n where n.sample_id = m.id) neun,
        (select count(*)::int from sample_specimens p where p.sample_id = m.id) animals, m.tissue_mass_text from structure_estimates e
        join submission_revisions r on r.id = e.revision_id join specimen_states t on t.revision_id = r.id join specimens s on s.id = t.specimen_id join samples m on m.structure_estimate_id = e.id where r.submission_id = '${id}'`,
    );
    // Two animals were pooled: mass and counts are those of one.
    expect(rows.rows).toEqual([{ code: 'S-1', cells: 6_105_000, mass_g: 0.4, aliquots: 4, neun: 2, animals: 2, tissue_mass_text: '0.80' }]);
    expect((await contributor.post(`/submissions/${id}/submit`)).status).toBe(409);
    expect((await patch(contributor, id, soundSpecimen('S-1x'), answer.body.etag)).status).toBe(409);
  });

  it('names every impossible entry at once', async () => {
    const { id } = await createWith(contributor, soundSpecimen('S-2', (content) => {
      content.specimen.bodyMass.text = '-3';
      content.provenance.licenceAccepted = false;
      content.structures[0]!.samples[0]!.countedOn = '2031-01-01';
      content.structures[0]!.definitionVersion = 9;
      content.specimen.taxon = 'no-such-species';
    }));
    const answer = await contributor.post<Problem>(`/submissions/${id}/submit`);
    expect(answer).toMatchObject({ status: 422, body: { code: 'checks-block' } });
    expect(answer.body.errors.map((error) => error.path)).toEqual(
      expect.arrayContaining(['specimen.bodyMass', 'provenance.licenceAccepted', 'structures.0.samples.0.countedOn', 'structures.0.definitionVersion', 'specimen.taxon']),
    );
    expect((await contributor.get<SubmissionDetail>(`/submissions/${id}`)).body.status).toBe('draft');
  });

  it('asks a word on a doubtful value and takes it', async () => {
    const doubtful = (content: ReturnType<typeof soundSpecimen>) => void content.structures[0]!.samples[0]!.aliquots.splice(2);
    const { id, etag } = await createWith(contributor, soundSpecimen('S-3', doubtful));
    const refused = await contributor.post<Problem>(`/submissions/${id}/submit`);
    expect(refused.status).toBe(422);
    expect(refused.body.errors).toEqual([expect.objectContaining({ path: 'structures.0.samples.0.aliquots', message: expect.stringContaining('Say why in a word') })]);
    const explained = await patch(contributor, id, soundSpecimen('S-3', (content) => {
      doubtful(content);
      content.explanations = { 'few-aliquots@structures.0.samples.0.aliquots': 'The suspension was spilt.' };
    }), etag);
    expect(explained.status).toBe(200);
    expect((await contributor.post(`/submissions/${id}/submit`)).status).toBe(200);
  });

  it('refuses the code of another animal of the laboratory, but not that of another laboratory or its own', async () => {
    const one = await createWith(contributor, soundSpecimen('CODE-7'));
    expect((await contributor.post(`/submissions/${one.id}/submit`)).status).toBe(200);
    const two = await createWith(contributor, soundSpecimen('code-7 '));
    expect((await contributor.post<Problem>(`/submissions/${two.id}/submit`)).body.errors).toEqual([expect.objectContaining({ path: 'specimen.code' })]);
    const other = await createWith(stranger, soundSpecimen('CODE-7'));
    expect((await stranger.post(`/submissions/${other.id}/submit`)).status).toBe(200);
  });

  it('lets one of two drafts with the same code through when both are submitted at once', async () => {
    const drafts = await Promise.all([createWith(contributor, soundSpecimen('TWIN')), createWith(contributor, soundSpecimen('TWIN'))]);
    const answers = await Promise.all(drafts.map((draft) => contributor.post(`/submissions/${draft.id}/submit`)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 422]);
  });

  it('refuses a state that was not read', async () => {
    const { id, etag } = await createWith(contributor, soundSpecimen('S-5'));
    await patch(contributor, id, soundSpecimen('S-5b'), etag);
    const stale = await contributor.post<Problem & { current: SubmissionDetail }>(`/submissions/${id}/submit`, undefined, { headers: { 'if-match': etag } });
    expect(stale).toMatchObject({ status: 409, body: { code: 'stale-revision', current: { content: { specimen: { code: 'S-5b' } } } } });
  });

  it('keeps human donors from being recognised', async () => {
    const human = (content: ReturnType<typeof soundSpecimen>) => Object.assign(content.specimen, { nameAsEntered: 'Homo sapiens', taxon: 'homo-sapiens', origin: 'unknown', ageDays: '33000' });
    const { id } = await createWith(contributor, soundSpecimen('H-1', human));
    const paths = (await contributor.post<Problem>(`/submissions/${id}/submit`)).body.errors.map((error) => error.path);
    expect(paths).toEqual(expect.arrayContaining(['specimen.diedOn', 'specimen.fixedOn', 'specimen.ageDays', 'structures.0.samples.0.countedOn']));
    const yearsOnly = await createWith(contributor, soundSpecimen('H-2', (content) => {
      human(content);
      Object.assign(content.specimen, { diedOn: '2025', fixedOn: '2025', ageDays: '' });
      content.structures[0]!.samples[0]!.countedOn = '2026';
    }));
    expect((await contributor.post(`/submissions/${yearsOnly.id}/submit`)).status).toBe(200);
  });

  it('refuses a person without a laboratory', async () => {
    const alone = await app.as(await makePerson(app.context.db, { roles: ['contributor'], labId: null }));
    const { id } = await createWith(alone, soundSpecimen('A-1'));
    expect((await alone.post(`/submissions/${id}/submit`)).status).toBe(403);
  });

  it('refuses structures of another class of animals', async () => {
    const { id } = await createWith(contributor, soundSpecimen('B-1', (content) => void (content.structures[0]!.structure = 'pallium')));
    expect((await contributor.post<Problem>(`/submissions/${id}/submit`)).body.errors).toEqual([expect.objectContaining({ path: 'structures.0.structure' })]);
  });

  it('writes printed values of a source with their kinds', async () => {
    const { id } = await createWith(contributor, soundLiterature('10.1234/printed'), 'literature');
    expect((await contributor.post(`/submissions/${id}/submit`)).status).toBe(200);
    const rows = await app.context.db.execute<Record<string, unknown>>(`select variable, value, value_text, centre, n from literature_values v join submission_revisions r on r.id = v.revision_id where r.submission_id = '${id}' and entry_id = 'rat-cortex' order by variable`);
    expect(rows.rows).toEqual([
      { variable: 'neurons', value: 31_020_000, value_text: '31020000', centre: 'arithmetic', n: 4 },
      { variable: 'otherCells', value: 46_620_000, value_text: '46620000', centre: 'arithmetic', n: 4 },
      { variable: 'structureMassG', value: 0.77, value_text: '0.77', centre: 'arithmetic', n: 4 },
    ]);
  });
});

describe('what was submitted', () => {
  it('is not altered by SQL', async () => {
    const { id } = await createWith(contributor, soundSpecimen('IMM-1'));
    await contributor.post(`/submissions/${id}/submit`);
    const attempt = (statement: string) => app.context.db.execute(statement).then(() => 'done', (error: Error) => (error.cause as { code?: string }).code);
    expect(await attempt(`update submission_revisions set content = '{}' where submission_id = '${id}'`)).toBe('KA001');
    expect(await attempt(`update submission_revisions set status = 'draft' where submission_id = '${id}'`)).toBe('KA002');
    expect(await attempt(`delete from submission_revisions where submission_id = '${id}'`)).toBe('KA001');
    expect(await attempt('update aliquots set nuclei = 1')).toBe('KA001');
    expect(await attempt('delete from submission_events')).toBe('KA001');
  });
});

describe('withdrawing', () => {
  it('ends a draft and a submitted revision, and nothing after', async () => {
    const draft = await createWith(contributor, soundSpecimen('W-1'));
    expect((await contributor.post<SubmissionDetail>(`/submissions/${draft.id}/withdraw`, {})).body.status).toBe('withdrawn');
    expect((await contributor.post(`/submissions/${draft.id}/submit`)).status).toBe(409);
    const submitted = await createWith(contributor, soundSpecimen('W-2'));
    await contributor.post(`/submissions/${submitted.id}/submit`);
    expect((await contributor.post<SubmissionDetail>(`/submissions/${submitted.id}/withdraw`, { reason: 'wrong animal' })).body.status).toBe('withdrawn');
    expect((await contributor.post(`/submissions/${submitted.id}/withdraw`, {})).status).toBe(409);
    expect((await colleague.post(`/submissions/${submitted.id}/withdraw`, {})).status).toBe(403);
  });
});

describe('lists', () => {
  it('page through one’s own and the laboratory’s, each once, and nobody else’s', async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const answer: { body: { items: SubmissionItem[]; nextCursor: string | null } } = await colleague.get(`/submissions?limit=5${cursor === null ? '' : `&cursor=${cursor}`}`);
      seen.push(...answer.body.items.map((item) => item.id));
      cursor = answer.body.nextCursor;
    } while (cursor !== null);
    const counted = await app.context.db.execute<{ count: number }>(`select count(*)::int from submissions where lab_id = '${app.labs.first.id}'`);
    expect(seen).toHaveLength(counted.rows[0]?.count ?? -1);
    expect(new Set(seen).size).toBe(seen.length);
    const drafts = await colleague.get<{ items: SubmissionItem[] }>('/submissions?status=withdrawn');
    expect(drafts.body.items.every((item) => item.status === 'withdrawn')).toBe(true);
    expect(drafts.body.items.length).toBe(2);
    expect((await colleague.get('/submissions?cursor=abc')).status).toBe(400);
  });
});
