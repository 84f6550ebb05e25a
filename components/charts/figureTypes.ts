import type { QuantityKind } from '../../shared/domain/quantityText';
import type { QuantityName } from '../theme/tokens';
import type { StoredFit } from './geometry';

export interface FigureAxis {
  /** "mass of the cerebral cortex". */
  label: string;
  /** "g"; null for counts. */
  unit: string | null;
  /** Colour of the axis title. */
  tone: QuantityName | 'ink';
  /** Name of the variable as in the API, for the diagonals. */
  variable: string;
  /** How its values are printed. */
  kind: QuantityKind;
}

export interface FigurePoint {
  id: string;
  /** Species; set in italic. */
  label: string;
  x: number;
  y: number;
  /** Ringed and named. */
  flag: boolean;
  /** Beside the name of a flagged point: "flagged, t = 5.8". */
  note?: string;
  /** Drawn hollow, in no line and no band. */
  setAside: boolean;
  href: string | null;
}

export interface FigureGroup {
  /** Slug of the clade; decides colour and shape. */
  key: string;
  label: string;
  points: readonly FigurePoint[];
  /** The stored fit; null where there is none. */
  fit: StoredFit | null;
}

/** A point with its group and its place in px. */
export interface PlacedPoint extends FigurePoint {
  group: FigureGroup;
  px: number;
  py: number;
}
