import type { CheckResult } from '../../../shared/contracts/checks';

export type StepKey = 'specimen' | 'structures' | 'tissue' | 'source' | 'values' | 'provenance' | 'evidence' | 'check';

export interface Step {
  key: StepKey;
  label: string;
  /** What is asked there, in a line. */
  about: string;
}

const all: Readonly<Record<StepKey, Step>> = {
  specimen: { key: 'specimen', label: 'Specimen', about: 'One animal: its species, where it comes from, its age and body mass.' },
  structures: { key: 'structures', label: 'Structures', about: 'What was dissected and counted, with the raw counts.' },
  tissue: { key: 'tissue', label: 'Tissue and method', about: 'In which state the tissue was weighed, and how it was counted.' },
  source: { key: 'source', label: 'Source', about: 'The publication that prints the values.' },
  values: { key: 'values', label: 'Values', about: 'Each value as printed, with its kind of centre, its spread and its number of animals.' },
  provenance: { key: 'provenance', label: 'Provenance', about: 'Publication, approval, permits, licence.' },
  evidence: { key: 'evidence', label: 'Evidence', about: 'Files that stand behind the counts: photographs, scanned sheets, tables.' },
  check: { key: 'check', label: 'Check and submit', about: 'What the register finds, and where the values lie.' },
};

const order: Readonly<Record<'specimen' | 'literature', readonly StepKey[]>> = {
  specimen: ['specimen', 'structures', 'tissue', 'provenance', 'evidence', 'check'],
  literature: ['source', 'values', 'provenance', 'check'],
};

export const stepsOf = (kind: 'specimen' | 'literature'): Step[] => order[kind].map((key) => all[key]);

/** The step of an address, or the first one. */
export function stepFrom(text: string | undefined, kind: 'specimen' | 'literature'): Step {
  const key = order[kind].find((known) => known === text) ?? order[kind][0] ?? 'check';
  return all[key];
}

const tissueFields = new Set(['massState', 'fixation', 'postMortemIntervalH', 'storageDays', 'method']);

/** The step where a field of a path stands. */
export function stepOfPath(path: string): StepKey {
  const first = path.split('.')[0] ?? '';
  if (tissueFields.has(first)) return 'tissue';
  if (first === 'specimen' || first === 'structures' || first === 'source' || first === 'values' || first === 'provenance') return first;
  return 'check';
}

/** How many entries of a step are missing or impossible, and how many are doubtful. */
export function countOf(step: StepKey, checks: readonly CheckResult[]): { blocks: number; warns: number } {
  const here = checks.filter((check) => stepOfPath(check.path) === step);
  return { blocks: here.filter((check) => check.level === 'blocks').length, warns: here.filter((check) => check.level === 'warns').length };
}
