import type { SampleEntry, SpecimenContent, StructureEntry } from '../contracts/content';
import { findChamber } from './chambers';
import type { AliquotInput, NeunCount, SampleInput } from './sampleTypes';
import { combineSamples, type StructureEstimate } from './structureEstimate';
import { parseCount, parseDilution, parseMassG, parseNumber, parseVolumeMl, type ParsedValue } from './units';

/** A text that is no value of its field, by path. */
export interface ReadingProblem {
  path: string;
  message: string;
}

export interface ReadSample {
  path: string;
  /** Null while the suspension volume or every aliquot is missing. */
  input: SampleInput | null;
  tissueMassG: number | null;
  /** Paths, in the content, of the aliquots and NeuN fields of `input`, in its order. */
  aliquotPaths: string[];
  neunPaths: string[];
  suspensionId: string | null;
  animals: number;
  problems: ReadingProblem[];
}

export interface ReadStructure {
  path: string;
  structure: string;
  samples: ReadSample[];
  estimate: StructureEstimate;
  /** Mass of the structure: as weighed apart, else from its samples. */
  structureMassG: number | null;
  weighedMassG: number | null;
  problems: ReadingProblem[];
}

/**
 * Reads one sample as entered into the numbers of the estimate: texts and units into g, mL and counts.
 *
 * Empty aliquots and NeuN fields are passed over; a field that cannot be read becomes a problem with its
 * path and leaves its number out. The counted volume is squares × volume of one square. Excluded aliquots
 * stay in the list, marked. `path` is the place of the sample in the content.
 */
export function readSample(entry: SampleEntry, path: string): ReadSample {
  const problems: ReadingProblem[] = [];
  const read = (parsed: ParsedValue, field: string): number | null => {
    if (parsed.problem !== null) problems.push({ path: `${path}.${field}`, message: parsed.problem });
    return parsed.value;
  };
  const tissueMassG = read(parseMassG(entry.tissueMass), 'tissueMass');
  const suspensionVolumeMl = read(parseVolumeMl(entry.suspensionVolume), 'suspensionVolume');
  const suspensionVolumeSe = read(parseVolumeMl(entry.suspensionVolumeSe), 'suspensionVolumeSe');
  const dilution = read(parseDilution(entry.dilution), 'dilution');
  const dilutionSe = read(parseNumber(entry.dilutionSe), 'dilutionSe');
  const factor = read(parseNumber(entry.scaleUp.factor), 'scaleUp.factor');
  const factorSe = read(parseNumber(entry.scaleUp.factorSe), 'scaleUp.factorSe');
  const squareVolumeMl = findChamber(entry.chamber.key)?.squareVolumeMl ?? read(parseVolumeMl(entry.chamber.squareVolume), 'chamber.squareVolume');

  const aliquots: AliquotInput[] = [];
  const aliquotPaths: string[] = [];
  entry.aliquots.forEach((aliquot, i) => {
    if (isEmptyAliquot(aliquot)) return;
    const nuclei = read(parseNumber(aliquot.nuclei), `aliquots.${i}.nuclei`);
    const squares = read(parseCount(aliquot.squares), `aliquots.${i}.squares`);
    if (nuclei === null || squares === null || squareVolumeMl === null) return;
    aliquots.push({ nuclei, squares, volumeMl: squares * squareVolumeMl, excluded: aliquot.excluded });
    aliquotPaths.push(`${path}.aliquots.${i}`);
  });

  const fields: NeunCount[] = [];
  const neunPaths: string[] = [];
  entry.neun.forEach((field, i) => {
    const positive = read(parseNumber(field.positive), `neun.${i}.positive`);
    const total = read(parseNumber(field.total), `neun.${i}.total`);
    if (positive === null || total === null) return;
    fields.push({ positive, total });
    neunPaths.push(`${path}.neun.${i}`);
  });

  const input: SampleInput | null =
    suspensionVolumeMl === null || aliquots.length === 0
      ? null
      : {
          tissueMassG, suspensionVolumeMl, suspensionVolumeSe, dilution, dilutionSe,
          scaleUp: { kind: entry.scaleUp.kind, factor, factorSe },
          aliquots,
          neun: fields.length === 0 ? null : { fields },
        };
  const suspension = entry.suspension.trim();
  return {
    path, input, tissueMassG, aliquotPaths, neunPaths, problems,
    suspensionId: suspension === '' ? null : suspension,
    animals: 1 + entry.pooledWith.filter((code) => code.trim() !== '').length,
  };
}

/** An aliquot of which nothing was entered but perhaps the usual number of squares. */
function isEmptyAliquot(aliquot: SampleEntry['aliquots'][number]): boolean {
  return aliquot.nuclei.trim() === '';
}

/**
 * Reads a structure with its samples and computes its estimate.
 *
 * The mass is the one weighed apart where entered, else the sum of the samples' scaled masses. A sample
 * that cannot be computed yet makes the structure's counts null. Masses of samples without counts still add.
 */
export function readStructure(entry: StructureEntry, path: string): ReadStructure {
  const samples = entry.samples.map((sample, i) => readSample(sample, `${path}.samples.${i}`));
  const mass = parseMassG(entry.mass);
  const estimate = combineSamples(
    samples.map((sample, i) => ({
      input: sample.input ?? massOnly(entry.samples[i], sample),
      suspensionId: sample.suspensionId,
      animals: sample.animals,
    })),
  );
  return {
    path,
    structure: entry.structure,
    samples,
    estimate,
    weighedMassG: mass.value,
    structureMassG: mass.value ?? estimate.structureMassG,
    problems: [
      ...(mass.problem === null ? [] : [{ path: `${path}.mass`, message: mass.problem }]),
      ...samples.flatMap((sample) => sample.problems),
    ],
  };
}

function massOnly(entry: SampleEntry | undefined, sample: ReadSample): SampleInput {
  const factor = entry ? parseNumber(entry.scaleUp.factor).value : null;
  return {
    tissueMassG: sample.tissueMassG,
    suspensionVolumeMl: NaN,
    aliquots: [],
    scaleUp: entry ? { kind: entry.scaleUp.kind, factor } : null,
  };
}

/** Reads every structure of a specimen; paths are those of the content. */
export function readSpecimen(content: Pick<SpecimenContent, 'structures'>): ReadStructure[] {
  return content.structures.map((structure, i) => readStructure(structure, `structures.${i}`));
}
