import type { LineSummary, Prediction, RawInterval } from './types';

/** The line at one x on log10, with the half-widths of both bands. */
export interface BandPoint {
  log10X: number;
  log10Estimate: number;
  /** Confidence band of the line (its mean at this x). */
  confidence: { lower: number; upper: number };
  /** Prediction band of one new species. */
  prediction: { lower: number; upper: number };
}

/** The fields of a stored fit that its line is made from; as they come out of JSON. */
interface StoredFit {
  n: number;
  residualSd: number | null;
  exponent: { estimate: number } | null;
  log10Coefficient: { estimate: number } | null;
  design: { meanLog10X: number; sxx: number; tCritical: number | null; level: number } | null;
}

/**
 * The line of a stored fit, ready for `bandAt` and `predictBand`.
 *
 * @returns null where the fit has no line or its method no bands (standardised major axis)
 */
export function lineOf(fit: StoredFit): LineSummary | null {
  const { n, residualSd, exponent, log10Coefficient, design } = fit;
  if (!design || !exponent || !log10Coefficient || residualSd === null || design.tCritical === null) return null;
  return {
    ...design,
    tCritical: design.tCritical,
    n,
    residualSd,
    exponent: exponent.estimate,
    log10Coefficient: log10Coefficient.estimate,
  };
}

/**
 * Line, confidence band and prediction band at one log10 x, on log10 y.
 *
 * Half-widths t·s·√(1/n + (x − x̄)²/Sxx) and t·s·√(1 + 1/n + (x − x̄)²/Sxx). Needs no distribution, so
 * that a picture can be drawn from a stored fit.
 *
 * @param line summary of a least-squares fit
 * @param log10X decimal logarithm of x
 * @param extraVariance variance on log10 added to the prediction (one specimen in its species); 0 unless said
 * @throws RangeError when log10X is not finite or the variance is negative
 * @source Draper & Smith, Applied Regression Analysis, ch. 3
 */
export function bandAt(line: LineSummary, log10X: number, extraVariance = 0): BandPoint {
  if (!Number.isFinite(log10X)) throw new RangeError(`log10 x must be finite, found ${log10X}`);
  if (!(extraVariance >= 0 && extraVariance < Infinity)) {
    throw new RangeError(`A variance is 0 or above, found ${extraVariance}`);
  }
  const log10Estimate = line.log10Coefficient + line.exponent * log10X;
  const distance = log10X - line.meanLog10X;
  const variance = line.residualSd * line.residualSd;
  const ofLine = variance * (1 / line.n + (distance * distance) / line.sxx);
  const confidence = line.tCritical * Math.sqrt(ofLine);
  const prediction = line.tCritical * Math.sqrt(variance + ofLine + extraVariance);
  return {
    log10X,
    log10Estimate,
    confidence: { lower: log10Estimate - confidence, upper: log10Estimate + confidence },
    prediction: { lower: log10Estimate - prediction, upper: log10Estimate + prediction },
  };
}

/** `bandAt` at each of the log10 x given, in their order. */
export function predictBand(line: LineSummary, log10Xs: readonly number[]): BandPoint[] {
  return log10Xs.map((log10X) => bandAt(line, log10X));
}

/**
 * Predicted median of y at a raw x, 10^(a + b·log10 x), with back-transformed intervals; a standard
 * error is never back-transformed.
 *
 * @param range the fitted species' range of raw x
 * @throws RangeError unless x is finite and above 0
 */
export function predictAt(line: LineSummary, x: number, range: { lower: number; upper: number }): Prediction {
  if (!(x > 0 && x < Infinity)) throw new RangeError(`x must be a finite number above 0, found ${x}`);
  const band = bandAt(line, Math.log10(x));
  return {
    x,
    log10Estimate: band.log10Estimate,
    estimate: powerOfTen(band.log10Estimate),
    confidence: rawInterval(band.confidence),
    prediction: rawInterval(band.prediction),
    extrapolated: x < range.lower || x > range.upper,
  };
}

/** An interval on log10 in raw units; a limit beyond the largest double is null. */
export function rawInterval(log10: { lower: number; upper: number }): RawInterval {
  return { lower: powerOfTen(log10.lower), upper: powerOfTen(log10.upper) };
}

/** 10^exponent, or null beyond the largest double: JSON has no infinity. */
export function powerOfTen(exponent: number): number | null {
  const value = 10 ** exponent;
  return Number.isFinite(value) ? value : null;
}
