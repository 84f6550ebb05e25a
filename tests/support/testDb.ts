import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';

/** Databases for tests: each file clones a template and drops its clone. */

export interface TestDatabase {
  url: string;
  drop(): Promise<void>;
}

const adminUrl = () => inject('databaseAdminUrl');
const nameOf = (template: string) => `${inject('databasePrefix')}${template}`;

function urlOf(name: string): string {
  const url = new URL(adminUrl());
  url.pathname = `/${name}`;
  return url.href;
}

/** PostgreSQL clones a template only while nobody is connected to it, so clones and builds of one run take turns. */
async function inTurn<T>(lock: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: adminUrl() });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock(hashtext($1))', [nameOf(lock)]);
    return await work(client);
  } finally {
    await client.end();
  }
}

async function copy(client: pg.Client, template: string, name: string): Promise<void> {
  await client.query(`create database "${name}" template "${template}" strategy wal_log`);
}

/**
 * A database of its own, as the template is: 'migrated' is always there, others are made by ensureTemplate.
 * `drop` also ends connections that are still open.
 */
export async function cloneDatabase(template = 'migrated'): Promise<TestDatabase> {
  const name = `${inject('databasePrefix')}clone_${randomUUID().replaceAll('-', '')}`;
  await inTurn('clone', (client) => copy(client, nameOf(template), name));
  return {
    url: urlOf(name),
    drop: () => inTurn('drop', async (client) => void (await client.query(`drop database if exists "${name}" with (force)`))),
  };
}

/**
 * Makes a further template once per run, whoever asks first: `build` gets the address of a clone of
 * 'migrated' and must close its connections. A build that fails leaves no template behind.
 */
export async function ensureTemplate(template: string, build: (url: string) => Promise<void>): Promise<void> {
  await inTurn(`build_${template}`, async (client) => {
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [nameOf(template)]);
    if (rowCount === 1) return;
    const making = `${nameOf(template)}_making`;
    await client.query(`drop database if exists "${making}" with (force)`);
    await inTurn('clone', (other) => copy(other, nameOf('migrated'), making));
    await build(urlOf(making));
    await client.query(`select pg_terminate_backend(pid) from pg_stat_activity where datname = $1`, [making]);
    await client.query(`alter database "${making}" rename to "${nameOf(template)}"`);
  });
}
