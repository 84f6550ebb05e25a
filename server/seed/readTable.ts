import { readFileSync } from 'node:fs';
import Papa from 'papaparse';

/** A table of data/published as rows of texts, by its header. Throws where the file is not a clean CSV. */
export function readTable(name: string): Record<string, string>[] {
  const text = readFileSync(new URL(`../../data/published/${name}.csv`, import.meta.url), 'utf8');
  const { data, errors } = Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true });
  const [first] = errors;
  if (first !== undefined) throw new Error(`data/published/${name}.csv, row ${first.row ?? 0}: ${first.message}`);
  return data;
}

/** A cell that the table must have; throws where the column is absent. */
export function cell(row: Record<string, string>, column: string): string {
  const value = row[column];
  if (value === undefined) throw new Error(`The table has no column ${column}.`);
  return value.trim();
}
