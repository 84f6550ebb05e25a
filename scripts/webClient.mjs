import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { buildFolder, dataFolder, root, webFolder } from './paths.mjs';
import { withLock } from './lock.mjs';
import { runQuietly } from './steps.mjs';

/** What the exported client is made of; a change in any of it makes the export stale. */
const sources = ['app', 'components', 'shared', 'assets', 'app.json', 'package-lock.json', 'package.json', 'metro.config.cjs', 'scripts/leaveOut.cjs', 'scripts/leftOut.cjs', 'tsconfig.json'];

function filesOf(path) {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesOf(join(path, name)));
}

export function clientFingerprint() {
  const hash = createHash('sha256');
  for (const file of sources.flatMap((source) => filesOf(join(root, source)))) {
    hash.update(`${relative(root, file)}\0`).update(readFileSync(file)).update('\0');
  }
  return hash.digest('hex');
}

/** Exports the web client when its sources have changed since the last export. Answers what was done. */
export async function ensureWebClient() {
  return await withLock('export', async () => {
    const fingerprint = clientFingerprint();
    const stamp = join(webFolder, '.stamp');
    if (existsSync(stamp) && readFileSync(stamp, 'utf8') === fingerprint) return 'up to date';
    // Beside the served folder and swapped in at the end, so that a failed export leaves the old client whole.
    const making = join(buildFolder, 'web');
    rmSync(making, { recursive: true, force: true });
    await runQuietly('Exporting the web client', join(root, 'node_modules', '.bin', 'expo'), ['export', '--platform', 'web', '--output-dir', relative(root, making)], {
      log: join(dataFolder, 'export.log'),
      env: { ...process.env, NODE_ENV: 'production', EXPO_OFFLINE: '1', CI: '1', EXPO_NO_TELEMETRY: '1' },
    });
    writeFileSync(join(making, '.stamp'), fingerprint);
    rmSync(webFolder, { recursive: true, force: true });
    renameSync(making, webFolder);
    return 'exported';
  }, 900_000);
}
