/** Decimal place of the last digit to show: −2 for hundredths, 3 for thousands. */
export interface RoundedError {
  error: number;
  place: number;
}

function leadingPower(value: number): number {
  // toExponential is exact where Math.log10 may fall on the wrong side of a power of ten.
  return Number(value.toExponential(15).split('e')[1]);
}

function firstDigit(value: number): number {
  return Number(value.toExponential(15).charAt(0));
}

/** Rounds to a decimal place by the shortest decimal, so that 0.285 to hundredths does not drift by binary. */
export function roundToPlace(value: number, place: number): number {
  if (place < -100) return value;
  if (place <= 0) return Number(value.toFixed(-place));
  return Number(`${Math.round(Number(`${value}e${-place}`) || value / 10 ** place)}e${place}`);
}

/**
 * Rounds an error to the digits it deserves: two if it begins with 1 or 2, else one.
 *
 * The rule is asked again after rounding, because 0.0296 rounds to 0.030 and 0.096 to 0.10. Returns null
 * for an error that is zero, negative or not finite: it decides no digits.
 */
export function roundError(error: number): RoundedError | null {
  if (!(Number.isFinite(error) && error > 0)) return null;
  const digitsOf = (value: number) => (firstDigit(value) <= 2 ? 2 : 1);
  const first = Number(error.toPrecision(digitsOf(error)));
  const digits = digitsOf(first);
  const place = leadingPower(first) - digits + 1;
  return { error: roundToPlace(first, place), place };
}

/** Decimal place of the last of `digits` significant digits of a value; 0 for zero. */
export function placeOfDigits(value: number, digits: number): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  return leadingPower(Number(Math.abs(value).toPrecision(digits))) - digits + 1;
}

/** Power of ten of the first digit, after rounding to the place: 9.99e7 to 1e6 gives 8. */
export function powerOfTen(value: number, place: number): number {
  const rounded = Math.abs(roundToPlace(value, place));
  return rounded === 0 ? 0 : leadingPower(rounded);
}
