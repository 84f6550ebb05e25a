import { finiteOrNull } from './quantity';

/** One value of a part of a specimen, with its standard error where known. */
export interface PartValue {
  value: number;
  standardError: number | null;
}

/**
 * Sum of the parts of one specimen: values add, standard errors in quadrature.
 *
 * Null where there is no part or one of them is missing (null): a sum over what is there would be too
 * small. The error is null where any part's is unknown.
 */
export function sumParts(parts: readonly (PartValue | null)[]): PartValue | null {
  if (parts.length === 0) return null;
  let value = 0;
  let variance: number | null = 0;
  for (const part of parts) {
    if (part === null) return null;
    value += part.value;
    variance = variance === null || part.standardError === null ? null : variance + part.standardError ** 2;
  }
  const sum = finiteOrNull(value);
  return sum === null ? null : { value: sum, standardError: variance === null ? null : finiteOrNull(Math.sqrt(variance)) };
}

/**
 * What is left of a whole when its parts are taken away: "rest of brain" is defined so.
 *
 * Whole and parts must be of one specimen, in the same unit. Errors add in quadrature. Null where the
 * whole or a part is missing, or where the parts are as large as the whole: a rest that is not there
 * is no rest of zero.
 */
export function restByComplement(whole: PartValue | null, parts: readonly (PartValue | null)[]): PartValue | null {
  const taken = sumParts(parts);
  if (whole === null || taken === null || !(whole.value > taken.value)) return null;
  return {
    value: whole.value - taken.value,
    standardError: whole.standardError === null || taken.standardError === null ? null : Math.hypot(whole.standardError, taken.standardError),
  };
}
