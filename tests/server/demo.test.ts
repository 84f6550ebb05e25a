import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { attachments, comments, labs, mails, notices, records, rechecks, registerSettings, submissionRevisions, taxa, users } from '../../db/schema/index';
import { readDemonstration } from '../../server/seed/demo/demonstration';
import { seedDemo } from '../../server/seed/demo/seedDemo';
import type { Me } from '../../shared/contracts/account';
import { createClient, signInCookie } from '../support/client';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies' });
  await seedDemo(app.context);
});
afterAll(() => app.close());

const counts = async () => {
  const { db } = app.context;
  const tables = { users, labs, taxa, submissionRevisions, records, rechecks, comments, attachments, notices, mails };
  return Object.fromEntries(await Promise.all(Object.entries(tables).map(async ([name, table]) => [name, await db.$count(table)] as const)));
};

test('the four accounts sign in with the password of the settings, contributor and reviewer in different laboratories', async () => {
  const people = await Promise.all(
    (['contributor', 'reviewer', 'curator', 'administrator'] as const).map(async (role) => {
      const client = createClient(app.url, await signInCookie(app.url, `${role}@demo.example`, app.context.config.demoPassword));
      return { role, me: (await client.get<Me>('/me')).body };
    }),
  );
  for (const { role, me } of people) expect(me.person?.roles).toEqual([role]);
  const labOf = (role: string) => people.find((person) => person.role === role)?.me.person?.lab?.id ?? null;
  expect(labOf('contributor')).not.toBeNull();
  expect(labOf('reviewer')).not.toBeNull();
  expect(labOf('contributor')).not.toBe(labOf('reviewer'));
  expect([labOf('curator'), labOf('administrator')]).toEqual([null, null]);
  const waiting = (role: string) => people.find((person) => person.role === role)?.me.waiting;
  // One sent back and one open re-check; three waiting, of which one from the reviewer's own laboratory.
  expect(waiting('contributor')?.submissions).toBe(2);
  expect(waiting('reviewer')?.review).toBe(2);
  expect(waiting('curator')?.curate).toBe(await app.context.db.$count(records));
});

test('every entry stands where it is meant to, and no invented count under a real name', async () => {
  const rows = await app.context.db.select({ status: submissionRevisions.status, content: submissionRevisions.content }).from(submissionRevisions);
  const { entries, taxa: invented } = readDemonstration();
  const statusOf = (code: string) => rows.find(({ content }) => content.kind === 'specimen' && content.specimen.code === code)?.status;
  for (const { code, outcome } of entries) expect(statusOf(code)).toBe(outcome === 'recheck' ? 'approved' : outcome);
  expect(new Set(entries.map((entry) => entry.outcome))).toEqual(new Set(['draft', 'submitted', 'changes-requested', 'approved', 'recheck']));
  for (const entry of entries) expect(invented.some((taxon) => taxon.name === entry.taxon)).toBe(true);
  const marked = await app.context.db.select({ demonstration: records.demonstration }).from(records);
  expect(marked.length).toBeGreaterThan(0);
  expect(marked.every((record) => record.demonstration)).toBe(true);
});

describe('running it again', () => {
  test('changes nothing, also where a run was interrupted just before its end', async () => {
    const before = await counts();
    await seedDemo(app.context);
    await app.context.db.delete(registerSettings).where(eq(registerSettings.key, 'demonstration'));
    await seedDemo(app.context);
    expect(await counts()).toEqual(before);
  });

  test('outside demo mode makes nothing', async () => {
    const real = await startTestApp({ env: { KARYA_DEMO: 'off' } });
    try {
      const before = await real.context.db.$count(users);
      await seedDemo(real.context);
      expect(await real.context.db.$count(users)).toBe(before);
    } finally {
      await real.close();
    }
  });
});
