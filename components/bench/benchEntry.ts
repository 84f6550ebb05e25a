import { sampleEntrySchema, type SampleEntry } from '../../shared/contracts/content';
import { estimateSample } from '../../shared/domain/sampleEstimate';
import type { SampleEstimate, SampleInput } from '../../shared/domain/sampleTypes';
import { readSample, type ReadingProblem } from '../../shared/domain/specimenReading';
import { parseNumber } from '../../shared/domain/units';

/** What is typed on the bench: a sample as a submission holds it, and the CV that is aimed at. */
export interface BenchEntry {
  sample: SampleEntry;
  targetCv: string;
}

const emptyAliquot: SampleEntry['aliquots'][number] = { nuclei: '', squares: '4', excluded: null, note: '' };
const emptyField: SampleEntry['neun'][number] = { positive: '', total: '' };

/** The next aliquot takes the number of squares of the one before. */
export function nextAliquot(sample: SampleEntry): SampleEntry['aliquots'][number] {
  return { ...emptyAliquot, squares: sample.aliquots.at(-1)?.squares || '4' };
}

export const nextField = (): SampleEntry['neun'][number] => ({ ...emptyField });

/** Four empty chamber loads of four large squares, as common practice asks. */
export function emptyEntry(): BenchEntry {
  const sample = sampleEntrySchema.parse({ id: 'bench', aliquots: Array.from({ length: 4 }, () => emptyAliquot), neun: [emptyField], tissueMass: { text: '', unit: 'g' }, suspensionVolume: { text: '', unit: 'mL' } });
  return { sample, targetCv: '0.05' };
}

export function isEmptyEntry({ sample }: BenchEntry): boolean {
  return [sample.tissueMass.text, sample.suspensionVolume.text, ...sample.aliquots.map(({ nuclei }) => nuclei), ...sample.neun.flatMap(({ positive, total }) => [positive, total])].every((text) => text.trim() === '');
}

export interface BenchReading {
  /** What the calculator was given; null while a volume or every count is missing. */
  input: SampleInput | null;
  estimate: SampleEstimate | null;
  /** Sentence by path of the field within the sample; `targetCv` stands for itself. */
  problems: Readonly<Record<string, string>>;
  /** What is still missing for a first number, in words. */
  missing: string[];
}

const at = 'sample';

/** Reads the entry and computes it, with the arithmetic of POST /samples/estimate. */
export function readBench({ sample, targetCv }: BenchEntry): BenchReading {
  const read = readSample(sample, at);
  const target = parseNumber(targetCv);
  const problems: Record<string, string> = {};
  const keep = ({ path, message }: ReadingProblem) => {
    problems[path.slice(at.length + 1)] ??= message;
  };
  read.problems.forEach(keep);
  const targetProblem = target.problem ?? (target.value !== null && !(target.value > 0 && target.value <= 1) ? 'The CV aimed at lies above 0 and is at most 1; 0.05 is usual.' : null);
  if (targetProblem) problems['targetCv'] = targetProblem;
  const missing = missingWords(sample);
  // A text that cannot be read would leave its number out, and the rest would be a wrong one.
  const input = read.input && read.problems.length === 0 && missing.length === 0 ? { ...read.input, targetCv: targetProblem ? null : target.value } : null;
  const estimate = input ? estimateSample(input, { side: sample.side, prefix: `${at}.` }) : null;
  // What a number cannot be is said at its field too.
  for (const check of estimate?.checks ?? []) if (check.level === 'blocks' && check.path.startsWith(`${at}.`)) keep({ path: entryPath(check.path, read.aliquotPaths, read.neunPaths), message: check.message });
  return { input, estimate, problems, missing };
}

/** The check counts aliquots and fields that were read; the form counts all of its rows. */
function entryPath(path: string, aliquotPaths: readonly string[], neunPaths: readonly string[]): string {
  const names: Readonly<Record<string, string>> = { [`${at}.tissueMassG`]: `${at}.tissueMass`, [`${at}.suspensionVolumeMl`]: `${at}.suspensionVolume` };
  const aliquot = /^sample\.aliquots\.(\d+)\.(.+)$/.exec(path);
  if (aliquot) return `${aliquotPaths[Number(aliquot[1])] ?? at}.${aliquot[2] === 'volumeMl' ? 'squares' : aliquot[2]}`;
  const field = /^sample\.neun\.fields\.(\d+)\.(.+)$/.exec(path);
  if (field) return `${neunPaths[Number(field[1])] ?? at}.${field[2]}`;
  return names[path] ?? path;
}

function missingWords(sample: SampleEntry): string[] {
  return [
    sample.suspensionVolume.text.trim() === '' ? 'the suspension volume' : null,
    sample.dilution.trim() === '' ? 'the dilution, 1 where there was none' : null,
    sample.chamber.key === 'other' && sample.chamber.squareVolume.text.trim() === '' ? 'the volume of one square' : null,
    sample.aliquots.every(({ nuclei, excluded }) => nuclei.trim() === '' || excluded !== null) ? 'the nuclei of one aliquot' : null,
  ].filter((word) => word !== null);
}

/** The body that POST /samples/estimate would get for the same numbers. */
export function requestBody(input: SampleInput): Record<string, unknown> {
  const { aliquots, scaleUp, ...rest } = input;
  const known = Object.fromEntries(Object.entries(rest).filter(([, value]) => value !== null && value !== undefined));
  const factors = scaleUp && { kind: scaleUp.kind, factor: scaleUp.kind === 'other-side' ? 2 : (scaleUp.factor ?? 1), factorSe: scaleUp.factorSe ?? 0 };
  return { ...known, ...(factors ? { scaleUp: factors } : null), aliquots: aliquots.map(({ nuclei, volumeMl, excluded }) => ({ nuclei, volumeMl, ...(excluded ? { excluded } : null) })) };
}
