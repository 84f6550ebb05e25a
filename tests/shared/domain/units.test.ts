import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findChamber } from '../../../shared/domain/chambers';
import { parseCount, parseDilution, parseMassG, parseNumber, parseVolumeMl } from '../../../shared/domain/units';

describe('a number as typed', () => {
  it.each([
    ['0.80', 0.8],
    [' 12 ', 12],
    ['1.2e8', 1.2e8],
    ['1.2E+08', 1.2e8],
    ['.5', 0.5],
    ['5.', 5],
    ['128 500 000', 128_500_000],
    ['128\u2009500\u2009000', 128_500_000],
    ['1\u202f234.5', 1234.5],
    ['1.285 × 10⁸', 128_500_000],
    ['1.285*10^8', 128_500_000],
    ['3 × 10⁻²', 0.03],
    ['16340000000', 16_340_000_000],
    ['\u22125', -5],
    ['-0', 0],
  ])('reads %j as %d', (text, expected) => {
    expect(parseNumber(text)).toEqual({ value: expected, problem: null });
  });

  it.each(['1,234', '0,8', '1.234,5', ','])('refuses the comma in %j with a sentence and guesses nothing', (text) => {
    const parsed = parseNumber(text);
    expect(parsed.value).toBeNull();
    expect(parsed.problem).toMatch(/comma/);
  });

  it.each([
    '12 34', '1 2', '1  234', 'abc', '0x10', '1e', 'e5', '--1', '1.2.3', '1_000', '١٢', 'Infinity', 'NaN', '1e400', '10 g', '=1+1', "1'; DROP TABLE records;--", '<b>1</b>', '.', '+', '12 345 6',
  ])('refuses %j', (text) => {
    const parsed = parseNumber(text);
    expect(parsed.value).toBeNull();
    expect(parsed.problem).not.toBeNull();
  });

  it('takes empty text for no entry, not for zero', () => {
    expect(parseNumber('')).toEqual({ value: null, problem: null });
    expect(parseNumber(' \t')).toEqual({ value: null, problem: null });
  });

  it('gives a finite number or none, for any text', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.string({ unit: 'binary' }), fc.double().map(String)), (text) => {
        const { value } = parseNumber(text);
        expect(value === null || Number.isFinite(value)).toBe(true);
      }),
      { numRuns: 500 },
    );
  });

  it('reads back every double it is given', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (number) => {
        expect(parseNumber(String(number)).value).toBe(number === 0 ? 0 : number);
      }),
    );
  });
});

describe('a count', () => {
  it('is kept beyond 32 bits', () => {
    expect(parseCount('86100000000').value).toBe(86_100_000_000);
    expect(parseCount('1.634e10').value).toBe(16_340_000_000);
    expect(parseCount(String(Number.MAX_SAFE_INTEGER)).value).toBe(Number.MAX_SAFE_INTEGER);
  });

  it.each(['12.5', '-3', '9007199254740993000'])('refuses %s', (text) => {
    expect(parseCount(text).value).toBeNull();
    expect(parseCount(text).problem).not.toBeNull();
  });
});

describe('a value with its unit', () => {
  it('turns masses to grams and volumes to millilitres without a rounding error', () => {
    expect(parseMassG({ text: '3', unit: 'mg' }).value).toBe(0.003);
    expect(parseMassG({ text: '1.1', unit: 'kg' }).value).toBe(1100);
    expect(parseMassG({ text: '0.769', unit: 'g' }).value).toBe(0.769);
    expect(parseVolumeMl({ text: '0.1', unit: 'µL' }).value).toBe(1e-4);
    expect(parseVolumeMl({ text: '0.1', unit: '\u03bcL' }).value).toBe(1e-4);
    expect(parseVolumeMl({ text: '2', unit: 'L' }).value).toBe(2000);
  });

  it.each(['', 'lb', 'G', 'constructor', '__proto__'])('refuses the unit %j', (unit) => {
    expect(parseMassG({ text: '1', unit }).value).toBeNull();
    expect(parseMassG({ text: '1', unit }).problem).toMatch(/unit/);
  });
});

describe('a dilution', () => {
  it('is one number, never a proportion', () => {
    expect(parseDilution('5').value).toBe(5);
    expect(parseDilution('1 : 5').problem).toMatch(/1 : 5/);
    expect(parseDilution('1/5').value).toBeNull();
  });
});

describe('the counting chambers', () => {
  it('know the volume over one large square of the improved Neubauer chamber', () => {
    expect(findChamber('improved-neubauer')?.squareVolumeMl).toBe(1e-4);
    expect(findChamber('other')?.squareVolumeMl).toBeNull();
    expect(findChamber('nothing')).toBeNull();
  });
});
