import type { RecordRow } from '../../../shared/contracts/records';
import type { LeftOut, MeanInput, PairQuestion, SetAsideScope as MeanScope, SpeciesMean } from '../../../shared/domain/meanInput';
import { isGenusLevel } from '../../../shared/domain/identifiers';
import { formSpeciesMeans } from '../../../shared/domain/speciesMean';
import type { Question } from './questions';
import type { DatasetRow } from './rows';

/** One species' mean with its place in the classification and the rows behind it. */
export interface MeanPoint {
  slug: string;
  species: string;
  lineage: readonly string[];
  x: number;
  y: number;
  n: number | null;
  marks: string[];
  demonstration: boolean;
  isSingleSpecimen: boolean;
  contributions: { record: string; weight: number; source: string }[];
  massStates: string[];
  countingMethods: string[];
  delineations: string[];
  rows: readonly RecordRow[];
  /** Reason, where every record of the species is set aside for the pair. */
  setAside: string | null;
}

export interface SpeciesMeans {
  /** Species that enter the fit, by slug. */
  points: MeanPoint[];
  /** Species that hold both values and are set aside: listed and drawn hollow, never fitted. */
  aside: MeanPoint[];
  leftOut: LeftOut[];
  /** Definition of the structures that was taken, `version · composition`; null for body mass. */
  definitions: { x: string | null; y: string | null };
  /** Why there is no mean at all; null where there is one. */
  emptyReason: string | null;
}

function toMeanScope(scope: RecordRow['setAside'][number]['scope']): MeanScope {
  if (scope === 'all') return 'all';
  return { x: scope.a.variable, xStructure: scope.a.structure, y: scope.b.variable, yStructure: scope.b.structure };
}

function specimenKey(row: RecordRow): string | null {
  if (row.kind === 'literature') return null;
  return [row.specimen ?? row.number, ...row.pooledWith].sort().join(' + ');
}


const isMarkedGenusLevel = (row: RecordRow): boolean => row.qualifier === 'sp.' || isGenusLevel(row.species);

function toMeanInput(row: RecordRow): MeanInput {
  return {
    recordNumber: row.number,
    taxonSlug: row.taxonSlug,
    // What enters no mean is known to formSpeciesMeans by an empty name.
    speciesName: row.named || isMarkedGenusLevel(row) ? row.species : '',
    marks: { domestic: row.origin === 'domestic', strain: row.origin === 'strain', hybrid: row.qualifier === 'hybrid', genusLevel: isMarkedGenusLevel(row), demonstration: row.demonstration },
    sourceKey: row.sourceKey,
    sourceKind: row.kind,
    specimenKey: specimenKey(row),
    n: row.n,
    structure: row.structure,
    definitionVersion: row.definitionVersion,
    composition: row.composition,
    values: {
      bodyMassG: row.bodyMassG,
      structureMassG: row.structureMassG,
      cells: row.cells,
      neurons: row.neurons,
      otherCells: row.otherCells,
      neuronsPerMg: row.neuronsPerMg,
      cellsPerMg: row.cellsPerMg,
      otherToNeuronRatio: row.otherToNeuronRatio,
    },
    setAside: row.setAside.map(({ scope, reason }) => ({ scope: toMeanScope(scope), reason })),
    sharesAnimalsWith: row.sharesAnimalsWith.map(({ source, overlap }) => ({ sourceKey: source, overlap })),
    year: row.sourceYear,
    massState: row.massState,
    countingMethod: row.method,
    delineation: row.delineation.length === 0 ? null : [...row.delineation].sort().join(', '),
  };
}

function toMeanPoint(mean: SpeciesMean, byNumber: ReadonlyMap<string, RecordRow>): MeanPoint {
  const rows = [...new Set(mean.contributions.map(({ recordNumber }) => recordNumber))].flatMap((number) => byNumber.get(number) ?? []);
  return {
    slug: mean.taxonSlug,
    species: mean.speciesName,
    lineage: rows[0]?.lineage ?? [],
    x: mean.x,
    y: mean.y,
    n: mean.n,
    marks: mean.marks,
    demonstration: rows.some((row) => row.demonstration),
    isSingleSpecimen: mean.isSingleSpecimen,
    contributions: mean.contributions.map(({ recordNumber, weight, sourceKey }) => ({ record: recordNumber, weight, source: sourceKey })),
    massStates: mean.massStates,
    countingMethods: mean.countingMethods,
    delineations: mean.delineations,
    rows,
    setAside: mean.setAside ?? null,
  };
}

const pairOf = ({ x, xStructure, y, yStructure }: Question): PairQuestion => ({ x: { variable: x, structure: xStructure }, y: { variable: y, structure: yStructure } });

/** Rows of a version and of a request never change, so their means are formed once. */
const formed = new WeakMap<readonly DatasetRow[], Map<string, SpeciesMeans>>();

/**
 * Species means for one pair of variables and structures, formed anew from rows.
 * @param rows rows of one version or of the working set; g, counts, counts per mg; not changed afterwards
 * @param question the pair; values of two definitions of a structure, and of two structures, are never pooled
 * @returns means that enter a fit, those set aside with their reason, and what was left out, sorted by taxon
 * @throws RangeError where a structure is missing for a variable other than body mass
 */
export function speciesMeansFor(rows: readonly DatasetRow[], question: Question): SpeciesMeans {
  const key = JSON.stringify([question.x, question.xStructure, question.y, question.yStructure]);
  const kept = formed.get(rows) ?? new Map<string, SpeciesMeans>();
  formed.set(rows, kept);
  const means = kept.get(key) ?? formMeans(rows, question);
  kept.set(key, means);
  return means;
}

function formMeans(rows: readonly DatasetRow[], question: Question): SpeciesMeans {
  const byNumber = new Map(rows.map(({ row }) => [row.number, row]));
  const structures = new Set([question.xStructure, question.yStructure]);
  const inputs = rows.flatMap(({ row }) => (structures.has(row.structure) ? [toMeanInput(row)] : []));
  const { means, leftOut, definitions, emptyReason } = formSpeciesMeans(inputs, pairOf(question));
  const all = means.map((mean) => toMeanPoint(mean, byNumber));
  return { points: all.filter((point) => point.setAside === null), aside: all.filter((point) => point.setAside !== null), leftOut, definitions, emptyReason };
}
