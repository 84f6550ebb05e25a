import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import { dirname, relative } from 'node:path';
import { root } from './paths.mjs';

/** Something the person in front of the terminal can act on: its message is the whole story, no stack. */
export class StopError extends Error {
  constructor(message, exitCode = 1) {
    super(message);
    this.name = 'StopError';
    this.exitCode = exitCode;
  }
}

const running = new Set();

/** Ends what a step has running, so that Ctrl-C during a long step does not leave it behind. */
export function stopRunningCommands() {
  for (const child of running) child.kill('SIGTERM');
}

export const seconds = (since) => ((performance.now() - since) / 1000).toFixed(1);

/** One line a step: its name, its seconds, and what it found. */
export async function step(name, work) {
  const began = performance.now();
  const label = `  ${name.padEnd(24)}`;
  if (process.stdout.isTTY) process.stdout.write(`${label} …`);
  const open = process.stdout.isTTY ? '\r' : '';
  try {
    const note = await work();
    console.log(`${open}${label}${seconds(began).padStart(6)} s${typeof note === 'string' && note !== '' ? `  ${note}` : ''}`);
  } catch (error) {
    console.log(`${open}${label}${seconds(began).padStart(6)} s  stopped`);
    throw error;
  }
}

export function tail(file, lines) {
  try {
    return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
  } catch {
    return '';
  }
}

/**
 * Runs a command with its words in a log file and answers its exit code.
 * `detached` keeps a terminal's Ctrl-C from reaching a command that must not be cut in half.
 */
export async function runLogged(command, args, { log, cwd = root, env = process.env, detached = false, ...identity }) {
  mkdirSync(dirname(log), { recursive: true });
  const output = openSync(log, 'w');
  try {
    const child = spawn(command, args, { cwd, env, detached, stdio: ['ignore', output, output], ...identity });
    running.add(child);
    return await new Promise((resolve, reject) => {
      child.on('error', reject);
      child.on('exit', (code, signal) => resolve(code ?? `signal ${signal}`));
    }).finally(() => running.delete(child));
  } finally {
    closeSync(output);
  }
}

/** As runLogged, but a failure stops with the last lines of the log. */
export async function runQuietly(purpose, command, args, options) {
  const code = await runLogged(command, args, options).catch((error) => {
    throw new StopError(`${purpose} could not be started: ${error.message}.`);
  });
  if (code === 0) return;
  throw new StopError(`${purpose} failed (${code}). The end of ${relative(root, options.log)}:\n${tail(options.log, 25)}`);
}

/** Runs a command and answers what it printed; an unknown command answers code 127. */
export async function capture(command, args, options = {}) {
  return await new Promise((resolve) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    let stdout = '';
    let stderr = '';
    child.stdout?.on('data', (part) => (stdout += part));
    child.stderr?.on('data', (part) => (stderr += part));
    child.on('error', (error) => resolve({ code: 127, stdout, stderr: error.message }));
    child.on('close', (code) => resolve({ code: code ?? 1, stdout, stderr }));
  });
}

/** Ends a script: a StopError as its sentence, anything else with its stack. */
export function reportAndExit(error) {
  if (error instanceof StopError) {
    console.error(`\n${error.message}`);
    process.exit(error.exitCode);
  }
  console.error(error);
  process.exit(1);
}
