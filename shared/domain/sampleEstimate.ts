import { aliquotsForCv, poolAliquots, type PooledAliquots } from './aliquots';
import { checkSample } from './checks/sampleChecks';
import { estimateNeuronFraction } from './neunFraction';
import { finiteOrNull, scaleBy, takeFraction, toQuantity, type Quantity, type Uncertain } from './quantity';
import type { NeuronFraction, SampleEstimate, SampleInput, ScaleUp } from './sampleTypes';

/** The numbers of one sample before rounding into an answer; `structureEstimate` sums them. */
export interface SampleComponents {
  pooled: PooledAliquots | null;
  fraction: NeuronFraction | null;
  tissueMassG: number | null;
  factor: number;
  factorSe: number;
  /** As counted, before any scale-up. */
  counted: { cells: Uncertain | null; neurons: Uncertain | null; otherCells: Uncertain | null };
  /** Scaled up to the structure. */
  scaled: { cells: Uncertain | null; neurons: Uncertain | null; otherCells: Uncertain | null };
}

/** Factor and standard error of a scale-up: 1 for none, 2 for the other side, else as entered. */
export function scaleUpFactor(scaleUp: ScaleUp | null | undefined): { factor: number; factorSe: number } {
  if (!scaleUp || scaleUp.kind === 'none') return { factor: 1, factorSe: 0 };
  const factorSe = scaleUp.factorSe ?? 0;
  if (scaleUp.kind === 'other-side') return { factor: 2, factorSe };
  return { factor: scaleUp.factor ?? 1, factorSe };
}

/** Splits a sample into the numbers that add over samples. Inputs as `estimateSample`. */
export function sampleComponents(input: SampleInput): SampleComponents {
  const pooled = poolAliquots(input);
  const fraction = input.neun ? estimateNeuronFraction(input.neun) : null;
  const { factor, factorSe } = scaleUpFactor(input.scaleUp);
  const cells = pooled?.counted ?? null;
  const p = fraction && { value: fraction.value, variance: fraction.standardError ** 2, lower: fraction.lower, upper: fraction.upper };
  const counted = {
    cells,
    neurons: cells && p ? takeFraction(cells, p) : null,
    otherCells: cells && p ? takeFraction(cells, { ...p, value: 1 - p.value, lower: 1 - p.upper, upper: 1 - p.lower }) : null,
  };
  const scale = (quantity: Uncertain | null) => quantity && scaleBy(quantity, factor, factorSe);
  const mass = input.tissueMassG ?? null;
  return {
    pooled,
    fraction,
    tissueMassG: mass !== null && mass > 0 ? finiteOrNull(mass) : null,
    factor,
    factorSe,
    counted,
    scaled: { cells: scale(counted.cells), neurons: scale(counted.neurons), otherCells: scale(counted.otherCells) },
  };
}

/** Counts per milligram of the tissue counted; members null where mass or count is missing. */
export function perMg(counted: Uncertain | null, tissueMassG: number | null): Quantity {
  return toQuantity(counted && tissueMassG ? scaleBy(counted, 1 / (tissueMassG * 1000)) : null);
}

/**
 * The estimate of one sample: nuclei of a suspension from its aliquots, split by NeuN, scaled up.
 *
 * Inputs: tissue mass in g, volumes in mL, dilution = final ÷ original volume (default 1). Output:
 * cells, neurons, other cells scaled up to the structure, with technical standard error and 95 %
 * limits; per-mg values = counted ÷ tissueMassG, never scaled; `structureMassG` = tissue mass ×
 * factor. `dispersion.p` is the upper tail. Errors entered for suspension volume, dilution and
 * counted volume are shared by all aliquots and enter once, after them, with z = 1.96; the error of
 * a scale-up factor enters the scaled values only.
 * What is undefined is null: no NaN, no infinity. Impossible numbers give null and a check that
 * blocks; nothing is thrown.
 * Source: Herculano-Houzel & Lent 2005, J. Neurosci. 25:2518–2521; limits combined after Zou &
 * Donner 2008, Stat. Med. 27:1693–1702.
 */
export function estimateSample(
  input: SampleInput,
  options: { structure?: string | null; side?: string | null; prefix?: string } = {},
): SampleEstimate {
  const parts = sampleComponents(input);
  const { pooled, fraction, tissueMassG, factor } = parts;
  const total = pooled ? aliquotsForCv(input.targetCv, pooled) : null;
  const estimate: Omit<SampleEstimate, 'checks'> = {
    structureMassG: tissueMassG === null ? null : finiteOrNull(tissueMassG * factor),
    cells: toQuantity(parts.scaled.cells),
    neurons: toQuantity(parts.scaled.neurons),
    otherCells: toQuantity(parts.scaled.otherCells),
    cellsPerMg: perMg(parts.counted.cells, tissueMassG),
    neuronsPerMg: perMg(parts.counted.neurons, tissueMassG),
    otherCellsPerMg: perMg(parts.counted.otherCells, tissueMassG),
    neuronFraction: fraction ?? { value: null, lower: null, upper: null, standardError: null, varianceKind: null, fields: 0 },
    aliquotCv: finiteOrNull(pooled?.aliquotCv),
    poissonCv: pooled && pooled.nucleiCounted > 0 ? 1 / Math.sqrt(pooled.nucleiCounted) : null,
    excessCv: pooled ? excessCv(pooled) : null,
    dispersion: pooled?.dispersion ?? null,
    standardErrorKind: pooled?.standardErrorKind ?? null,
    scaleUpFactor: factor,
    nucleiCounted: pooled?.nucleiCounted ?? 0,
    aliquotsCounted: pooled?.aliquotsCounted ?? 0,
    aliquotsForTargetCv: total,
    aliquotsStillNeeded: total === null || !pooled ? null : Math.max(0, total - pooled.aliquotsCounted),
  };
  const { structure = null, side = null, prefix = '' } = options;
  return { ...estimate, checks: checkSample(input, estimate, { structure, side, prefix }) };
}

/** CV between aliquots beyond counting error: √max(0, CV² − 1/c̄). */
function excessCv(pooled: PooledAliquots): number | null {
  if (pooled.aliquotCv === null || pooled.meanCount <= 0) return null;
  return finiteOrNull(Math.sqrt(Math.max(0, pooled.aliquotCv ** 2 - 1 / pooled.meanCount)));
}
