import type { AxisQuestion, LeftOut, MeanContribution, MeanInput, PairQuestion, SpeciesMean, SpeciesMeans } from './meanInput';
import { unitsOfSource, type MeanUnit } from './meanUnits';

interface SourceMean {
  sourceKey: string;
  units: MeanUnit[];
  shares: number[];
  log10X: number;
  log10Y: number;
  n: number | null;
  year: number | null;
}

/** Weights that sum to 1: by animals, or equal where any number is unknown. */
function weightsOf(counts: readonly (number | null)[]): { weights: number[]; kind: 'animals' | 'equal' } {
  const known = counts.filter((n): n is number => n !== null && n > 0);
  if (known.length < counts.length) return { weights: counts.map(() => 1 / counts.length), kind: 'equal' };
  const total = known.reduce((sum, n) => sum + n, 0);
  return { weights: known.map((n) => n / total), kind: 'animals' };
}

function totalOf(counts: readonly (number | null)[]): number | null {
  return counts.reduce<number | null>((sum, n) => (sum === null || n === null ? null : sum + n), 0);
}

function meanOfSource(units: MeanUnit[]): SourceMean {
  const { weights } = weightsOf(units.map((unit) => unit.n));
  const mean = (pick: (unit: MeanUnit) => number) => units.reduce((sum, unit, i) => sum + (weights[i] ?? 0) * Math.log10(pick(unit)), 0);
  const years = units.flatMap((unit) => unit.xRecords.flatMap((record) => record.year ?? []));
  return {
    sourceKey: units[0]?.sourceKey ?? '',
    units, shares: weights,
    log10X: mean((unit) => unit.x), log10Y: mean((unit) => unit.y),
    n: totalOf(units.map((unit) => unit.n)),
    year: years.length === 0 ? null : Math.max(...years),
  };
}

/** Whether two sources hold some of the same animals, said by either. */
function shareAnimals(a: SourceMean, b: SourceMean): boolean {
  const says = (one: SourceMean, other: SourceMean) =>
    one.units.some((unit) => [...unit.xRecords, ...unit.yRecords].some((record) =>
      record.sharesAnimalsWith.some((entry) => entry.sourceKey === other.sourceKey && entry.overlap !== 'none')));
  return says(a, b) || says(b, a);
}

/** Most animals first (unknown last), then the later, then by key so that the order of the input does not matter. */
function byStanding(a: SourceMean, b: SourceMean): number {
  return (b.n ?? -1) - (a.n ?? -1) || (b.year ?? -Infinity) - (a.year ?? -Infinity) || (a.sourceKey < b.sourceKey ? -1 : 1);
}

function independentSources(sources: readonly SourceMean[], leftOut: LeftOut[]): SourceMean[] {
  const kept: SourceMean[] = [];
  for (const source of [...sources].sort(byStanding)) {
    const holder = kept.find((other) => shareAnimals(source, other));
    if (holder === undefined) kept.push(source);
    else leaveOut(source.units, `The source shares animals with ${holder.sourceKey}, of which more animals, or later values, enter.`, leftOut);
  }
  return kept.sort((a, b) => (a.sourceKey < b.sourceKey ? -1 : 1));
}

function leaveOut(units: readonly MeanUnit[], reason: string, leftOut: LeftOut[]): void {
  for (const unit of units) {
    for (const record of new Set([...unit.xRecords, ...unit.yRecords])) leftOut.push({ taxonSlug: unit.taxonSlug, recordNumber: record.recordNumber, reason });
  }
}

function contributionsOf(source: SourceMean, weight: number): MeanContribution[] {
  return source.units.flatMap((unit, i) =>
    [...new Set([...unit.xRecords, ...unit.yRecords])].map((record) => {
      const [onX, onY] = [unit.xRecords.includes(record), unit.yRecords.includes(record)];
      return {
        recordNumber: record.recordNumber,
        axis: onX && onY ? ('both' as const) : onX ? ('x' as const) : ('y' as const),
        sourceKey: unit.sourceKey, specimenKey: unit.specimenKey, n: unit.n,
        weight: weight * (source.shares[i] ?? 0), x: unit.x, y: unit.y,
      };
    }),
  );
}

function marksOf(records: readonly MeanInput[]): string[] {
  const names = [['domestic', 'domestic'], ['strain', 'strain'], ['hybrid', 'hybrid'], ['genusLevel', 'name at genus level'], ['demonstration', 'demonstration']] as const;
  return names.filter(([key]) => records.some((record) => record.marks?.[key] === true)).map(([, name]) => name);
}

function distinct(texts: readonly (string | null | undefined)[]): string[] {
  return [...new Set(texts.filter((text): text is string => text !== null && text !== undefined && text !== ''))].sort();
}

function meanOfSpecies(units: readonly MeanUnit[], leftOut: LeftOut[]): SpeciesMean {
  const bySource = new Map<string, MeanUnit[]>();
  for (const unit of units) bySource.set(unit.sourceKey, [...(bySource.get(unit.sourceKey) ?? []), unit]);
  const sources = independentSources([...bySource.values()].map(meanOfSource), leftOut);
  const { weights, kind } = weightsOf(sources.map((source) => source.n));
  const log10 = (pick: (source: SourceMean) => number) => sources.reduce((sum, source, i) => sum + (weights[i] ?? 0) * pick(source), 0);
  const used = sources.flatMap((source) => source.units);
  const records = used.flatMap((unit) => [...unit.xRecords, ...unit.yRecords]);
  const [only] = used;
  const single = used.length === 1 && only !== undefined ? only : null;
  return {
    taxonSlug: records[0]?.taxonSlug ?? '',
    speciesName: records[0]?.speciesName ?? '',
    // One unit alone is its own mean: no rounding by way of logarithms.
    x: single ? single.x : 10 ** log10((source) => source.log10X),
    y: single ? single.y : 10 ** log10((source) => source.log10Y),
    contributions: sources.flatMap((source, i) => contributionsOf(source, weights[i] ?? 0)),
    sources: sources.length,
    n: totalOf(sources.map((source) => source.n)),
    weighting: kind,
    isSingleSpecimen: single !== null && single.specimenKey !== null && single.n === 1,
    marks: marksOf(records),
    massStates: distinct(records.map((record) => record.massState)),
    countingMethods: distinct(records.map((record) => record.countingMethod)),
    delineations: distinct(records.map((record) => record.delineation)),
  };
}

function definitionKey(record: MeanInput): string {
  return `${record.definitionVersion} · ${record.composition}`;
}

/** Keeps records of one definition of the axis' structure: the one asked for, else the one of most species. */
function ofOneDefinition(records: readonly MeanInput[], axis: AxisQuestion, leftOut: LeftOut[]): { kept: MeanInput[]; definition: string | null } {
  if (axis.structure === null) return { kept: [...records], definition: null };
  const own = records.filter((record) => record.structure === axis.structure);
  const matches = own.filter((record) =>
    (axis.definitionVersion === undefined || String(record.definitionVersion) === String(axis.definitionVersion)) &&
    (axis.composition === undefined || record.composition === axis.composition));
  const species = new Map<string, Set<string>>();
  for (const record of matches) species.set(definitionKey(record), (species.get(definitionKey(record)) ?? new Set()).add(record.taxonSlug));
  const [definition = null] = [...species.entries()].sort((a, b) => b[1].size - a[1].size || (a[0] < b[0] ? 1 : -1)).map(([key]) => key);
  const ofDefinition = new Set(matches.filter((record) => definitionKey(record) === definition));
  const isKept = (record: MeanInput) => record.structure !== axis.structure || ofDefinition.has(record);
  for (const record of own.filter((candidate) => !isKept(candidate))) {
    leftOut.push({ taxonSlug: record.taxonSlug, recordNumber: record.recordNumber, reason: 'The structure is defined or composed otherwise.' });
  }
  return { kept: records.filter(isKept), definition };
}

/**
 * Species' means for one pair of variables and structures, with what was left out and why.
 *
 * Steps: records of unnamed species and of another definition or composition are left out; sources that
 * hold both values of the same animals are kept (a body mass is that of the record of the other axis, never
 * borrowed from another source); what is set aside for the pair is left out; of sources that share animals
 * (same, partly, unknown) the one with most animals enters, the later on a tie; within a source specimens
 * give a geometric mean, parts summed first, and means of a publication enter as printed; over independent
 * sources the geometric mean is weighted by animals, or equally where any number is unknown. A species all
 * of whose usable records are set aside is given with its value and reason.
 *
 * Output sorted by taxon; the same for any order of the input. Throws RangeError where neither axis names
 * a structure, or a structure is missing for a variable other than body mass.
 */
export function formSpeciesMeans(records: readonly MeanInput[], pair: PairQuestion): SpeciesMeans {
  for (const axis of [pair.x, pair.y]) {
    if ((axis.structure === null) !== (axis.variable === 'bodyMassG')) {
      throw new RangeError('Body mass belongs to no structure, every other variable to one.');
    }
  }
  if (pair.x.structure === null && pair.y.structure === null) throw new RangeError('A pair needs a variable of a structure.');

  const leftOut: LeftOut[] = [];
  const ordered = [...records].sort((a, b) => (a.recordNumber < b.recordNumber ? -1 : 1));
  const named = ordered.filter((record) => {
    if (record.speciesName.trim() !== '' && record.taxonSlug !== '') return true;
    leftOut.push({ taxonSlug: record.taxonSlug, recordNumber: record.recordNumber, reason: 'An unnamed species enters no fit.' });
    return false;
  });
  const onX = ofOneDefinition(named, pair.x, leftOut);
  const onBoth = pair.y.structure === pair.x.structure ? onX : ofOneDefinition(onX.kept, pair.y, leftOut);

  const groups = new Map<string, MeanInput[]>();
  for (const record of onBoth.kept) {
    const key = JSON.stringify([record.taxonSlug, record.sourceKey]);
    groups.set(key, [...(groups.get(key) ?? []), record]);
  }
  const byTaxon = new Map<string, MeanUnit[]>();
  for (const group of groups.values()) {
    for (const unit of unitsOfSource(group, pair, leftOut)) byTaxon.set(unit.taxonSlug, [...(byTaxon.get(unit.taxonSlug) ?? []), unit]);
  }

  const means = [...byTaxon.values()].map((units) => {
    const inForce = units.filter((unit) => unit.setAsideReason === null);
    for (const unit of units) if (unit.setAsideReason !== null) leaveOut([unit], `Set aside: ${unit.setAsideReason}`, leftOut);
    if (inForce.length > 0) return meanOfSpecies(inForce, leftOut);
    return { ...meanOfSpecies(units, leftOut), setAside: units[0]?.setAsideReason ?? '' };
  });
  means.sort((a, b) => (a.taxonSlug < b.taxonSlug ? -1 : 1));
  return { means, leftOut, definitions: { x: onX.definition, y: pair.y.structure === null ? null : onBoth.definition }, emptyReason: emptyReasonOf(named, means, pair) };
}

function emptyReasonOf(records: readonly MeanInput[], means: readonly SpeciesMean[], pair: PairQuestion): string | null {
  if (means.length > 0) return null;
  const holds = (axis: AxisQuestion) => records.some((record) => (axis.structure === null || record.structure === axis.structure) && record.values[axis.variable] !== null);
  if (!holds(pair.x)) return 'No record holds the variable on x.';
  if (!holds(pair.y)) return 'No record holds the variable on y.';
  return 'No source holds both values of the same animals; a value is never borrowed from another source.';
}

/** Species' means for a pair, as `formSpeciesMeans`, without what was left out. */
export function speciesMeans(records: readonly MeanInput[], pair: PairQuestion): SpeciesMean[] {
  return formSpeciesMeans(records, pair).means;
}
