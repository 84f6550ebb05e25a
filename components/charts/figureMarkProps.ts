import type { CladeMarkSpec } from '../theme/cladeMarks';
import type { PlacedPoint } from './figureTypes';

export interface MarkLook {
  spec: CladeMarkSpec;
  radius: number;
  fill: string;
  /** Outline of a hollow mark. */
  stroke?: string;
  /** Thin outline in the colour of the sheet, so that marks that touch stay apart. */
  outline: string;
  /** What a screen reader hears. */
  spoken: string;
}

/** What the chart gives to each mark (x, y, datum) and what the figure adds. */
export interface FigureMarkProps {
  x?: number;
  y?: number;
  datum?: { point: PlacedPoint };
  look?: (point: PlacedPoint) => MarkLook;
  idPrefix?: string;
  activeKey?: string | null;
  onFocusPoint?: (point: PlacedPoint | null) => void;
  /** True when the key was used. */
  onKey?: (key: string, point: PlacedPoint) => boolean;
}
