import { chmodSync, existsSync, rmSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { databaseUrl, ensureDatabase, openCluster } from '../../scripts/cluster.mjs';

/** The cluster of `npm start`, in a folder of this test. */

let parent: string;
let home: string;

beforeAll(async () => {
  parent = await mkdtemp(join(tmpdir(), 'cluster-'));
  // The user postgres must be able to enter it when root runs the tests.
  chmodSync(parent, 0o755);
  home = join(parent, `cluster-${process.pid}`);
});
afterAll(async () => await rm(parent, { recursive: true, force: true }));

async function answer(url: string, text: string): Promise<unknown> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query({ text, rowMode: 'array' })).rows[0]?.[0];
  } finally {
    await client.end();
  }
}

describe('the cluster of a checkout', () => {
  it('is made once, reused while it runs, and keeps its content when it starts again', async () => {
    const [first, second] = await Promise.all([openCluster({ home }), openCluster({ home })]);
    expect([first.state, second.state].sort()).toEqual(['made and started', 'running']);
    expect(second.adminUrl).toBe(first.adminUrl);
    expect(await answer(first.adminUrl, 'show data_directory')).toBe(join(home, 'data'));
    const url = databaseUrl(first.adminUrl, 'register');
    expect([await ensureDatabase(url), await ensureDatabase(url)]).toEqual([true, false]);
    await answer(url, 'create table kept as select 7 as value');
    await first.close();
    await expect(answer(first.adminUrl, 'select 1')).rejects.toMatchObject({ code: 'ECONNREFUSED' });

    const again = await openCluster({ home });
    expect(again.state).toBe('started');
    expect(await answer(databaseUrl(again.adminUrl, 'register'), 'select value from kept')).toBe(7);
    await again.close();
  });

  it('listens on loopback only and refuses a wrong password', async () => {
    const cluster = await openCluster({ home });
    expect(await answer(cluster.adminUrl, 'show listen_addresses')).toBe('127.0.0.1');
    const wrong = new URL(cluster.adminUrl);
    wrong.password = 'wrong';
    await expect(answer(wrong.href, 'select 1')).rejects.toMatchObject({ code: '28P01' });
    await cluster.close();
  });

  it('says what to do when it is half made', async () => {
    rmSync(join(home, 'complete'));
    await expect(openCluster({ home })).rejects.toThrow(/is half made: "npm run reset" makes it anew/);
    expect(existsSync(join(home, 'data'))).toBe(true);
  });
});
