import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import Papa from 'papaparse';
import type { DatasetRow } from '../../server/services/dataset/rows';
import { recordNumber, speciesSlug } from '../../shared/domain/identifiers';
import { root } from '../../scripts/paths.mjs';

/** Rows of the dataset made from the published tables in tests/reference, without a database. */

function readReference(name: string): Record<string, string>[] {
  const text = readFileSync(join(root, 'tests', 'reference', name), 'utf8');
  return Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true }).data;
}

const numberOrNull = (text: string | undefined) => (text === undefined || text === '' ? null : Number(text));

let serial = 0;

/** One row; what is not said is a plain literature value of an adult. */
export function makeRow(given: Partial<DatasetRow['row']> & { species: string; structure: string; lineage: string[] }): DatasetRow {
  serial += 1;
  const neurons = given.neurons ?? null;
  const others = given.otherCells ?? null;
  const cells = neurons === null || others === null ? null : neurons + others;
  const massG = given.structureMassG ?? null;
  const perMg = (count: number | null) => (count === null || massG === null ? null : count / (massG * 1000));
  return {
    recordId: `00000000-0000-4000-8000-${String(serial).padStart(12, '0')}`,
    recordRevisionId: `00000000-0000-4000-9000-${String(serial).padStart(12, '0')}`,
    row: {
      number: recordNumber(serial), revision: 1, kind: 'literature',
      taxonSlug: speciesSlug(given.species) ?? '', nameAsEntered: given.species, qualifier: 'none', named: true, origin: 'unknown', demonstration: false,
      definitionVersion: 1, composition: '', delineation: [], specimen: null, pooledWith: [], sex: 'unknown', ageClass: 'adult',
      sourceKey: 'source', sourceCitation: 'Source', sourceDoi: null, sourceYear: null, sourcePlace: '', sharesAnimalsWith: [],
      lab: null, contributors: [], n: null, centre: 'arithmetic', spreadKind: 'SD',
      bodyMassG: null, bodyMassError: null, bodyMassKind: 'unknown', structureMassG: null, structureMassError: null,
      cells, cellsError: null, neurons: null, neuronsError: null, otherCells: null, otherCellsError: null,
      cellsPerMg: perMg(cells), neuronsPerMg: perMg(neurons), otherToNeuronRatio: neurons === null || others === null ? null : others / neurons,
      massState: 'fixed', fixation: 'perfused', method: 'isotropic fractionation, by eye', scaledUp: '', printedDifferently: '', note: '',
      approval: 'see-source', setAside: [], openRecheck: false, approvedAt: '2020-01-01T00:00:00.000Z', approvedBy: 'Register loader (system)',
      ...given,
    },
  };
}

/** Published lineage of a species, names from the root to the parent. */
export function lineageOf(species: string): string[] {
  const found = readReference('classification.csv').find((row) => row['species'] === species);
  if (found?.['lineage'] === undefined) throw new Error(`classification.csv does not hold ${species}.`);
  return found['lineage'].split(' > ');
}

/** Rows of cell_counts.csv and mammals62.csv, as printed; species of mammals62 where the common name fits one only. */
export function referenceRows(): DatasetRow[] {
  const classes = readReference('classification.csv');
  const bySpecies = new Map(classes.map((row) => [row['species'] ?? '', (row['lineage'] ?? '').split(' > ')]));
  const counts = readReference('cell_counts.csv').map((row) =>
    makeRow({
      species: row['species'] ?? '',
      structure: row['structure'] ?? '',
      lineage: bySpecies.get(row['species'] ?? '') ?? [],
      named: !(row['species'] ?? '').endsWith(' sp.'),
      sourceKey: row['source'] ?? '',
      n: numberOrNull(row['n']),
      structureMassG: numberOrNull(row['structure_mass_g']),
      neurons: numberOrNull(row['neurons']),
      otherCells: numberOrNull(row['other_cells']),
      bodyMassG: numberOrNull(row['body_mass_g']),
    }),
  );
  const brains = readReference('mammals62.csv').flatMap((row) => {
    const common = row['species_common'] ?? '';
    const found = classes.find((entry) => entry['species'] !== '' && (entry['common_name_in_source'] ?? '').split('; ').includes(common));
    if (found?.['species'] === undefined) return [];
    return [makeRow({
      species: found['species'], structure: 'brain_not_specified', lineage: (found['lineage'] ?? '').split(' > '), sourceKey: 'allison-cicchetti-1976', method: 'no count',
      bodyMassG: Number(row['body_kg']) * 1000, structureMassG: Number(row['brain_g']),
    })];
  });
  return [...counts, ...brains];
}

/** The same rows with one species' records of a structure set aside for mass on neurons. */
export function settingAside(rows: readonly DatasetRow[], species: string, structure: string, reason: string): DatasetRow[] {
  return rows.map((one) =>
    one.row.species !== species || one.row.structure !== structure
      ? one
      : { ...one, row: { ...one.row, setAside: [{ scope: { a: { variable: 'structureMassG', structure }, b: { variable: 'neurons', structure } }, reason, by: 'Register loader (system)', at: '2020-01-01T00:00:00.000Z' }] } },
  );
}

export const reproducibleExponents = () => readReference('reproducible_exponents.csv');
