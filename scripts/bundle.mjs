import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { buildFolder, root } from './paths.mjs';
import { StopError } from './steps.mjs';

/** A source file knows its place by import.meta.url; in the bundle it must still be the source's place. */
const keepPlaces = (folder) => ({
  name: 'keep-places',
  setup(build) {
    build.onLoad({ filter: /\.ts$/ }, ({ path }) => {
      const source = readFileSync(path, 'utf8');
      if (path.includes('node_modules') || !source.includes('import.meta.url')) return undefined;
      const place = JSON.stringify(relative(folder, path).replaceAll('\\', '/'));
      return { contents: source.replaceAll('import.meta.url', `new URL(${place}, import.meta.url).href`), loader: 'ts', resolveDir: dirname(path) };
    });
  },
});

/** Bundles the server and the local services into a folder of this checkout; packages stay outside. Answers the two files. */
export async function bundleServer(folder = buildFolder) {
  const { build } = await import('esbuild');
  const entries = { server: join(root, 'server', 'main.ts'), fakes: join(root, 'server', 'fakes', 'main.ts') };
  for (const entry of Object.values(entries)) if (!existsSync(entry)) throw new StopError(`${relative(root, entry)} is absent: the checkout is not whole.`);
  mkdirSync(folder, { recursive: true });
  await build({
    entryPoints: entries,
    outdir: folder,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    packages: 'external',
    platform: 'node',
    format: 'esm',
    target: 'node20',
    sourcemap: true,
    tsconfig: join(root, 'tsconfig.server.json'),
    plugins: [keepPlaces(folder)],
    logLevel: 'silent',
  }).catch((error) => {
    throw new StopError(`The server could not be bundled:\n${error.message}`);
  });
  return { server: join(folder, 'server.mjs'), fakes: join(folder, 'fakes.mjs') };
}
