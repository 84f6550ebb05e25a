import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { closeSync, existsSync, mkdirSync, openSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { root } from './paths.mjs';
import { StopError } from './steps.mjs';

/** The processes a start has: the server and, in demo mode and tests, the local mail and storage. */

const quietStorageClient = { AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true' };

function openLog(file) {
  if (existsSync(file) && statSync(file).size > 20_000_000) renameSync(file, `${file}.1`);
  return openSync(file, 'a');
}

/**
 * Starts a Node.js program in a process group of its own, so that a terminal's Ctrl-C reaches only the
 * parent, which stops everything in order. Its output goes to the log; what it says on stderr is kept too.
 */
function launch(program, args, { log, env }) {
  const output = openLog(log);
  const child = spawn(process.execPath, ['--enable-source-maps', '--import', join(root, 'scripts', 'stopWithParent.mjs'), program, ...args], {
    cwd: root,
    env,
    detached: true,
    stdio: ['ignore', output, 'pipe', 'ipc'],
  });
  const launched = { child, log, stderr: '', code: undefined, ended: undefined };
  child.stderr.on('data', (part) => {
    launched.stderr = (launched.stderr + part).slice(-20_000);
    try {
      writeFileSync(output, part);
    } catch {
      // The log is closed once the process has ended.
    }
  });
  launched.ended = new Promise((resolve) => {
    child.on('error', (error) => {
      launched.stderr += error.message;
      resolve((launched.code = 'error'));
    });
    child.on('close', (code, signal) => {
      closeSync(output);
      resolve((launched.code = code ?? signal));
    });
  });
  return launched;
}

/** Asks a process to stop and, when it does not within the time, ends it. */
export async function stopProcess(launched, timeoutMs = 20_000) {
  if (launched === undefined || launched.code !== undefined) return;
  launched.child.kill('SIGTERM');
  const late = new AbortController();
  await Promise.race([launched.ended, wait(timeoutMs, undefined, { signal: late.signal }).then(() => launched.child.kill('SIGKILL')).catch(() => {})]);
  late.abort();
  await launched.ended;
}

/** A secret of this checkout, made at the first start and kept in a file that only its owner reads. */
function keptSecret(folder, name) {
  const file = join(folder, name);
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 });
  return readFileSync(file, 'utf8').trim();
}

/**
 * Starts the local mail and storage and answers the settings that point at them.
 * A service whose address is set in `given` is not started: the given one is used.
 */
export async function startLocalServices({ bundle, folder, given }) {
  mkdirSync(folder, { recursive: true });
  const keys = {
    MAIL_API_KEY: `re_${keptSecret(folder, 'mail-key')}`,
    STORAGE_ACCESS_KEY_ID: 'local',
    STORAGE_SECRET_ACCESS_KEY: keptSecret(folder, 'storage-key'),
  };
  const kinds = [];
  if (!given.MAIL_API_URL) kinds.push({ kind: 'mail', address: 'MAIL_API_URL', also: { MAIL_API_KEY: keys.MAIL_API_KEY, MAIL_FROM: 'Allokarya <register@demo.example>' } });
  if (!given.STORAGE_ENDPOINT) kinds.push({ kind: 'storage', address: 'STORAGE_ENDPOINT', also: { STORAGE_BUCKET: 'attachments', STORAGE_ACCESS_KEY_ID: keys.STORAGE_ACCESS_KEY_ID, STORAGE_SECRET_ACCESS_KEY: keys.STORAGE_SECRET_ACCESS_KEY } });
  const started = [];
  const settings = {};
  const startOne = async ({ kind, address, also }) => {
    const launched = launch(bundle, [kind], { log: join(folder, `${kind}.log`), env: { ...process.env, ...keys, FAKE_FOLDER: join(folder, kind), FAKE_PORT: '0' } });
    started.push(launched);
    const listening = new Promise((resolve) => launched.child.once('message', (message) => resolve(message.listening)));
    const url = await Promise.race([listening, launched.ended.then(() => undefined)]);
    if (url === undefined) throw new StopError(`The local ${kind} service did not start:\n${launched.stderr.trim()}`);
    Object.assign(settings, { [address]: url }, also);
  };
  const outcomes = await Promise.allSettled(kinds.map(startOne));
  const failed = outcomes.find(({ status }) => status === 'rejected');
  if (failed !== undefined) {
    await Promise.all(started.map((launched) => stopProcess(launched)));
    throw failed.reason;
  }
  return { started, settings };
}

/** 78 is how the server says that its last words are meant for the person at the terminal. */
function endedEarly(launched) {
  if (launched.code === 78) return new StopError(launched.stderr.trim());
  const words = launched.stderr.trim().split('\n').slice(-30).join('\n');
  return new StopError(`The server ended before it answered (${launched.code}).${words === '' ? '' : `\n${words}`}\nIts log is ${relative(root, launched.log)}.`);
}

/** Starts the server and waits until its health is 200, which is after migrating and seeding. */
export async function startServer({ bundle, log, settings, baseUrl, timeoutMs = 600_000 }) {
  const launched = launch(bundle, [], { log, env: { ...process.env, ...quietStorageClient, ...settings } });
  return { launched, ready: waitForHealth(launched, baseUrl, timeoutMs) };
}

async function waitForHealth(launched, baseUrl, timeoutMs) {
  for (const until = Date.now() + timeoutMs; Date.now() < until; await Promise.race([wait(100), launched.ended])) {
    if (launched.code !== undefined) throw endedEarly(launched);
    const status = await fetch(`${baseUrl}/api/v1/health`, { signal: AbortSignal.timeout(5_000) }).then((answer) => answer.status, () => undefined);
    if (status === 200) return;
  }
  throw new StopError(`The server did not become ready in ${timeoutMs / 1000} s; its log is ${relative(root, launched.log)}.`);
}

/** The secret that signs sessions in demo mode. */
export function demoAuthSecret(folder) {
  mkdirSync(folder, { recursive: true });
  return keptSecret(folder, 'auth-secret');
}
