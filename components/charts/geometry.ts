import type { Frame } from './logScale';
import { xPx, yPx } from './logScale';

/** A stored fit: log10 y = log10Coefficient + exponent · log10 x, with what its bands need. Nothing is refitted here. */
export interface StoredFit {
  exponent: number;
  log10Coefficient: number;
  /** Residual SD on log10 y; null where the method has none, then there are no bands. */
  residualSd: number | null;
  n: number;
  meanLog10X: number;
  /** Sum of squared deviations of log10 x. */
  sxx: number;
  /** Two-sided t of the shown level on n − 2 df. */
  tCritical: number | null;
  /** Range of x (not log) over which the line was fitted: it is drawn there only. */
  xRange: { lower: number; upper: number };
}

export interface XY {
  x: number;
  y: number;
}

export interface BandPoint {
  x: number;
  lower: number;
  upper: number;
}

/** y of the line at x. */
export function lineAt(fit: StoredFit, x: number): number {
  return 10 ** (fit.log10Coefficient + fit.exponent * Math.log10(x));
}

/** Both ends of the line, at the ends of its own range of x. */
export function lineEnds(fit: StoredFit): [XY, XY] {
  const { lower, upper } = fit.xRange;
  return [
    { x: lower, y: lineAt(fit, lower) },
    { x: upper, y: lineAt(fit, upper) },
  ];
}

/**
 * Confidence band of the line or prediction band for one more species, at evenly spaced log10 x:
 * log10 y ± t·s·√(h) with h = 1/n + (log10 x − mean)²/sxx, and 1 + h for the prediction band.
 * Empty where the fit has no residual SD, no t or no spread in x.
 */
export function bandPoints(fit: StoredFit, kind: 'confidence' | 'prediction', steps = 40): BandPoint[] {
  const { residualSd, tCritical, sxx, n, meanLog10X, xRange } = fit;
  if (residualSd === null || tCritical === null || !(sxx > 0)) return [];
  const from = Math.log10(xRange.lower);
  const to = Math.log10(xRange.upper);
  return Array.from({ length: steps + 1 }, (_, index) => {
    const log10X = from + ((to - from) * index) / steps;
    const leverage = 1 / n + (log10X - meanLog10X) ** 2 / sxx;
    const half = tCritical * residualSd * Math.sqrt(kind === 'prediction' ? 1 + leverage : leverage);
    const middle = fit.log10Coefficient + fit.exponent * log10X;
    return { x: 10 ** log10X, lower: 10 ** (middle - half), upper: 10 ** (middle + half) };
  });
}

const countVariables = new Set(['cells', 'neurons', 'otherCells']);
const massVariables = new Set(['structureMassG', 'bodyMassG']);

export interface Diagonal {
  /** Number per mg, a power of ten. */
  density: number;
  from: XY;
  to: XY;
}

export interface DensityRange {
  /** Least and greatest number per mg among the points. */
  least: number;
  greatest: number;
}

/** The densities of points of a count against a mass in g, or the other way round; null for other pairs. */
export function densityRange(points: readonly XY[], xVariable: string, yVariable: string): DensityRange | null {
  const massOnCount = massVariables.has(yVariable) && countVariables.has(xVariable);
  const countOnMass = countVariables.has(yVariable) && massVariables.has(xVariable);
  if (points.length === 0 || !(massOnCount || countOnMass)) return null;
  const densities = points.map(({ x, y }) => (massOnCount ? x / (1000 * y) : y / (1000 * x)));
  return { least: Math.min(...densities), greatest: Math.max(...densities) };
}

/**
 * Lines of constant density (count ÷ mass in mg) across the frame, for a count against a mass in g or
 * the other way round, at the powers of ten that enclose the points' own densities; none for other pairs.
 * In px. Short corners are left out.
 */
export function densityDiagonals(frame: Frame, points: readonly XY[], xVariable: string, yVariable: string): Diagonal[] {
  const massOnCount = massVariables.has(yVariable) && countVariables.has(xVariable);
  const range = densityRange(points, xVariable, yVariable);
  if (!range) return [];
  // log10 y = log10 x + offset, with offset = −3 − log10 d (mass on count) or 3 + log10 d (count on mass).
  const offsetOf = (power: number) => (massOnCount ? -3 - power : 3 + power);
  const result: Diagonal[] = [];
  for (let power = Math.floor(Math.log10(range.least)); power <= Math.ceil(Math.log10(range.greatest)); power += 1) {
    const offset = offsetOf(power);
    const from = Math.max(frame.x[0], frame.y[0] - offset);
    const to = Math.min(frame.x[1], frame.y[1] - offset);
    if (to - from < 0.8) continue;
    const at = (log10X: number): XY => ({ x: xPx(frame, 10 ** log10X), y: yPx(frame, 10 ** (log10X + offset)) });
    result.push({ density: 10 ** power, from: at(from), to: at(to) });
  }
  return result;
}

/** The index of the point nearest to a place in px, within a radius; null where none is. */
export function nearestIndex(points: readonly XY[], place: XY, radius: number): number | null {
  let best: number | null = null;
  let least = radius * radius;
  points.forEach((point, index) => {
    const distance = (point.x - place.x) ** 2 + (point.y - place.y) ** 2;
    if (distance <= least) {
      least = distance;
      best = index;
    }
  });
  return best;
}
