import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatBeforeAfter, formatExponent, formatInterval, formatP, formatQuantity, formatRatio, groupThousands, powerText, ratioSentence,
} from '../../../shared/domain/quantityText';
import { roundError } from '../../../shared/domain/significantFigures';

const thin = (text: string) => text.replace(/_/g, '\u2009');

describe('an error', () => {
  it.each([
    [0.06, 0.06, -2],
    [0.0634, 0.06, -2],
    [0.0134, 0.013, -3],
    [0.0249, 0.025, -3],
    [0.0296, 0.03, -2],
    [0.0949, 0.09, -2],
    [0.096, 0.1, -2],
    [1149, 1100, 2],
    [6_120_000, 6_000_000, 6],
    [1, 1, -1],
  ])('of %d is printed as %d, to the place %d', (error, printed, place) => {
    expect(roundError(error)).toEqual({ error: printed, place });
  });

  it('decides nothing where it is zero, negative or missing', () => {
    expect(roundError(0)).toBeNull();
    expect(roundError(-1)).toBeNull();
    expect(roundError(NaN)).toBeNull();
  });
});

describe('a quantity in print', () => {
  it('has its value cut at the place of the error', () => {
    expect(formatQuantity({ value: 1.2854e8, error: 6.1e6, kind: 'count' })).toEqual({
      value: '1.29', error: '0.06', power: '10⁸', unit: '', plain: '129000000', text: '(1.29 ± 0.06) × 10⁸',
    });
    const density = formatQuantity({ value: 23_386, error: 1104, kind: 'density', unit: 'per mg' });
    expect(density?.text).toBe(thin('23_400 ± 1_100 per mg'));
    expect(density?.plain).toBe('23400');
    expect(formatQuantity({ value: 1.25e8, error: 2.7e6, kind: 'count' })?.text).toBe('(1.250 ± 0.027) × 10⁸');
    expect(formatQuantity({ value: 0.769, error: 0.113, kind: 'mass', unit: 'g' })?.text).toBe('0.77 ± 0.11 g');
  });

  it('keeps its zeros where the error asks for them, and drops them where there is none', () => {
    expect(formatQuantity({ value: 5, error: 0.13, kind: 'mass' })?.text).toBe('5.00 ± 0.13');
    expect(formatQuantity({ value: 5.5, kind: 'mass', unit: 'g' })?.text).toBe('5.5 g');
    expect(formatQuantity({ value: 1232.93, kind: 'mass', unit: 'g' })?.text).toBe(thin('1_233 g'));
    expect(formatQuantity({ value: 16.34e9, kind: 'count' })?.text).toBe('1.63 × 10¹⁰');
    expect(formatQuantity({ value: 0, kind: 'count' })?.text).toBe('0');
  });

  it('raises the power when rounding carries over', () => {
    expect(formatQuantity({ value: 9.996e7, error: 6e5, kind: 'count' })?.text).toBe('(1.000 ± 0.006) × 10⁸');
  });

  it('takes the power from the error where that is larger than the value', () => {
    expect(formatQuantity({ value: 400_000, error: 3.4e6, kind: 'count' })?.text).toBe('(0 ± 3) × 10⁶');
  });

  it('is none where the value is missing or no number', () => {
    expect(formatQuantity({ value: null, kind: 'mass' })).toBeNull();
    expect(formatQuantity({ value: NaN, kind: 'mass' })).toBeNull();
  });

  it('copies as a plain number that reads back near the value', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e13, noNaN: true }), fc.double({ min: 0.001, max: 0.4, noNaN: true }), (value, cv) => {
        const plain = formatQuantity({ value, error: value * cv, kind: 'count' })?.plain ?? '';
        expect(plain).toMatch(/^\d+(\.\d+)?$/);
        expect(Math.abs(Number(plain) - value)).toBeLessThanOrEqual(0.5 * value * cv * 1.02);
      }),
    );
  });
});

describe('other numbers in print', () => {
  it('powers of ten are Unicode superscripts', () => {
    expect(powerText(8)).toBe('10⁸');
    expect(powerText(-12)).toBe('10⁻¹²');
  });

  it('thousands are parted by thin spaces, also after a minus sign', () => {
    expect(groupThousands('1234567.891')).toBe(thin('1_234_567.891'));
    expect(groupThousands('-1234')).toBe(thin('−1_234'));
    expect(groupThousands('999')).toBe('999');
  });

  it('exponents have two decimals, before and after three with the difference of what is printed', () => {
    expect(formatExponent(1.5124)).toBe('1.51');
    expect(formatExponent(-0.001)).toBe('0.00');
    expect(formatBeforeAfter(1.2554, 1.2316)).toEqual({ before: '1.255', after: '1.232', difference: '−0.023' });
    expect(formatBeforeAfter(1.51349, 1.52051)).toEqual({ before: '1.513', after: '1.521', difference: '+0.008' });
    expect(formatBeforeAfter(1, 1).difference).toBe('0.000');
  });

  it('intervals have an en dash and thin spaces, and say where they have no end', () => {
    expect(formatInterval(1.414, 1.636)).toBe(thin('1.41_–_1.64'));
    expect(formatInterval(null, 2)).toMatch(/not bounded below/);
    expect(formatInterval(1, null)).toMatch(/not bounded above/);
  });

  it('probabilities are never printed as nothing or as certainty', () => {
    expect(formatP(1e-9)).toBe('p < 0.001');
    expect(formatP(0.0321)).toBe('p = 0.032');
    expect(formatP(0.572)).toBe('p = 0.57');
    expect(formatP(0.9999)).toBe('p > 0.99');
    expect(formatP(null)).toBe('p not defined');
  });

  it('the place on a line is a sentence', () => {
    expect(ratioSentence({ ratio: 1.63, inside: true })).toBe('1.6 times the line; inside the 95 % prediction interval');
    expect(ratioSentence({ ratio: 2.83, inside: false, level: 0.99 })).toBe('2.8 times the line; outside the 99 % prediction interval');
    expect(ratioSentence({ ratio: 1, inside: null })).toMatch(/no prediction interval/);
    expect(formatRatio(0.4184)).toBe('0.42');
    expect(formatRatio(24.6)).toBe('25');
    expect(formatRatio(9.96)).toBe('10.0');
  });
});
