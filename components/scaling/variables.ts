import type { ScalingAnswer } from '../../shared/contracts/fits';
import type { Variable } from '../../shared/contracts/vocabulary';
import type { QuantityKind } from '../../shared/domain/quantityText';
import type { FigureAxis } from '../charts/figureTypes';

interface VariableWords {
  /** In a list of choices. */
  choice: string;
  /** Before "of the cerebral cortex" or "in the cerebral cortex". */
  what: string;
  preposition: 'of' | 'in';
  unit: string | null;
  tone: FigureAxis['tone'];
  kind: QuantityKind;
}

const words: Record<Variable, VariableWords> = {
  bodyMassG: { choice: 'body mass', what: 'body mass', preposition: 'of', unit: 'g', tone: 'mass', kind: 'mass' },
  structureMassG: { choice: 'structure mass', what: 'mass', preposition: 'of', unit: 'g', tone: 'mass', kind: 'mass' },
  cells: { choice: 'cells', what: 'cells', preposition: 'in', unit: null, tone: 'cells', kind: 'count' },
  neurons: { choice: 'neurons', what: 'neurons', preposition: 'in', unit: null, tone: 'neurons', kind: 'count' },
  otherCells: { choice: 'other cells', what: 'other cells', preposition: 'in', unit: null, tone: 'other', kind: 'count' },
  neuronsPerMg: { choice: 'neurons per mg', what: 'neurons per mg', preposition: 'of', unit: null, tone: 'neurons', kind: 'density' },
  cellsPerMg: { choice: 'cells per mg', what: 'cells per mg', preposition: 'of', unit: null, tone: 'cells', kind: 'density' },
  otherToNeuronRatio: { choice: 'other cells per neuron', what: 'other cells per neuron', preposition: 'in', unit: null, tone: 'other', kind: 'ratio' },
};

const structureWords: Readonly<Record<string, string>> = {
  rest_of_brain: 'the rest of the brain',
  whole_brain_without_olfactory_bulb: 'the brain without its olfactory bulbs',
  brain_not_specified: 'the brain (parts not specified)',
};

/** Structures that most papers report, in the order of the list of choices. */
export const usualStructures = ['cerebral_cortex', 'cerebellum', 'rest_of_brain', 'olfactory_bulb', 'whole_brain', 'whole_brain_without_olfactory_bulb', 'brain_not_specified'] as const;

export const variableChoice = (variable: Variable): string => words[variable].choice;

/** "the cerebral cortex" of a structure's key. */
export function structureText(key: string): string {
  return structureWords[key] ?? `the ${key.replaceAll('_', ' ')}`;
}

/** "mass of the cerebral cortex", "neurons in the cerebellum", "body mass". */
export function axisText(variable: Variable, structure: string | null): string {
  const { what, preposition } = words[variable];
  return structure === null || variable === 'bodyMassG' ? what : `${what} ${preposition} ${structureText(structure)}`;
}

/** The axis as the figure draws it. */
export function axisOf(variable: Variable, structure: string | null): FigureAxis {
  const { unit, tone, kind } = words[variable];
  return { label: axisText(variable, structure), unit, tone, variable, kind };
}

type Question = Pick<ScalingAnswer['question'], 'y' | 'yStructure' | 'x' | 'xStructure'>;

/** The question as a title: "Mass of the cerebral cortex on its neurons". */
export function questionTitle({ y, yStructure, x, xStructure }: Question): string {
  const upper = axisText(y, yStructure);
  const lower = x !== 'bodyMassG' && yStructure !== null && xStructure === yStructure ? `its ${words[x].what}` : axisText(x, xStructure);
  return `${upper.charAt(0).toUpperCase()}${upper.slice(1)} on ${lower}`;
}

/** The same in one line of a phone: "Cerebral cortex: mass on neurons". */
export function shortTitle(question: Question): string {
  const { y, yStructure, x, xStructure } = question;
  if (yStructure !== xStructure || yStructure === null) return questionTitle(question);
  const structure = structureText(yStructure).replace(/^the /, '');
  return `${structure.charAt(0).toUpperCase()}${structure.slice(1)}: ${words[y].what} on ${words[x].what}`;
}

const madeFrom: Partial<Record<Variable, readonly Variable[]>> = {
  neuronsPerMg: ['neurons', 'structureMassG'],
  cellsPerMg: ['cells', 'structureMassG'],
  otherToNeuronRatio: ['otherCells', 'neurons'],
};

/** One variable is a quotient that holds the other: part of the exponent then stands by construction. */
export function isMadeFromTheOther({ y, yStructure, x, xStructure }: Question): boolean {
  if (yStructure !== xStructure) return false;
  return Boolean(madeFrom[y]?.includes(x) ?? false) || Boolean(madeFrom[x]?.includes(y) ?? false);
}

/** What such a pair says of itself; null where there is nothing to warn of. */
export function constructionWarning(question: Question): string | null {
  if (!isMadeFromTheOther(question)) return null;
  const { x, y } = question;
  if ((y === 'neuronsPerMg' && x === 'neurons') || (y === 'cellsPerMg' && x === 'cells')) {
    return `Density is ${words[x].what} over mass, so its exponent is 1 − b, with b that of mass on ${words[x].what}: it tells nothing that mass on ${words[x].what} does not. No standardised major axis and no R² are given.`;
  }
  return 'One of the two is made from the other, so part of the exponent stands by construction. No standardised major axis and no R² are given.';
}
