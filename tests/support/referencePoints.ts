import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import Papa from 'papaparse';
import { root } from '../../scripts/paths.mjs';

/** Points of the public data in tests/reference, as a caller of POST /fits would send them: body kg, brain g. */
const animals = Papa.parse<{ species_common: string; body_kg: string; brain_g: string }>(readFileSync(join(root, 'tests', 'reference', 'animals28.csv'), 'utf8'), { header: true, skipEmptyLines: true });

export const rows = {
  animals: animals.data.map(({ species_common: id, body_kg: x, brain_g: y }) => ({ id, x: Number(x), y: Number(y) })),
};
