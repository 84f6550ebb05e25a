import type { CheckResult } from '../contracts/checks';
import type { Quantity } from './quantity';

export type ScaleUpKind = 'none' | 'other-side' | 'mass-fraction' | 'slab-series';

export interface ScaleUp {
  kind: ScaleUpKind;
  factor?: number | null;
  factorSe?: number | null;
}

/** One chamber load: nuclei counted in a known volume. `excluded` holds the reason, if it is set apart. */
export interface AliquotInput {
  nuclei: number;
  volumeMl: number;
  volumeSe?: number | null;
  excluded?: string | null;
  /** Number of chamber squares counted in this aliquot, where it was entered. */
  squares?: number | null;
}

export interface NeunCount {
  positive: number;
  total: number;
}

export type NeunInput = NeunCount | { fields: readonly NeunCount[] };

/** The body of POST /samples/estimate: mass in g, volumes in mL, dilution = final ÷ original volume. */
export interface SampleInput {
  tissueMassG?: number | null;
  suspensionVolumeMl: number;
  suspensionVolumeSe?: number | null;
  dilution?: number | null;
  dilutionSe?: number | null;
  scaleUp?: ScaleUp | null;
  aliquots: readonly AliquotInput[];
  neun?: NeunInput | null;
  targetCv?: number | null;
}

export interface NeuronFraction {
  value: number;
  lower: number;
  upper: number;
  standardError: number;
  /** Which variance entered: the binomial one, or that between fields where it is larger. */
  varianceKind: 'binomial' | 'between-fields';
  fields: number;
}

export interface UndefinedFraction {
  value: null;
  lower: null;
  upper: null;
  standardError: null;
  varianceKind: null;
  fields: 0;
}

export interface SampleEstimate {
  structureMassG: number | null;
  cells: Quantity;
  neurons: Quantity;
  otherCells: Quantity;
  cellsPerMg: Quantity;
  neuronsPerMg: Quantity;
  otherCellsPerMg: Quantity;
  /** Members are null where no NeuN count was given. */
  neuronFraction: NeuronFraction | UndefinedFraction;
  aliquotCv: number | null;
  poissonCv: number | null;
  excessCv: number | null;
  dispersion: { statistic: number; df: number; p: number; lowerTailP: number } | null;
  standardErrorKind: 'between-aliquots' | 'counting' | null;
  scaleUpFactor: number;
  nucleiCounted: number;
  aliquotsCounted: number;
  aliquotsForTargetCv: number | null;
  aliquotsStillNeeded: number | null;
  checks: CheckResult[];
}

/** Says whether an aliquot is set apart: an empty reason is none. */
export function isExcluded(aliquot: { excluded?: string | null }): boolean {
  return typeof aliquot.excluded === 'string' && aliquot.excluded.trim() !== '';
}
