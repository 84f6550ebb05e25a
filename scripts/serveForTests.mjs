import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { bundleServer } from './bundle.mjs';
import { databaseUrl, ensureDatabase, openCluster, query } from './cluster.mjs';
import { joinAlone } from './lock.mjs';
import { dataFolder, testCluster } from './paths.mjs';
import { startLocalServices, startServer, stopProcess } from './services.mjs';
import { reportAndExit } from './steps.mjs';

/**
 * `node scripts/serveForTests.mjs NAME PORT`: a register in demo mode for browser tests, fresh at every
 * start, in the cluster for tests and a folder of its own. It serves dist/ as it is.
 */
const [name = 'browser', port = '4790'] = process.argv.slice(2);
const folder = join(dataFolder, `test-${name}`);
const open = { services: [], server: undefined, cluster: undefined, turn: undefined };
let stopping;

function stopAll() {
  stopping ??= (async () => {
    await stopProcess(open.server);
    await Promise.all(open.services.map((service) => stopProcess(service)));
    await open.cluster?.close();
    open.turn?.leave();
  })();
  return stopping;
}
const end = () => void stopAll().then(() => process.exit(0), reportAndExit);
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, end);
// A runner that is killed says nothing; its register would hold the port and the database for the next run.
const runner = process.ppid;
setInterval(() => process.ppid === runner || end(), 1_000).unref();

async function serve() {
  open.turn = await joinAlone(`browser-${name}`, (pid) => `Browser tests of this checkout already run (process ${pid}).`);
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  const bundle = await bundleServer(join(folder, 'bundle'));
  // TEST_DATABASE_ADMIN_URL: the whole test run has opened the cluster already.
  const given = process.env.TEST_DATABASE_ADMIN_URL;
  open.cluster = given ? undefined : await openCluster({ home: testCluster, disposable: true });
  const adminUrl = given ?? open.cluster.adminUrl;
  await query(adminUrl, `drop database if exists "${name}" with (force)`);
  const url = databaseUrl(adminUrl, name);
  await ensureDatabase(url);
  const local = await startLocalServices({ bundle: bundle.fakes, folder, given: {} });
  open.services = local.started;
  const settings = {
    ...local.settings,
    NODE_ENV: 'production',
    PORT: port,
    HOST: '127.0.0.1',
    APP_URL: `http://127.0.0.1:${port}`,
    DATABASE_URL: url,
    KARYA_DEMO: 'on',
    DEMO_PASSWORD: '',
    FREEZE_AGREEMENT: 'one',
    WEB_DIST: '',
    AUTH_SECRET: 'a-secret-for-tests-only-0123456789abcdef',
    SIGN_IN_CALLS_PER_MINUTE: '100000',
    CALCULATOR_CALLS_PER_MINUTE: '100000',
  };
  const { launched, ready } = await startServer({ bundle: bundle.server, log: join(folder, 'server.log'), settings, baseUrl: `http://127.0.0.1:${port}` });
  open.server = launched;
  await ready;
  console.log(`ready at http://127.0.0.1:${port}`);
  void launched.ended.then(async (code) => {
    if (stopping !== undefined) return;
    console.error(`The server for browser tests ended (${code}); its log is ${launched.log}.`);
    await stopAll();
    process.exit(1);
  });
}

serve().catch(async (error) => {
  if (stopping !== undefined) return;
  await stopAll().catch(() => {});
  reportAndExit(error);
});
