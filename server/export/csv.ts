import { fittedNumber, shortestNumber } from '../../shared/domain/shortestNumber';

export type CellValue = string | number | boolean | null;

/** One column of a frozen table: how its cells are made, and what the Table Schema says of it. */
export interface Column<Row> {
  name: string;
  type: 'string' | 'number' | 'integer' | 'boolean';
  description: string;
  unit?: string;
  /** Numbers that a fit made are written at 12 significant digits, entered and derived ones in their shortest form. */
  fitted?: true;
  value: (row: Row) => CellValue;
}

/** A spreadsheet would take a text with such a beginning for a formula; an apostrophe before it keeps it a text. */
const formulaStart = /^[=+\-@\t\r]/;

function textCell(text: string): string {
  // Line breaks inside a cell are LF, so that the file has one kind.
  const plain = text.replace(/\r\n?/g, '\n');
  const safe = formulaStart.test(plain) ? `'${plain}` : plain;
  return /[",\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

function cellText<Row>(column: Column<Row>, row: Row): string {
  const value = column.value(row);
  if (value === null) return '';
  if (typeof value === 'number') return column.fitted === true ? shortestNumber(fittedNumber(value)) : shortestNumber(value);
  if (typeof value === 'boolean') return String(value);
  return textCell(value);
}

/**
 * A table by RFC 4180 with a header, in UTF-8, lines ended by LF. Numbers in the shortest form that reads back the
 * same, a missing value as an empty cell, no text that a spreadsheet would run as a formula.
 */
export function csvText<Row>(columns: readonly Column<Row>[], rows: readonly Row[]): string {
  const lines = [columns.map((column) => column.name), ...rows.map((row) => columns.map((column) => cellText(column, row)))];
  return lines.map((cells) => `${cells.join(',')}\n`).join('');
}
