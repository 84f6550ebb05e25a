import type { Variable } from '../contracts/vocabulary';
import type { AxisQuestion, LeftOut, MeanInput, PairQuestion, SetAsideScope } from './meanInput';

/** The same animals with both values: one specimen, or one mean of a publication. */
export interface MeanUnit {
  taxonSlug: string;
  sourceKey: string;
  specimenKey: string | null;
  x: number;
  y: number;
  n: number | null;
  xRecords: readonly MeanInput[];
  yRecords: readonly MeanInput[];
  setAsideReason: string | null;
}

const SUMMED: readonly Variable[] = ['structureMassG', 'cells', 'neurons', 'otherCells'];

function matchesPair(scope: SetAsideScope, pair: PairQuestion): boolean {
  if (scope === 'all') return true;
  const isAxis = (variable: Variable, structure: string | null | undefined, axis: AxisQuestion) =>
    variable === axis.variable && (structure === null || structure === undefined || structure === axis.structure);
  return (
    (isAxis(scope.x, scope.xStructure, pair.x) && isAxis(scope.y, scope.yStructure, pair.y)) ||
    (isAxis(scope.x, scope.xStructure, pair.y) && isAxis(scope.y, scope.yStructure, pair.x))
  );
}

/** Why a record is left out of this pair, either variable on x; null where it is not. */
export function setAsideReason(record: MeanInput, pair: PairQuestion): string | null {
  return record.setAside.find((entry) => matchesPair(entry.scope, pair))?.reason ?? null;
}

/** Value of a variable over the parts of one specimen: masses and counts add, densities and ratios follow from the sums. */
function valueOver(records: readonly MeanInput[], variable: Variable): number | null {
  const first = records[0];
  if (first === undefined) return null;
  if (records.length === 1 || variable === 'bodyMassG') return first.values[variable];
  const sumOf = (pick: (record: MeanInput) => number | null): number | null =>
    records.reduce<number | null>((sum, record) => {
      const value = pick(record);
      return sum === null || value === null ? null : sum + value;
    }, 0);
  if (SUMMED.includes(variable)) return sumOf((record) => record.values[variable]);
  if (variable === 'otherToNeuronRatio') {
    const [others, neurons] = [sumOf((record) => record.values.otherCells), sumOf((record) => record.values.neurons)];
    return others === null || neurons === null ? null : others / neurons;
  }
  // A density over parts is that of their tissue together: weighted by mass.
  const mass = sumOf((record) => record.values.structureMassG);
  const weighted = sumOf((record) => {
    const [density, own] = [record.values[variable], record.values.structureMassG];
    return density === null || own === null ? null : density * own;
  });
  return mass === null || weighted === null ? null : weighted / mass;
}

function fewestAnimals(records: readonly MeanInput[]): number | null {
  const counts = records.map((record) => record.n);
  return counts.some((n) => n === null) ? null : Math.min(...counts.map((n) => n ?? 0));
}

/**
 * Forms the units of one source and taxon: groups its records by animal (a specimen, or the publication's
 * mean) and keeps those that hold both values, above zero.
 *
 * Rows of a publication that stand for one structure more than once pair only within themselves: whether
 * a second row is of the same animals as a row of another structure is not known.
 */
export function unitsOfSource(records: readonly MeanInput[], pair: PairQuestion, leftOut: LeftOut[]): MeanUnit[] {
  const byAnimal = new Map<string, MeanInput[]>();
  for (const record of records) {
    const key = record.specimenKey ?? '';
    byAnimal.set(key, [...(byAnimal.get(key) ?? []), record]);
  }
  return [...byAnimal.entries()].flatMap(([key, own]) => {
    const xRecords = recordsOfAxis(own, pair.x, pair.y);
    const yRecords = recordsOfAxis(own, pair.y, pair.x);
    if (xRecords.length === 0 || yRecords.length === 0) return [];
    const isRepeated = key === '' && (xRecords.length > 1 || yRecords.length > 1);
    if (!isRepeated) return unitOf(xRecords, yRecords, pair, leftOut);
    if (xRecords.some((record) => !yRecords.includes(record))) {
      for (const record of new Set([...xRecords, ...yRecords])) {
        leftOut.push({ taxonSlug: record.taxonSlug, recordNumber: record.recordNumber, reason: 'The source gives this structure more than once, and not which rows are of the same animals.' });
      }
      return [];
    }
    return xRecords.flatMap((record) => unitOf([record], [record], pair, leftOut));
  });
}

/** Records that carry an axis: of its structure, or, for body mass, those of the other axis that state it. */
function recordsOfAxis(records: readonly MeanInput[], axis: AxisQuestion, other: AxisQuestion): MeanInput[] {
  const structure = axis.structure ?? other.structure;
  return records.filter((record) => record.structure === structure && record.values[axis.variable] !== null);
}

function unitOf(xRecords: readonly MeanInput[], yRecords: readonly MeanInput[], pair: PairQuestion, leftOut: LeftOut[]): MeanUnit[] {
  const records = [...new Set([...xRecords, ...yRecords])];
  const first = records[0];
  const x = valueOver(xRecords, pair.x.variable);
  const y = valueOver(yRecords, pair.y.variable);
  if (first === undefined || x === null || y === null) return [];
  if (!(x > 0 && y > 0 && Number.isFinite(x) && Number.isFinite(y))) {
    for (const record of records) leftOut.push({ taxonSlug: record.taxonSlug, recordNumber: record.recordNumber, reason: 'A value of zero has no logarithm.' });
    return [];
  }
  const reasons = records.flatMap((record) => setAsideReason(record, pair) ?? []);
  return [
    {
      taxonSlug: first.taxonSlug, sourceKey: first.sourceKey, specimenKey: first.specimenKey, x, y,
      n: fewestAnimals(records), xRecords, yRecords, setAsideReason: reasons[0] ?? null,
    },
  ];
}
