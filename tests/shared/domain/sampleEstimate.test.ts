import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { estimateSample } from '../../../shared/domain/sampleEstimate';
import type { SampleInput } from '../../../shared/domain/sampleTypes';
import reference from '../../reference/method/isotropic_fractionator_examples.json';

type Example = (typeof reference.examples)[number];

function inputOf(example: Example): SampleInput {
  return {
    tissueMassG: example.structure_mass_g,
    suspensionVolumeMl: example.suspension_ml,
    dilution: example.dilution,
    aliquots: example.counts.map((nuclei) => ({ nuclei, volumeMl: example.volume_per_count_ml })),
    neun: { positive: example.neun_positive, total: example.neun_counted },
    targetCv: 0.05,
  };
}

function expectClose(actual: number | null | undefined, expected: number, relative = 1e-9) {
  expect(actual).not.toBeNull();
  expect(Math.abs((actual ?? NaN) / expected - 1)).toBeLessThan(relative);
}

const round = inputOf(reference.examples[0] as Example);

describe.each(reference.examples)('example $id', (example) => {
  const estimate = estimateSample(inputOf(example));
  const countingIsLarger = example.total_cells_se_poisson >= example.total_cells_se_between;

  it('gives the reference cells, fraction, neurons and densities', () => {
    expectClose(estimate.cells.value, example.total_cells);
    expectClose(estimate.neuronFraction.value, example.neuron_fraction);
    expectClose(estimate.neuronFraction.lower, example.neuron_fraction_wilson95[0] ?? NaN);
    expectClose(estimate.neuronFraction.upper, example.neuron_fraction_wilson95[1] ?? NaN);
    expectClose(estimate.neurons.value, example.neurons);
    expectClose(estimate.otherCells.value, example.nonneurons);
    expectClose(estimate.neuronsPerMg.value, example.neurons_per_mg);
    expectClose(estimate.otherCellsPerMg.value, example.nonneurons_per_mg);
  });

  it('gives the reference CVs and dispersion', () => {
    expectClose(estimate.aliquotCv, example.cv_between_aliquots);
    expectClose(estimate.poissonCv, example.poisson_cv_of_total_count);
    expectClose(estimate.dispersion?.statistic, example.dispersion_index);
    expect(estimate.dispersion?.df).toBe(example.dispersion_df);
    expectClose(estimate.dispersion?.p, example.dispersion_p);
  });

  it('takes the larger of the two errors, with the limits that belong to it', () => {
    expect(estimate.standardErrorKind).toBe(countingIsLarger ? 'counting' : 'between-aliquots');
    expectClose(estimate.cells.standardError, Math.max(example.total_cells_se_between, example.total_cells_se_poisson));
    const limits = countingIsLarger ? example.total_cells_ci95_poisson_exact : example.total_cells_ci95_t;
    expectClose(estimate.cells.lower, limits[0] ?? NaN);
    expectClose(estimate.cells.upper, limits[1] ?? NaN);
  });

  it('gives the neurons the reference error, with the larger error of the cells and the product term', () => {
    const f = example.neuron_fraction;
    const fractionCv2 = (1 - f) / (f * example.neun_counted);
    // The reference follows the CV of the mean throughout and leaves the product of the variances out.
    expectClose(example.neurons_cv_delta, Math.sqrt(example.cv_of_mean ** 2 + fractionCv2));
    const cellsCv2 = Math.max(example.cv_of_mean, example.poisson_cv_of_total_count) ** 2;
    const withoutProduct = example.neurons * Math.sqrt(cellsCv2 + fractionCv2);
    expectClose(estimate.neurons.standardError, example.neurons * Math.sqrt(cellsCv2 + fractionCv2 + cellsCv2 * fractionCv2));
    // The product term is 0.28 % where the aliquots scatter by 0.38, else below 2e-3.
    expectClose(estimate.neurons.standardError, withoutProduct, countingIsLarger ? 2e-3 : 3e-3);
    if (!countingIsLarger) expectClose(estimate.otherCells.standardError, example.nonneurons_se_delta, 3e-3);
  });
});

describe('a sample estimate', () => {
  it('doubles mass, counts and errors of one side, and leaves the densities as counted', () => {
    const one = estimateSample(round);
    const both = estimateSample({ ...round, scaleUp: { kind: 'other-side' } });
    expect(both.structureMassG).toBe(1);
    expectClose(both.neurons.value, 2 * (one.neurons.value ?? NaN), 1e-14);
    expectClose(both.neurons.standardError, 2 * (one.neurons.standardError ?? NaN), 1e-14);
    expectClose(both.cells.upper, 2 * (one.cells.upper ?? NaN), 1e-14);
    expect(both.neuronsPerMg).toEqual(one.neuronsPerMg);
    expect(both.checks.some((check) => check.code === 'scaled-to-both-sides' && check.level === 'passes')).toBe(true);
  });

  it('adds the error of a scale-up factor to the scaled counts only', () => {
    const certain = estimateSample({ ...round, scaleUp: { kind: 'mass-fraction', factor: 4, factorSe: 0 } });
    const uncertain = estimateSample({ ...round, scaleUp: { kind: 'mass-fraction', factor: 4, factorSe: 0.4 } });
    // 10⁷ cells, counting SE 5·10⁵: √(16·25e10 + 1e14·0.16 + 0.16·25e10).
    expectClose(uncertain.cells.standardError, Math.sqrt(16 * 25e10 + 1e14 * 0.16 + 0.16 * 25e10), 1e-12);
    expect(uncertain.cellsPerMg).toEqual(certain.cellsPerMg);
  });

  it('lets the errors of volume and dilution enter once, whatever the number of aliquots', () => {
    const estimate = estimateSample({ ...round, suspensionVolumeSe: 0.5, dilutionSe: 0.03 });
    const variance = 500_000 ** 2 + (1e7 * 0.05) ** 2 + (1e7 * 0.03) ** 2;
    expectClose(estimate.cells.standardError, Math.sqrt(variance), 1e-12);
  });

  it('takes the errors of counted volumes as one error of the chamber', () => {
    const aliquots = round.aliquots.map((aliquot) => ({ ...aliquot, volumeSe: 2e-6 }));
    expectClose(estimateSample({ ...round, aliquots }).cells.standardError, Math.hypot(500_000, 1e7 * 0.02), 1e-12);
  });

  it('weights aliquots of unequal volumes by their volume', () => {
    const estimate = estimateSample({ suspensionVolumeMl: 10, aliquots: [{ nuclei: 100, volumeMl: 1e-4 }, { nuclei: 500, volumeMl: 4e-4 }] });
    expectClose(estimate.cells.value, 10 * (600 / 5e-4), 1e-12);
    // k/(k−1)·Σ(c − e·r)² with r = 1.2e6: expected 120 and 480.
    expectClose(estimate.cells.standardError, (10 * Math.sqrt(2 * (20 ** 2 + 20 ** 2))) / 5e-4, 1e-12);
  });

  it('leaves excluded aliquots out of the sum', () => {
    const spoilt = { ...round, aliquots: [...round.aliquots, { nuclei: 3, volumeMl: 1e-4, excluded: 'bubble' }] };
    expect(estimateSample(spoilt).cells).toEqual(estimateSample(round).cells);
  });

  it('gives a single aliquot its counting error alone', () => {
    const estimate = estimateSample({ ...round, aliquots: [{ nuclei: 100, volumeMl: 1e-4 }] });
    expect(estimate.standardErrorKind).toBe('counting');
    expect(estimate.aliquotCv).toBeNull();
    expect(estimate.dispersion).toBeNull();
    expectClose(estimate.cells.standardError, 1e6, 1e-12);
  });

  it('leaves masses and densities null where no tissue mass is given', () => {
    const estimate = estimateSample({ ...round, tissueMassG: null });
    expect([estimate.structureMassG, estimate.cellsPerMg.value, estimate.neuronsPerMg.value]).toEqual([null, null, null]);
    expectClose(estimate.cells.value, 1e7);
  });

  it('answers no nuclei at all with zero, an upper limit and no error', () => {
    const estimate = estimateSample({ ...round, aliquots: [{ nuclei: 0, volumeMl: 1e-4 }, { nuclei: 0, volumeMl: 1e-4 }] });
    expect(estimate.cells.value).toBe(0);
    expect(estimate.cells.standardError).toBeNull();
    expect(estimate.cells.lower).toBe(0);
    // −ln 0.025 nuclei in twice 10⁻⁴ mL of 10 mL.
    expectClose(estimate.cells.upper, (-Math.log(0.025) * 10) / 2e-4, 1e-9);
    expect([estimate.aliquotCv, estimate.poissonCv, estimate.dispersion]).toEqual([null, null, null]);
  });

  it('gives nothing but a check that blocks where a number is impossible', () => {
    for (const broken of [
      { ...round, suspensionVolumeMl: -1 },
      { ...round, suspensionVolumeMl: NaN },
      { ...round, dilution: 0.2 },
      { ...round, aliquots: [{ nuclei: 1.5, volumeMl: 1e-4 }] },
      { ...round, aliquots: [{ nuclei: 10, volumeMl: 0 }] },
    ]) {
      const estimate = estimateSample(broken);
      expect(numbersIn([estimate.cells, estimate.neurons])).toEqual([]);
      expect(estimate.checks.some((check) => check.level === 'blocks')).toBe(true);
    }
    expect(estimateSample({ ...round, aliquots: [] }).cells.value).toBeNull();
  });

  it('counts the aliquots that a wished CV of the mean needs', () => {
    // CV 0.3758 needs (0.3758/0.05)² = 56.5 aliquots.
    const scattered = estimateSample(inputOf(reference.examples[2] as Example));
    expect(scattered.aliquotsForTargetCv).toBe(57);
    expect(scattered.aliquotsStillNeeded).toBe(53);
    expect(estimateSample(round).aliquotsForTargetCv).toBe(4);
    // One aliquot of 20: the counting rule 1/(0.05²·20) alone.
    const single = estimateSample({ ...round, aliquots: [{ nuclei: 20, volumeMl: 1e-4 }] });
    expect(single.aliquotsForTargetCv).toBe(20);
    expect(estimateSample({ ...round, targetCv: null }).aliquotsForTargetCv).toBeNull();
    expect(estimateSample({ ...round, targetCv: 0.5 }).aliquotsStillNeeded).toBe(0);
  });

  it('keeps the exact Poisson limits of large counts', () => {
    // scipy 1.10 chi2.ppf(0.975, 4802)/2 and chi2.ppf(0.025, 4800)/2 of 2,400 nuclei, on 2,400.
    const estimate = estimateSample({ suspensionVolumeMl: 1, aliquots: [{ nuclei: 2400, volumeMl: 1 }] });
    expectClose(estimate.cells.upper, 4995.963701365125 / 2, 1e-11);
    expectClose(estimate.cells.lower, 4609.86480179572 / 2, 1e-11);
  });
});

const aliquot = fc.record({ nuclei: fc.integer({ min: 0, max: 5000 }), volumeMl: fc.constantFrom(1e-4, 2e-4, 4e-4, 9e-4) });
const sample = fc.record({
  tissueMassG: fc.double({ min: 1e-3, max: 100, noNaN: true }),
  suspensionVolumeMl: fc.double({ min: 0.1, max: 500, noNaN: true }),
  dilution: fc.double({ min: 1, max: 50, noNaN: true }),
  aliquots: fc.array(aliquot, { minLength: 1, maxLength: 9 }),
  neun: fc.tuple(fc.integer({ min: 0, max: 900 }), fc.integer({ min: 1, max: 900 })).map(([a, b]) => ({ positive: Math.min(a, b), total: Math.max(a, b) })),
});
const hostile = fc.record({
  tissueMassG: fc.double(),
  suspensionVolumeMl: fc.double(),
  dilution: fc.double(),
  suspensionVolumeSe: fc.double({ min: 0 }),
  aliquots: fc.array(fc.record({ nuclei: fc.oneof(fc.double(), fc.integer()), volumeMl: fc.double() }), { maxLength: 4 }),
  neun: fc.record({ positive: fc.oneof(fc.double(), fc.integer()), total: fc.integer() }),
  targetCv: fc.double(),
});

function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  return value !== null && typeof value === 'object' ? Object.values(value).flatMap(numbersIn) : [];
}

describe('the arithmetic of any sample', () => {
  it('gives twice the cells for twice the suspension volume', () => {
    fc.assert(
      fc.property(sample, (input) => {
        const once = estimateSample(input).neurons;
        const twice = estimateSample({ ...input, suspensionVolumeMl: 2 * input.suspensionVolumeMl }).neurons;
        expect(twice?.value).toBeCloseTo(2 * (once?.value ?? NaN), -Math.log10((once?.value ?? 1) * 1e-9 + 1e-9));
        if (once?.standardError) expectClose(twice?.standardError, 2 * once.standardError, 1e-9);
      }),
    );
  });

  it('does not depend on the order of the aliquots', () => {
    fc.assert(
      fc.property(sample, (input) => {
        const forward = estimateSample(input);
        const backward = estimateSample({ ...input, aliquots: [...input.aliquots].reverse() });
        if ((forward.cells.value ?? 0) > 0) expectClose(backward.cells.standardError, forward.cells.standardError ?? NaN, 1e-9);
        expect(backward.nucleiCounted).toBe(forward.nucleiCounted);
      }),
    );
  });

  it('splits the cells into neurons and other cells without remainder', () => {
    fc.assert(
      fc.property(sample, (input) => {
        const { cells, neurons, otherCells } = estimateSample(input);
        const sum = (neurons?.value ?? NaN) + (otherCells?.value ?? NaN);
        expect(Math.abs(sum - (cells?.value ?? NaN))).toBeLessThanOrEqual(1e-9 * (cells?.value ?? NaN));
      }),
    );
  });

  it('holds every value within its limits', () => {
    fc.assert(
      fc.property(sample, (input) => {
        for (const quantity of [estimateSample(input).cells, estimateSample(input).neurons, estimateSample(input).otherCells]) {
          expect(quantity?.lower).toBeLessThanOrEqual((quantity?.value ?? NaN) * (1 + 1e-12));
          expect(quantity?.upper).toBeGreaterThanOrEqual((quantity?.value ?? NaN) * (1 - 1e-12));
        }
      }),
    );
  });

  it('lets no NaN and no infinity out, whatever comes in', () => {
    fc.assert(
      fc.property(hostile, (input) => {
        const { checks: _checks, ...numbers } = estimateSample(input);
        expect(numbersIn(numbers).filter((value) => !Number.isFinite(value))).toEqual([]);
      }),
      { numRuns: 1000 },
    );
  });
});
