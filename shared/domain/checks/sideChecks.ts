import type { CheckResult } from '../../contracts/checks';
import type { ScaleUpKind } from '../sampleTypes';
import { limits } from './limits';
import { outcome, shortFigure } from './outcome';
import { partsShare, type MeasuredStructure } from './partsChecks';

export interface SampledStructure extends MeasuredStructure {
  /** Mass weighed apart from the samples, and the sum of the samples' scaled masses. */
  weighedMassG: number | null;
  sampledMassG: number | null;
  samples: readonly { side: string | null; scaleUp: ScaleUpKind; tissueMassG: number | null }[];
}

function isNearDouble(ratio: number): boolean {
  return ratio >= limits.doubleLeast && ratio <= limits.doubleMost;
}

function isDoubled(structure: SampledStructure): boolean {
  return structure.samples.some((sample) => sample.scaleUp === 'other-side');
}

/** The one side declared by all samples, left or right, or null. */
function onlySide(structure: SampledStructure): string | null {
  const side = structure.samples[0]?.side ?? null;
  return (side === 'left' || side === 'right') && structure.samples.every((sample) => sample.side === side) ? side : null;
}

function massOfSide(structure: SampledStructure, side: string): number {
  return structure.samples.reduce((sum, sample) => (sample.side === side ? sum + (sample.tissueMassG ?? NaN) : sum), 0);
}

/** Declared side: one side counted, nothing scaled. */
function byDeclaredSide(structure: SampledStructure): string | null {
  const side = onlySide(structure);
  if (side === null || structure.samples.some((sample) => sample.scaleUp !== 'none')) return null;
  return `Only the ${side} side was counted and nothing was scaled to the other side: are mass and counts those of one side?`;
}

/** Weighed mass twice that of the samples. */
function byWeighedMass(structure: SampledStructure): string | null {
  if (structure.weighedMassG === null || structure.sampledMassG === null || !(structure.sampledMassG > 0)) return null;
  return isNearDouble(structure.weighedMassG / structure.sampledMassG)
    ? 'The structure weighs about twice its samples: was one side counted and not scaled to both?'
    : null;
}

/** The side against its own other side: twice as heavy. */
function byOtherSide(structure: SampledStructure): string | null {
  const left = massOfSide(structure, 'left');
  const right = massOfSide(structure, 'right');
  const ratio = Math.max(left, right) / Math.min(left, right);
  return Number.isFinite(ratio) && isNearDouble(ratio) ? 'One side weighs about twice the other: was one of them entered for both sides?' : null;
}

/** Side not stated where all other parts of the specimen were scaled from one side. */
function byOtherParts(structure: SampledStructure, all: readonly SampledStructure[]): string | null {
  const others = all.filter((other) => other !== structure && other.samples.length > 0 && other.samples.every((sample) => sample.side !== 'midline'));
  const isSilent = structure.samples.every((sample) => (sample.side === null || sample.side === 'not-stated') && sample.scaleUp === 'none');
  return isSilent && others.length > 0 && others.every(isDoubled)
    ? 'The other parts of this specimen were counted on one side and doubled; here no side is stated and nothing is scaled.'
    : null;
}

/** Brain mass: the parts are too light, and doubling this one makes them fit. */
function byBrainMass(structure: SampledStructure, all: readonly SampledStructure[]): string | null {
  for (const whole of all) {
    const sum = partsShare(all, whole);
    if (sum === null || !sum.isComplete || sum.share >= limits.partsOfWholeLeast || isDoubled(structure)) continue;
    const distance = (part: MeasuredStructure) => Math.abs(sum.share + (part.structureMassG ?? NaN) / (whole.structureMassG ?? NaN) - 1);
    // Only the part whose doubling fits best is named: one side is missing, not several.
    const best = [...sum.parts].sort((a, b) => distance(a) - distance(b))[0];
    if (best?.path !== structure.path) continue;
    const doubled = sum.share + (structure.structureMassG ?? NaN) / (whole.structureMassG ?? NaN);
    if (doubled >= limits.partsOfWholeLeast && doubled <= limits.partsOfWholeMost) {
      return `The parts sum to ${shortFigure(sum.share)} of the brain, and to ${shortFigure(doubled)} with this one doubled: was one side counted and not scaled to both?`;
    }
  }
  return null;
}

/**
 * A side that was not doubled, sought within the specimen only: the declared side, the weighed mass, the
 * other side, the other parts, the brain mass. Never on the clade's line, along which halving mass and
 * neurons together moves. One result for each structure with samples.
 */
export function checkSideNotDoubled(structures: readonly SampledStructure[]): CheckResult[] {
  return structures
    .filter((structure) => structure.samples.length > 0)
    .map((structure) => {
      const reason =
        byDeclaredSide(structure) ?? byWeighedMass(structure) ?? byOtherSide(structure) ?? byBrainMass(structure, structures) ?? byOtherParts(structure, structures);
      return outcome(
        reason === null ? 'passes' : 'warns', 'side-not-doubled', `${structure.path}.samples`,
        reason ?? 'Sides and masses of the specimen agree.', reason === null ? null : '×2?', null,
      );
    });
}
