import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { bandAt, lineOf, predictBand } from '../../../shared/stats/bands';
import type { FitMethod, FitPoint, ScalingFit } from '../../../shared/stats/types';
import { relativeError } from './reference';
import { fitOne, pointsOf } from './support';

// Random cases may wait for a processor that others use.
vi.setConfig({ testTimeout: 60_000 });

/** Points about a line with enough spread that 1e-9 is fair to ask of sums in another order. */
const clouds = fc.array(
  fc.record({
    logX: fc.double({ min: -3, max: 9, noNaN: true }),
    scatter: fc.double({ min: -0.5, max: 0.5, noNaN: true }),
  }),
  { minLength: 8, maxLength: 40 },
).map((drawn) => drawn.map(({ logX, scatter }, i) => ({
  id: `s${i}`, x: 10 ** (logX + i / 10), y: 10 ** (0.3 + 0.7 * logX + scatter + (i % 3) / 20),
}))).filter((points) => {
  const fit = fitOne(points);
  return fit.rSquared! > 0.3 && fit.residualSd! > 1e-3;
});
const factors = fc.constantFrom(1e-6, 1e-3, 0.5, 7, 1000, 1e9);
const close = (found: number | null | undefined, expected: number | null | undefined): boolean =>
  expected === null ? found === null : relativeError(found, expected!) < 1e-8 || Math.abs(found! - expected!) < 1e-9;

describe.each(['ols', 'sma'] as FitMethod[])('%s', (method) => {
  const fit = (points: FitPoint[]): ScalingFit => fitOne(points, method, { against: [1, 0.75] });

  it('keeps its exponent, tests, residuals and flags when units change, and shifts the coefficient', () => {
    fc.assert(fc.property(clouds, factors, factors, (points, fx, fy) => {
      const before = fit(points);
      const after = fit(points.map(({ id, x, y }) => ({ id, x: x * fx, y: y * fy })));
      const shift = Math.log10(fy) - before.exponent!.estimate * Math.log10(fx);
      expect(close(after.exponent!.estimate, before.exponent!.estimate)).toBe(true);
      expect(close(after.exponent!.lower, before.exponent!.lower)).toBe(true);
      expect(close(after.exponent!.upper, before.exponent!.upper)).toBe(true);
      expect(close(after.rSquared, before.rSquared)).toBe(true);
      expect(close(after.residualSd, before.residualSd)).toBe(true);
      expect(close(after.log10Coefficient!.estimate, before.log10Coefficient!.estimate + shift)).toBe(true);
      after.tests.forEach((test, i) => expect(close(test.p, before.tests[i]!.p)).toBe(true));
      expect(after.points.map(({ flags }) => flags)).toEqual(before.points.map(({ flags }) => flags));
      expect(after.leaveOneOut!.mostMoving).toBe(before.leaveOneOut!.mostMoving);
    }), { seed: 1, numRuns: 100 });
  });

  it('does not depend on the order of the points, and answers in the order given', () => {
    fc.assert(fc.property(clouds, fc.integer({ min: 1, max: 1000 }), (points, turn) => {
      const mixed = [...points].sort((a, b) => ((Number(a.id.slice(1)) * turn) % 17) - ((Number(b.id.slice(1)) * turn) % 17));
      const [before, after] = [fit(points), fit(mixed)];
      expect(after.points.map(({ id }) => id)).toEqual(mixed.map(({ id }) => id));
      expect(close(after.exponent!.estimate, before.exponent!.estimate)).toBe(true);
      expect(close(after.log10Coefficient!.upper, before.log10Coefficient!.upper)).toBe(true);
      for (const point of before.points) {
        const same = after.points.find(({ id }) => id === point.id)!;
        expect(close(same.residual, point.residual)).toBe(true);
        expect(same.flags).toEqual(point.flags);
        if (method === 'ols') expect(close(same.studentised, point.studentised)).toBe(true);
      }
    }), { seed: 2, numRuns: 100 });
  });

  it('names the range of exponents that refitting without each species gives', () => {
    fc.assert(fc.property(clouds, (points) => {
      const without = points.map((left) => fit(points.filter(({ id }) => id !== left.id)));
      // Near r = 0 the sign of a major axis hangs on rounding.
      fc.pre(without.every(({ rSquared }) => rSquared !== null && rSquared > 0.01));
      const refits = without.map(({ exponent }) => exponent!.estimate);
      const { leaveOneOut, exponent } = fit(points);
      expect(close(leaveOneOut!.lower, Math.min(...refits))).toBe(true);
      expect(close(leaveOneOut!.upper, Math.max(...refits))).toBe(true);
      const moves = refits.map((refit) => Math.abs(refit - exponent!.estimate));
      const most = points.findIndex(({ id }) => id === leaveOneOut!.mostMoving);
      expect(close(moves[most], Math.max(...moves))).toBe(true);
    }), { seed: 3, numRuns: 40 });
  });
});

describe('the standardised major axis', () => {
  it('gives the reciprocal exponent and limits when the axes are swapped', () => {
    fc.assert(fc.property(clouds, (points) => {
      const forward = fitOne(points, 'sma');
      const swapped = fitOne(points.map(({ id, x, y }) => ({ id, x: y, y: x })), 'sma');
      expect(close(swapped.exponent!.estimate * forward.exponent!.estimate, 1)).toBe(true);
      expect(close(swapped.exponent!.lower * forward.exponent!.upper, 1)).toBe(true);
      expect(close(swapped.exponent!.upper * forward.exponent!.lower, 1)).toBe(true);
      expect(close(swapped.rSquared, forward.rSquared)).toBe(true);
    }), { seed: 4, numRuns: 100 });
  });

  it('mirrors exponent and limits when y falls instead of rising', () => {
    fc.assert(fc.property(clouds, (points) => {
      const rising = fitOne(points, 'sma').exponent!;
      const falling = fitOne(points.map(({ id, x, y }) => ({ id, x, y: 1 / y })), 'sma').exponent!;
      expect(close(falling.estimate, -rising.estimate)).toBe(true);
      expect(close(falling.lower, -rising.upper)).toBe(true);
      expect(close(falling.upper, -rising.lower)).toBe(true);
    }), { seed: 8, numRuns: 30 });
  });

  it('is the least-squares exponent divided by r', () => {
    fc.assert(fc.property(clouds, (points) => {
      const ols = fitOne(points, 'ols');
      const sma = fitOne(points, 'sma');
      expect(close(sma.exponent!.estimate, ols.exponent!.estimate / Math.sqrt(ols.rSquared!))).toBe(true);
    }), { seed: 5, numRuns: 50 });
  });

  it('is not rejected at its own limits below the level, and p there is 1 − level', () => {
    fc.assert(fc.property(clouds, fc.constantFrom(0.8, 0.95, 0.99), (points, level) => {
      const { exponent } = fitOne(points, 'sma', { level });
      const { tests } = fitOne(points, 'sma', { against: [exponent!.lower, exponent!.upper] });
      tests.forEach(({ p }) => expect(Math.abs(p! - (1 - level))).toBeLessThan(1e-8));
    }), { seed: 6, numRuns: 50 });
  });
});

describe('the bands of a least-squares line', () => {
  it('are drawn from the stored sums as the predictions of the fit itself', () => {
    fc.assert(fc.property(clouds, fc.double({ min: -5, max: 12, noNaN: true }), (points, log10X) => {
      const x = 10 ** log10X;
      const fit = fitOne(points, 'ols', { predictAt: [x], level: 0.9 });
      // The line as it would come out of the database: through JSON.
      const stored = JSON.parse(JSON.stringify(fit)) as ScalingFit;
      const [drawn] = predictBand(lineOf(stored)!, [Math.log10(x)]);
      const [predicted] = fit.predictions!;
      expect(close(Math.log10(predicted!.prediction.upper!), drawn!.prediction.upper)).toBe(true);
      expect(close(Math.log10(predicted!.confidence.lower!), drawn!.confidence.lower)).toBe(true);
      expect(predicted!.extrapolated).toBe(x < fit.xRange.lower || x > fit.xRange.upper);
    }), { seed: 7, numRuns: 100 });
  });

  it('are narrowest at the mean of log10 x, where the line is known to s/√n', () => {
    const line = lineOf(fitOne(pointsOf([1, 10, 100, 1000], [1, 12, 80, 1100])));
    const atMean = bandAt(line!, 1.5);
    const half = (atMean.confidence.upper - atMean.confidence.lower) / 2;
    expect(half).toBeCloseTo(line!.tCritical * line!.residualSd / 2, 12);
    const aside = bandAt(line!, 1.6);
    expect(aside.confidence.upper - aside.confidence.lower).toBeGreaterThan(2 * half);
    expect(() => bandAt(line!, Number.NaN)).toThrow(RangeError);
    expect(() => bandAt(line!, 1, -1)).toThrow(RangeError);
  });
});
