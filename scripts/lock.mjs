import { mkdirSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { lockFolder } from './paths.mjs';
import { StopError } from './steps.mjs';

/** A process number alone is used again after a restart, so the moment it began belongs to its name. */
function beganAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? '0';
  } catch {
    return '0';
  }
}

const ownName = () => `${process.pid}-${beganAt(process.pid)}`;

function isAlive(name) {
  const [pid, began] = name.split('-');
  try {
    process.kill(Number(pid), 0);
  } catch (error) {
    if (error.code !== 'EPERM') return false;
  }
  return beganAt(Number(pid)) === began;
}

function lockIsStale(folder) {
  try {
    return !isAlive(readFileSync(join(folder, 'owner'), 'utf8'));
  } catch {
    // Between making the folder and writing the owner's name there is a moment without a name.
    try {
      return Date.now() - statSync(folder).mtimeMs > 5_000;
    } catch {
      return false;
    }
  }
}

/** Runs `work` while no other process of this checkout holds the lock of that name. */
export async function withLock(name, work, timeoutMs = 300_000) {
  mkdirSync(lockFolder, { recursive: true });
  const folder = join(lockFolder, `${name}.lock`);
  const until = Date.now() + timeoutMs;
  for (;;) {
    try {
      mkdirSync(folder);
      break;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    if (lockIsStale(folder)) rmSync(folder, { recursive: true, force: true });
    else if (Date.now() > until) throw new StopError(`Another start of this checkout has held "${name}" for too long: end it, or remove ${folder}.`);
    else await wait(50);
  }
  writeFileSync(join(folder, 'owner'), ownName());
  try {
    return await work();
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Notes that this process uses something shared; `leave` answers how many others still do. */
export function joinUsers(name) {
  const folder = join(lockFolder, `${name}.users`);
  const own = join(folder, ownName());
  mkdirSync(folder, { recursive: true });
  writeFileSync(own, '');
  return {
    leave() {
      rmSync(own, { force: true });
      return liveUsers(name).length;
    },
  };
}

/** Process numbers of those that use the named thing now; names of the dead are swept away. */
export function liveUsers(name) {
  const folder = join(lockFolder, `${name}.users`);
  let names;
  try {
    names = readdirSync(folder);
  } catch {
    return [];
  }
  const alive = names.filter(isAlive);
  for (const gone of names.filter((entry) => !alive.includes(entry))) rmSync(join(folder, gone), { force: true });
  return alive.map((entry) => Number(entry.split('-')[0]));
}

/** For what only one process of a checkout may do at a time; `refusal` makes the sentence for the second. */
export async function joinAlone(name, refusal) {
  return await withLock(name, async () => {
    const [other] = liveUsers(name);
    if (other !== undefined) throw new StopError(refusal(other));
    return joinUsers(name);
  });
}

export const alreadyRuns = (pid) => `The register of this checkout already runs (process ${pid}): stop it first. A second one runs from another checkout, with another PORT.`;
