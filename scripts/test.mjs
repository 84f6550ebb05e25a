import { existsSync, mkdirSync } from 'node:fs';
import { createServer } from 'node:net';
import { freePort, openCluster } from './cluster.mjs';
import { installFromDebian } from './debian.mjs';
import { checkNode, ensurePackages } from './packages.mjs';
import { dataFolder, testCluster } from './paths.mjs';
import { StopError, seconds, step, stopRunningCommands } from './steps.mjs';
import { partsOfTheRun } from './testParts.mjs';
import { ensureWebClient } from './webClient.mjs';

/**
 * `npm test`: everything, from nothing. `node scripts/test.mjs --only unit,server` runs some parts.
 * It ends with "N passed, N failed"; a part that did not run makes it fail.
 */

const began = performance.now();
let cluster;
let stopping = false;

async function ensureChromium() {
  const place = process.env.CHROMIUM || '/usr/bin/chromium';
  if (existsSync(place)) return 'present';
  if (process.env.CHROMIUM) throw new StopError(`CHROMIUM is "${place}", but nothing is there.`);
  await installFromDebian('Chromium is needed for the browser tests', ['chromium']);
  return 'installed';
}

function isFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.on('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}

/** Two neighbouring free ports: one register for each size of screen. */
async function freePair() {
  for (;;) {
    const port = await freePort();
    if (port < 65_535 && (await isFree(port + 1))) return String(port);
  }
}

function wantedParts(parts) {
  const at = process.argv.indexOf('--only');
  if (at < 0) return parts;
  const names = (process.argv[at + 1] ?? '').split(',');
  const unknown = names.filter((name) => !parts.some((part) => part.name === name));
  if (unknown.length > 0) throw new StopError(`There is no part "${unknown.join(', ')}"; there are ${parts.map(({ name }) => name).join(', ')}.`);
  return parts.filter(({ name }) => names.includes(name));
}

async function runPart(part) {
  const since = performance.now();
  let result;
  try {
    if (part.needsClient) await step('web client', ensureWebClient);
    result = await part.run();
  } catch (error) {
    result = { passed: 0, failed: 1, words: error instanceof StopError ? error.message : String(error.stack) };
  }
  console.log(`  ${part.name.padEnd(24)}${seconds(since).padStart(6)} s  ${result.passed} passed, ${result.failed} failed`);
  if (result.words !== '') console.log(`${result.words}\n`);
  return result;
}

async function test() {
  checkNode();
  mkdirSync(dataFolder, { recursive: true });
  await step('packages', ensurePackages);
  await step('PostgreSQL', async () => (cluster = await openCluster({ home: testCluster, disposable: true })).state);
  const env = { TEST_DATABASE_ADMIN_URL: cluster.adminUrl, BROWSER_TEST_PORT: await freePair(), CI: '1' };
  const parts = wantedParts(partsOfTheRun(env));
  if (parts.some(({ needsClient }) => needsClient)) await step('Chromium', ensureChromium);
  let passed = 0;
  let failed = 0;
  for (const part of parts) {
    const result = await runPart(part);
    if (stopping) return 130;
    passed += result.passed;
    failed += result.failed;
  }
  await cluster.close();
  console.log(`  ${'all'.padEnd(24)}${seconds(began).padStart(6)} s\n\n${passed} passed, ${failed} failed`);
  return failed === 0 && passed > 0 ? 0 : 1;
}

for (const signal of ['SIGINT', 'SIGTERM']) {
  process.on(signal, () => {
    if (stopping) return;
    stopping = true;
    stopRunningCommands();
  });
}

test().then(
  async (code) => {
    if (stopping) await cluster?.close();
    process.exit(code);
  },
  async (error) => {
    await cluster?.close().catch(() => {});
    console.log(`\n${error instanceof StopError ? error.message : error.stack}\n\n0 passed, 1 failed`);
    process.exit(1);
  },
);
