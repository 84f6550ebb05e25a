import { groupThousands, powerText } from '../../shared/domain/quantityText';

export interface LogTicks {
  /** Whole powers of ten within the range. */
  major: number[];
  /** 2 to 9 times a power of ten within the range. */
  minor: number[];
}

const EDGE = 1e-9;

/** Ticks of a log axis between two values given as log10; a tick on either end counts. */
export function logTicks(fromLog10: number, toLog10: number): LogTicks {
  if (!(fromLog10 < toLog10)) throw new RangeError('A log axis needs a lower end below its upper end.');
  const major: number[] = [];
  const minor: number[] = [];
  for (let decade = Math.floor(fromLog10); decade <= Math.ceil(toLog10); decade += 1) {
    for (let digit = 1; digit <= 9; digit += 1) {
      const at = decade + Math.log10(digit);
      if (at < fromLog10 - EDGE || at > toLog10 + EDGE) continue;
      // 10 ** negative powers carry rounding dust; parsing gives the nearest double to the written number.
      const value = Number(`${digit}e${decade}`);
      (digit === 1 ? major : minor).push(value);
    }
  }
  return { major, minor };
}

/** The name of a decade: written out from 0.001 to 1 000, else as a power of ten. */
export function decadeText(value: number): string {
  const power = Math.round(Math.log10(value));
  if (power < -3 || power > 3) return powerText(power);
  return power < 0 ? value.toFixed(-power) : groupThousands(value.toFixed(0));
}
