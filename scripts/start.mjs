import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { bundleServer } from './bundle.mjs';
import { databaseUrl, ensureDatabase, openCluster } from './cluster.mjs';
import { storedDemoMode } from './demoMode.mjs';
import { alreadyRuns, joinAlone } from './lock.mjs';
import { checkNode, ensurePackages } from './packages.mjs';
import { dataFolder, registerCluster } from './paths.mjs';
import { ensurePostgres } from './postgresBinaries.mjs';
import { demoAuthSecret, startLocalServices, startServer, stopProcess } from './services.mjs';
import { StopError, reportAndExit, step, stopRunningCommands } from './steps.mjs';
import { ensureWebClient } from './webClient.mjs';

/** `npm start`: from a bare machine with Node.js 20 to a register that answers. */

const environment = process.env;
const port = environment.PORT || '4680';
const host = environment.HOST || '127.0.0.1';
const appUrl = (environment.APP_URL || `http://127.0.0.1:${port}`).replace(/\/+$/, '');
const linkFile = join(dataFolder, 'first-account-link');

const open = { services: [], server: undefined, cluster: undefined, turn: undefined };
let stopping;

/** Stops in the order of need: who asks before who answers. Asked twice, it still happens once. */
function stopAll() {
  stopping ??= (async () => {
    stopRunningCommands();
    await stopProcess(open.server);
    await Promise.all(open.services.map((service) => stopProcess(service)));
    const cluster = await open.cluster?.catch(() => undefined);
    await cluster?.close();
    open.turn?.leave();
  })();
  return stopping;
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => {
    if (stopping !== undefined) return;
    console.log('\nStopping.');
    stopAll().then(
      () => process.exit(0),
      (error) => reportAndExit(error),
    );
  });
}

function checkPort() {
  if (!/^\d+$/.test(port) || Number(port) < 1 || Number(port) > 65_535) throw new StopError(`PORT is "${port}"; expected is a whole number from 1 to 65535.`);
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on('error', (error) => {
      if (error.code === 'EADDRINUSE') reject(new StopError(`Port ${port} is in use: stop the program that uses it, or choose another port: PORT=${Number(port) + 1} npm start`));
      else reject(new StopError(`The server cannot listen on ${host}:${port} (${error.code}): choose another HOST or PORT.`));
    });
    probe.listen(Number(port), host, () => probe.close(resolve));
  });
}

async function openDatabase() {
  if (environment.DATABASE_URL) {
    await ensureDatabase(environment.DATABASE_URL);
    return { url: environment.DATABASE_URL, note: 'DATABASE_URL' };
  }
  open.cluster = openCluster({ home: registerCluster });
  const cluster = await open.cluster;
  const url = databaseUrl(cluster.adminUrl, 'allokarya');
  await ensureDatabase(url);
  return { url, note: cluster.state };
}

function announce(demo) {
  const lines = [`Allokarya answers at ${appUrl}${demo ? ' (demonstration)' : ''}. Ctrl-C stops it.`];
  if (demo) {
    for (const role of ['contributor', 'reviewer', 'curator', 'administrator']) lines.push(`  ${role}@demo.example`);
    lines.push(`  password: ${environment.DEMO_PASSWORD || 'karya-demo-2026'}`);
  } else {
    try {
      lines.push(readFileSync(linkFile, 'utf8').trim());
    } catch {
      // The first account exists already, so there is no link to show.
    }
  }
  console.log(`\n${lines.join('\n')}`);
}

async function start() {
  checkNode();
  open.turn = await joinAlone('register', alreadyRuns);
  await checkPort();
  mkdirSync(dataFolder, { recursive: true });
  await step('packages', ensurePackages);
  if (!environment.DATABASE_URL) await step('PostgreSQL', async () => ((await ensurePostgres()).installed ? 'installed' : 'present'));
  await step('web client', ensureWebClient);
  let bundle;
  await step('server bundle', async () => void (bundle = await bundleServer()));
  let database;
  await step('database', async () => (database = await openDatabase()).note);
  const demoSetting = environment.KARYA_DEMO || (await storedDemoMode(database.url)) || 'on';
  const demo = demoSetting !== 'off';
  const settings = { NODE_ENV: 'production', PORT: port, HOST: host, APP_URL: appUrl, DATABASE_URL: database.url, KARYA_DEMO: demoSetting, KARYA_FIRST_ACCOUNT_FILE: linkFile };
  if (demo) {
    settings.AUTH_SECRET = environment.AUTH_SECRET || demoAuthSecret(dataFolder);
    await step('local mail and storage', async () => {
      const local = await startLocalServices({ bundle: bundle.fakes, folder: dataFolder, given: environment });
      open.services = local.started;
      Object.assign(settings, local.settings);
    });
  }
  rmSync(linkFile, { force: true });
  await step('server', async () => {
    if (stopping !== undefined) return;
    const { launched, ready } = await startServer({ bundle: bundle.server, log: join(dataFolder, 'server.log'), settings, baseUrl: `http://${host === '0.0.0.0' ? '127.0.0.1' : host}:${port}` });
    open.server = launched;
    await ready;
  });
  announce(demo);
  for (const service of [open.server, ...open.services]) void service.ended.then((code) => endWith(service, code));
}

async function endWith(service, code) {
  if (stopping !== undefined) return;
  console.error(`\nA process of the register ended on its own (${code}); its log is ${service.log}. Everything is stopped now; start again with npm start.`);
  await stopAll().catch((error) => console.error(error.message));
  process.exit(1);
}

start().catch(async (error) => {
  if (stopping !== undefined) return;
  await stopAll().catch(() => {});
  reportAndExit(error);
});
