import { join } from 'node:path';
import { dataFolder } from './paths.mjs';
import { StopError, capture, runLogged, tail } from './steps.mjs';

let listsAreFresh = false;

export const isRoot = () => process.getuid?.() === 0;

/**
 * Installs packages of Debian as root; anyone else is told the one command to type.
 * `purpose` begins the sentence: "PostgreSQL is needed".
 */
export async function installFromDebian(purpose, packages) {
  const command = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`;
  const apt = await capture('apt-get', ['--version']);
  if (apt.code !== 0) throw new StopError(`${purpose}, and this system has no apt-get: install ${packages.join(' ')} by its own means and start again.`);
  if (!isRoot()) throw new StopError(`${purpose}. Type this once, then start again:\n  sudo sh -c '${command}'`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const log = join(dataFolder, 'apt.log');
  if (!listsAreFresh) {
    if ((await runLogged('apt-get', ['update', '-q'], { log, env })) !== 0) throw new StopError(`${purpose}, but "apt-get update" failed:\n${tail(log, 12)}`);
    listsAreFresh = true;
  }
  const code = await runLogged('apt-get', ['install', '-y', '-q', '--no-install-recommends', ...packages], { log, env });
  if (code !== 0) throw new StopError(`${purpose}, but "${command}" failed:\n${tail(log, 12)}`);
}
