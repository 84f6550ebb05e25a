import type { Entered } from '../contracts/content';

/** The canonical number of what was typed, or the sentence that says why there is none. Empty: neither. */
export interface ParsedValue {
  value: number | null;
  problem: string | null;
}

const MASS_PER_G: Readonly<Record<string, number>> = { g: 1, mg: 1000, kg: 0.001 };
const VOLUME_PER_ML: Readonly<Record<string, number>> = { mL: 1, ml: 1, 'µL': 1000, 'μL': 1000, uL: 1000, ul: 1000, 'µl': 1000, 'μl': 1000, L: 0.001, l: 0.001 };
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const PLAIN = /^[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d+)?$/i;
const GROUPED = /^[+-]?\d{1,3}([ \u00a0\u2009\u202f]\d{3})+(\.\d*)?$/;
/** Above this a double no longer tells neighbouring whole numbers apart. */
const LARGEST_WHOLE = Number.MAX_SAFE_INTEGER;

const nothing: ParsedValue = { value: null, problem: null };
const refuse = (problem: string): ParsedValue => ({ value: null, problem });

/** Writes "1.2 × 10⁸" and "1.2*10^8" in the plain form 1.2e8, and the minus sign as a hyphen. */
function plainForm(text: string): string {
  return text
    .trim()
    .replace(/\u2212/g, '-')
    .replace(/\s*[×x*·]\s*10\s*(\^\s*)?([-+⁻]?[\d⁰¹²³⁴⁵⁶⁷⁸⁹]+)$/, (_all, _caret, power: string) =>
      `e${power.replace('⁻', '-').replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)))}`,
    );
}

/**
 * A number as typed: 0.80, 1.2e8, 1.2 × 10⁸, 128 500 000 (spaces between groups of three).
 *
 * A comma is refused, never guessed: it may mean thousands or a decimal. Empty text gives neither value
 * nor problem. The result is a double; what a double cannot hold is refused.
 */
export function parseNumber(text: string): ParsedValue {
  const form = plainForm(text);
  if (form === '') return nothing;
  if (form.includes(',')) return refuse('A comma may mean thousands or a decimal: write 1234.5 or 1 234.5.');
  if (!PLAIN.test(form) && !GROUPED.test(form)) return refuse(`“${form.slice(0, 40)}” is not a number.`);
  const value = Number(form.replace(/[ \u00a0\u2009\u202f]/g, ''));
  if (!Number.isFinite(value)) return refuse('The number is too large to be kept.');
  return { value: value === 0 ? 0 : value, problem: null };
}

/** A count of nuclei or cells that is a whole number of 0 or more, up to 2⁵³ − 1. */
export function parseCount(text: string): ParsedValue {
  const parsed = parseNumber(text);
  if (parsed.value === null) return parsed;
  if (parsed.value < 0) return refuse('A count cannot be negative.');
  if (!Number.isInteger(parsed.value)) return refuse('A count must be a whole number.');
  return parsed.value > LARGEST_WHOLE ? refuse('The number is too large to be kept exactly.') : parsed;
}

function parseWithUnit(entered: Entered, perCanonical: Readonly<Record<string, number>>, known: string): ParsedValue {
  const parsed = parseNumber(entered.text);
  if (parsed.value === null) return parsed;
  const unit = entered.unit.trim();
  const divisor = Object.hasOwn(perCanonical, unit) ? perCanonical[unit] : undefined;
  if (divisor === undefined) return refuse(unit === '' ? `The unit is missing: ${known}.` : `“${unit}” is not one of the units ${known}.`);
  // Division keeps 3 mg at 0.003 g; a factor of 0.001 would leave a rounding error.
  const value = divisor < 1 ? parsed.value * Math.round(1 / divisor) : parsed.value / divisor;
  return Number.isFinite(value) ? { value, problem: null } : refuse('The number is too large to be kept.');
}

/** A mass entered in mg, g or kg, in grams. The sign is not judged here. */
export function parseMassG(entered: Entered): ParsedValue {
  return parseWithUnit(entered, MASS_PER_G, 'mg, g, kg');
}

/** A volume entered in µL, mL or L, in millilitres. The sign is not judged here. */
export function parseVolumeMl(entered: Entered): ParsedValue {
  return parseWithUnit(entered, VOLUME_PER_ML, 'µL, mL, L');
}

/** A dilution, final ÷ original volume, a number of 1 or more; "1 : 5" is refused because it is read in two ways. */
export function parseDilution(text: string): ParsedValue {
  if (/[:/]/.test(text)) return refuse('Write the dilution as one number, the final over the original volume: 5, not 1 : 5.');
  return parseNumber(text);
}
