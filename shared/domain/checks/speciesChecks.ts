import type { CheckResult } from '../../contracts/checks';
import { formatRatio } from '../quantityText';
import type { OtherSpecimen } from './context';
import { limits } from './limits';
import { outcome } from './outcome';

/** Gross parts and finer ones are bounded by different criteria rightly: within a specimen only finer parts are compared. */
const GROSS = ['cerebral_cortex', 'cerebellum', 'rest_of_brain', 'olfactory_bulb', 'whole_brain', 'whole_brain_without_olfactory_bulb', 'brain_not_specified'];

/**
 * Neurons against the species' other specimens (their geometric mean): within 1.7 times, or 2 times for
 * the olfactory bulb and the rest of the brain. Null where there is nothing to compare.
 */
export function checkSecondSpecimen(
  own: { path: string; structure: string; neurons: number | null },
  others: readonly OtherSpecimen[],
): CheckResult | null {
  const known = others.flatMap((other) => (other.structure === own.structure && other.neurons !== null && other.neurons > 0 ? [other.neurons] : []));
  if (own.neurons === null || !(own.neurons > 0) || known.length === 0) return null;
  const mean = 10 ** (known.reduce((sum, neurons) => sum + Math.log10(neurons), 0) / known.length);
  const ratio = own.neurons / mean;
  const limit = limits.looseStructures.includes(own.structure) ? limits.secondSpecimenLoose : limits.secondSpecimen;
  const isFar = Math.max(ratio, 1 / ratio) > limit;
  return outcome(
    isFar ? 'warns' : 'passes', 'second-specimen', own.path,
    isFar
      ? `The neurons are ${formatRatio(ratio)} times those of the species’ ${known.length === 1 ? 'other specimen' : `${known.length} other specimens`}: further than specimens of one species usually lie.`
      : 'The neurons agree with those of the species’ other specimens.',
    formatRatio(ratio), `${formatRatio(1 / limit)} – ${limit}`,
  );
}

/**
 * Delineation of one structure by one criterion: the finer parts of a specimen share a criterion, and a
 * structure one with the register's records of it. An entry without criteria is passed over.
 */
export function checkDelineation(
  structures: readonly { path: string; structure: string; delineation: readonly string[] }[],
  register: Readonly<Record<string, readonly string[]>> = {},
): CheckResult[] {
  const stated = structures.filter((structure) => structure.delineation.length > 0);
  const finer = stated.filter((structure) => !GROSS.includes(structure.structure));
  const first = finer[0];
  return stated.flatMap((structure) => {
    const shares = (criteria: readonly string[]) => criteria.some((criterion) => structure.delineation.includes(criterion));
    const held = register[structure.structure] ?? [];
    const isUnlikeSpecimen = first !== undefined && finer.includes(structure) && !shares(first.delineation);
    const isUnlikeRegister = held.length > 0 && !shares(held);
    if (!isUnlikeSpecimen && !isUnlikeRegister) return [];
    return [
      outcome('warns', 'delineation-mixed', `${structure.path}.delineation`,
        isUnlikeRegister
          ? 'The register’s records of this structure are bounded by another criterion; areas bounded in different ways are not the same area.'
          : 'Parts of this specimen are bounded by different criteria; areas bounded in different ways are not comparable.',
        structure.delineation.join(', '), (isUnlikeRegister ? held : (first?.delineation ?? [])).join(', ')),
    ];
  });
}
