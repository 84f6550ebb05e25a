import { spawn } from 'node:child_process';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { dataFolder, root } from './paths.mjs';
import { withLock } from './lock.mjs';
import { reportAndExit, runQuietly } from './steps.mjs';

const bin = (name) => join(root, 'node_modules', '.bin', name);

/** Typed routes are written by this command only; what it does to tsconfig.json on the way is undone. */
async function writeTypedRoutes() {
  const file = join(root, 'tsconfig.json');
  const before = readFileSync(file);
  try {
    await runQuietly('Writing the types of the routes', bin('expo'), ['customize', 'tsconfig.json'], {
      log: join(dataFolder, 'routes.log'),
      env: { ...process.env, EXPO_OFFLINE: '1', CI: '1', EXPO_NO_TELEMETRY: '1' },
    });
  } finally {
    if (!existsSync(file) || !readFileSync(file).equals(before)) writeFileSync(file, before);
  }
}

function check(project) {
  return new Promise((resolve) => spawn(bin('tsc'), ['-p', project], { cwd: root, stdio: 'inherit' }).on('exit', resolve));
}

try {
  await withLock('routes', writeTypedRoutes);
  const codes = [await check('tsconfig.json'), await check('tsconfig.server.json')];
  process.exitCode = codes.every((code) => code === 0) ? 0 : 1;
} catch (error) {
  reportAndExit(error);
}
