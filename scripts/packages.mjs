import { createHash } from 'node:crypto';
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { dataFolder, root } from './paths.mjs';
import { withLock } from './lock.mjs';
import { StopError, runQuietly } from './steps.mjs';

/** Refuses another Node.js before anything is installed for it. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major !== 20 || minor < 19) throw new StopError(`Node.js 20.19 or a later 20 is needed; this is ${process.versions.node}.`);
}

/** npm ci when the packages are absent or older than the lockfile. Answers what was done. */
export async function ensurePackages() {
  return await withLock('packages', async () => {
    const lockfile = join(root, 'package-lock.json');
    const installed = join(root, 'node_modules', '.package-lock.json');
    const stamp = join(root, 'node_modules', '.installed-from');
    const wanted = createHash('sha256').update(readFileSync(lockfile)).digest('hex');
    if (existsSync(installed)) {
      // The stamp says exactly which lockfile was installed; packages installed by hand have only their time.
      const current = existsSync(stamp) ? readFileSync(stamp, 'utf8') === wanted : statSync(installed).mtimeMs >= statSync(lockfile).mtimeMs;
      if (current) return 'present';
    }
    await runQuietly('Installing the packages (npm ci)', 'npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], { log: join(dataFolder, 'npm.log') });
    writeFileSync(stamp, wanted);
    return 'installed';
  }, 900_000);
}
