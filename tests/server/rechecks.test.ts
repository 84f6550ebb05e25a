import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { findFirstRecordNumber } from '../../db/queries/demo';
import { fitRuns, recheckEvents, records, rechecks } from '../../db/schema/index';
import { createSubmission } from '../../server/services/submissions/drafts';
import { decideRevision } from '../../server/services/submissions/decideRevision';
import { submitRevision } from '../../server/services/submissions/submitRevision';
import type { Recheck } from '../../shared/contracts/rechecks';
import type { SubmissionDetail } from '../../shared/contracts/submissions';
import { recordNumber } from '../../shared/domain/identifiers';
import type { TestClient } from '../support/client';
import { makeDemoWorld, type DemoWorld } from '../support/demoWorld';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let world: DemoWorld;
let contributor: TestClient;
let reviewer: TestClient;
let curator: TestClient;
beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies' });
  world = await makeDemoWorld(app);
  [contributor, reviewer, curator] = [await world.client('contributor'), await world.client('reviewer'), await world.client('curator')];
}, 120_000);
afterAll(() => app.close());

const checklist = { rawCounts: true, derivedValues: true, checks: true, evidence: true, provenance: true };
let serial = 0;
/** A record of the contributor's laboratory, approved by a reviewer of another one. */
async function makeRecord(): Promise<{ number: string; submissionId: string }> {
  const [by, judge] = [await world.actor('contributor'), await world.actor('reviewer')];
  const { id } = await createSubmission(app.context, by, { kind: 'specimen', content: world.specimen(`CHECK-${(serial += 1)}`) });
  await submitRevision(app.context, by, id);
  await decideRevision(app.context, judge, id, { revision: 1, decision: 'approve', comment: 'Agreed.', checklist });
  return { number: recordNumber((await findFirstRecordNumber(app.context.db, id)) ?? 0), submissionId: id };
}
const ask = (number: string, client = curator) => client.post<Recheck>(`/records/${number}/rechecks`, { question: 'Is the mass right?' });
const answer = (id: string, body: object) => contributor.post<Recheck>(`/rechecks/${id}/answers`, { text: 'We looked again.', ...body });
const close = (id: string, client = reviewer, outcome = 'close') => client.post<Recheck & { code: string }>(`/rechecks/${id}/close`, { outcome, text: 'As answered.' });
const newestNotice = async (client: TestClient) => (await client.get<{ items: { kind: string; href: string }[] }>('/notices?limit=1')).body.items[0];

describe('a re-check', () => {
  test('goes from asked over answered to closed, tells whom it concerns once each, and keeps every word', async () => {
    const { number } = await makeRecord();
    const asked = await ask(number);
    expect(asked.status).toBe(201);
    expect(asked.body).toMatchObject({ record: number, status: 'open', may: { answer: false, close: false } });
    expect(await newestNotice(contributor)).toMatchObject({ kind: 'recheck-asked', href: `/rechecks/${asked.body.id}` });
    expect((await close(asked.body.id)).status).toBe(409);
    expect((await answer(asked.body.id, { answer: 'confirmed' })).body).toMatchObject({ status: 'answered' });
    expect(await newestNotice(curator)).toMatchObject({ kind: 'recheck-answered' });
    expect((await answer(asked.body.id, { answer: 'confirmed' })).status).toBe(409);
    const closed = await close(asked.body.id);
    expect(closed.body).toMatchObject({ status: 'closed' });
    expect(closed.body.events.map((event) => event.kind)).toEqual(['asked', 'answered', 'closed']);
    expect(await newestNotice(contributor)).toMatchObject({ kind: 'recheck-closed' });
    await app.runJobs();
    const mailed = (await app.sentMails()).filter((mail) => mail.to.includes('contributor@demo.example') && mail.text.includes(asked.body.id));
    expect(mailed.map((mail) => mail.subject.split(':')[1]?.trim()).sort()).toEqual(['Re-check asked', 'Re-check closed']);
  });

  test('is one at a time for a record, also when two ask at the same moment', async () => {
    const { number } = await makeRecord();
    const both = await Promise.all([ask(number, curator), ask(number, reviewer)]);
    expect(both.map((one) => one.status).sort()).toEqual([201, 409]);
  });

  test('is opened again where the answer does not settle it', async () => {
    const { id } = (await ask((await makeRecord()).number)).body;
    await answer(id, { answer: 'confirmed' });
    expect((await close(id, curator, 'reopen')).body.status).toBe('open');
    expect((await answer(id, { answer: 'confirmed', text: 'With the balance’s protocol.' })).body.events.map((event) => event.kind)).toEqual(['asked', 'answered', 'reopened', 'answered']);
  });

  test('is not closed by the record’s own laboratory', async () => {
    const { id } = (await ask((await makeRecord()).number)).body;
    await answer(id, { answer: 'confirmed' });
    const own = await close(id, await world.client('mei.castellan'));
    expect(own.status).toBe(403);
    expect(own.body.code).toBe('own-lab');
  });

  test('answered by two at the same moment keeps one answer', async () => {
    const { id } = (await ask((await makeRecord()).number)).body;
    const both = await Promise.all([answer(id, { answer: 'confirmed' }), answer(id, { answer: 'confirmed' })]);
    expect(both.map((one) => one.status).sort()).toEqual([201, 409]);
    expect(await app.context.db.$count(recheckEvents, eq(recheckEvents.recheckId, id))).toBe(2);
  });
});

describe('an answer', () => {
  test('that corrects begins a revision, and is closed only once that is decided', async () => {
    const { number, submissionId } = await makeRecord();
    const { id } = (await ask(number)).body;
    expect((await answer(id, { answer: 'corrected' })).body).toMatchObject({ status: 'answered' });
    const detail = (await contributor.get<SubmissionDetail>(`/submissions/${submissionId}`)).body;
    expect(detail).toMatchObject({ revision: 2, status: 'draft', recheck: { id } });
    expect((await close(id)).status).toBe(409);
    await submitRevision(app.context, await world.actor('contributor'), submissionId);
    expect((await close(id)).status).toBe(409);
    await decideRevision(app.context, await world.actor('reviewer'), submissionId, { revision: 2, decision: 'approve', comment: 'Corrected.', checklist });
    expect((await close(id)).body.status).toBe('closed');
  });

  test('that withdraws takes the record out of later versions and asks for new fits', async () => {
    const { number } = await makeRecord();
    const { id } = (await ask(number)).body;
    const runs = await app.context.db.$count(fitRuns);
    await answer(id, { answer: 'withdrawn', text: 'The vial was mislabelled.' });
    const [record] = await app.context.db.select().from(records).innerJoin(rechecks, eq(rechecks.recordId, records.id)).where(eq(rechecks.id, id));
    expect(record?.records.withdrawnAt).not.toBeNull();
    expect(record?.records.withdrawnReason).toBe('The vial was mislabelled.');
    expect(await app.context.db.$count(fitRuns)).toBe(runs + 1);
    await close(id);
    expect((await ask(number)).status).toBe(409);
  });
});

test('contributors list the re-checks of their own laboratory, reviewers and curators all', async () => {
  const stranger = await world.client('bram.oduya');
  const list = async (client: TestClient) => (await client.get<{ items: Recheck[] }>('/rechecks')).body.items;
  expect((await list(curator)).length).toBe(await app.context.db.$count(rechecks));
  expect((await list(contributor)).length).toBe((await list(curator)).length);
  expect(await list(stranger)).toEqual([]);
});
