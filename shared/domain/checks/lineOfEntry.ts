import type { Variable } from '../../contracts/vocabulary';
import { fitOls } from '../../stats/leastSquares';
import { placeOnLine } from '../../stats/placeOnLine';
import type { FitPoint } from '../../stats/types';
import type { LineOfEntry } from './context';

/**
 * Places an entry on its clade's line for the unit slip: ordinary least squares of log10 y on log10 x
 * over the species means without the entry's species (points of the same id are left out), with the
 * 95 % prediction interval, wider by the within-species variance (log10) where one specimen is placed.
 * Values raw, above 0. Null where the other species give no line.
 */
export function lineOfEntry(
  entry: { path: string; cladeName: string; x: Variable; xStructure: string | null; y: Variable; yStructure: string | null },
  species: FitPoint,
  points: readonly FitPoint[],
  withinSpeciesVariance: number | null = null,
): LineOfEntry | null {
  const place = placeOnLine(species, points, { level: 0.95, withinSpeciesVariance });
  if (place.kind === 'unfit') return null;
  const others = points.filter((point) => point.id !== species.id);
  const fit = fitOls(others.map((point) => Math.log10(point.x)), others.map((point) => Math.log10(point.y)), 0.95);
  if (fit.kind === 'unfit') return null;
  return { ...entry, exponent: fit.exponent.estimate, log10Ratio: place.log10Ratio, residualSd: fit.residualSd, inside: place.inside };
}
