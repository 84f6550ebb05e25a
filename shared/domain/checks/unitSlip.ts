import type { CheckResult } from '../../contracts/checks';
import type { Variable } from '../../contracts/vocabulary';
import { formatRatio } from '../quantityText';
import type { LineOfEntry } from './context';
import { outcome } from './outcome';

export interface SuggestedFactor {
  factor: number;
  /** What a slip by this factor would be, as a question. */
  question: string;
  applies: 'counts' | 'counts and masses';
}

type Slipped = 'counts' | 'structure mass' | 'body mass';

const COUNTS: readonly Variable[] = ['cells', 'neurons', 'otherCells', 'neuronsPerMg', 'cellsPerMg'];
const DENSITIES: readonly Variable[] = ['neuronsPerMg', 'cellsPerMg'];

/** Factors that the entries suggest: 2, the numbers of squares, the dilutions, 10 and 1000. */
export function suggestedFactors(entries: { squares: readonly number[]; dilutions: readonly number[] }): SuggestedFactor[] {
  const factors: SuggestedFactor[] = [
    { factor: 2, question: 'Was one side of two entered?', applies: 'counts' },
    ...[...new Set(entries.squares)].filter((squares) => squares > 1).map((factor): SuggestedFactor => ({ factor, question: 'Is the number of squares right?', applies: 'counts' })),
    ...[...new Set(entries.dilutions)].filter((dilution) => dilution > 1).map((factor): SuggestedFactor => ({ factor, question: 'Is the dilution right?', applies: 'counts' })),
    { factor: 10, question: 'Was a decimal point misplaced?', applies: 'counts and masses' },
    { factor: 1000, question: 'Was a unit mistaken, mg for g or µL for mL?', applies: 'counts and masses' },
  ];
  // A dilution of 2 or 10 suggests what is already there; the more telling word stands first.
  return factors.filter((one, i) => i === 0 || !factors.slice(1, i).some((earlier) => earlier.factor === one.factor));
}

/** Power with which a slipped quantity enters a variable: 1, −1 (mass in a density) or 0. */
function powerIn(variable: Variable, slipped: Slipped): number {
  if (slipped === 'body mass') return variable === 'bodyMassG' ? 1 : 0;
  if (slipped === 'counts') return COUNTS.includes(variable) ? 1 : 0;
  if (DENSITIES.includes(variable)) return -1;
  return variable === 'structureMassG' ? 1 : 0;
}

/**
 * A slip by a factor: speaks only where the value is outside the 95 % prediction interval of the line
 * fitted without its species AND a suggested factor, or its inverse, brings it within one residual SD.
 *
 * A factor on x moves the expected y by exponent·log10 factor. Of several that fit, the one that leaves
 * the smallest residual is named, with the quantity it applies to. `ownStructure` is the entry's key:
 * only its values move.
 */
export function checkUnitSlip(line: LineOfEntry, ownStructure: string, factors: readonly SuggestedFactor[]): CheckResult {
  const ratio = `${formatRatio(10 ** line.log10Ratio)} times the line of ${line.cladeName}`;
  const limit = 'inside the 95 % prediction interval';
  if (line.inside) return outcome('passes', 'unit-slip', line.path, `${ratio}, inside the 95 % prediction interval.`, formatRatio(10 ** line.log10Ratio), limit);

  const moves = (variable: Variable, structure: string | null, slipped: Slipped) =>
    slipped === 'body mass' || structure === null || structure === ownStructure ? powerIn(variable, slipped) : 0;
  const found: { residual: number; text: string; question: string }[] = [];
  for (const { factor, question, applies } of factors) {
    for (const slipped of ['counts', 'structure mass', 'body mass'] as const) {
      if (slipped !== 'counts' && applies === 'counts') continue;
      const shift = moves(line.y, line.yStructure, slipped) - line.exponent * moves(line.x, line.xStructure, slipped);
      if (shift === 0) continue;
      for (const direction of [1, -1]) {
        const residual = Math.abs(line.log10Ratio + direction * shift * Math.log10(factor));
        if (residual <= line.residualSd) found.push({ residual, question, text: `the ${slipped} ${direction === 1 ? '×' : '÷'} ${factor}` });
      }
    }
  }
  const best = found.sort((a, b) => a.residual - b.residual)[0];
  return best === undefined
    ? outcome('passes', 'unit-slip', line.path, `${ratio}, outside the 95 % prediction interval; no factor that the entries suggest explains it.`, formatRatio(10 ** line.log10Ratio), limit)
    : outcome('warns', 'unit-slip', line.path, `${ratio}, outside the 95 % prediction interval; ${best.text} would bring it within one residual SD. ${best.question}`, best.text, limit);
}
