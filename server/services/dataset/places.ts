import type { Place } from '../../../shared/contracts/fits';
import type { LineOfEntry } from '../../../shared/domain/checks/context';
import { lineOfEntry } from '../../../shared/domain/checks/lineOfEntry';
import { ratioSentence } from '../../../shared/domain/quantityText';
import { placeOnLine } from '../../../shared/stats/placeOnLine';
import type { FitPoint } from '../../../shared/stats/types';
import { speciesMeansFor, type MeanPoint } from './means';
import { standingFitSlug, structureWords, type Question } from './questions';
import type { DatasetRow } from './rows';
import { leastStandingSpecies, standingQuestions, toFitPoint } from './standingFits';
import { standingCladeNames } from './taxonomy';
import { withinSpeciesVariance } from './withinSpecies';

/** What is to be placed: one record, or one species' mean. Raw values in g and counts. */
export interface ToPlace {
  taxonSlug: string;
  /** Names from the root to the parent of the species. */
  lineage: readonly string[];
  structure: string;
  definitionVersion: number;
  structureMassG: number | null;
  neurons: number | null;
  bodyMassG?: number | null;
  isSingleSpecimen: boolean;
}

export interface PlaceFound {
  place: Place | null;
  /** Why there is no place. */
  noPlace: string | null;
}

interface LineForPlace {
  question: Question;
  clade: { slug: string; name: string };
  others: MeanPoint[];
  point: FitPoint;
}

const level = 0.95;

/** The standing question that speaks of a structure: its mass on its neurons, or on body mass where no neurons are kept. */
function questionFor({ structure, neurons, bodyMassG }: ToPlace): Question | null {
  const asked = standingQuestions.filter(({ y, yStructure }) => y === 'structureMassG' && yStructure === structure);
  return asked.find(({ x }) => (x === 'neurons' ? neurons !== null : bodyMassG != null)) ?? asked[0] ?? null;
}

/** The lowest clade with standing fits in which five other species hold both values, or why there is none. */
function findLine(rows: readonly DatasetRow[], thing: ToPlace): LineForPlace | string {
  const name = structureWords(thing.structure);
  const question = questionFor(thing);
  if (question === null) return `The register keeps no line for the ${name}.`;
  const y = thing.structureMassG;
  const x = question.x === 'neurons' ? thing.neurons : (thing.bodyMassG ?? null);
  if (y === null || !(y > 0)) return `The mass of the ${name} is not known.`;
  if (x === null || !(x > 0)) return question.x === 'neurons' ? `The neurons of the ${name} are not known.` : 'The body mass of the same animals is not known.';
  const { points, definitions } = speciesMeansFor(rows, question);
  if (definitions.y !== null && !definitions.y.startsWith(`${thing.definitionVersion} ·`)) return `The line of the ${name} is fitted to another definition of it.`;
  const standing = standingCladeNames.filter((known) => thing.lineage.includes(known)).sort((a, b) => thing.lineage.indexOf(b) - thing.lineage.indexOf(a));
  for (const known of standing) {
    const others = points.filter((point) => point.slug !== thing.taxonSlug && point.lineage.includes(known));
    if (others.length >= leastStandingSpecies) {
      return { question, clade: { slug: known.toLowerCase(), name: known }, others, point: { id: thing.taxonSlug, x, y } };
    }
  }
  const clade = standing[0] ?? thing.lineage.at(-1) ?? 'its clade';
  return `Fewer than ${leastStandingSpecies} other species of ${clade} hold mass and ${question.x === 'neurons' ? 'neurons' : 'body mass'} of the ${name}.`;
}

/**
 * Place of a record or species against its clade's line, fitted without its species by least squares on log10.
 * @param rows the dataset that gives the line
 * @param thing what is placed; a single specimen's interval takes in the variance within species where it is known
 * @returns the ratio to the line with the 95 % prediction interval of the ratio, or the reason why there is none
 */
export function placeRecord(rows: readonly DatasetRow[], thing: ToPlace): PlaceFound {
  const line = findLine(rows, thing);
  if (typeof line === 'string') return { place: null, noPlace: line };
  const { question, clade, others, point } = line;
  const within = thing.isSingleSpecimen ? withinSpeciesVariance(rows, thing.structure, thing.definitionVersion, question.y) : null;
  const placed = placeOnLine(point, others.map(toFitPoint(clade.slug)), { level, withinSpeciesVariance: within?.variance ?? null });
  if (placed.kind === 'unfit') return { place: null, noPlace: placed.unfit.message };
  const { ratio, lowerRatio, upperRatio, inside, extrapolated, n } = placed;
  if (ratio === null || lowerRatio === null || upperRatio === null) return { place: null, noPlace: 'The line gives no number here.' };
  const sentences = [
    `${ratioSentence({ ratio, inside, level })} of ${n} other ${clade.name}.`,
    extrapolated ? `Its ${question.x === 'neurons' ? 'neurons lie' : 'body mass lies'} outside the range of the species fitted.` : '',
    thing.isSingleSpecimen && within === null ? 'The interval lacks the variance within species: no species has two specimens.' : '',
    within === null ? '' : `The interval takes in the variance between specimens of ${within.species.join(', ')}.`,
  ];
  return {
    place: {
      clade: clade.slug,
      cladeName: clade.name,
      fit: standingFitSlug(question, clade.slug, 'ols'),
      ...question,
      n, ratio, lowerRatio, upperRatio, inside, extrapolated, level,
      sentence: sentences.filter((sentence) => sentence !== '').join(' '),
    },
    noPlace: null,
  };
}

/**
 * What the check for a unit slip needs of the line: the place of an entry against the line without its species.
 * @param path path of the entry in its content, for example `structures.0`
 * @returns null where the entry has no place on a line
 */
export function lineContext(rows: readonly DatasetRow[], thing: ToPlace & { path: string }): LineOfEntry | null {
  const line = findLine(rows, thing);
  if (typeof line === 'string') return null;
  const { question, clade, others, point } = line;
  const within = thing.isSingleSpecimen ? withinSpeciesVariance(rows, thing.structure, thing.definitionVersion, question.y) : null;
  return lineOfEntry({ path: thing.path, cladeName: clade.name, ...question }, point, others.map(toFitPoint(clade.slug)), within?.variance ?? null);
}
