import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { gzipSync } from 'node:zlib';
import { root, webFolder } from './paths.mjs';

/**
 * `node scripts/firstView.mjs [FOLDER]`: kilobytes of compressed JavaScript that the Register page (`/`) loads
 * from an exported client, file by file: what index.html names, and the parts of the routes that `/` opens.
 */
const folder = resolve(process.argv[2] ?? webFolder);
const index = join(folder, 'index.html');
if (!existsSync(index)) {
  console.error(`There is no exported client in ${folder}; npm start makes one.`);
  process.exit(1);
}

const named = [...readFileSync(index, 'utf8').matchAll(/<script src="\/([^"]+\.js)"/g)].map((match) => match[1]);
const entry = named.find((path) => /\/entry-/.test(path));
const source = readFileSync(join(folder, entry), 'utf8');

/** The route table of the bundle pairs each route's file with a module, and the module with the part it lies in. */
function partOf(route) {
  const line = source.split('\n').find((text) => text.includes(`"${route}":{`)) ?? '';
  const place = /r\(d\[\d+\]\)\(d\[(\d+)\],d\.paths\)/.exec(line.slice(line.indexOf(`"${route}":{`)))?.[1];
  const table = /,(\{"0":\d.*\})\);?$/.exec(line)?.[1];
  const modules = table === undefined ? {} : JSON.parse(table);
  const path = modules.paths?.[modules[place]];
  if (path === undefined) throw new Error(`The bundle does not say where ${route} lies; has the bundler changed?`);
  return path.slice(1);
}

const files = [...named, partOf('./_layout.tsx'), partOf('./(browse)/index.tsx')];
let total = 0;
for (const file of files) {
  const kilobytes = gzipSync(readFileSync(join(folder, file))).length / 1000;
  total += kilobytes;
  console.log(`${kilobytes.toFixed(1).padStart(7)} kB  ${file.replace(/-[0-9a-f]{32}/, '')}`);
}
console.log(`${total.toFixed(1).padStart(7)} kB  first view of ${folder.startsWith(root) ? folder.slice(root.length + 1) : folder}`);
