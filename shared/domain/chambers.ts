export interface CountingChamber {
  key: string;
  name: string;
  /** Volume over one counted square in mL; null where it must be entered. */
  squareVolumeMl: number | null;
  note: string;
}

/**
 * Counting chambers offered at the bench. Improved Neubauer: 0.1 mm deep, a large square 1 mm × 1 mm,
 * so 0.1 mm³ = 1e-4 mL. Volumes of other chambers are entered from their own inscription.
 */
export const countingChambers: readonly CountingChamber[] = [
  { key: 'improved-neubauer', name: 'Improved Neubauer', squareVolumeMl: 1e-4, note: '0.1 mm deep; one large square 1 mm × 1 mm holds 0.1 µL' },
  { key: 'other', name: 'Another chamber', squareVolumeMl: null, note: 'enter the volume of one square, as inscribed on the chamber' },
];

/** The chamber of a key, or null where it is not listed. */
export function findChamber(key: string): CountingChamber | null {
  return countingChambers.find((chamber) => chamber.key === key) ?? null;
}
