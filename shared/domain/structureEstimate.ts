import { addUncertain, finiteOrNull, scaleBy, toQuantity, type Quantity, type Uncertain } from './quantity';
import { perMg, sampleComponents, type SampleComponents } from './sampleEstimate';
import type { SampleInput } from './sampleTypes';

export interface StructureSample {
  input: SampleInput;
  /** Samples with the same key came from one suspension and share its errors; null shares nothing. */
  suspensionId: string | null;
  /** Animals pooled in this sample, 1 for a sample of one animal. */
  animals?: number;
}

export interface StructureEstimate {
  structureMassG: number | null;
  /** Mass of what was dissociated, over all animals pooled. */
  tissueMassG: number | null;
  cells: Quantity;
  neurons: Quantity;
  otherCells: Quantity;
  cellsPerMg: Quantity;
  neuronsPerMg: Quantity;
  otherCellsPerMg: Quantity;
  otherToNeuronRatio: number | null;
  /** Whether any sample was scaled up, and by which factors, in order of the samples. */
  scaleUpFactors: number[];
  samples: number;
  animals: number;
}

type Part = 'cells' | 'neurons' | 'otherCells';

/**
 * A structure's estimate as the sum of its samples.
 *
 * Scale-ups apply per sample before the sum. Standard errors add in quadrature; errors of volume and
 * dilution add linearly over samples that share a suspension. Mass and counts of a sample pooled over
 * animals are divided by their number, so that they are those of one animal; densities are not.
 * Densities = Σ counted ÷ Σ tissue mass. A value that any sample lacks is null for the structure:
 * a sum of what happens to be there would be too small. No samples: everything null.
 */
export function combineSamples(samples: readonly StructureSample[]): StructureEstimate {
  const members = samples.map((sample) => ({
    parts: sampleComponents(sample.input),
    suspensionKey: sample.suspensionId,
    animals: sample.animals ?? 1,
  }));
  if (members.some((member) => !Number.isInteger(member.animals) || member.animals < 1)) {
    throw new RangeError('A sample comes from one animal or more, a whole number.');
  }
  type Member = (typeof members)[number];
  const sumOf = (pick: (member: Member) => Uncertain | null): Uncertain | null => {
    const quantities: { quantity: Uncertain; suspensionKey: string | null }[] = [];
    for (const member of members) {
      const quantity = pick(member);
      if (quantity === null) return null;
      quantities.push({ quantity, suspensionKey: member.suspensionKey });
    }
    return quantities.length === 0 ? null : addUncertain(quantities);
  };
  const scaled = (part: Part) =>
    sumOf(({ parts, animals }) => {
      const quantity = parts.scaled[part];
      return quantity && scaleBy(quantity, 1 / animals);
    });
  const counted = (part: Part) => sumOf(({ parts }) => parts.counted[part]);
  const tissueMassG = sumMasses(members.map(({ parts }) => parts.tissueMassG));
  const cells = scaled('cells');
  const neurons = scaled('neurons');
  const otherCells = scaled('otherCells');
  return {
    structureMassG: sumMasses(members.map(({ parts, animals }) => scaledMass(parts, animals))),
    tissueMassG,
    cells: toQuantity(cells),
    neurons: toQuantity(neurons),
    otherCells: toQuantity(otherCells),
    cellsPerMg: perMg(counted('cells'), tissueMassG),
    neuronsPerMg: perMg(counted('neurons'), tissueMassG),
    otherCellsPerMg: perMg(counted('otherCells'), tissueMassG),
    otherToNeuronRatio: neurons && otherCells ? finiteOrNull(otherCells.value / neurons.value) : null,
    scaleUpFactors: members.map(({ parts }) => parts.factor),
    samples: members.length,
    animals: members.reduce((most, member) => Math.max(most, member.animals), 1),
  };
}

function scaledMass(parts: SampleComponents, animals: number): number | null {
  return parts.tissueMassG === null ? null : (parts.tissueMassG * parts.factor) / animals;
}

function sumMasses(masses: readonly (number | null)[]): number | null {
  let sum = 0;
  for (const mass of masses) {
    if (mass === null) return null;
    sum += mass;
  }
  return masses.length === 0 ? null : finiteOrNull(sum);
}
