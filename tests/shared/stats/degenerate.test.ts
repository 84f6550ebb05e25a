import { describe, expect, it } from 'vitest';
import { lineOf } from '../../../shared/stats/bands';
import { fitScaling } from '../../../shared/stats/fit';
import { fitOls } from '../../../shared/stats/leastSquares';
import { placeOnLine } from '../../../shared/stats/placeOnLine';
import type { FitMethod, ScalingFit } from '../../../shared/stats/types';
import { fitOne, pointsOf } from './support';

const methods: FitMethod[] = ['ols', 'sma'];

/** Every number of an answer is finite: JSON would turn the others into null unnoticed. */
function notFinite(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (value === null || typeof value !== 'object') return [];
  return Object.entries(value).flatMap(([key, inner]) => notFinite(inner, `${path}/${key}`));
}

describe.each(methods)('%s', (method) => {
  it.each([1, 2])('gives no line for %i species and says so', (n) => {
    const fit = fitOne(pointsOf([1, 2].slice(0, n), [3, 5].slice(0, n)), method, { against: [1], predictAt: [4] });
    expect(fit.unfit).toEqual({ code: 'too-few-points', message: `A line needs at least 3 species, found ${n}.` });
    expect(fit).toMatchObject({ n, df: null, exponent: null, log10Coefficient: null, rSquared: null, design: null, leaveOneOut: null, tests: [] });
    expect(fit.points).toHaveLength(n);
    expect(notFinite(fit)).toEqual([]);
  });

  it.each([7, 1e-12, 1e15, 0.1])('gives no line when all x are %d', (x) => {
    const fit = fitOne(pointsOf([x, x, x, x], [1, 2, 3, 4]), method);
    expect(fit.unfit?.code).toBe('x-all-equal');
    expect(fit.points.map(({ flag }) => flag)).toEqual(['none', 'none', 'none', 'none']);
  });

  it('takes x that differ only by rounding as equal', () => {
    expect(fitOne(pointsOf([0.1 + 0.2, 0.3, 0.3], [1, 2, 3]), method).unfit?.code).toBe('x-all-equal');
  });

  it('fits three species with 1 degree of freedom and no diagnostics', () => {
    const fit = fitOne(pointsOf([1, 10, 100], [2, 11, 150]), method);
    expect(fit).toMatchObject({ n: 3, df: 1, unfit: null, leaveOneOut: null });
    expect(fit.points.every((point) => point.leverage === null && point.studentised === null
      && point.cooksDistance === null && point.bonferroniP === null)).toBe(true);
    expect(fit.points.every(({ residual }) => residual !== null)).toBe(true);
    expect(notFinite(fit)).toEqual([]);
  });

  it('finds the law of a perfect fit, leaves nothing to test with and flags nothing', () => {
    const xs = [1e-12, 1e-6, 0.5, 3, 77, 1e4, 1e9, 1e12, 1e15];
    const fit = fitOne(pointsOf(xs, xs.map((x) => 3 * x ** 0.75)), method, { against: [0.75, 1], predictAt: [10] });
    expect(fit.exponent!.estimate).toBeCloseTo(0.75, 12);
    expect(fit.exponent!.upper - fit.exponent!.lower).toBe(0);
    expect(fit.log10Coefficient!.estimate).toBeCloseTo(Math.log10(3), 12);
    expect(fit).toMatchObject({ rSquared: 1, residualSd: 0, logLikelihood: null, aic: null });
    expect(fit.tests.map(({ statistic, p }) => [statistic, p])).toEqual([[null, null], [null, null]]);
    expect(fit.points.every(({ flag, studentised }) => flag === 'none' && studentised === null)).toBe(true);
    expect(fit.notes.join(' ')).toMatch(/lies on the line/);
    expect(notFinite(fit)).toEqual([]);
  });

  it('fits values from 1e-12 to 1e15', () => {
    const xs = [1e-12, 1e-9, 1e-6, 1e-3, 1, 1e3, 1e6, 1e9, 1e12, 1e15];
    const ys = xs.map((x, i) => x * (i % 2 ? 2 : 0.5));
    const fit = fitOne(pointsOf(xs, ys), method, { against: [1], predictAt: [1e-12, 1e15] });
    expect(fit.exponent!.estimate).toBeCloseTo(1, 1);
    expect(fit.unfit).toBeNull();
    expect(notFinite(fit)).toEqual([]);
  });

  it.each([
    ['NaN', Number.NaN], ['Infinity', Infinity], ['zero', 0], ['a negative value', -1],
  ])('refuses %s as x, y or x to predict at', (_, bad) => {
    expect(() => fitOne(pointsOf([1, 2, bad], [1, 2, 3]), method)).toThrow(/x of p2/);
    expect(() => fitOne(pointsOf([1, 2, 3], [1, bad, 3]), method)).toThrow(/y of p1/);
    expect(() => fitOne(pointsOf([1, 2, 3], [1, 2, 5]), method, { predictAt: [bad] })).toThrow(RangeError);
  });

  it.each([0, 1, 95, Number.NaN])('refuses a level of %d', (level) => {
    expect(() => fitOne(pointsOf([1, 2, 3], [1, 2, 5]), method, { level })).toThrow(RangeError);
  });

  it('refuses a stated exponent that is no number', () => {
    expect(() => fitOne(pointsOf([1, 2, 3], [1, 2, 5]), method, { against: [Number.NaN] })).toThrow(RangeError);
  });

  it('fits each group by itself in the order of first appearance', () => {
    const shared = pointsOf([1, 10, 100, 1000], [2, 11, 150, 900]);
    const { fits, comparison, match } = fitScaling({
      method,
      points: [
        { id: 'b1', group: 'B', x: 1, y: 1 },
        ...shared.map((point) => ({ ...point, group: 'A' })),
        { id: 'b2', group: 'B', x: 2, y: 3 },
        ...shared,
        ...shared.map((point) => ({ ...point, group: null })),
      ],
    });
    expect(fits.map(({ group, n }) => [group, n])).toEqual([['B', 2], ['A', 4], [null, 8]]);
    expect(fits[0]!.unfit?.code).toBe('too-few-points');
    const alone: ScalingFit = fitOne(shared, method);
    expect(fits[1]).toEqual({ ...alone, group: 'A' });
    expect([comparison, match]).toEqual([null, null]);
  });

  it('answers no points with no fits', () => {
    expect(fitScaling({ points: [], method }).fits).toEqual([]);
  });
});

describe('y without variation', () => {
  const points = pointsOf([1, 2, 3, 4], [5, 5, 5, 5]);

  it('is an exponent of 0 by least squares, with no R²', () => {
    const fit = fitOne(points, 'ols', { against: [0] });
    expect(fit.exponent).toEqual({ estimate: 0, standardError: 0, lower: 0, upper: 0 });
    expect(fit.rSquared).toBeNull();
    expect(fit.notes.join(' ')).toMatch(/R² is not defined/);
  });

  it('has no standardised major axis', () => {
    expect(fitOne(points, 'sma').unfit?.code).toBe('y-all-equal');
  });
});

describe('x and y without correlation', () => {
  it('have no sign, so no standardised major axis', () => {
    expect(fitOne(pointsOf([0.1, 1, 10], [3, 1, 3]), 'sma').unfit?.code).toBe('no-direction');
    expect(fitOne(pointsOf([0.1, 1, 10], [3, 1, 3]), 'ols').unfit).toBeNull();
  });
});

describe('one species that alone spreads x', () => {
  const xs = [2, 2, 2, 2, 2, 2, 2, 2, 900];
  const fit = fitOne(pointsOf(xs, [1, 1.1, 0.9, 1.2, 1, 1.05, 0.95, 1.1, 300]));

  it('has leverage 1, no studentised residual, and no leave-one-out range', () => {
    expect(fit.points[8]!.leverage).toBeCloseTo(1, 12);
    expect(fit.points[8]).toMatchObject({ studentised: null, cooksDistance: null, dffits: null });
    expect(fit.points[8]!.reasons.join(' ')).toMatch(/Far out in x/);
    expect(fit.leaveOneOut).toBeNull();
    expect(fit.notes.join(' ')).toMatch(/alone decides the line/);
    expect(notFinite(fit)).toEqual([]);
  });
});

describe('a standardised major axis', () => {
  const fit = fitOne(pointsOf([1, 3, 10, 30, 100, 300, 1000, 3000], [2, 5, 11, 60, 150, 280, 900, 4000]), 'sma', {
    against: [0, 1], predictAt: [5],
  });

  it('leaves null what it does not define, and says why', () => {
    expect(fit).toMatchObject({ predictions: null, logLikelihood: null, aic: null, smearingFactor: null, design: null });
    expect(fit.exponent!.standardError).toBeNull();
    expect(fit.points.every((point) => point.leverage === null && point.studentised === null && point.cooksDistance === null)).toBe(true);
    expect(fit.notes.join(' ')).toMatch(/are not defined/);
    expect(fit.notes.join(' ')).toMatch(/least-squares fit of the same species/);
  });

  it('has no bands to draw', () => {
    expect(lineOf(fit)).toBeNull();
  });

  it('cannot be tested against 0', () => {
    expect(fit.tests.map(({ p }) => p === null)).toEqual([true, false]);
  });
});

describe('a prediction beyond the largest double', () => {
  it('is null and not infinite', () => {
    const fit = fitOne(pointsOf([1, 2, 4], [1e-100, 1, 1e100]), 'ols', { predictAt: [1e10] });
    expect(fit.predictions![0]).toMatchObject({ estimate: null, prediction: { upper: null }, extrapolated: true });
    expect(notFinite(fit)).toEqual([]);
  });
});

describe('fitOls', () => {
  it('refuses lists of unequal length and values that are not finite', () => {
    expect(() => fitOls([1, 2, 3], [1, 2])).toThrow(RangeError);
    expect(() => fitOls([1, 2, Number.NaN], [1, 2, 3])).toThrow(RangeError);
  });
});

describe('placing a species', () => {
  const others = pointsOf([1, 10, 100, 1000], [2, 11, 150, 900]);

  it('needs three others', () => {
    const place = placeOnLine({ id: 'p0', x: 1, y: 2 }, others.slice(0, 3));
    expect(place).toMatchObject({ kind: 'unfit', n: 2, unfit: { code: 'too-few-points' } });
  });

  it('leaves the species itself out of its line', () => {
    const far = placeOnLine({ id: 'p3', x: 1000, y: 1e9 }, others);
    const near = placeOnLine({ id: 'p3', x: 1000, y: 900 }, others);
    if (far.kind === 'unfit' || near.kind === 'unfit') throw new Error('no line');
    expect(far.n).toBe(3);
    expect(far.exponent).toEqual(near.exponent);
    expect([far.inside, near.inside]).toEqual([false, true]);
    expect([near.extrapolated, placeOnLine({ id: 'new', x: 50, y: 60 }, others)]).toMatchObject([true, { n: 4, extrapolated: false }]);
  });

  it('refuses masses that are not above 0 and negative variances', () => {
    expect(() => placeOnLine({ id: 'new', x: 0, y: 1 }, others)).toThrow(RangeError);
    expect(() => placeOnLine({ id: 'new', x: 1, y: 1 }, others, { withinSpeciesVariance: -1 })).toThrow(RangeError);
  });

  it('on an exact line is on it or outside', () => {
    const exact = pointsOf([1, 10, 100, 1000], [2, 20, 200, 2000]);
    expect(placeOnLine({ id: 'new', x: 50, y: 100 }, exact)).toMatchObject({ inside: true, side: 'on', studentised: null });
    expect(placeOnLine({ id: 'new', x: 50, y: 101 }, exact)).toMatchObject({ inside: false, side: 'above', studentised: null });
  });
});
