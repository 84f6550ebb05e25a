import { placeOfDigits, powerOfTen, roundError, roundToPlace } from './significantFigures';

export type QuantityKind = 'count' | 'mass' | 'density' | 'fraction' | 'ratio' | 'volume';

export interface QuantityText {
  /** The digits to set in the quantity's colour. */
  value: string;
  /** The error at the same place, or null. */
  error: string | null;
  /** "10⁸", or null where no power is taken out. */
  power: string | null;
  unit: string;
  /** The printed number without separators or powers, for copying: 129000000. */
  plain: string;
  /** All of it in one line: "(1.29 ± 0.06) × 10⁸". */
  text: string;
}

export const THIN_SPACE = '\u2009';
const MINUS = '\u2212';
const SUPERSCRIPTS = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹'];
/** Counts from here on are written with a power of ten. */
const POWER_FROM = 1e6;
/** Digits where no error decides them. */
const DIGITS_WITHOUT_ERROR: Readonly<Record<QuantityKind, number>> = { count: 3, mass: 4, density: 3, fraction: 3, ratio: 2, volume: 4 };

/** 8 → "10⁸", −3 → "10⁻³": Unicode superscripts, never raised markup. */
export function powerText(power: number): string {
  const digits = [...String(Math.abs(power))].map((digit) => SUPERSCRIPTS[Number(digit)]).join('');
  return `10${power < 0 ? '⁻' : ''}${digits}`;
}

/** Groups the whole part by thin spaces and sets a real minus sign: "23400" → "23 400". */
export function groupThousands(digits: string): string {
  const [whole = '', fraction] = digits.replace('-', MINUS).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, THIN_SPACE);
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}

function fixed(value: number, place: number): string {
  const rounded = roundToPlace(value, place);
  // toFixed turns to exponents from 1e21 on; such whole numbers are written out digit by digit.
  return Math.abs(rounded) >= 1e21 ? BigInt(rounded).toString() : rounded.toFixed(Math.min(100, Math.max(0, -place)));
}

/**
 * A quantity as the register prints it.
 *
 * The error decides the digits (two if it begins with 1 or 2, else one) and the value is cut at the same
 * place; without an error three significant digits (four for masses and volumes, two for ratios), trailing
 * zeros dropped. Counts of a million and more are written with a power of ten. Thin spaces group
 * thousands. Returns null where the value is not a finite number.
 */
export function formatQuantity(input: { value: number | null; error?: number | null; unit?: string; kind: QuantityKind }): QuantityText | null {
  const { value, kind, unit = '' } = input;
  if (value === null || !Number.isFinite(value)) return null;
  const rounded = roundError(input.error ?? 0);
  const place = rounded?.place ?? placeOfDigits(value, DIGITS_WITHOUT_ERROR[kind]);
  const largest = Math.max(Math.abs(value), rounded?.error ?? 0);
  const power = kind === 'count' && largest >= POWER_FROM ? powerOfTen(largest, place) : 0;
  const shown = (number: number) => {
    const digits = fixed(roundToPlace(number, place) / 10 ** power, place - power);
    return groupThousands(rounded === null && digits.includes('.') ? digits.replace(/\.?0+$/, '') : digits);
  };
  const valueText = shown(value);
  const errorText = rounded === null ? null : shown(rounded.error);
  const powerPart = power === 0 ? null : powerText(power);
  const pair = errorText === null ? valueText : `${valueText} ± ${errorText}`;
  const number = powerPart === null ? pair : `${errorText === null ? pair : `(${pair})`} × ${powerPart}`;
  const plain = fixed(value, place);
  return {
    value: valueText,
    error: errorText,
    power: powerPart,
    unit,
    plain: rounded === null && plain.includes('.') ? plain.replace(/\.?0+$/, '') : plain,
    text: unit === '' ? number : `${number} ${unit}`,
  };
}

/** An exponent with two decimals, or as many as asked: "1.52", "−0.30". */
export function formatExponent(exponent: number | null, decimals = 2): string {
  if (exponent === null || !Number.isFinite(exponent)) return 'not defined';
  return groupThousands(fixed(exponent, -decimals)).replace(/^−(0(\.0+)?)$/, '$1');
}

/** Two exponents of successive versions with three decimals; the difference is that of the printed values. */
export function formatBeforeAfter(before: number, after: number): { before: string; after: string; difference: string } {
  const difference = Math.round(roundToPlace(after, -3) * 1000) - Math.round(roundToPlace(before, -3) * 1000);
  const sign = difference > 0 ? '+' : difference < 0 ? MINUS : '';
  return { before: formatExponent(before, 3), after: formatExponent(after, 3), difference: `${sign}${(Math.abs(difference) / 1000).toFixed(3)}` };
}

/** An interval with en dash and thin spaces: "1.27 – 1.75"; a missing end is said. */
export function formatInterval(lower: number | null, upper: number | null, decimals = 2): string {
  if (lower === null && upper === null) return 'not defined';
  if (lower === null) return `up to ${formatExponent(upper, decimals)}, not bounded below`;
  if (upper === null) return `from ${formatExponent(lower, decimals)}, not bounded above`;
  return `${formatExponent(lower, decimals)}${THIN_SPACE}–${THIN_SPACE}${formatExponent(upper, decimals)}`;
}

/** A probability: "p < 0.001", three decimals below 0.1, two above, "p > 0.99". */
export function formatP(p: number | null): string {
  if (p === null || !Number.isFinite(p)) return 'p not defined';
  if (p < 0.001) return 'p < 0.001';
  if (p > 0.99) return 'p > 0.99';
  return `p = ${p < 0.0995 ? p.toFixed(3) : p.toFixed(2)}`;
}

/** A ratio to the line in words' digits: "1.6", "0.42", "25". */
export function formatRatio(ratio: number): string {
  if (!(Number.isFinite(ratio) && ratio > 0)) return 'not defined';
  return ratio >= 10 ? groupThousands(fixed(ratio, 0)) : fixed(ratio, Math.min(-1, placeOfDigits(ratio, 2)));
}

/**
 * The place on a line in words: "1.6 times the line; inside the 95 % prediction interval".
 * `inside` is null where no prediction interval exists, which is then said.
 */
export function ratioSentence(place: { ratio: number; inside: boolean | null; level?: number }): string {
  const level = Number(((place.level ?? 0.95) * 100).toPrecision(4));
  const words = place.inside === null ? 'no prediction interval' : `${place.inside ? 'inside' : 'outside'} the ${level} % prediction interval`;
  return `${formatRatio(place.ratio)} times the line; ${words}`;
}
