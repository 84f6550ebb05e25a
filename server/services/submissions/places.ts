import type { SubmissionContent } from '../../../shared/contracts/content';
import type { DerivedStructure } from '../../../shared/contracts/submissions';
import type { LineOfEntry } from '../../../shared/domain/checks/context';
import { readLiteratureValue } from '../../../shared/domain/literatureReading';
import { parseMassG } from '../../../shared/domain/units';
import { lineContext, placeRecord, type ToPlace } from '../dataset/places';
import type { DatasetRow } from '../dataset/rows';
import type { ContentVocabulary } from './vocabulary';

/** The dataset whose lines entries are placed on. */
export interface PlacingSet {
  rows: readonly DatasetRow[];
}

/** Entries placed at once; a long table of a source is placed row by row on its records' pages instead. */
const mostPlaced = 40;

export interface Placed {
  places: Pick<DerivedStructure, 'place' | 'noPlace'>[];
  lines: LineOfEntry[];
}

const withoutPlace = (reason: string | null) => ({ place: null, noPlace: reason });

function entriesOf(content: SubmissionContent): { path: string; taxon: string; definitionVersion: number; bodyMassG: number | null; isSingle: boolean }[] {
  if (content.kind === 'specimen') {
    const bodyMassG = parseMassG(content.specimen.bodyMass).value;
    return content.structures.map(({ definitionVersion, samples }, i) => ({ path: `structures.${i}`, taxon: content.specimen.taxon, definitionVersion, bodyMassG, isSingle: samples.every(({ pooledWith }) => pooledWith.every((code) => code.trim() === '')) }));
  }
  return content.values.map((entry, i) => ({ path: `values.${i}`, taxon: entry.taxon, definitionVersion: entry.definitionVersion, bodyMassG: readLiteratureValue(entry, '').bodyMassG.value, isSingle: false }));
}

/**
 * Places each structure (or row of a source) on its clade's line, fitted without its species.
 *
 * @param derived derived values in the order of the content
 * @param placing the dataset that gives the lines; null where there is none yet
 * @returns one place or reason per entry, and the lines that the check for a unit slip needs
 */
export function placeEntries(content: SubmissionContent, derived: readonly Omit<DerivedStructure, 'place' | 'noPlace'>[], vocabulary: ContentVocabulary, placing: PlacingSet | null): Placed {
  const entries = entriesOf(content);
  if (placing === null) return { places: entries.map(() => withoutPlace('The register has no version yet to give a line.')), lines: [] };
  if (entries.length > mostPlaced) return { places: entries.map(() => withoutPlace('A long table is not placed row by row here; each record’s page shows its place.')), lines: [] };
  const lines: LineOfEntry[] = [];
  const places = entries.map(({ path, taxon: slug, definitionVersion, bodyMassG, isSingle }, i) => {
    const values = derived[i];
    const taxon = vocabulary.taxa.get(slug);
    if (values === undefined || taxon === undefined) return withoutPlace('Choose the species to see its place.');
    if (values.structure === '') return withoutPlace('Choose the structure to see its place.');
    const { structure, structureMassG, neurons } = values;
    const thing: ToPlace = {
      taxonSlug: taxon.slug,
      lineage: taxon.lineage.map((node) => node.name),
      structure,
      definitionVersion,
      structureMassG,
      neurons: neurons.value,
      bodyMassG,
      isSingleSpecimen: isSingle,
    };
    const line = lineContext(placing.rows, { ...thing, path });
    if (line !== null) lines.push(line);
    return placeRecord(placing.rows, thing);
  });
  return { places, lines };
}
