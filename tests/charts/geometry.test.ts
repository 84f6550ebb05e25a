import { describe, expect, it } from 'vitest';
import { bandPoints, densityDiagonals, lineAt, lineEnds, nearestIndex, type StoredFit } from '../../components/charts/geometry';
import { equalDecadeFrame, xPx, yPx } from '../../components/charts/logScale';

const fit: StoredFit = { exponent: 1.5, log10Coefficient: -11, residualSd: 0.1, n: 10, meanLog10X: 8, sxx: 4, tCritical: 2.306, xRange: { lower: 1e7, upper: 1e9 } };

describe('a stored line', () => {
  it('is drawn over its own range of x only', () => {
    const [low, high] = lineEnds(fit);
    expect(low.x).toBe(1e7);
    expect(high.x).toBe(1e9);
    expect(Math.log10(low.y)).toBeCloseTo(-0.5, 12);
    expect(Math.log10(high.y)).toBeCloseTo(2.5, 12);
  });

  it('has its narrowest confidence band at the mean of log x, of half-width t·s/√n', () => {
    const band = bandPoints(fit, 'confidence', 40);
    const middle = band[20];
    expect(middle?.x).toBeCloseTo(1e8, 0);
    expect(Math.log10(middle?.upper ?? 0) - Math.log10(lineAt(fit, 1e8))).toBeCloseTo((2.306 * 0.1) / Math.sqrt(10), 9);
    const widths = band.map(({ lower, upper }) => Math.log10(upper / lower));
    expect(Math.min(...widths)).toBe(widths[20]);
  });

  it('has a prediction band that holds the confidence band everywhere', () => {
    const confidence = bandPoints(fit, 'confidence');
    bandPoints(fit, 'prediction').forEach((point, index) => {
      expect(point.upper).toBeGreaterThan(confidence[index]?.upper ?? Infinity);
      expect(point.lower).toBeLessThan(confidence[index]?.lower ?? 0);
    });
  });

  it('has no band where the method stores no residual SD', () => {
    expect(bandPoints({ ...fit, residualSd: null }, 'confidence')).toEqual([]);
    expect(bandPoints({ ...fit, tCritical: null }, 'prediction')).toEqual([]);
  });
});

describe('lines of constant density', () => {
  const frame = equalDecadeFrame({ x: [6, 10], y: [-2, 3] }, { width: 560, height: 700 }, { left: 60, right: 10, top: 30, bottom: 60 });
  const points = [{ x: 1e8, y: 2.5 }];

  it('pass through points of that density: 10⁵ per mg is 1e8 neurons in 1 g', () => {
    const diagonal = densityDiagonals(frame, points, 'neurons', 'structureMassG').find((line) => line.density === 1e5);
    if (!diagonal) throw new Error('the diagonal of 10⁵ per mg is missing');
    const { from, to } = diagonal;
    const at = { x: xPx(frame, 1e8), y: yPx(frame, 1) };
    const cross = (to.x - from.x) * (at.y - from.y) - (to.y - from.y) * (at.x - from.x);
    expect(Math.abs(cross)).toBeLessThan(1e-6);
    expect(to.x - from.x).toBeCloseTo(from.y - to.y, 9);
  });

  it('are those that enclose the densities of the points', () => {
    expect(densityDiagonals(frame, points, 'neurons', 'structureMassG').map((line) => line.density)).toEqual([1e4, 1e5]);
  });

  it('stay away where the pair has no density meaning', () => {
    expect(densityDiagonals(frame, points, 'bodyMassG', 'structureMassG')).toEqual([]);
    expect(densityDiagonals(frame, points, 'neurons', 'neuronsPerMg')).toEqual([]);
  });
});

describe('finding a point under the pointer', () => {
  const points = [{ x: 10, y: 10 }, { x: 40, y: 40 }];
  it('takes the nearest within the radius', () => {
    expect(nearestIndex(points, { x: 30, y: 30 }, 30)).toBe(1);
  });
  it('finds none beyond the radius', () => {
    expect(nearestIndex(points, { x: 200, y: 10 }, 30)).toBeNull();
  });
});
