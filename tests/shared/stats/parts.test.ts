import { describe, expect, it } from 'vitest';
import * as distributions from '../../../shared/stats/distributions';
import { encephalisationQuotient } from '../../../shared/stats/encephalisation';
import { median } from '../../../shared/stats/median';
import { exponentSentence } from '../../../shared/stats/sentences';
import { fitTheilSen, medianOfCountedSlopes, medianOfListedSlopes } from '../../../shared/stats/theilSen';
import { relativeError } from './reference';
import { normals, uniforms } from './support';

describe('distributions', () => {
  // Closed forms and defining identities; tabled values: Abramowitz & Stegun 1964, tables 26.1, 26.8–26.10.
  it('agree with closed forms on 1 and 2 degrees of freedom', () => {
    expect(relativeError(distributions.tQuantile(0.75, 1), 1)).toBeLessThan(1e-14);
    expect(relativeError(distributions.tTwoSidedP(Math.sqrt(2), 2), 1 - 1 / Math.sqrt(2))).toBeLessThan(1e-14);
    expect(relativeError(distributions.chiSquareUpperTail(100, 2), Math.exp(-50))).toBeLessThan(1e-12);
    expect(relativeError(distributions.chiSquareLowerTail(1e-8, 2), -Math.expm1(-5e-9))).toBeLessThan(1e-12);
    expect(relativeError(distributions.chiSquareQuantile(0.95, 2), -2 * Math.log(0.05))).toBeLessThan(1e-10);
    // F on 2 and d: P(F > f) = (1 + 2f/d)^(−d/2).
    expect(relativeError(distributions.fUpperTail(30, 2, 20), 4 ** -10)).toBeLessThan(1e-12);
    expect(relativeError(distributions.fQuantileUpper(0.5, 2, 9), (4.5) * (2 ** (2 / 9) - 1))).toBeLessThan(1e-9);
  });

  it('agree with printed tables', () => {
    expect(distributions.tCritical(0.95, 10)).toBeCloseTo(2.228, 3);
    expect(distributions.normalQuantile(0.975)).toBeCloseTo(1.95996, 5);
    expect(distributions.fQuantileUpper(0.05, 1, 10)).toBeCloseTo(4.96, 2);
    expect(distributions.chiSquareQuantile(0.95, 10)).toBeCloseTo(18.307, 3);
  });

  it('keep their digits far in the tail, where 1 − cdf is 0', () => {
    const p = distributions.tTwoSidedP(50, 20);
    expect(p).toBeGreaterThan(0);
    expect(p).toBeLessThan(1e-20);
    expect(relativeError(distributions.fUpperTail(2500, 1, 20), p)).toBeLessThan(1e-9);
    expect([distributions.fUpperTail(0, 1, 5), distributions.chiSquareUpperTail(0, 3), distributions.chiSquareLowerTail(0, 3)]).toEqual([1, 1, 0]);
  });

  it('refuse probabilities outside 0…1, no degrees of freedom and NaN', () => {
    expect(() => distributions.tQuantile(1.1, 3)).toThrow(RangeError);
    expect(() => distributions.tTwoSidedP(1, 0)).toThrow(RangeError);
    expect(() => distributions.fUpperTail(Number.NaN, 1, 3)).toThrow(RangeError);
    expect(() => distributions.chiSquareQuantile(Number.NaN, 3)).toThrow(RangeError);
    expect(() => distributions.normalQuantile(-0.1)).toThrow(RangeError);
  });
});

describe('Theil–Sen above 500 points', () => {
  it.each([[501, false], [640, true]] as const)('finds the median slope of %i points as listing every pair does (ties: %s)', (n, ties) => {
    const uniform = uniforms(n);
    const normal = normals(uniform);
    const x = Array.from({ length: n }, () => (ties ? Math.round(uniform() * 20) : uniform() * 20));
    const y = x.map((v) => -3 - 0.4 * v + normal() * 2);
    const [counted, listed] = [medianOfCountedSlopes(x, y)!, medianOfListedSlopes(x, y)!];
    expect(counted.pairs).toBe(listed.pairs);
    expect(relativeError(counted.exponent, listed.exponent)).toBeLessThan(1e-12);
    expect(fitTheilSen(x, y)!.exponent).toBe(counted.exponent);
  });

  it.each([1000, -1000, 0])('finds a slope of %d', (slope) => {
    const x = Array.from({ length: 600 }, (_, i) => i / 100);
    expect(fitTheilSen(x, x.map((v) => slope * v))!.exponent).toBeCloseTo(slope, 9);
  });

  it('gives no line when no two x differ, and refuses unusable lists', () => {
    expect(fitTheilSen([1, 1], [1, 2])).toBeNull();
    expect(fitTheilSen(Array<number>(600).fill(1), Array<number>(600).fill(2))).toBeNull();
    expect(() => fitTheilSen([1], [1, 2])).toThrow(RangeError);
    expect(() => fitTheilSen([1, Infinity], [1, 2])).toThrow(RangeError);
  });
});

describe('median', () => {
  it('is the middle value or the mean of the middle two', () => {
    expect(median([3, 1, 2])).toBe(2);
    expect(median([4, 1, 3, 2])).toBe(2.5);
    expect(() => median([])).toThrow(RangeError);
  });
});

describe('the encephalisation quotient', () => {
  it('divides by 0.12·P^(2/3) grams and prints the law', () => {
    const { quotient, expectedBrainMassG, lawText } = encephalisationQuotient(24, 1000);
    expect(expectedBrainMassG).toBeCloseTo(12, 10);
    expect(quotient).toBeCloseTo(2, 10);
    expect(lawText).toBe('Jerison 1973: brain = 0.12 · body^(2/3), in grams');
  });

  it('takes any stated law', () => {
    const law = { name: 'Primates here', coefficient: 0.5, exponent: 1, source: 'fit' };
    expect(encephalisationQuotient(50, 50, law)).toMatchObject({ quotient: 2, lawText: 'Primates here: brain = 0.5 · body^(1), in grams' });
  });

  it('refuses masses that are not above 0', () => {
    expect(() => encephalisationQuotient(0, 1)).toThrow(RangeError);
    expect(() => encephalisationQuotient(1, Number.NaN)).toThrow(RangeError);
  });
});

describe('the sentence about an exponent', () => {
  const words = { y: 'mass', x: 'the neurons', growing: 'cortices', ratio: { name: 'density', of: 'x-per-y' as const } };

  it.each([
    [1.2, 1.8, 0.001, 'mass rises faster than the neurons (exponent above 1): density falls as cortices grow'],
    [0.9, 1.2, 0.268, 'constant density is not excluded (p 0.27)'],
    [0.9, 1.0, 0.05, 'constant density is not excluded (p 0.05)'],
    [0.99, 1.5, null, 'constant density is not excluded'],
    [0.4, 0.8, 0.01, 'mass rises more slowly than the neurons (exponent below 1): density rises as cortices grow'],
    [-0.8, -0.2, 0.01, 'mass falls as the neurons rise (exponent below 0)'],
  ])('of %d to %d', (lower, upper, p, sentence) => {
    expect(exponentSentence(words, { lower, upper }, p)).toBe(sentence);
  });

  it('turns round for neurons on mass', () => {
    const turned = { y: 'the number of neurons', x: 'mass', growing: 'brains', ratio: { name: 'density', of: 'y-per-x' as const } };
    expect(exponentSentence(turned, { lower: 0.5, upper: 0.7 }, 0.01))
      .toBe('the number of neurons rises more slowly than mass (exponent below 1): density falls as brains grow');
  });

  it('refuses limits out of order', () => {
    expect(() => exponentSentence(words, { lower: 2, upper: 1 }, null)).toThrow(RangeError);
  });
});
