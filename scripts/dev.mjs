import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { bundleServer } from './bundle.mjs';
import { databaseUrl, ensureDatabase, openCluster } from './cluster.mjs';
import { storedDemoMode } from './demoMode.mjs';
import { alreadyRuns, joinAlone } from './lock.mjs';
import { checkNode, ensurePackages } from './packages.mjs';
import { dataFolder, registerCluster, root } from './paths.mjs';
import { demoAuthSecret, startLocalServices, stopProcess } from './services.mjs';
import { reportAndExit, step } from './steps.mjs';

/**
 * `npm run dev`: the server restarts and the client reloads as files are saved. The client is Metro's at
 * http://localhost:8081 (CLIENT_PORT), which hands /api to the server at PORT; data are those of `npm start`.
 */
async function develop() {
  checkNode();
  const turn = await joinAlone('register', alreadyRuns);
  mkdirSync(dataFolder, { recursive: true });
  await step('packages', ensurePackages);
  const port = process.env.PORT || '4680';
  const clientPort = process.env.CLIENT_PORT || '8081';
  const cluster = process.env.DATABASE_URL ? undefined : await openCluster({ home: registerCluster });
  const url = cluster === undefined ? process.env.DATABASE_URL : databaseUrl(cluster.adminUrl, 'allokarya');
  let services = [];
  try {
    await step('database', async () => void (await ensureDatabase(url)));
    const demo = process.env.KARYA_DEMO || (await storedDemoMode(url)) || 'on';
    const settings = { NODE_ENV: 'development', PORT: port, DATABASE_URL: url, KARYA_DEMO: demo, APP_URL: process.env.APP_URL || `http://localhost:${clientPort}`, KARYA_API_URL: `http://127.0.0.1:${port}`, KARYA_FIRST_ACCOUNT_FILE: join(dataFolder, 'first-account-link') };
    if (demo !== 'off') {
      const bundle = await bundleServer();
      const local = await startLocalServices({ bundle: bundle.fakes, folder: dataFolder, given: process.env });
      services = local.started;
      Object.assign(settings, local.settings, { AUTH_SECRET: process.env.AUTH_SECRET || demoAuthSecret(dataFolder) });
    }
    const { default: concurrently } = await import('concurrently');
    const env = { ...process.env, ...settings, AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true', PATH: `${join(root, 'node_modules', '.bin')}:${process.env.PATH}`, EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1' };
    const { result } = concurrently(
      [
        { name: 'server', command: 'tsx watch --clear-screen=false server/main.ts', env },
        { name: 'client', command: `expo start --web --port ${clientPort}`, env: { ...env, BROWSER: 'none', NODE_ENV: 'development' } },
      ],
      { cwd: root, killOthersOn: ['failure', 'success'], prefixColors: ['blue', 'green'] },
    );
    await result.catch(() => {});
  } finally {
    await Promise.all(services.map((service) => stopProcess(service)));
    await cluster?.close();
    turn.leave();
  }
}

// concurrently passes Ctrl-C on to both programs; when they have ended, the rest is stopped in order.
process.on('SIGINT', () => {});
develop().then(() => process.exit(0), reportAndExit);
