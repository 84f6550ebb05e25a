export interface PlaceOnLineValue {
  /** y of the record ÷ y of the line fitted without its species. */
  ratio: number;
  /** Prediction interval as ratios to the line; null where the line gives none. */
  lower: number | null;
  upper: number | null;
}

/** Whether the ratio lies in its interval; null without an interval. */
export function isInside({ ratio, lower, upper }: PlaceOnLineValue): boolean | null {
  return lower === null || upper === null ? null : ratio >= lower && ratio <= upper;
}

/** Share of the strip's width at which a ratio lies, 0 to 1, for a strip from 1/range to range; beyond the ends it is cut and said so. */
export function stripPosition(ratio: number, range: number): { at: number; beyond: boolean } {
  const at = 0.5 + Math.log(ratio) / Math.log(range) / 2;
  return { at: Math.min(1, Math.max(0, at)), beyond: !(at >= 0 && at <= 1) };
}
