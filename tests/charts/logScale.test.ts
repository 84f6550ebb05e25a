import { describe, expect, it } from 'vitest';
import { equalDecadeFrame, logRange, naturalHeight, xPx, yPx } from '../../components/charts/logScale';
import { decadeText, logTicks } from '../../components/charts/ticks';

const margins = { left: 60, right: 10, top: 30, bottom: 60 };

describe('a log–log frame', () => {
  it('makes a decade as long on y as on x whatever the ranges and the size', () => {
    for (const size of [{ width: 530, height: 640 }, { width: 358, height: 430 }, { width: 900, height: 300 }]) {
      const frame = equalDecadeFrame({ x: [6.2, 10.4], y: [-2.1, 3] }, size, margins);
      const decadeOnX = xPx(frame, 1e9) - xPx(frame, 1e8);
      const decadeOnY = yPx(frame, 1) - yPx(frame, 10);
      expect(decadeOnX).toBeCloseTo(decadeOnY, 9);
    }
  });

  it('shows both ranges whole and ends exactly at the edges of the plot', () => {
    const frame = equalDecadeFrame({ x: [6, 10], y: [-2, 3] }, { width: 500, height: 700 }, margins);
    expect(frame.x[0]).toBeLessThanOrEqual(6);
    expect(frame.x[1]).toBeGreaterThanOrEqual(10);
    expect(frame.y[0]).toBeLessThanOrEqual(-2);
    expect(frame.y[1]).toBeGreaterThanOrEqual(3);
    expect(xPx(frame, 10 ** frame.x[1])).toBeCloseTo(frame.left + frame.width, 9);
    expect(yPx(frame, 10 ** frame.y[1])).toBeCloseTo(frame.top, 9);
  });

  it('an exponent of 1 rises at 45 degrees', () => {
    const frame = equalDecadeFrame({ x: [0, 3], y: [0, 2] }, { width: 400, height: 400 }, margins);
    const rise = yPx(frame, 2) - yPx(frame, 200);
    const run = xPx(frame, 500) - xPx(frame, 5);
    expect(rise).toBeCloseTo(run, 9);
  });

  it('refuses a drawing with no room between its margins', () => {
    expect(() => equalDecadeFrame({ x: [0, 1], y: [0, 1] }, { width: 60, height: 200 }, margins)).toThrow(RangeError);
  });

  it('takes the height that suits the ranges, within its bounds', () => {
    const bounds = { least: 0.5, most: 2 };
    expect(naturalHeight({ x: [0, 4], y: [0, 4] }, 470, margins, bounds)).toBe(400 + 90);
    expect(naturalHeight({ x: [0, 1], y: [0, 9] }, 470, margins, bounds)).toBe(800 + 90);
  });

  it('leaves values that have no logarithm out of a range', () => {
    expect(logRange([0, -3, 10, 1000, Number.NaN], 0)).toEqual([1, 3]);
  });
});

describe('ticks of a log axis', () => {
  it('puts majors at whole powers and minors at 2 to 9, ends included', () => {
    const { major, minor } = logTicks(0, 1);
    expect(major).toEqual([1, 10]);
    expect(minor).toEqual([2, 3, 4, 5, 6, 7, 8, 9]);
  });

  it('names small decades without rounding dust', () => {
    expect(logTicks(-2, 0).minor).toContain(0.03);
    expect(logTicks(-2, 0).major.map(decadeText)).toEqual(['0.01', '0.1', '1']);
  });

  it('writes decades beyond a thousand as powers of ten', () => {
    expect(decadeText(1000)).toBe('1\u2009000');
    expect(decadeText(1e7)).toBe('10⁷');
    expect(decadeText(1e10)).toBe('10¹⁰');
    expect(decadeText(1e-5)).toBe('10⁻⁵');
  });

  it('refuses an axis without length', () => {
    expect(() => logTicks(3, 3)).toThrow(RangeError);
  });
});
