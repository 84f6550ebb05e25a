import { createHash } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findCurrentVersionNumber, findFrozenVersion, findVersionFiles, type VersionFileRow } from '../../db/queries/versions';
import { postgresError } from '../../server/errors';
import type { Context } from '../../server/context';
import { freezeNow, runFreeze, startFreeze } from '../../server/services/versions/freeze';
import { setAside } from '../../server/services/versions/setAside';
import { startTestApp, type TestApp } from '../support/testApp';

const fixedClock = () => new Date('2031-02-03T23:30:00.000Z');
const points = ['freeze:rows-written', 'freeze:fits-written', 'freeze:files-stored', 'freeze:before-switch'];
const note = 'A note that only this test writes: 6a1f.';

/** Sets the elephant's cortex aside, so that there is something to freeze. */
async function change(app: TestApp, context: Context = app.context): Promise<void> {
  const found = await app.context.db.execute<{ number: string }>(sql`select 'AK-' || lpad(r.number::text, 6, '0') as number from records r join taxa t on t.id = r.taxon_id join structures s on s.id = r.structure_id where t.slug = 'loxodonta-africana' and s.key = 'cerebral_cortex'`);
  await setAside(context, await systemActor(app), found.rows[0]?.number ?? '', { scope: 'all', reason: 'Far out in x.' });
}

async function systemActor(app: TestApp) {
  const found = await app.context.db.execute<{ id: string }>(sql`select id from users where kind = 'system'`);
  return { ...(await app.actor('curator')), id: found.rows[0]?.id ?? '' };
}

async function filesOf(app: TestApp, number: number): Promise<VersionFileRow[]> {
  const version = await findFrozenVersion(app.context.db, number);
  return version === null ? [] : findVersionFiles(app.context.db, version.id);
}
const sums = (files: readonly VersionFileRow[]) => files.map(({ name, sha256 }) => `${sha256} ${name}`);

describe('a freeze', () => {
  let plain: TestApp;
  let wanted: string[];

  beforeAll(async () => {
    plain = await startTestApp({ seed: 'published', clock: fixedClock });
    await change(plain);
    await freezeNow(plain.context, await systemActor(plain), { label: '2', note });
    wanted = sums(await filesOf(plain, 2));
  }, 120_000);
  afterAll(() => plain.close());

  it('writes eleven files, the manifest last, and takes its date from the injected clock', async () => {
    const files = await filesOf(plain, 2);
    expect(files.map(({ name }) => name)).toEqual(['records.csv', 'species_means.csv', 'standing_fits.csv', 'sources.csv', 'sources.bib', 'datapackage.json', 'README.md', 'CHANGES.md', 'CITATION.cff', 'LICENSE', 'CHECKSUMS.sha256']);
    const version = await findFrozenVersion(plain.context.db, 2);
    expect(version?.frozenAt?.toISOString()).toBe('2031-02-03T23:30:00.000Z');
    expect(version?.manifestSha256).toBe(files.at(-1)?.sha256);
    for (const { storageKey, sha256, bytes } of files) {
      const stored = await plain.context.storage.get(storageKey);
      expect(createHash('sha256').update(stored?.content ?? '').digest('hex')).toBe(sha256);
      expect(stored?.content.length).toBe(bytes);
    }
  });

  it('gives the same bytes for rows stored in another order, in another time zone', async () => {
    const zone = process.env['TZ'];
    const other = await startTestApp({ seed: 'published', clock: fixedClock });
    try {
      // CLUSTER writes a table anew in the order of its random keys.
      for (const table of ['records', 'record_revisions', 'taxa', 'structures', 'sources', 'standing_fits', 'set_asides', 'version_rows']) {
        await other.context.db.execute(sql.raw(`cluster ${table} using ${table}_${table === 'version_rows' ? 'version_id_record_id_pk' : 'pkey'}`));
      }
      process.env['TZ'] = 'Pacific/Kiritimati';
      expect(new Date('2031-02-03T23:30:00.000Z').getDate()).toBe(4);
      await change(other);
      await freezeNow(other.context, await systemActor(other), { label: '2', note });
      expect(sums(await filesOf(other, 2))).toEqual(wanted);
    } finally {
      if (zone === undefined) delete process.env['TZ'];
      else process.env['TZ'] = zone;
      await other.close();
    }
  }, 120_000);

  it.each(points)('killed at %s and taken up again, gives the same bytes and never shows half a version', async (point) => {
    const app = await startTestApp({ seed: 'published', clock: fixedClock });
    try {
      await change(app);
      let reached = 0;
      const dying: Context = {
        ...app.context,
        killPoint: (name) => {
          if (name !== point) return;
          reached += 1;
          throw new Error('killed here');
        },
      };
      const versionId = await startFreeze(app.context, await systemActor(app), { label: '2', note });
      await expect(runFreeze(dying, versionId)).rejects.toThrow('killed here');
      expect(reached).toBe(1);
      expect(await findCurrentVersionNumber(app.context.db)).toBe(1);
      expect((await app.anonymous.get('/versions/2')).status).toBe(404);
      await app.runJobs();
      expect(sums(await filesOf(app, 2))).toEqual(wanted);
      await runFreeze(app.context, versionId);
      expect(sums(await filesOf(app, 2))).toEqual(wanted);
    } finally {
      await app.close();
    }
  }, 120_000);

  it('refuses every change of a frozen version by SQL', async () => {
    const statements = [
      `update versions set note = 'x' where number = 2`,
      `update versions set status = 'preparing' where number = 2`,
      `delete from versions where number = 2`,
      `update version_rows set number = number`,
      `delete from version_rows`,
      `truncate version_rows cascade`,
      `update version_files set bytes = 1`,
      `delete from version_files`,
      `insert into version_files select id, 'more.csv', 'text/csv', 1, repeat('0', 64), 'k', null, 99 from versions where number = 2`,
      `insert into version_rows select version_id, record_id, record_revision_id, number, row from version_rows limit 1`,
      `update fit_results set result = '{}' where set = 'version'`,
      `update flags set kind = 'watch'`,
    ];
    for (const statement of statements) {
      const error: unknown = await plain.context.db.execute(sql.raw(statement)).then(() => null, (reason: unknown) => reason);
      expect(postgresError(error)?.code, statement).toBe('KA001');
    }
  });

  it('refuses a second one with who is freezing and since when', async () => {
    const app = await startTestApp({ seed: 'published', clock: fixedClock });
    try {
      await change(app);
      const curator = await app.as('curator');
      const answers = await Promise.all([curator.post('/versions', { label: '2' }), curator.post('/versions', { label: '2' })]);
      expect(answers.map(({ status }) => status).sort()).toEqual([202, 409]);
      const third = await curator.post<{ code: string; detail: string }>('/versions', { label: '3' });
      expect(third.status).toBe(409);
      expect(third.body.code).toBe('freeze-under-way');
      expect(third.body.detail).toContain('Test curator has been freezing version 2 since 2031-02-03T23:30:00.000Z');
      await app.runJobs();
      expect((await app.anonymous.get<{ current: boolean }>('/versions/2')).body.current).toBe(true);
    } finally {
      await app.close();
    }
  }, 120_000);

  it('waits for a second person where the setting asks for two', async () => {
    const app = await startTestApp({ seed: 'published', clock: fixedClock, env: { FREEZE_AGREEMENT: 'two' } });
    try {
      await change(app);
      const curator = await app.as('curator');
      expect((await curator.post('/versions', { label: '2' })).status).toBe(202);
      await app.runJobs();
      expect(await findCurrentVersionNumber(app.context.db)).toBe(1);
      expect((await curator.post('/versions/preparing/agree')).status).toBe(403);
      const administrator = await app.as('administrator');
      expect((await administrator.post('/versions/preparing/agree')).status).toBe(202);
      await app.runJobs();
      expect(await findCurrentVersionNumber(app.context.db)).toBe(2);
    } finally {
      await app.close();
    }
  }, 120_000);
});
