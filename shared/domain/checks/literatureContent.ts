import type { CheckResult } from '../../contracts/checks';
import type { LiteratureContent } from '../../contracts/content';
import { readLiteratureValue, type ReadLiteratureNumber, type ReadLiteratureValue } from '../literatureReading';
import type { CheckContext } from './context';
import { checkDates } from './dateChecks';
import { checkDoi, checkOrcid } from './identifierChecks';
import { limits } from './limits';
import { applicable, byLevel, outcome, shortFigure } from './outcome';
import { missingOfLiterature } from './requiredFields';
import { checkUnitSlip, suggestedFactors } from './unitSlip';

const FIELDS = [
  ['bodyMassG', 'bodyMass', 'The body mass'],
  ['structureMassG', 'structureMass', 'The mass of the structure'],
  ['cells', 'cells', 'The number of cells'],
  ['neurons', 'neurons', 'The number of neurons'],
  ['otherCells', 'otherCells', 'The number of other cells'],
] as const;

/**
 * Everything that is checked of values from a source before a reviewer looks.
 *
 * Parts are not held against wholes here: means of a source may come from different animals. Order and
 * paths as for a specimen (`values.3.neurons.text`).
 */
export function checkLiteratureContent(content: LiteratureContent, context: CheckContext): CheckResult[] {
  return byLevel([
    ...missingOfLiterature(content),
    ...applicable([
      checkDoi(content.source.doi, 'source.doi'),
      checkDoi(content.provenance.doi, 'provenance.doi'),
      checkDoi(content.provenance.protocolDoi, 'provenance.protocolDoi'),
      ...(context.orcids ?? []).map(({ path, text }) => checkOrcid(text, path)),
    ]),
    ...checkDates([{ path: 'source.year', text: content.source.year, act: 'publication' }], context.today),
    ...content.values.flatMap((entry, i) => {
      const path = `values.${i}`;
      const read = readLiteratureValue(entry, path);
      return [
        ...read.problems.map((problem) => outcome('blocks', 'not-readable', problem.path, problem.message)),
        ...FIELDS.flatMap(([key, field, what]) => checkPrintedNumber(read[key], `${path}.${field}`, what)),
        ...applicable([checkCellsSum(read, path), checkListedTwice(content, i)]),
        ...(context.lines ?? [])
          .filter((line) => line.path === path)
          .map((line) => checkUnitSlip(line, entry.structure, suggestedFactors({ squares: [], dilutions: [] }))),
      ];
    }),
  ]);
}

/** A printed value is above zero (neurons may be none), its spread not negative, and seldom larger than it. */
export function checkPrintedNumber(number: ReadLiteratureNumber, path: string, what: string): CheckResult[] {
  const isMass = path.endsWith('Mass');
  return applicable([
    number.value !== null && (isMass ? number.value <= 0 : number.value < 0)
      ? outcome('blocks', isMass ? 'mass-not-positive' : 'count-negative', `${path}.text`, `${what} must be ${isMass ? 'above zero' : 'zero or more'}.`, number.value, isMass ? '> 0' : '≥ 0')
      : null,
    number.spread !== null && number.spread < 0
      ? outcome('blocks', 'spread-negative', `${path}.spreadText`, 'A standard deviation or error cannot be negative.', number.spread, '≥ 0')
      : null,
    number.value !== null && number.value > 0 && number.spread !== null && number.spread > number.value
      ? outcome('warns', 'spread-exceeds-mean', `${path}.spreadText`, 'The spread is larger than the value: is one of them printed in another unit?', shortFigure(number.spread), `≤ ${shortFigure(number.value)}`)
      : null,
  ]);
}

/** Cells are neurons plus other cells, up to the rounding of a table. Null where one is not given. */
export function checkCellsSum(read: Pick<ReadLiteratureValue, 'cells' | 'neurons' | 'otherCells'>, path: string): CheckResult | null {
  const [cells, neurons, otherCells] = [read.cells.value, read.neurons.value, read.otherCells.value];
  if (cells === null || neurons === null || otherCells === null || !(cells > 0)) return null;
  const off = Math.abs(neurons + otherCells - cells) / cells;
  return outcome(
    off > limits.cellsSum ? 'warns' : 'passes', 'cells-not-the-sum', `${path}.cells`,
    off > limits.cellsSum ? 'Neurons and other cells do not sum to the cells: is one of the three printed wrongly?' : 'Neurons and other cells sum to the cells.',
    off, `≤ ${limits.cellsSum}`,
  );
}

/** One taxon and structure stands once in a source, unless the rows are different animals. */
export function checkListedTwice(content: LiteratureContent, index: number): CheckResult | null {
  const entry = content.values[index];
  if (entry === undefined || entry.taxon === '' || entry.structure === '') return null;
  const first = content.values.findIndex((other) => other.taxon === entry.taxon && other.structure === entry.structure);
  return first < index
    ? outcome('warns', 'listed-twice', `values.${index}.structure`, 'This species and structure stand twice in the source: are these different animals?', `row ${index + 1}`, `once, row ${first + 1}`)
    : null;
}
