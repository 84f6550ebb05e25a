import { z } from 'zod';
import type { RecordRow } from '../../../shared/contracts/records';
import type { recordsQuerySchema } from '../../../shared/contracts/register';
import { recordSerial } from '../../../shared/domain/identifiers';
import type { Context } from '../../context';
import { AppError } from '../../errors';
import { csvText } from '../../export/csv';
import { recordColumns } from '../../export/recordsFile';
import { entityTag } from '../../frozenAnswer';
import { decodeCursor, encodeCursor } from '../../paging';
import { requirePublished, type Published } from './publishedData';
import { liesIn, loadTaxonomy } from './taxonomy';

export type RecordsQuery = z.infer<typeof recordsQuerySchema>;
const cursorSchema = z.object({ version: z.string(), after: z.number().int() });

/** Rows that match, in order of record number. A former name of species or clade leads on. */
async function select(context: Context, query: RecordsQuery, label: string | undefined): Promise<{ published: Published; rows: RecordRow[] }> {
  const published = await requirePublished(context, label);
  const taxonomy = await loadTaxonomy(context.db);
  const clade = query.clade === undefined ? null : (taxonomy.resolve(query.clade)?.node ?? null);
  const species = query.species === undefined ? null : (taxonomy.resolve(query.species)?.node.slug ?? query.species);
  const known = { structures: new Set(published.rows.map(({ row }) => row.structure)), species: new Set(published.rows.map(({ row }) => row.taxonSlug)) };
  const errors = [
    ...(query.clade !== undefined && clade === null ? [{ path: 'clade', message: `Expected is the address of a clade, such as primates; found "${query.clade}"` }] : []),
    ...(query.structure !== undefined && !known.structures.has(query.structure) ? [{ path: 'structure', message: `Expected is a structure that this version holds; found "${query.structure}"` }] : []),
    ...(species !== null && !known.species.has(species) ? [{ path: 'species', message: `Expected is the address of a species of this version; found "${query.species ?? ''}"` }] : []),
  ];
  if (errors.length > 0) throw new AppError('invalid-input', 'The list cannot be filtered in this way.', { errors });
  const rows = published.rows.flatMap(({ row }) => {
    const fits = (clade === null || liesIn(row.lineage, clade, row.species)) && (query.structure === undefined || row.structure === query.structure) && (species === null || row.taxonSlug === species);
    return fits ? [row] : [];
  });
  return { published, rows };
}

/**
 * Records of a frozen version, a page at a time.
 * @throws not-found for an unknown version, invalid-input for a filter or cursor that names nothing
 */
export async function listRecords(context: Context, query: RecordsQuery) {
  const cursor = query.cursor === undefined ? null : decodeCursor(query.cursor, cursorSchema);
  const { published, rows } = await select(context, query, query.version ?? cursor?.version);
  const rest = cursor === null ? rows : rows.filter(({ number }) => (recordSerial(number) ?? 0) > cursor.after);
  const items = rest.slice(0, query.limit);
  const last = items.at(-1);
  const page = { items, nextCursor: rest.length > items.length && last !== undefined ? encodeCursor({ version: published.label, after: recordSerial(last.number) ?? 0 }) : null };
  return { page, tag: entityTag(page), explicit: published.explicit };
}

/** The same records as one table: every match, whatever the page size, with the columns of records.csv. */
export async function exportRecords(context: Context, query: RecordsQuery) {
  const { published, rows } = await select(context, query, query.version);
  const text = csvText(recordColumns({ label: published.label, demonstration: published.version.demonstration }), rows);
  return { text, tag: entityTag(text), explicit: published.explicit, name: `allokarya-version-${published.label}-records.csv` };
}
