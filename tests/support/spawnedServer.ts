import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, readFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { bundleServer } from '../../scripts/bundle.mjs';
import { root } from '../../scripts/paths.mjs';
import { testSettings } from './testSettings';

/** The server as a process of its own, so that it can be killed as a machine kills it. */
export interface SpawnedServer {
  url: string;
  /** Resolves with the signal or code when the process is gone. */
  ended: Promise<string>;
  kill(): Promise<void>;
  /** Ends it as an operator does, and waits. */
  stop(): Promise<void>;
  /** Kill points that were reached. */
  reached(): string[];
}

let bundled: Promise<string> | undefined;

/** Bundled as `npm start` does, once a test file, so that it starts in a second. */
function bundleOnce(): Promise<string> {
  bundled ??= bundleServer(join(root, 'node_modules', '.cache', 'allokarya', `tested-${process.pid}`)).then((files) => files.server);
  return bundled;
}

async function freePort(): Promise<number> {
  const probe = createServer();
  await new Promise<void>((resolve) => void probe.listen(0, '127.0.0.1', resolve));
  const { port } = probe.address() as AddressInfo;
  await new Promise((resolve) => probe.close(resolve));
  return port;
}

async function untilReady(url: string, child: ChildProcess, output: () => string): Promise<void> {
  for (const until = Date.now() + 60_000; Date.now() < until; await new Promise((resolve) => setTimeout(resolve, 50))) {
    if (child.exitCode !== null || child.signalCode !== null) throw new Error(`The server ended before it was ready:\n${output()}`);
    const answer = await fetch(`${url}/api/v1/health`).catch(() => null);
    if (answer?.status === 200) return;
  }
  throw new Error(`The server did not become ready:\n${output()}`);
}

/** Starts a server on the given database. `killAt` names the point at which it kills itself; `awaitReady` false where that may come first. */
export async function spawnServer(databaseUrl: string, env: Record<string, string>, options: { killAt?: string; awaitReady?: boolean } = {}): Promise<SpawnedServer> {
  const file = await bundleOnce();
  const port = await freePort();
  const log = join(mkdtempSync(join(tmpdir(), 'allokarya-kill-')), 'reached');
  const settings = testSettings(databaseUrl, { PORT: String(port), ...env, ...(options.killAt === undefined ? {} : { KARYA_KILL_AT: options.killAt }) });
  const child = spawn(process.execPath, ['--import', './scripts/stopWithParent.mjs', file], { env: { PATH: process.env['PATH'], KARYA_KILL_LOG: log, AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true', ...settings }, stdio: ['ignore', 'pipe', 'pipe', 'ipc'], cwd: root });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream?.on('data', (chunk: Buffer) => (output += chunk.toString('utf8')));
  const ended = new Promise<string>((resolve) => void child.once('exit', (code, signal) => resolve(signal ?? String(code))));
  const url = `http://127.0.0.1:${port}`;
  if (options.awaitReady !== false) await untilReady(url, child, () => output);
  return {
    url,
    ended,
    async kill() {
      child.kill('SIGKILL');
      await ended;
    },
    async stop() {
      child.kill('SIGTERM');
      await ended;
    },
    reached() {
      try {
        return readFileSync(log, 'utf8').split('\n').filter((name) => name !== '');
      } catch {
        return [];
      }
    },
  };
}
