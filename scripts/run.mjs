import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { databaseUrl, ensureDatabase, openCluster } from './cluster.mjs';
import { registerCluster, root } from './paths.mjs';
import { StopError, reportAndExit } from './steps.mjs';

/** `node scripts/run.mjs FILE [arguments]`: runs a TypeScript file with DATABASE_URL set, starting the cluster when it does not run. */
async function run([file, ...args]) {
  if (file === undefined) throw new StopError('Say which file to run: node scripts/run.mjs scripts/loadPublished.ts');
  const cluster = process.env.DATABASE_URL ? undefined : await openCluster({ home: registerCluster });
  // The child gets the terminal's Ctrl-C itself; the cluster is closed once it has ended.
  process.on('SIGINT', () => {});
  try {
    const url = cluster === undefined ? process.env.DATABASE_URL : databaseUrl(cluster.adminUrl, 'allokarya');
    await ensureDatabase(url);
    const child = spawn(join(root, 'node_modules', '.bin', 'tsx'), [file, ...args], { cwd: root, stdio: 'inherit', env: { ...process.env, DATABASE_URL: url } });
    return await new Promise((resolve) => child.on('exit', (code) => resolve(code ?? 1)));
  } finally {
    await cluster?.close();
  }
}

run(process.argv.slice(2)).then((code) => process.exit(code), reportAndExit);
