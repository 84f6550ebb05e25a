/**
 * The shapes that a scaling fit is asked for and answered with: plain data, safe to send as JSON
 * (no NaN, no Infinity). x and y are raw values in the caller's units, above 0; everything named
 * log10 is on the decimal logarithm of these.
 */

export type FitMethod = 'ols' | 'sma';

/** One species' place in the plane. `group` parts the points into separate fits. */
export interface FitPoint {
  id: string;
  group?: string | null;
  x: number;
  y: number;
}

export interface FitRequest {
  points: readonly FitPoint[];
  method: FitMethod;
  /** Level of every interval, between 0 and 1; 0.95 unless said. */
  level?: number;
  /** Exponents to test each fit against. */
  against?: readonly number[];
  /** Raw values of x, above 0, at which to predict y. */
  predictAt?: readonly number[];
}

export interface Interval {
  lower: number;
  upper: number;
}

/** `standardError` is null where the interval does not come from one (standardised major axis). */
export interface Estimate extends Interval {
  estimate: number;
  standardError: number | null;
}

/**
 * Test of a stated exponent. `statistic` is t on `df` (least squares) or F on 1 and `df`
 * (standardised major axis), as `statisticKind` says; null with its p where nothing is left to test.
 */
export interface ExponentTest {
  exponent: number;
  statistic: number | null;
  statisticKind: 't' | 'F';
  df: number;
  p: number | null;
}

/** Raw units; null stands for a value beyond the largest double. */
export interface RawInterval {
  lower: number | null;
  upper: number | null;
}

/** Predicted median of y at a raw x: `confidence` for the line, `prediction` for one new species. */
export interface Prediction {
  x: number;
  log10Estimate: number;
  estimate: number | null;
  confidence: RawInterval;
  prediction: RawInterval;
  /** x lies outside the fitted species' range. */
  extrapolated: boolean;
}

export type FlagName = 'watch' | 'outlier' | 'influential';

/** One point beside its line. Diagnostics are null below four points and where not defined. */
export interface DiagnosedPoint {
  id: string;
  x: number;
  y: number;
  fittedLog10: number | null;
  /** log10 y − fittedLog10. */
  residual: number | null;
  /** Externally studentised residual. */
  studentised: number | null;
  internallyStudentised: number | null;
  leverage: number | null;
  cooksDistance: number | null;
  dffits: number | null;
  bonferroniP: number | null;
  /** The first of outlier, influential, watch. */
  flag: 'none' | FlagName;
  flags: FlagName[];
  /** In words: why each flag stands, and remarks that are no flag. */
  reasons: string[];
}

export type UnfitCode = 'too-few-points' | 'x-all-equal' | 'y-all-equal' | 'no-direction';

/** Why the data give no line: a situation, not a failure. */
export interface Unfit {
  code: UnfitCode;
  message: string;
}

export interface LeaveOneOut extends Interval {
  /** The id whose absence moves the exponent most. */
  mostMoving: string;
}

/** Of a least-squares fit, what its bands need beside its own numbers (see `lineOf` in bands.ts). */
export interface FitDesign {
  meanLog10X: number;
  /** Sum of squares of log10 x about its mean. */
  sxx: number;
  /** Two-sided critical value of t at `level` on n − 2. */
  tCritical: number;
  level: number;
}

/** All that draws a least-squares line and both its bands without refitting. */
export interface LineSummary extends FitDesign {
  n: number;
  residualSd: number;
  exponent: number;
  log10Coefficient: number;
}

/** One group's fit. Fields that the method does not define are null, and `notes` says why. */
export interface ScalingFit {
  group: string | null;
  n: number;
  df: number | null;
  method: FitMethod;
  level: number;
  exponent: Estimate | null;
  log10Coefficient: Estimate | null;
  rSquared: number | null;
  residualSd: number | null;
  logLikelihood: number | null;
  aic: number | null;
  smearingFactor: number | null;
  lambda: null;
  bootstrap: null;
  tests: ExponentTest[];
  predictions: Prediction[] | null;
  points: DiagnosedPoint[];
  xRange: Interval;
  leaveOneOut: LeaveOneOut | null;
  design: FitDesign | null;
  notes: string[];
  unfit: Unfit | null;
}

/** The answer to a fit request; `comparison` and `match` belong to methods that compare or use a tree. */
export interface ScalingAnswer {
  fits: ScalingFit[];
  comparison: null;
  match: null;
}
