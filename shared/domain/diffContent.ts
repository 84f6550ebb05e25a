import type { Change } from '../contracts/submissions';

/** A leaf of a content: its path and its text. */
type Leaf = [path: string, text: string];

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const idOf = (value: unknown): string | null => (isObject(value) && typeof value['id'] === 'string' ? value['id'] : null);

function textOf(value: unknown): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return String(value);
}

function leavesOf(value: unknown, path: string): Leaf[] {
  if (Array.isArray(value)) return value.flatMap((member, index) => leavesOf(member, join(path, String(index))));
  if (isObject(value)) return Object.entries(value).flatMap(([key, member]) => (key === 'id' ? [] : leavesOf(member, join(path, key))));
  return [[path, textOf(value)]];
}

const join = (path: string, key: string): string => (path === '' ? key : `${path}.${key}`);
const came = (value: unknown, path: string): Change[] => leavesOf(value, path).flatMap(([at, text]) => (text === '' ? [] : [{ path: at, before: '', after: text }]));
const went = (value: unknown, path: string): Change[] => leavesOf(value, path).flatMap(([at, text]) => (text === '' ? [] : [{ path: at, before: text, after: '' }]));

function diffLists(before: readonly unknown[], after: readonly unknown[], path: string): Change[] {
  const haveIds = [...before, ...after].every((member) => idOf(member) !== null);
  const partner = (index: number): unknown => (haveIds ? before.find((member) => idOf(member) === idOf(after[index])) : before[index]);
  const kept = after.flatMap((member, index) => {
    const old = partner(index);
    return old === undefined ? came(member, join(path, String(index))) : diffValues(old, member, join(path, String(index)));
  });
  const left = before.flatMap((member, index) => {
    const stays = haveIds ? after.some((other) => idOf(other) === idOf(member)) : index < after.length;
    return stays ? [] : went(member, join(path, String(index)));
  });
  return [...kept, ...left];
}

function diffValues(before: unknown, after: unknown, path: string): Change[] {
  if (Array.isArray(before) && Array.isArray(after)) return diffLists(before, after, path);
  if (isObject(before) && isObject(after)) {
    return [...new Set([...Object.keys(before), ...Object.keys(after)])].flatMap((key) => (key === 'id' ? [] : diffValues(before[key], after[key], join(path, key))));
  }
  if (isObject(before) || isObject(after) || Array.isArray(before) || Array.isArray(after)) return [...went(before, path), ...came(after, path)];
  const [old, now] = [textOf(before), textOf(after)];
  return old === now ? [] : [{ path, before: old, after: now }];
}

/**
 * What one revision's content changes against another's, leaf by leaf, in the order of the newer one.
 *
 * Inputs: two contents (any JSON values). Output: one element per changed leaf with its path
 * (`structures.0.samples.1.aliquots.2.nuclei`) and both texts; an empty text stands for nothing entered.
 * Members of a list that carry an `id` are matched by it, so that an entry put in between changes nothing
 * else; others by place. Paths count in the newer content, those of what went in the older one.
 */
export function diffContent(before: unknown, after: unknown): Change[] {
  return diffValues(before, after, '');
}
