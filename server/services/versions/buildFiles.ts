import { createHash } from 'node:crypto';
import type { RecordRow } from '../../../shared/contracts/records';
import { bibliographyText } from '../../export/bibtex';
import { csvText, type Column } from '../../export/csv';
import { dataPackageText, type TableResource } from '../../export/dataPackage';
import { changesText, checksumsText, citationCff, licenceText, readmeText } from '../../export/documents';
import { fitColumns, meanColumns, type FitRow, type MeanRow } from '../../export/fitFiles';
import { recordColumns } from '../../export/recordsFile';
import { sourceColumns, type SourceRow } from '../../export/sourcesFile';
import type { VersionFacts } from '../../export/versionFacts';
import type { VersionSummary } from './summary';
import type { StoredFit } from './versionFits';

export interface BuiltFile {
  name: string;
  mediaType: string;
  content: Buffer;
  sha256: string;
  /** Rows of a table without its header; null for other files. */
  rows: number | null;
}

export const manifestName = 'CHECKSUMS.sha256';
export const sha256Of = (content: Buffer): string => createHash('sha256').update(content).digest('hex');

function file(name: string, mediaType: string, text: string, rows: number | null = null): BuiltFile {
  const content = Buffer.from(text, 'utf8');
  return { name, mediaType, content, sha256: sha256Of(content), rows };
}

const byCode = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** One row a question, species and contributing record; fits of several clades and methods share their means. */
function meanRows(fits: readonly StoredFit[]): MeanRow[] {
  const rows = new Map<string, MeanRow>();
  for (const { definition, inputs, exclusions } of fits) {
    const { y, yStructure, x, xStructure } = definition;
    const question = [y, yStructure ?? '', x, xStructure ?? ''].join(' ');
    const species = [...inputs.map((input) => ({ ...input, reason: null })), ...exclusions];
    for (const { slug, species: name, x: meanX, y: meanY, n, marks, demonstration, contributions, reason } of species) {
      for (const { record, weight, source } of contributions) {
        rows.set([question, slug, record].join('\n'), { y, yStructure, x, xStructure, slug, species: name, meanX, meanY, n, record, weight, source, marks, setAside: reason, demonstration });
      }
    }
  }
  return [...rows].sort(([a], [b]) => byCode(a, b)).map(([, row]) => row);
}

function fitRows(fits: readonly StoredFit[]): FitRow[] {
  return fits.map(({ definition, inputs, exclusions, result }) => ({
    ...definition,
    clade: definition.cladeSlug,
    fit: result,
    species: inputs.map(({ slug }) => slug),
    setAside: exclusions.map(({ slug }) => slug),
    demonstration: inputs.some((input) => input.demonstration),
  }));
}

interface Table {
  built: BuiltFile;
  resource: TableResource;
}

function table<Row>(name: string, title: string, columns: readonly Column<Row>[], rows: readonly Row[], keys: Pick<TableResource, 'primaryKey' | 'foreignKeys'>): Table {
  const path = `${name}.csv`;
  const built = file(path, 'text/csv', csvText(columns, rows), rows.length);
  return { built, resource: { name: name.replaceAll('_', '-'), path, title, bytes: built.content.length, sha256: built.sha256, columns, ...keys } };
}

/**
 * The files of a version, in the order in which they are listed, the manifest last. A pure function of what it is
 * given: equal rows give equal bytes whatever the machine, time zone and locale.
 * @param rows rows of the version in order of record number
 * @param fits standing fits of the version in order of their address
 * @param sources sources of the rows
 */
export function buildVersionFiles(version: VersionFacts, summary: VersionSummary, rows: readonly RecordRow[], fits: readonly StoredFit[], sources: readonly Omit<SourceRow, 'records'>[]): BuiltFile[] {
  const counted = sources
    .map((source) => ({ ...source, records: rows.filter((row) => row.sourceKey === source.key).length }))
    .sort((a, b) => byCode(a.key, b.key));
  const toSources = [{ fields: ['source'], resource: 'sources', referenced: ['source'] }];
  const tables = [
    table('records', 'Records', recordColumns(version), rows, { primaryKey: ['record'], foreignKeys: toSources }),
    table('species_means', 'Species means', meanColumns(version), meanRows(fits), { primaryKey: [], foreignKeys: [...toSources, { fields: ['record'], resource: 'records', referenced: ['record'] }] }),
    table('standing_fits', 'Standing fits', fitColumns(version), fitRows(fits), { primaryKey: ['fit'], foreignKeys: [] }),
    table('sources', 'Sources', sourceColumns(version), counted, { primaryKey: ['source'], foreignKeys: [] }),
  ];
  const files = [
    ...tables.map(({ built }) => built),
    file('sources.bib', 'application/x-bibtex', bibliographyText(version, counted)),
    file('datapackage.json', 'application/json', dataPackageText(version, tables.map(({ resource }) => resource), counted)),
    file('README.md', 'text/markdown', readmeText(version, summary)),
    file('CHANGES.md', 'text/markdown', changesText(version, summary)),
    file('CITATION.cff', 'application/yaml', citationCff(version)),
    file('LICENSE', 'text/plain', licenceText(version)),
  ];
  return [...files, file(manifestName, 'text/plain', checksumsText(version, files))];
}
