import { and, eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { decisions, fitResults, fitRuns, records, specimenStates, submissionEvents, submissionRevisions, submissions, versions } from '../../db/schema/index';
import { killPointNames } from '../../server/killPointNames';
import { createSubmission } from '../../server/services/submissions/drafts';
import { submitRevision } from '../../server/services/submissions/submitRevision';
import { makeDemoWorld, type DemoWorld } from '../support/demoWorld';
import { spawnServer, type SpawnedServer } from '../support/spawnedServer';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let world: DemoWorld;
let running: SpawnedServer | undefined;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
  world = await makeDemoWorld(app);
  await app.runJobs();
}, 240_000);
afterAll(async () => {
  await running?.kill();
  await app.close();
});

async function serve(killAt?: string): Promise<SpawnedServer> {
  const { mail, storage, databaseUrl } = app.context.config;
  running = await spawnServer(databaseUrl, { MAIL_API_URL: mail.apiUrl, MAIL_API_KEY: mail.apiKey, STORAGE_BUCKET: storage.bucket }, killAt === undefined ? {} : { killAt });
  return running;
}

let serial = 0;
async function makeDraft(): Promise<string> {
  const contributor = await world.actor('contributor');
  return (await createSubmission(app.context, contributor, { kind: 'specimen', content: world.specimen(`KILL-${(serial += 1)}`) })).id;
}
async function makeSubmitted(): Promise<string> {
  const id = await makeDraft();
  await submitRevision(app.context, await world.actor('contributor'), id);
  return id;
}

const approval = { revision: 1, decision: 'approve', comment: 'Everything agrees.', checklist: { rawCounts: true, derivedValues: true, checks: true, evidence: true, provenance: true } };

/** What is written of one submission, in figures. */
async function stateOf(id: string) {
  const { db } = app.context;
  const [revision] = await db.select().from(submissionRevisions).where(eq(submissionRevisions.submissionId, id));
  const revisionId = revision?.id ?? '';
  return {
    status: revision?.status,
    submitted: await db.$count(submissionEvents, and(eq(submissionEvents.submissionId, id), eq(submissionEvents.kind, 'submitted'))),
    states: await db.$count(specimenStates, eq(specimenStates.revisionId, revisionId)),
    decisions: await db.$count(decisions, eq(decisions.revisionId, revisionId)),
    records: await db.$count(records, eq(records.submissionId, id)),
  };
}
const draft = { status: 'draft', submitted: 0, states: 0, decisions: 0, records: 0 };
const submitted = { status: 'submitted', submitted: 1, states: 1, decisions: 0, records: 0 };
const approved = { status: 'approved', submitted: 1, states: 1, decisions: 1, records: 4 };

const named = (area: string) => killPointNames.filter((name) => name.startsWith(`${area}:`));

describe('a process that dies while somebody', () => {
  test.each(named('submit'))('submits, at %s, leaves the draft whole; submitting again works once', async (point) => {
    const id = await makeDraft();
    const dying = await serve(point);
    await expect((await world.client('contributor', dying.url)).post(`/submissions/${id}/submit`)).rejects.toThrow();
    expect(await dying.ended).toBe('SIGKILL');
    expect(dying.reached()).toEqual([point]);
    expect(await stateOf(id)).toEqual(draft);
    const next = await serve();
    expect((await (await world.client('contributor', next.url)).post(`/submissions/${id}/submit`)).status).toBe(200);
    expect(await stateOf(id)).toEqual(submitted);
    await next.kill();
    expect(await stateOf(id)).toEqual(submitted);
  }, 120_000);

  test.each(named('decide'))('decides, at %s, leaves it waiting without a record; deciding again works once', async (point) => {
    const id = await makeSubmitted();
    const dying = await serve(point);
    await expect((await world.client('reviewer', dying.url)).post(`/submissions/${id}/decisions`, approval)).rejects.toThrow();
    expect(await dying.ended).toBe('SIGKILL');
    expect(dying.reached()).toEqual([point]);
    expect(await stateOf(id)).toEqual(submitted);
    const next = await serve();
    const reviewer = await world.client('reviewer', next.url);
    expect((await reviewer.post(`/submissions/${id}/decisions`, approval)).status).toBe(200);
    expect((await reviewer.post(`/submissions/${id}/decisions`, approval)).status).toBe(409);
    expect(await stateOf(id)).toEqual(approved);
    await next.kill();
  }, 120_000);

  test('waits for fits, at each of their points, has them computed by the next process', async () => {
    const { db } = app.context;
    const [run] = await db.insert(fitRuns).values({ set: 'working', reason: 'asked by a test' }).returning({ id: fitRuns.id });
    const runId = run?.id ?? '';
    for (const point of named('fits')) {
      const dying = await serve(point);
      expect(await dying.ended).toBe('SIGKILL');
      expect(dying.reached()).toEqual([point]);
      expect(await db.$count(fitResults, eq(fitResults.runId, runId))).toBe(0);
    }
    const next = await serve();
    await expect.poll(async () => (await db.select().from(fitRuns).where(eq(fitRuns.id, runId)))[0]?.finishedAt ?? null, { timeout: 90_000, interval: 200 }).not.toBeNull();
    expect(await db.$count(fitResults, eq(fitResults.runId, runId))).toBeGreaterThan(0);
    await next.stop();
  }, 240_000);

  test('freezes, at each point in turn, ends with one whole version, and the one before stays current until then', async () => {
    const { db } = app.context;
    const points = named('freeze');
    for (const point of points) {
      const dying = await serve(point);
      // Only the first process is asked: those after it find the unfinished freeze themselves. It may die before it answers.
      if (point === points[0]) {
        const answer = await (await world.client('curator', dying.url)).post('/versions', { label: '2', note: 'Frozen while processes died.' }).catch(() => null);
        expect(answer?.status ?? 202).toBe(202);
      }
      expect(await dying.ended).toBe('SIGKILL');
      expect(dying.reached()).toEqual([point]);
      expect((await app.anonymous.get<{ version: string }>('/health')).body.version).toBe('1');
    }
    const next = await serve();
    await expect.poll(async () => (await app.anonymous.get<{ version: string }>('/health')).body.version, { timeout: 120_000, interval: 250 }).toBe('2');
    expect(await db.$count(versions)).toBe(2);
    const checked = await (await world.client('curator', next.url)).get<{ ok: boolean }>('/versions/2/verify');
    expect(checked.status).toBe(200);
    expect(checked.body).toMatchObject({ version: '2', ok: true });
    await next.stop();
  }, 300_000);
});

/** What must hold whenever anybody looks. */
async function brokenRows(): Promise<Record<string, number>> {
  const count = async (query: ReturnType<typeof sql>) => Number((await app.context.db.execute<{ count: string }>(query)).rows[0]?.count);
  return {
    withoutRevision: await count(sql`select count(*) from ${submissions} s where not exists (select 1 from ${submissionRevisions} r where r.submission_id = s.id)`),
    withoutDraftedEvent: await count(sql`select count(*) from ${submissionRevisions} r where not exists (select 1 from ${submissionEvents} e where e.revision_id = r.id and e.kind = 'drafted')`),
    submittedEvents: await count(sql`select count(*) from ${submissionRevisions} r where (r.submitted_at is not null) <> ((select count(*) from ${submissionEvents} e where e.revision_id = r.id and e.kind = 'submitted') = 1)`),
    decidedWithoutDecision: await count(sql`select count(*) from ${submissionRevisions} r where (r.status in ('approved', 'declined', 'changes-requested')) <> exists (select 1 from ${decisions} d where d.revision_id = r.id) and r.status <> 'withdrawn'`),
    approvedWithoutRecord: await count(sql`select count(*) from ${submissionRevisions} r where r.status = 'approved' and not exists (select 1 from ${records} k where k.submission_id = r.submission_id)`),
    recordOfUnapproved: await count(sql`select count(*) from ${records} k where not exists (select 1 from ${submissionRevisions} r where r.submission_id = k.submission_id and r.status = 'approved')`),
  };
}

test('twenty kills at any moment of people’s acts lose nothing that was answered and leave nothing half', async () => {
  const acknowledged = new Map<string, 'draft' | 'submitted' | 'approved'>();
  // Numbers of a small generator with a fixed seed: another run kills at the same pauses.
  let seed = 20_260;
  const random = () => (seed = (seed * 48_271) % 2_147_483_647) / 2_147_483_647;
  for (let round = 0; round < 20; round += 1) {
    const server = await serve();
    const [contributor, reviewer] = [await world.client('contributor', server.url), await world.client('reviewer', server.url)];
    let answers = 0;
    const note = (id: string, state: 'draft' | 'submitted' | 'approved') => {
      acknowledged.set(id, state);
      answers += 1;
    };
    const act = async (index: number): Promise<void> => {
      const made = await contributor.post<{ id: string }>('/submissions', { kind: 'specimen', content: world.specimen(`R${round}-${index}`) });
      if (made.status !== 201) throw new Error(`Making a draft answered ${made.status}.`);
      note(made.body.id, 'draft');
      if ((await contributor.post(`/submissions/${made.body.id}/submit`)).status === 200) note(made.body.id, 'submitted');
      if ((await reviewer.post(`/submissions/${made.body.id}/decisions`, approval)).status === 200) note(made.body.id, 'approved');
    };
    const acts = Promise.allSettled([0, 1, 2].map(act));
    // After some of the round's answers, and a little later: so it also falls between the writes of the next act.
    const enough = Math.floor(random() * 9);
    for (const until = Date.now() + 15_000; answers < enough && Date.now() < until; ) await new Promise((resolve) => setTimeout(resolve, 5));
    await new Promise((resolve) => setTimeout(resolve, random() * 80));
    await server.kill();
    await acts;
  }
  expect(acknowledged.size).toBeGreaterThan(10);
  expect(Object.values(await brokenRows())).toEqual([0, 0, 0, 0, 0, 0]);
  const order = ['draft', 'submitted', 'approved'];
  for (const [id, least] of acknowledged) expect(order.indexOf((await stateOf(id)).status ?? ''), id).toBeGreaterThanOrEqual(order.indexOf(least));
}, 400_000);
