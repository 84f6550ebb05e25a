/**
 * JSON in one canonical form, so that equal content has equal bytes (after RFC 8785): keys sorted by
 * UTF-16 code units, no blanks, numbers in their shortest round-trip form, −0 as 0.
 *
 * Properties that are undefined are left out, as JSON does. Throws RangeError for NaN, infinities and
 * lone surrogates, TypeError for what JSON cannot hold (functions, bigints, undefined in a list).
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'boolean') return String(value);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError('Canonical JSON holds no NaN and no infinity.');
    return JSON.stringify(value);
  }
  if (typeof value === 'string') return canonicalString(value);
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value === 'object' && isPlainObject(value)) {
    const members = Object.entries(value)
      .filter(([, member]) => member !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
      .map(([key, member]) => `${canonicalString(key)}:${canonicalJson(member)}`);
    return `{${members.join(',')}}`;
  }
  throw new TypeError(`Canonical JSON cannot hold a value of type ${typeof value}.`);
}

function canonicalString(text: string): string {
  // A lone surrogate has no UTF-8 form, so its bytes could not be checked.
  if (/\p{Surrogate}/u.test(text)) {
    throw new RangeError('Canonical JSON holds no lone surrogate.');
  }
  return JSON.stringify(text);
}

function isPlainObject(value: object): boolean {
  const prototype: unknown = Object.getPrototypeOf(value);
  // A Date or a Map would come out as an empty object: refuse rather than lose it.
  return prototype === Object.prototype || prototype === null;
}
