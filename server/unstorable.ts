import type { FieldError } from '../shared/contracts/problems';

/** Halves of a surrogate pair, which PostgreSQL keeps in no JSON. NUL it keeps in no text. */
const halfPair = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/;

function placesIn(value: unknown, path: string): string[] {
  if (typeof value === 'string') return value.includes('\0') || halfPair.test(value) ? [path] : [];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, member]) => placesIn(member, path === '' ? key : `${path}.${key}`));
}

/** Texts of an input that the database cannot keep, each with its place. */
export function unstorableTexts(input: unknown): FieldError[] {
  return placesIn(input, '').map((path) => ({ path, message: 'Expected is text that can be stored; found a NUL or half of a surrogate pair' }));
}
