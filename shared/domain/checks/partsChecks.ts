import type { CheckResult } from '../../contracts/checks';
import { limits } from './limits';
import { outcome, shortFigure } from './outcome';

/** A structure of one specimen with its mass, all in the same mass state. */
export interface MeasuredStructure {
  path: string;
  structure: string;
  structureMassG: number | null;
}

const BULB = 'olfactory_bulb';
const WITHOUT_BULB = ['cerebral_cortex', 'cerebellum', 'rest_of_brain'] as const;

/** The gross parts that make up a brain; a whole that does not say its extent has parts but no sum. */
const GROSS_PARTS: Readonly<Record<string, readonly string[]>> = {
  whole_brain: [...WITHOUT_BULB, BULB],
  whole_brain_without_olfactory_bulb: WITHOUT_BULB,
  brain_not_specified: WITHOUT_BULB,
};

/** Wholes whose listed parts leave nothing out, so that a sum below the whole means something. */
const SUMMED_WHOLES = ['whole_brain', 'whole_brain_without_olfactory_bulb'];

/** No part is heavier than the whole of the same specimen (or than the body, key `body`). */
export function checkPartHeavierThanWhole(
  structures: readonly MeasuredStructure[],
  parts: Readonly<Record<string, readonly string[]>> = {},
): CheckResult[] {
  const partsOf = { ...parts, ...GROSS_PARTS };
  return structures.flatMap((whole) =>
    structures
      .filter((part) => (partsOf[whole.structure] ?? []).includes(part.structure) || (whole.structure === 'body' && part !== whole))
      .flatMap((part) =>
        whole.structureMassG !== null && part.structureMassG !== null && part.structureMassG > whole.structureMassG
          ? [outcome('blocks', 'part-heavier-than-whole', `${part.path}.mass`,
              `This part is heavier than the ${whole.structure === 'body' ? 'body' : 'whole'} of the same specimen (${shortFigure(whole.structureMassG)} g).`,
              `${shortFigure(part.structureMassG)} g`, `≤ ${shortFigure(whole.structureMassG)} g`)]
          : [],
      ),
  );
}

/** Sum of a whole's parts over its mass, with whether every part is there; null where it cannot be formed. */
export function partsShare(structures: readonly MeasuredStructure[], whole: MeasuredStructure): { share: number; isComplete: boolean; parts: MeasuredStructure[] } | null {
  if (!SUMMED_WHOLES.includes(whole.structure) || whole.structureMassG === null || !(whole.structureMassG > 0)) return null;
  const keys = GROSS_PARTS[whole.structure] ?? [];
  const parts = structures.filter((structure) => keys.includes(structure.structure) && structure.structureMassG !== null);
  const sum = parts.reduce((total, part) => total + (part.structureMassG ?? 0), 0);
  const isComplete = keys.every((key) => parts.some((part) => part.structure === key));
  return parts.length === 0 ? null : { share: sum / whole.structureMassG, isComplete, parts };
}

/**
 * Parts of one specimen against its whole: complete parts sum to 0.92–1.03 of it. With a part missing
 * only the upper limit speaks.
 */
export function checkPartsAndWhole(structures: readonly MeasuredStructure[]): CheckResult[] {
  return structures.flatMap((whole) => {
    const sum = partsShare(structures, whole);
    if (sum === null) return [];
    const isOver = sum.share > limits.partsOfWholeMost;
    const isUnder = sum.isComplete && sum.share < limits.partsOfWholeLeast;
    if (!isOver && !sum.isComplete) return [];
    const percent = (share: number) => `${Number((share * 100).toPrecision(3))} %`;
    const off = percent(Math.abs(sum.share - 1));
    return [
      outcome(isOver || isUnder ? 'warns' : 'passes', 'parts-and-whole', `${whole.path}.mass`,
        isOver
          ? `The parts sum to ${off} more than the whole: was a part weighed twice, or in another state?`
          : isUnder
            ? `The parts sum to ${off} less than the whole: meninges, a part left out, or a side not doubled?`
            : 'The parts sum to the whole.',
        percent(sum.share), `${percent(limits.partsOfWholeLeast)} – ${percent(limits.partsOfWholeMost)}`),
    ];
  });
}

/** A structure stands once in a specimen: its pieces are samples of one entry. */
export function checkStructureTwice(structures: readonly MeasuredStructure[]): CheckResult[] {
  return structures.flatMap((structure, i) =>
    structure.structure !== '' && structures.findIndex((other) => other.structure === structure.structure) < i
      ? [outcome('blocks', 'structure-twice', `${structure.path}.structure`, 'This structure stands twice in the specimen: put its pieces as samples under one entry.', structure.structure, 'once')]
      : [],
  );
}
