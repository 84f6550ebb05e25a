import type { LiteratureContent } from '../../shared/contracts/content';
import { literatureContentSchema } from '../../shared/contracts/content';
import { speciesSlug } from '../../shared/domain/identifiers';
import { cell, readTable } from './readTable';
import { speciesByCommonName } from './classification';

/** A primary source of the published tables. `citation` is as its table prints it, completed where the table gives a DOI alone. */
export interface PublishedSource {
  doi: string;
  year: string;
  citation: string;
  carrier: string;
  licence: string;
  content: LiteratureContent;
}

const noClaim = 'Facts of the cited paper; no claim is made to them.';
/** Sources of which the tables print the DOI alone. */
const completedCitations: Record<string, string> = {
  '10.1073/pnas.1517131113': 'Olkowicz S et al. 2016 PNAS 113:7255-7260',
  '10.1371/journal.pone.0017514': 'Herculano-Houzel S 2011 PLoS ONE 6:e17514',
};
const sleepInMammals = { doi: '10.1126/science.982039', citation: 'Allison T, Cicchetti DV 1976 Science 194:732-734' };

/** Animals that are domestic by the name the source gives them. */
const domesticByCommonName = new Set(['Cow', 'Goat', 'Donkey', 'Horse', 'Cat', 'Sheep', 'Pig']);
const domesticSpecies = new Set(['Sus scrofa']);

type Entry = LiteratureContent['values'][number];
type Printed = Entry['cells'];

function printed(text: string, unit: string, centre: Printed['centre'], spreadText: string, n: string): Printed {
  return { text, unit, centre, spreadText, spreadKind: text === '' ? 'not-stated' : spreadText === '' ? 'none' : 'SD', n };
}

const doiOf = (source: string): string => {
  const doi = /doi:(\S+)$/.exec(source)?.[1];
  if (doi === undefined) throw new Error(`The source "${source}" has no DOI.`);
  return doi;
};
const citationOf = (source: string) => source.replace(/\s*doi:\S+$/, '');
const yearOf = (citation: string): string => /\b(19|20)\d\d\b/.exec(citation)?.[0] ?? '';

/** The entry's name in its document: constant, so that a later revision speaks of the same record. */
const entryIdOf = (taxon: string, structure: string) => `${taxon}-${structure}`.replaceAll('_', '-').slice(0, 40);

function entry(taxonName: string, nameAsEntered: string, structure: string): Pick<Entry, 'id' | 'nameAsEntered' | 'qualifier' | 'taxon' | 'structure' | 'definitionVersion'> {
  const taxon = speciesSlug(taxonName) ?? '';
  return { id: entryIdOf(taxon, structure), nameAsEntered, qualifier: taxonName.endsWith(' sp.') ? 'sp.' : 'none', taxon, structure, definitionVersion: 1 };
}

function cellCountEntry(row: Record<string, string>): Entry {
  const species = cell(row, 'species');
  const n = cell(row, 'n');
  // A value of one animal is no mean.
  const centre = n === '1' ? 'single' : 'arithmetic';
  const number = (column: string, unit: string, spreadColumn: string) => printed(cell(row, column), unit, cell(row, column) === '' ? 'not-stated' : centre, cell(row, spreadColumn), cell(row, column) === '' ? '' : n);
  const structure = cell(row, 'structure');
  return {
    ...entry(species, cell(row, 'name_in_source'), structure),
    origin: domesticSpecies.has(species) ? 'domestic' : 'unknown',
    massState: 'unknown',
    method: cell(row, 'neurons') === '' ? 'no count' : 'isotropic fractionation, by eye',
    bodyMass: number('body_mass_g', 'g', 'body_mass_sd_g'),
    structureMass: number('structure_mass_g', 'g', 'structure_mass_sd_g'),
    cells: printed('', 'count', 'not-stated', '', ''),
    neurons: number('neurons', 'count', 'neurons_sd'),
    otherCells: number('other_cells', 'count', 'other_cells_sd'),
    place: cell(row, 'source_table'),
    printedDifferently: cell(row, 'printed_differently'),
    note: cell(row, 'note'),
  };
}

function mammalEntry(row: Record<string, string>, species: string): Entry {
  const common = cell(row, 'species_common');
  return {
    ...entry(species, common, 'brain_not_specified'),
    origin: domesticByCommonName.has(common) ? 'domestic' : 'unknown',
    massState: 'unknown',
    method: 'no count',
    bodyMass: { text: cell(row, 'body_kg'), unit: 'kg', centre: 'not-stated', spreadText: '', spreadKind: 'none', n: '' },
    structureMass: { text: cell(row, 'brain_g'), unit: 'g', centre: 'not-stated', spreadText: '', spreadKind: 'none', n: '' },
    cells: printed('', 'count', 'not-stated', '', ''),
    neurons: printed('', 'count', 'not-stated', '', ''),
    otherCells: printed('', 'count', 'not-stated', '', ''),
    place: 'data set mammals of the R package MASS, after Weisberg 1985',
    printedDifferently: '',
    note: 'The source does not say what the brain’s mass includes. The binomial was assigned from the common name.',
  };
}

/** The register's word on values that its checks doubt: kept as printed. */
const doubtful = [
  { taxon: 'callithrix-jacchus', structure: 'olfactory_bulb', check: 'spread-exceeds-mean', field: 'structureMass.spreadText', word: 'Printed so: the standard deviation is larger than the mass. Kept and not altered.' },
];

function explanationsOf(values: readonly Entry[]): Record<string, string> {
  return Object.fromEntries(
    doubtful.flatMap(({ taxon, structure, check, field, word }) => {
      const index = values.findIndex((value) => value.taxon === taxon && value.structure === structure);
      return index < 0 ? [] : [[`${check}@values.${index}.${field}`, word]];
    }),
  );
}

function sourceOf(doi: string, citation: string, carrier: string, licence: string, values: Entry[], sharesAnimalsWith: LiteratureContent['source']['sharesAnimalsWith'] = []): PublishedSource {
  const year = yearOf(citation);
  const content = literatureContentSchema.parse({
    kind: 'literature',
    source: { doi, citation, year, sharesAnimalsWith },
    values,
    provenance: { published: true, doi, citation, approvalKind: 'see-source', licenceAccepted: true },
    explanations: explanationsOf(values),
    note: `Read from: ${carrier}. ${licence}`,
  });
  return { doi, year, citation, carrier, licence, content };
}

/** Sources that report on animals of one laboratory's series without saying which are the same. */
const sharedAnimals: Record<string, LiteratureContent['source']['sharesAnimalsWith']> = {
  '10.1371/journal.pone.0017514': [{ source: '10.1159/000330825', overlap: 'unknown' }],
};

function cellCountSources(): PublishedSource[] {
  const rows = readTable('cellcounts');
  const byDoi = new Map<string, Record<string, string>[]>();
  for (const row of rows) {
    const doi = doiOf(cell(row, 'source'));
    byDoi.set(doi, [...(byDoi.get(doi) ?? []), row]);
  }
  return [...byDoi].map(([doi, own]) => {
    const citation = own.map((row) => citationOf(cell(row, 'source'))).find((text) => text !== '') ?? completedCitations[doi];
    if (citation === undefined) throw new Error(`The source ${doi} has no citation.`);
    const carriers = [...new Set(own.map((row) => cell(row, 'source_table')))];
    return sourceOf(doi, citation, carriers.join('; '), noClaim, own.map(cellCountEntry), sharedAnimals[doi]);
  });
}

function mammalSource(): PublishedSource {
  const known = speciesByCommonName();
  const values = readTable('mammals62').flatMap((row) => {
    const species = known.get(cell(row, 'species_common'));
    return species === undefined ? [] : [mammalEntry(row, species)];
  });
  const carrier = 'data set mammals of the R package MASS (GPL-2 or GPL-3), after Weisberg S 1985, Applied Linear Regression, 2nd edition';
  return sourceOf(sleepInMammals.doi, sleepInMammals.citation, carrier, noClaim, values);
}

/**
 * The published tables as literature submissions, one a primary source, oldest first, values in the order of the tables. Values are texts as
 * printed; what the source prints differently stands beside what is used. An empty n stays empty: unknown never passes as 1.
 */
export function publishedSources(): PublishedSource[] {
  return [...cellCountSources(), mammalSource()].sort((a, b) => a.year.localeCompare(b.year) || a.doi.localeCompare(b.doi, 'en'));
}
