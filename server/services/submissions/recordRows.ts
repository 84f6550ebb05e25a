import type { DefinedStructure, TaxonInPlace } from '../../../db/queries/recordVocabulary';
import type { StoredRow } from '../../../db/queries/records';
import type { LiteratureContent, LiteratureValueEntry, SampleEntry, SpecimenContent, SubmissionContent } from '../../../shared/contracts/content';
import { finiteOrNull } from '../../../shared/domain/quantity';
import { readLiteratureValue, type ReadLiteratureNumber } from '../../../shared/domain/literatureReading';
import { readSpecimen } from '../../../shared/domain/specimenReading';
import { parseMassG } from '../../../shared/domain/units';
import { AppError } from '../../errors';
import type { ContentVocabulary } from './vocabulary';

/** What a row says of its source and of its submission, beside the values themselves. */
export interface RowFrame {
  source: { key: string; citation: string; doi: string | null; year: number | null };
  sharesAnimalsWith: StoredRow['sharesAnimalsWith'];
  lab: string | null;
  contributors: StoredRow['contributors'];
  demonstration: boolean;
  approvedAt: string;
  approvedBy: string;
}

/** A row without number and revision, which the register gives. */
export interface RowDraft {
  entryId: string;
  taxon: TaxonInPlace;
  structure: DefinedStructure;
  row: Omit<StoredRow, 'number' | 'revision'>;
}

/** What a structure includes and excludes, in words; the same words for the same definition. */
export function compositionInWords(structure: DefinedStructure, version: number): string {
  const definition = structure.definitions.find((known) => known.version === version);
  if (definition === undefined) return '';
  const parts = [
    ...(definition.includes.length > 0 ? [`includes ${definition.includes.join(', ')}`] : []),
    ...(definition.excludes.length > 0 ? [`excludes ${definition.excludes.join(', ')}`] : []),
  ];
  return parts.join('; ');
}

function approvalInWords({ provenance }: SubmissionContent): string {
  if (provenance.approvalKind === null) return '';
  const kind = provenance.approvalKind === 'see-source' ? 'see source' : provenance.approvalKind;
  return [kind, provenance.approvalText.trim()].filter((text) => text !== '').join(': ') + (provenance.permits.trim() === '' ? '' : `; permits: ${provenance.permits.trim()}`);
}

function scaledUpInWords(samples: readonly SampleEntry[]): string {
  const words = samples.flatMap(({ label, side, scaleUp }, i) => {
    if (scaleUp.kind === 'none') return [];
    const name = label.trim() === '' ? `sample ${i + 1}` : label.trim();
    if (scaleUp.kind === 'other-side') return [`${name === `${side} side` ? name : `${name}: ${side ?? 'one'} side`}, × 2 for the other side`];
    return [`${name}: × ${scaleUp.factor.trim()} (${scaleUp.kind === 'mass-fraction' ? 'fraction of the mass' : 'series of slabs'})`];
  });
  return words.join('; ');
}

function commonOf(taxon: TaxonInPlace, structure: DefinedStructure, definitionVersion: number, content: SubmissionContent, frame: RowFrame) {
  return {
    taxonSlug: taxon.slug,
    species: taxon.name,
    named: taxon.named,
    lineage: taxon.lineage.map((node) => node.name),
    demonstration: frame.demonstration || taxon.demonstration,
    structure: structure.key,
    definitionVersion,
    composition: compositionInWords(structure, definitionVersion),
    sourceKey: frame.source.key,
    sourceCitation: frame.source.citation,
    sourceDoi: frame.source.doi,
    sourceYear: frame.source.year,
    sharesAnimalsWith: frame.sharesAnimalsWith,
    lab: frame.lab,
    contributors: frame.contributors,
    approval: approvalInWords(content),
    approvedAt: frame.approvedAt,
    approvedBy: frame.approvedBy,
  };
}

function known(vocabulary: ContentVocabulary, slug: string, key: string): { taxon: TaxonInPlace; structure: DefinedStructure } {
  const taxon = vocabulary.taxa.get(slug);
  const structure = vocabulary.structures.get(key);
  if (taxon === undefined || structure === undefined) throw new AppError('wrong-state', `${taxon === undefined ? `The taxon ${slug}` : `The structure ${key}`} is no longer in the register's vocabularies.`);
  return { taxon, structure };
}

function rowsOfSpecimen(content: SpecimenContent, vocabulary: ContentVocabulary, frame: RowFrame): RowDraft[] {
  const { specimen } = content;
  const bodyMassG = parseMassG(specimen.bodyMass).value;
  return readSpecimen(content).map(({ structureMassG, estimate }, i) => {
    const entry = content.structures[i]!;
    const { taxon, structure } = known(vocabulary, specimen.taxon, entry.structure);
    const pooledWith = [...new Set(entry.samples.flatMap((sample) => sample.pooledWith.map((code) => code.trim())))].filter((code) => code !== '');
    return {
      entryId: entry.id,
      taxon,
      structure,
      row: {
        ...commonOf(taxon, structure, entry.definitionVersion, content, frame),
        kind: 'specimen',
        nameAsEntered: specimen.nameAsEntered.trim(),
        qualifier: specimen.qualifier,
        origin: specimen.origin ?? 'unknown',
        delineation: entry.delineation,
        specimen: specimen.code.trim(),
        pooledWith,
        sex: specimen.sex ?? 'unknown',
        ageClass: specimen.ageClass ?? 'unknown',
        sourcePlace: '',
        n: 1 + pooledWith.length,
        centre: pooledWith.length === 0 ? 'single' : 'arithmetic',
        spreadKind: 'SE',
        bodyMassG,
        bodyMassError: null,
        bodyMassKind: specimen.bodyMassKind ?? 'unknown',
        structureMassG,
        structureMassError: null,
        cells: estimate.cells.value,
        cellsError: estimate.cells.standardError,
        neurons: estimate.neurons.value,
        neuronsError: estimate.neurons.standardError,
        otherCells: estimate.otherCells.value,
        otherCellsError: estimate.otherCells.standardError,
        cellsPerMg: estimate.cellsPerMg.value,
        neuronsPerMg: estimate.neuronsPerMg.value,
        otherToNeuronRatio: estimate.otherToNeuronRatio,
        massState: content.massState ?? 'unknown',
        fixation: content.fixation ?? 'unknown',
        method: content.method ?? 'other',
        scaledUp: scaledUpInWords(entry.samples),
        printedDifferently: '',
        note: [entry.note.trim(), content.note.trim()].filter((text) => text !== '').join(' '),
      },
    };
  });
}

const counts = ['neurons', 'cells', 'otherCells', 'structureMass', 'bodyMass'] as const;

/** The number whose kind of centre and spread stands for the row: the first given of neurons, cells, other cells, masses. */
function leadingNumber(entry: LiteratureValueEntry) {
  return entry[counts.find((field) => entry[field].text.trim() !== '') ?? 'structureMass'];
}

/** Cells, or other cells, that follow from the two printed beside them, where both are means of the same animals. */
function derivedCounts(entry: LiteratureValueEntry, read: { cells: ReadLiteratureNumber; neurons: ReadLiteratureNumber; otherCells: ReadLiteratureNumber }) {
  const agree = (one: 'cells' | 'neurons' | 'otherCells', other: 'cells' | 'neurons' | 'otherCells') => entry[one].centre === entry[other].centre && entry[one].n === entry[other].n;
  const [cells, neurons, otherCells] = [read.cells.value, read.neurons.value, read.otherCells.value];
  // A sum of arithmetic means is the mean of the sums; that of medians or geometric means is nothing printed anywhere.
  const adds = ['arithmetic', 'single', 'not-stated'].includes(entry.neurons.centre);
  return {
    cells: cells ?? (adds && neurons !== null && otherCells !== null && agree('neurons', 'otherCells') ? neurons + otherCells : null),
    otherCells: otherCells ?? (adds && cells !== null && neurons !== null && cells >= neurons && agree('cells', 'neurons') ? cells - neurons : null),
  };
}

function perMg(count: number | null, massG: number | null): number | null {
  return count === null || massG === null || massG <= 0 ? null : finiteOrNull(count / (massG * 1000));
}

function rowsOfLiterature(content: LiteratureContent, vocabulary: ContentVocabulary, frame: RowFrame): RowDraft[] {
  return content.values.map((entry, i) => {
    const read = readLiteratureValue(entry, `values.${i}`);
    const { taxon, structure } = known(vocabulary, entry.taxon, entry.structure);
    const lead = leadingNumber(entry);
    const { cells, otherCells } = derivedCounts(entry, read);
    const neurons = read.neurons.value;
    const massG = read.structureMassG.value;
    const n = [read.neurons.n, read.cells.n, read.otherCells.n, read.structureMassG.n].find((number) => number !== null) ?? null;
    return {
      entryId: entry.id,
      taxon,
      structure,
      row: {
        ...commonOf(taxon, structure, entry.definitionVersion, content, frame),
        kind: 'literature',
        nameAsEntered: entry.nameAsEntered.trim(),
        qualifier: entry.qualifier,
        origin: entry.origin ?? 'unknown',
        delineation: [],
        specimen: null,
        pooledWith: [],
        sex: 'unknown',
        ageClass: 'unknown',
        sourcePlace: entry.place.trim(),
        n,
        centre: lead.centre,
        spreadKind: lead.spreadKind,
        bodyMassG: read.bodyMassG.value,
        bodyMassError: read.bodyMassG.spread,
        bodyMassKind: read.bodyMassG.value === null ? 'unknown' : 'literature',
        structureMassG: massG,
        structureMassError: read.structureMassG.spread,
        cells,
        cellsError: read.cells.spread,
        neurons,
        neuronsError: read.neurons.spread,
        otherCells,
        otherCellsError: read.otherCells.spread,
        cellsPerMg: perMg(cells, massG),
        neuronsPerMg: perMg(neurons, massG),
        otherToNeuronRatio: neurons === null || neurons === 0 || otherCells === null ? null : finiteOrNull(otherCells / neurons),
        massState: entry.massState ?? 'unknown',
        fixation: 'unknown',
        method: entry.method ?? 'other',
        scaledUp: '',
        printedDifferently: entry.printedDifferently.trim(),
        note: entry.note.trim(),
      },
    };
  });
}

/**
 * The rows of the dataset that a content stands for: one per structure of a specimen, one per value of a source.
 *
 * Masses in g; counts scaled up to the whole structure, for one animal; per-mg values those of the tissue counted.
 * Of a source, cells (or other cells) that are not printed are the sum (difference) of the two others where these are
 * means of the same animals, without an error of their own; per-mg values are the ratio of the printed means.
 * @throws wrong-state where a taxon or structure has left the vocabularies since submission
 */
export function recordRowsOf(content: SubmissionContent, vocabulary: ContentVocabulary, frame: RowFrame): RowDraft[] {
  return content.kind === 'specimen' ? rowsOfSpecimen(content, vocabulary, frame) : rowsOfLiterature(content, vocabulary, frame);
}
