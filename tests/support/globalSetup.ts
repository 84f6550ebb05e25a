import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { existsSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { databaseUrl, openCluster } from '../../scripts/cluster.mjs';
import { root, testCluster } from '../../scripts/paths.mjs';

/**
 * Before the server tests: a PostgreSQL cluster for tests only, a migrated template database in it, and the
 * stand-ins for mail and storage as processes of their own. Several runs may share the cluster: each has
 * its own prefix for database names, and the last to end stops it.
 */

declare module 'vitest' {
  export interface ProvidedContext {
    databaseAdminUrl: string;
    databasePrefix: string;
    mailApiUrl: string;
    mailApiKey: string;
    storageEndpoint: string;
    storageAccessKeyId: string;
    storageSecretAccessKey: string;
  }
}

const prefixOf = (pid: number) => `run${pid}_`;

async function withAdmin<T>(adminUrl: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: adminUrl });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}

/** Removes this run's databases and those that killed runs have left. */
async function dropDatabases(adminUrl: string): Promise<void> {
  await withAdmin(adminUrl, async (client) => {
    const { rows } = await client.query<{ datname: string }>("select datname from pg_database where datname ~ '^run[0-9]+_'");
    for (const { datname } of rows) {
      const pid = Number(/^run(\d+)_/.exec(datname)?.[1]);
      if (pid === process.pid || !isAlive(pid)) await client.query(`drop database if exists "${datname}" with (force)`);
    }
  });
}

async function makeMigratedTemplate(adminUrl: string, name: string): Promise<void> {
  await withAdmin(adminUrl, (client) => client.query(`create database "${name}"`));
  if (!existsSync(join(root, 'db', 'migrate.ts'))) throw new Error('db/migrate.ts is absent: the template database cannot be migrated.');
  const { migrateDatabase } = await import('../../db/migrate');
  await migrateDatabase(databaseUrl(adminUrl, name));
}

async function startFake(kind: 'mail' | 'storage', environment: Record<string, string>): Promise<{ child: ChildProcess; url: string }> {
  const child = spawn(process.execPath, ['--import', 'tsx', '--import', './scripts/stopWithParent.mjs', 'server/fakes/main.ts', kind], {
    cwd: root,
    env: { ...process.env, ...environment },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const url = await new Promise<string>((resolve, reject) => {
    child.once('message', (message: { listening: string }) => resolve(message.listening));
    child.once('exit', (code) => reject(new Error(`The stand-in for ${kind} ended with ${code} before it listened.`)));
  });
  child.unref();
  child.channel?.unref();
  return { child, url };
}

async function stopFake(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  child.ref();
  await new Promise<void>((resolve) => {
    child.once('exit', () => resolve());
    child.kill('SIGTERM');
  });
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  // The client of the object storage announces a later end of Node.js 20 once a process.
  process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';
  const given = process.env['TEST_DATABASE_ADMIN_URL'];
  const cluster = given === undefined ? await openCluster({ home: testCluster, disposable: true }) : undefined;
  const adminUrl = given ?? cluster?.adminUrl ?? '';
  const folder = await mkdtemp(join(tmpdir(), 'allokarya-tests-'));
  const prefix = prefixOf(process.pid);
  const mailApiKey = 're_test_key';
  const storageKeys = { STORAGE_ACCESS_KEY_ID: 'test-key-id', STORAGE_SECRET_ACCESS_KEY: 'test-secret-access-key' };
  await dropDatabases(adminUrl);
  const [mail, storage] = await Promise.all([
    startFake('mail', { FAKE_FOLDER: join(folder, 'mail'), MAIL_API_KEY: mailApiKey }),
    startFake('storage', { FAKE_FOLDER: join(folder, 'storage'), ...storageKeys }),
    makeMigratedTemplate(adminUrl, `${prefix}migrated`),
  ]);
  project.provide('databaseAdminUrl', adminUrl);
  project.provide('databasePrefix', prefix);
  project.provide('mailApiUrl', mail.url);
  project.provide('mailApiKey', mailApiKey);
  project.provide('storageEndpoint', storage.url);
  project.provide('storageAccessKeyId', storageKeys.STORAGE_ACCESS_KEY_ID);
  project.provide('storageSecretAccessKey', storageKeys.STORAGE_SECRET_ACCESS_KEY);
  return async () => {
    await Promise.all([stopFake(mail.child), stopFake(storage.child)]);
    await dropDatabases(adminUrl);
    await cluster?.close();
    await rm(folder, { recursive: true, force: true });
  };
}
