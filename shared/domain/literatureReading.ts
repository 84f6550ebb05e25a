import type { LiteratureContent, LiteratureNumber } from '../contracts/content';
import type { ReadingProblem } from './specimenReading';
import { parseCount, parseMassG, parseNumber, type ParsedValue } from './units';

type Entry = LiteratureContent['values'][number];

/** A printed value in its canonical unit, with its spread where that is one number, and n where printed. */
export interface ReadLiteratureNumber {
  value: number | null;
  spread: number | null;
  n: number | null;
}

export interface ReadLiteratureValue {
  bodyMassG: ReadLiteratureNumber;
  structureMassG: ReadLiteratureNumber;
  cells: ReadLiteratureNumber;
  neurons: ReadLiteratureNumber;
  otherCells: ReadLiteratureNumber;
  problems: ReadingProblem[];
}

/**
 * Reads one row of a source into g and counts. Counts of a source are means and need not be whole. A spread
 * printed as an interval or a range (CI95, range) stays text; SD and SE are read in the value's unit.
 * What cannot be read becomes a problem with its path and stays null.
 */
export function readLiteratureValue(entry: Entry, path: string): ReadLiteratureValue {
  const problems: ReadingProblem[] = [];
  const keep = (parsed: ParsedValue, at: string): number | null => {
    if (parsed.problem !== null) problems.push({ path: at, message: parsed.problem });
    return parsed.value;
  };
  const read = (number: LiteratureNumber, field: string, parse: (text: string) => ParsedValue): ReadLiteratureNumber => {
    const at = `${path}.${field}`;
    const n = keep(parseCount(number.n), `${at}.n`);
    if (n === 0) problems.push({ path: `${at}.n`, message: 'A mean is over one animal or more; leave n empty where it is not printed.' });
    return {
      value: keep(parse(number.text), `${at}.text`),
      spread: number.spreadKind === 'SD' || number.spreadKind === 'SE' ? keep(parse(number.spreadText), `${at}.spreadText`) : null,
      n: n === 0 ? null : n,
    };
  };
  const mass = (number: LiteratureNumber) => (text: string) => parseMassG({ text, unit: number.unit });
  return {
    bodyMassG: read(entry.bodyMass, 'bodyMass', mass(entry.bodyMass)),
    structureMassG: read(entry.structureMass, 'structureMass', mass(entry.structureMass)),
    cells: read(entry.cells, 'cells', parseNumber),
    neurons: read(entry.neurons, 'neurons', parseNumber),
    otherCells: read(entry.otherCells, 'otherCells', parseNumber),
    problems,
  };
}
