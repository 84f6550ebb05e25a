import { randomUUID } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { openDatabase } from '../../db/client';
import { findActor } from '../../db/queries/people';
import { chooseDemoMode } from '../../db/queries/settings';
import { buildApp } from '../../server/app';
import { createAuth, type Auth } from '../../server/auth';
import { loadConfig } from '../../server/config';
import type { Actor, Context } from '../../server/context';
import { listenOnLoopback } from '../../server/fakes/listen';
import { buildMailFake } from '../../server/fakes/mail';
import { connectMailer } from '../../server/integrations/mail';
import { connectStorage, type ObjectStore } from '../../server/integrations/storage';
import { createJobHandlers } from '../../server/jobs/handlers';
import { createLogger } from '../../server/logger';
import type { Role } from '../../shared/contracts/vocabulary';
import { createClient, signInCookie, type TestClient } from './client';
import { makeLab, makePerson, type TestPerson } from './factories';
import { collectJobs } from './jobs';
import { cloneDatabase, ensureTemplate } from './testDb';
import { testSettings } from './testSettings';

export interface TestAppOptions {
  /** What stands in the database: nothing, structures and taxa, or also the published tables frozen as version 1. */
  seed?: 'none' | 'vocabularies' | 'published';
  clock?: () => Date;
  /** Changed settings, by their names in the environment. */
  env?: Record<string, string | undefined>;
}

export interface TestApp {
  url: string;
  context: Context;
  auth: Auth;
  /** Two laboratories; `contributor` belongs to the first, `reviewer` to the second, the others to none. */
  labs: { first: { id: string; name: string }; second: { id: string; name: string } };
  /** The person made for a role, the same one each time. */
  person(role: Role): Promise<TestPerson>;
  /** A signed-in client: for the person of a role, or for one from `makePerson`. */
  as(who: Role | TestPerson): Promise<TestClient>;
  anonymous: TestClient;
  /** The actor that services get, for calling one directly. */
  actor(who: Role | TestPerson): Promise<Actor>;
  /** Does the work of the queue (mails, fits, freezes) until none is left; finds it as the sweep does. */
  runJobs(): Promise<void>;
  /** Mails sent so far, newest first. */
  sentMails(): ReturnType<Context['mailer']['listSent']>;
  close(): Promise<void>;
}

/** Holds the files of versions that stand in a template; every application reads it and writes into a bucket of its own. */
const templateBucket = 'templates';

/** Objects of the application's own bucket, and behind them those of the template. */
function overTemplate(own: ObjectStore, template: ObjectStore): ObjectStore {
  return {
    ...own,
    get: async (key) => (await own.get(key)) ?? template.get(key),
    head: async (key) => (await own.head(key)) ?? template.head(key),
    close: () => {
      own.close();
      template.close();
    },
  };
}

async function templateOf(seed: NonNullable<TestAppOptions['seed']>): Promise<string> {
  if (seed === 'none') return 'migrated';
  await ensureTemplate(seed, async (url) => {
    const app = await startTestApp({ env: { DATABASE_URL: url, STORAGE_BUCKET: templateBucket } });
    try {
      const { seedTemplate } = await import('./seededTemplates');
      await seedTemplate(seed, app.context, () => app.runJobs());
    } finally {
      await app.close();
    }
  });
  return seed;
}

/** The application on a port of its own over a cloned database, with a mail stand-in of its own; see tests/support/factories.ts for people. */
export async function startTestApp(options: TestAppOptions = {}): Promise<TestApp> {
  const given = options.env?.['DATABASE_URL'];
  const template = await templateOf(options.seed ?? 'none');
  const database = given === undefined ? await cloneDatabase(template) : { url: given, drop: async () => undefined };
  const folder = await mkdtemp(join(tmpdir(), 'allokarya-app-'));
  const server = createServer();
  await new Promise<void>((resolve) => void server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  const mail = await listenOnLoopback(await buildMailFake({ folder, apiKey: 're_test_key' }), 0);
  const config = loadConfig(testSettings(database.url, { PORT: String(port), MAIL_API_URL: mail.url, MAIL_API_KEY: 're_test_key', STORAGE_BUCKET: `attachments-${randomUUID()}`, ...options.env }));
  const logger = createLogger(config.logLevel);
  const { db, pool } = openDatabase(config.databaseUrl, () => undefined, 6);
  const own = connectStorage(config.storage);
  await own.checkBucket({ create: true });
  const storage = template === 'published' ? overTemplate(own, connectStorage({ ...config.storage, bucket: templateBucket })) : own;
  const jobs = collectJobs();
  const context: Context = {
    db,
    config,
    logger,
    clock: options.clock ?? (() => new Date()),
    mailer: connectMailer(config.mail),
    storage,
    jobs: jobs.queue,
    killPoint: () => undefined,
    demo: await chooseDemoMode(db, config.demo),
  };
  const auth = createAuth(context);
  server.on('request', buildApp(context, auth));
  const url = `http://127.0.0.1:${port}`;

  let labPair: Promise<TestApp['labs']> | undefined;
  const labsOf = () => (labPair ??= (async () => ({ first: await makeLab(db, `First laboratory ${randomUUID().slice(0, 4)}`), second: await makeLab(db, `Second laboratory ${randomUUID().slice(0, 4)}`) }))());
  const labs = given === undefined ? await labsOf() : { first: { id: '', name: '' }, second: { id: '', name: '' } };
  const byRole = new Map<Role, Promise<TestPerson>>();
  const person = (role: Role): Promise<TestPerson> => {
    const labId = role === 'contributor' ? labs.first.id : role === 'reviewer' ? labs.second.id : null;
    const known = byRole.get(role) ?? makePerson(db, { name: `Test ${role}`, email: `${role}@test.example`, roles: [role], labId });
    byRole.set(role, known);
    return known;
  };
  const personOf = async (who: Role | TestPerson) => (typeof who === 'string' ? await person(who) : who);
  const cookies = new Map<string, Promise<string>>();

  return {
    url,
    context,
    auth,
    labs,
    person,
    anonymous: createClient(url, null),
    async as(who) {
      const { id, email } = await personOf(who);
      const cookie = cookies.get(id) ?? signInCookie(url, email);
      cookies.set(id, cookie);
      return createClient(url, await cookie);
    },
    async actor(who) {
      const found = await findActor(db, (await personOf(who)).id, context.clock().toISOString().slice(0, 10));
      if (found === null) throw new Error('There is no such active person.');
      return found;
    },
    runJobs: () => jobs.drain(createJobHandlers(context)),
    sentMails: () => context.mailer.listSent(100),
    async close() {
      await new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      });
      await mail.close();
      storage.close();
      await pool.end();
      await database.drop();
      await rm(folder, { recursive: true, force: true });
    },
  };
}
