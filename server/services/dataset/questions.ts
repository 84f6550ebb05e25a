import type { SetAsideScope } from '../../../shared/contracts/records';
import type { FitMethod, Variable } from '../../../shared/contracts/vocabulary';
import type { ExponentWords } from '../../../shared/stats/sentences';

/** Which variable of which structure stands against which other one. Body mass belongs to no structure. */
export interface Question {
  y: Variable;
  yStructure: string | null;
  x: Variable;
  xStructure: string | null;
}

const slugPart: Record<Variable, string> = {
  bodyMassG: 'bodymassg',
  structureMassG: 'structuremassg',
  cells: 'cells',
  neurons: 'neurons',
  otherCells: 'othercells',
  neuronsPerMg: 'neuronspermg',
  cellsPerMg: 'cellspermg',
  otherToNeuronRatio: 'othertoneuronratio',
};
const variableWords: Record<Variable, string> = {
  bodyMassG: 'body mass',
  structureMassG: 'mass',
  cells: 'cells',
  neurons: 'neurons',
  otherCells: 'other cells',
  neuronsPerMg: 'neurons per mg',
  cellsPerMg: 'cells per mg',
  otherToNeuronRatio: 'other cells per neuron',
};
/** Structures in the plural, as a sentence needs them. */
const pluralWords: Record<string, string> = { cerebral_cortex: 'cortices', cerebellum: 'cerebella', rest_of_brain: 'rests of brain', olfactory_bulb: 'olfactory bulbs' };

/** Structures whose key is no name in a sentence. */
const namedStructures: Readonly<Record<string, string>> = { brain_not_specified: 'brain (parts not specified)' };

/** Name of a structure after "the". */
export const structureWords = (key: string): string => namedStructures[key] ?? key.replaceAll('_', ' ');

/** "mass of the cerebral cortex", "neurons of the cerebellum", "body mass". */
const axisWords = (variable: Variable, structure: string | null): string => (structure === null ? variableWords[variable] : `${variableWords[variable]} of the ${structureWords(structure)}`);

/** "all fits", or the pair of variables of which a record is set aside. */
export const scopeWords = (scope: SetAsideScope): string => (scope === 'all' ? 'all fits' : `fits of ${axisWords(scope.a.variable, scope.a.structure)} and ${axisWords(scope.b.variable, scope.b.structure)}`);

const axisSlug = (variable: Variable, structure: string | null): string =>
  structure === null ? slugPart[variable] : `${slugPart[variable]}-${structure.replaceAll('_', '-')}`;

/**
 * Permanent address of a standing fit, `y-ystructure--x-xstructure--clade--method`, lower case with hyphens.
 * @param cladeSlug slug of the clade
 */
export function standingFitSlug(question: Question, cladeSlug: string, method: FitMethod): string {
  return [axisSlug(question.y, question.yStructure), axisSlug(question.x, question.xStructure), cladeSlug, method].join('--');
}

/** "cerebral cortex mass on neurons": the question in words, without clade and method. */
export function questionTitle({ y, yStructure, x, xStructure }: Question): string {
  const upper = yStructure === null ? variableWords[y] : `${structureWords(yStructure)} ${variableWords[y]}`;
  const lower = xStructure === null || xStructure === yStructure ? variableWords[x] : `${structureWords(xStructure)} ${variableWords[x]}`;
  return `${upper} on ${lower}`;
}

/** "cerebral cortex mass on neurons, Rodentia, OLS": a standing fit in words. */
export const fitTitle = (question: Question, cladeName: string, method: string): string => `${questionTitle(question)}, ${cladeName}, ${method.toUpperCase()}`;

/**
 * The names with which a sentence speaks of an exponent, or null for a pair whose ratio has no name of its own.
 * A ratio is named only within one structure, or against body mass.
 */
export function exponentWords({ y, yStructure, x, xStructure }: Question): ExponentWords | null {
  const growing = pluralWords[yStructure ?? xStructure ?? ''] ?? 'brains';
  const same = yStructure === xStructure;
  if (same && y === 'structureMassG' && x === 'neurons') return { y: 'mass', x: 'the neurons', growing, ratio: { name: 'density', of: 'x-per-y' } };
  if (same && y === 'structureMassG' && x === 'cells') return { y: 'mass', x: 'the cells', growing, ratio: { name: 'density of cells', of: 'x-per-y' } };
  if (same && y === 'neurons' && x === 'structureMassG') return { y: 'the number of neurons', x: 'mass', growing, ratio: { name: 'density', of: 'y-per-x' } };
  if (same && y === 'cells' && x === 'structureMassG') return { y: 'the number of cells', x: 'mass', growing, ratio: { name: 'density of cells', of: 'y-per-x' } };
  if (same && y === 'otherCells' && x === 'neurons') return { y: 'the number of other cells', x: 'the neurons', growing, ratio: { name: 'other cells per neuron', of: 'y-per-x' } };
  if (y === 'structureMassG' && x === 'bodyMassG') return { y: `the mass of the ${structureWords(yStructure ?? '')}`, x: 'body mass', growing: 'bodies', ratio: { name: 'relative mass', of: 'y-per-x' } };
  return null;
}

const quotients: Partial<Record<Variable, readonly [Variable, Variable]>> = {
  neuronsPerMg: ['neurons', 'structureMassG'],
  cellsPerMg: ['cells', 'structureMassG'],
  otherToNeuronRatio: ['otherCells', 'neurons'],
};

/** True where one variable is made from the other, so that part of the exponent holds by construction. */
export function isMadeFromTheOther({ y, yStructure, x, xStructure }: Question): boolean {
  if (yStructure !== xStructure) return false;
  return (quotients[y]?.includes(x) ?? false) || (quotients[x]?.includes(y) ?? false);
}

/** Whether two variables of a pair are the same quantity of the same structure. */
export const isSameOnBothAxes = ({ y, yStructure, x, xStructure }: Question): boolean => y === x && yStructure === xStructure;
