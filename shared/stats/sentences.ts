import type { Interval } from './types';

/** The names that a sentence about an exponent speaks with. */
export interface ExponentWords {
  /** What rises or falls, in the singular: "mass". */
  y: string;
  /** What it is compared with, with its article where it needs one: "the neurons". */
  x: string;
  /** What grows along the line, in the plural: "cortices", "brains". */
  growing: string;
  /** The ratio that stays constant at an exponent of 1, "density", and which way up it is taken. */
  ratio: { name: string; of: 'x-per-y' | 'y-per-x' };
}

/**
 * What an exponent says, read from its interval against 1.
 *
 * For mass on neurons: interval above 1, "mass rises faster than the neurons (exponent above 1):
 * density falls as cortices grow"; holding 1, "constant density is not excluded (p 0.27)"; below 1,
 * "mass rises more slowly than the neurons (exponent below 1): density rises as cortices grow"; and
 * an interval below 0 says that y falls.
 *
 * @param words names of the variables
 * @param exponent limits of the exponent's interval
 * @param pAgainstOne p of the test of an exponent of 1, null where there is none
 * @returns one sentence without its full stop
 * @throws RangeError when the limits are not finite or not in order
 */
export function exponentSentence(words: ExponentWords, exponent: Interval, pAgainstOne: number | null): string {
  const { lower, upper } = exponent;
  if (!(Number.isFinite(lower) && Number.isFinite(upper) && lower <= upper)) {
    throw new RangeError(`An interval has finite limits in order, found ${lower} and ${upper}`);
  }
  const { y, x, growing, ratio } = words;
  if (lower > 1) {
    const turn = ratio.of === 'x-per-y' ? 'falls' : 'rises';
    return `${y} rises faster than ${x} (exponent above 1): ${ratio.name} ${turn} as ${growing} grow`;
  }
  if (upper < 1) {
    const turn = ratio.of === 'x-per-y' ? 'rises' : 'falls';
    if (upper < 0) return `${y} falls as ${x} rise (exponent below 0)`;
    return `${y} rises more slowly than ${x} (exponent below 1): ${ratio.name} ${turn} as ${growing} grow`;
  }
  const p = pAgainstOne === null ? '' : ` (${pText(pAgainstOne)})`;
  return `constant ${ratio.name} is not excluded${p}`;
}

/** "p 0.27", "p < 0.001": two figures. */
function pText(p: number): string {
  if (p < 0.001) return 'p < 0.001';
  return `p ${p < 0.1 ? Number(p.toPrecision(2)) : p.toFixed(2)}`;
}
