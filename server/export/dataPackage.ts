import { canonicalJson } from '../../shared/domain/canonicalJson';
import type { Column } from './csv';
import type { SourceRow } from './sourcesFile';
import { demonstrationSentence, type VersionFacts } from './versionFacts';

export interface TableResource {
  name: string;
  path: string;
  title: string;
  bytes: number;
  sha256: string;
  columns: readonly Pick<Column<never>, 'name' | 'type' | 'description' | 'unit'>[];
  primaryKey: readonly string[];
  foreignKeys: readonly { fields: readonly string[]; resource: string; referenced: readonly string[] }[];
}

const required = new Set(['version', 'record', 'revision', 'source', 'species', 'taxon', 'structure', 'fit', 'y', 'x']);

function schemaOf({ columns, primaryKey, foreignKeys }: TableResource) {
  return {
    $schema: 'https://datapackage.org/profiles/2.0/tableschema.json',
    fields: columns.map(({ name, type, description, unit }) => ({ name, type, description, ...(unit === undefined ? {} : { unit }), ...(required.has(name) ? { constraints: { required: true } } : {}) })),
    ...(primaryKey.length === 0 ? {} : { primaryKey }),
    missingValues: [''],
    ...(foreignKeys.length === 0 ? {} : { foreignKeys: foreignKeys.map(({ fields, resource, referenced }) => ({ fields, reference: { resource, fields: referenced } })) }),
  };
}

/** datapackage.json, Data Package 2.0 with a Table Schema for every table, in canonical JSON. */
export function dataPackageText(version: VersionFacts, tables: readonly TableResource[], sources: readonly SourceRow[]): string {
  const document = {
    $schema: 'https://datapackage.org/profiles/2.0/datapackage.json',
    name: `allokarya-version-${version.label}`,
    ...(version.doi === null ? {} : { id: `https://doi.org/${version.doi}` }),
    title: version.title,
    description: version.demonstration ? demonstrationSentence : 'Brain-tissue masses and cell counts with the standing fits of this version.',
    version: version.label,
    created: version.frozenAt,
    demonstration: version.demonstration,
    licenses: [{ name: 'CC-BY-4.0', path: 'https://creativecommons.org/licenses/by/4.0/', title: 'Creative Commons Attribution 4.0 International' }],
    contributors: version.contributors.length === 0
      ? [{ title: 'Allokarya register', roles: ['compiler'] }]
      : version.contributors.map(({ name, orcid }) => ({ title: name, roles: ['contributor'], ...(orcid === null ? {} : { path: `https://orcid.org/${orcid}` }) })),
    sources: sources.map(({ citation, doi }) => ({ title: citation, ...(doi === null ? {} : { path: `https://doi.org/${doi}` }) })),
    resources: tables.map((table) => ({
      name: table.name,
      path: table.path,
      title: table.title,
      type: 'table',
      format: 'csv',
      mediatype: 'text/csv',
      encoding: 'utf-8',
      bytes: table.bytes,
      hash: `sha256:${table.sha256}`,
      schema: schemaOf(table),
    })),
  };
  return `${canonicalJson(document)}\n`;
}
