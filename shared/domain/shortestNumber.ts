/**
 * A number as written into files: the shortest decimal that reads back as the same double; −0 as 0.
 * Throws RangeError for NaN and infinities, which no file holds; an absent number is the caller's to write.
 */
export function shortestNumber(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError('Files hold no NaN and no infinity.');
  return String(value === 0 ? 0 : value);
}

/** A fitted number cut to 12 significant digits, so that files agree over processors and compilers. */
export function fittedNumber(value: number): number {
  if (!Number.isFinite(value)) throw new RangeError('Files hold no NaN and no infinity.');
  return Number(value.toPrecision(12));
}
