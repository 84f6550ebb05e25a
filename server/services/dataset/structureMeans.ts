import type { SpeciesPage } from '../../../shared/contracts/register';
import type { RecordRow } from '../../../shared/contracts/records';
import type { Variable } from '../../../shared/contracts/vocabulary';
import { speciesMeansFor, type MeanPoint } from './means';
import type { Question } from './questions';
import type { DatasetRow } from './rows';

type StructureMean = SpeciesPage['structures'][number]['mean'];

/** The other variable of the pair in which a variable's mean is formed, first choice first. */
const partners: Partial<Record<Variable, readonly Variable[]>> = {
  structureMassG: ['neurons', 'cells', 'bodyMassG'],
  bodyMassG: ['structureMassG'],
};
const usualPartners: readonly Variable[] = ['structureMassG', 'cells'];

function questionOf(y: Variable, x: Variable, structure: string): Question {
  return { y, yStructure: y === 'bodyMassG' ? null : structure, x, xStructure: x === 'bodyMassG' ? null : structure };
}

/** A species' mean for the first pair that holds it, also where it is set aside from fits. */
export function speciesMean(rows: readonly DatasetRow[], slug: string, structure: string, variable: Variable): MeanPoint | null {
  for (const partner of partners[variable] ?? usualPartners) {
    if (partner === variable) continue;
    const { points, aside } = speciesMeansFor(rows, questionOf(variable, partner, structure));
    const found = [...points, ...aside].find((point) => point.slug === slug);
    if (found !== undefined) return found;
  }
  return null;
}

/**
 * What a species' page says of one structure as a whole: a single record as it stands, several as the species mean
 * of each variable, without a spread, since the kinds of spread of different sources do not add.
 * @param rows the dataset
 * @param own the species' rows of this structure, at least one
 */
export function structureMean(rows: readonly DatasetRow[], own: readonly RecordRow[]): StructureMean {
  const [first] = own;
  if (first === undefined) throw new RangeError('A structure is shown with at least one record.');
  const single = own.length === 1;
  const means = new Map<Variable, MeanPoint | null>();
  const value = (variable: Variable): number | null => {
    if (single) return first[variable];
    const mean = speciesMean(rows, first.taxonSlug, first.structure, variable);
    means.set(variable, mean);
    return mean?.y ?? null;
  };
  const error = (held: number | null) => (single ? held : null);
  const answer = {
    structureMassG: value('structureMassG'),
    cells: value('cells'),
    neurons: value('neurons'),
    otherCells: value('otherCells'),
    neuronsPerMg: value('neuronsPerMg'),
    bodyMassG: value('bodyMassG'),
  };
  const mean = means.get('neurons') ?? means.get('structureMassG') ?? null;
  return {
    ...answer,
    n: single ? first.n : (mean?.n ?? null),
    structureMassError: error(first.structureMassError),
    cellsError: error(first.cellsError),
    neuronsError: error(first.neuronsError),
    otherCellsError: error(first.otherCellsError),
    errorKind: single ? first.spreadKind : 'none',
  };
}
