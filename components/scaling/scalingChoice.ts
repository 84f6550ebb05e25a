import { variables, type Variable } from '../../shared/contracts/vocabulary';
import type { ScalingQuery } from '../queries/scaling';
import { isMadeFromTheOther } from './variables';

export const methods = ['ols', 'sma'] as const;
export const levels = ['0.9', '0.95', '0.99'] as const;
export type Method = (typeof methods)[number];
export type Level = (typeof levels)[number];

/** What the Scaling screen shows, as its address holds it. */
export interface ScalingChoice {
  y: Variable;
  yStructure: string | null;
  x: Variable;
  xStructure: string | null;
  /** Slugs; null leaves the choice to the register (the clades with standing fits). */
  clades: readonly string[] | null;
  method: Method;
  level: Level;
  confidence: boolean;
  prediction: boolean;
  without: readonly string[];
  /** Slug of the selected species. */
  species: string | null;
  /** A frozen version by its label; null is the one frozen last. */
  version: string | null;
  working: boolean;
}

export type ScalingParams = Partial<Record<'y' | 'yStructure' | 'x' | 'xStructure' | 'clades' | 'method' | 'level' | 'bands' | 'without' | 'species' | 'version' | 'set', string>>;

const usual = { y: 'structureMassG', x: 'neurons', structure: 'cerebral_cortex', method: 'ols', level: '0.95', bands: 'confidence' } as const;

function oneOf<Value extends string>(known: readonly Value[], text: string | undefined, fallback: Value): Value {
  return known.find((value) => value === text) ?? fallback;
}

const listOf = (text: string | undefined): string[] => [...new Set((text ?? '').split(',').map((part) => part.trim()).filter((part) => part !== ''))];

/** Reads the address; what it does not say is the usual question: cortical mass on neurons by least squares. */
export function readChoice(params: ScalingParams): ScalingChoice {
  const y = oneOf(variables, params.y, usual.y);
  const x = oneOf(variables, params.x, y === usual.x ? 'structureMassG' : usual.x);
  const named = params.yStructure ?? params.xStructure ?? usual.structure;
  const yStructure = y === 'bodyMassG' ? null : (params.yStructure ?? named);
  const xStructure = x === 'bodyMassG' ? null : (params.xStructure ?? named);
  const bands = listOf(params.bands ?? usual.bands);
  const method = oneOf(methods, params.method, usual.method);
  return {
    y,
    yStructure,
    x,
    xStructure,
    clades: params.clades === undefined ? null : listOf(params.clades).filter((slug) => slug !== 'none'),
    // A standardised major axis of a quotient on its own part has no meaning; the register refuses it.
    method: isMadeFromTheOther({ y, yStructure, x, xStructure }) ? 'ols' : method,
    level: oneOf(levels, params.level, usual.level),
    confidence: bands.includes('confidence'),
    prediction: bands.includes('prediction'),
    without: listOf(params.without),
    species: params.species ?? null,
    version: params.version ?? null,
    working: params.set === 'working',
  };
}

/** The address of a choice; what is usual is left out. An undefined entry takes a parameter away. */
export function writeChoice(choice: ScalingChoice): Record<keyof ScalingParams, string | undefined> {
  const bands = [choice.confidence ? 'confidence' : null, choice.prediction ? 'prediction' : null].filter((band) => band !== null).join(',') || 'none';
  const unless = (text: string, plain: string) => (text === plain ? undefined : text);
  // An axis that names no structure takes the other's: two that differ are both named.
  const { yStructure, xStructure } = choice;
  const differ = yStructure !== null && xStructure !== null && yStructure !== xStructure;
  return {
    y: unless(choice.y, usual.y),
    yStructure: yStructure === null ? undefined : differ ? yStructure : unless(yStructure, usual.structure),
    x: choice.x === usual.x && choice.y !== usual.x ? undefined : choice.x,
    xStructure: xStructure === null ? undefined : differ ? xStructure : yStructure === null ? unless(xStructure, usual.structure) : undefined,
    clades: choice.clades === null ? undefined : choice.clades.join(',') || 'none',
    method: unless(choice.method, usual.method),
    level: unless(choice.level, usual.level),
    bands: unless(bands, usual.bands),
    without: choice.without.join(',') || undefined,
    species: choice.species ?? undefined,
    version: choice.version ?? undefined,
    set: choice.working ? 'working' : undefined,
  };
}

/** What the register is asked. */
export function queryOf(choice: ScalingChoice): ScalingQuery {
  return {
    version: choice.working ? undefined : (choice.version ?? undefined),
    y: choice.y,
    yStructure: choice.yStructure ?? undefined,
    x: choice.x,
    xStructure: choice.xStructure ?? undefined,
    clades: choice.clades ?? [],
    method: choice.method,
    level: Number(choice.level),
    without: choice.without,
  };
}

/** Address within the app that shows the same again; `version` pins the frozen version it was read from. */
export function addressOf(choice: ScalingChoice, version: string): string {
  const parameters = new URLSearchParams();
  for (const [name, value] of Object.entries(writeChoice({ ...choice, version: choice.working ? null : version }))) if (value !== undefined) parameters.set(name, value);
  // A comma may stand as it is, and reads better in a citation.
  return `/scaling?${parameters.toString().replaceAll('%2C', ',')}`;
}
