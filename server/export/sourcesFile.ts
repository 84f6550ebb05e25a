import type { Column } from './csv';
import { versionCell, type VersionFacts } from './versionFacts';

/** A source of the version's rows. */
export interface SourceRow {
  key: string;
  kind: string;
  citation: string;
  doi: string | null;
  year: number | null;
  carrier: string;
  licence: string;
  records: number;
  demonstration: boolean;
}

/** Columns of sources.csv: one row a source, in order of its key. */
export function sourceColumns(version: Pick<VersionFacts, 'label' | 'demonstration'>): Column<SourceRow>[] {
  return [
    { name: 'version', type: 'string', description: 'Version of the dataset', value: () => versionCell(version) },
    { name: 'source', type: 'string', description: 'Key of the source', value: (row) => row.key },
    { name: 'kind', type: 'string', description: 'publication, or the specimens of a laboratory', value: (row) => row.kind },
    { name: 'citation', type: 'string', description: 'Citation of the source', value: (row) => row.citation },
    { name: 'doi', type: 'string', description: 'DOI of the source', value: (row) => row.doi },
    { name: 'year', type: 'integer', description: 'Year of publication', value: (row) => row.year },
    { name: 'carrier', type: 'string', description: 'Where the values were read, when it was not the source itself', value: (row) => row.carrier },
    { name: 'licence', type: 'string', description: 'Licence or claim', value: (row) => row.licence },
    { name: 'records', type: 'integer', description: 'Records of this version that come from the source', value: (row) => row.records },
    { name: 'demonstration', type: 'boolean', description: 'True for an invented source of the demonstration', value: (row) => row.demonstration },
  ];
}
