import type { ThemeName } from './tokens';

export type MarkShape =
  | 'disc'
  | 'square'
  | 'triangle'
  | 'diamond'
  | 'inverted triangle'
  | 'plus'
  | 'saltire'
  | 'hourglass';

export interface CladeMarkSpec {
  shape: MarkShape;
  /** SVG path centred on 0,0, drawn for radius `MARK_PATH_RADIUS`; all shapes are optically of one size. */
  path: string;
  colour: Record<ThemeName, string>;
}

export const MARK_PATH_RADIUS = 5.6;

/** In order: DAB brown, luxol blue, methyl green, eosin, orange G, haematoxylin, alcian blue, silver. */
const marks: readonly CladeMarkSpec[] = [
  { shape: 'disc', path: 'M-5.6 0A5.6 5.6 0 1 0 5.6 0A5.6 5.6 0 1 0 -5.6 0Z', colour: { brightfield: '#733F0B', darkfield: '#F6C8A0' } },
  { shape: 'square', path: 'M-5.04 -5.04L5.04 -5.04L5.04 5.04L-5.04 5.04Z', colour: { brightfield: '#243A94', darkfield: '#8AA0E8' } },
  { shape: 'triangle', path: 'M0.00 -7.00L6.58 4.62L-6.58 4.62Z', colour: { brightfield: '#256B4B', darkfield: '#3F9A80' } },
  { shape: 'diamond', path: 'M0.00 -7.28L6.26 0.00L0.00 7.28L-6.26 0.00Z', colour: { brightfield: '#DC437F', darkfield: '#E2505C' } },
  { shape: 'inverted triangle', path: 'M0.00 7.00L6.58 -4.62L-6.58 -4.62Z', colour: { brightfield: '#A07A00', darkfield: '#DE9422' } },
  { shape: 'plus', path: 'M-2.35 -6.44L2.35 -6.44L2.35 -2.35L6.44 -2.35L6.44 2.35L2.35 2.35L2.35 6.44L-2.35 6.44L-2.35 2.35L-6.44 2.35L-6.44 -2.35L-2.35 -2.35Z', colour: { brightfield: '#8F62DC', darkfield: '#8F68E0' } },
  { shape: 'saltire', path: 'M2.89 -6.22L6.22 -2.89L3.33 0.00L6.22 2.89L2.89 6.22L0.00 3.33L-2.89 6.22L-6.22 2.89L-3.33 0.00L-6.22 -2.89L-2.89 -6.22L0.00 -3.33Z', colour: { brightfield: '#43939A', darkfield: '#7AEAF4' } },
  { shape: 'hourglass', path: 'M-5.54 -6.16L5.54 -6.16L1.36 0.00L5.54 6.16L-5.54 6.16L-1.36 0.00Z', colour: { brightfield: '#3C3C45', darkfield: '#B4B3BA' } },
];

/** Clades with a fixed mark. Glires and the bird orders take marks whose owners are rarely fitted beside them. */
const fixed: Readonly<Record<string, number>> = {
  rodentia: 0,
  primates: 1,
  eulipotyphla: 2,
  artiodactyla: 3,
  carnivora: 4,
  afrotheria: 5,
  marsupialia: 6,
  scandentia: 7,
  glires: 7,
  lagomorpha: 6,
  psittaciformes: 2,
  passeriformes: 3,
};

/** A clade's slug or name, or a path ending in it, as the key of its mark. */
function cladeKey(clade: string): string {
  const parts = clade.trim().toLowerCase().split(/[/>.|\s]+/);
  return parts.filter(Boolean).at(-1) ?? '';
}

function fallbackIndex(key: string): number {
  let sum = 0;
  for (const character of key) sum = (sum * 31 + character.charCodeAt(0)) % 9973;
  return sum % marks.length;
}

function markAt(index: number): CladeMarkSpec {
  const mark = marks[index % marks.length];
  if (!mark) throw new RangeError('no clade marks');
  return mark;
}

/** The mark (shape, path, colours) of one clade by slug or name; the same clade always gets the same one. */
export function cladeMark(clade: string): CladeMarkSpec {
  const key = cladeKey(clade);
  return markAt(fixed[key] ?? fallbackIndex(key));
}

/**
 * Marks for clades shown together: each keeps its own mark where it can; a clade that would share
 * one with an earlier clade takes the next free. Above eight clades marks repeat.
 */
export function assignCladeMarks(clades: readonly string[]): Map<string, CladeMarkSpec> {
  const result = new Map<string, CladeMarkSpec>();
  const taken = new Set<number>();
  const ownFirst = [...clades].sort((a, b) => Number(!(cladeKey(a) in fixed)) - Number(!(cladeKey(b) in fixed)));
  for (const clade of ownFirst) {
    const key = cladeKey(clade);
    let index = fixed[key] ?? fallbackIndex(key);
    for (let step = 0; step < marks.length && taken.has(index); step += 1) index = (index + 1) % marks.length;
    taken.add(index);
    result.set(clade, markAt(index));
  }
  return result;
}
