import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { estimateNeuronFraction, neunHomogeneity } from '../../../shared/domain/neunFraction';
import { restByComplement, sumParts } from '../../../shared/domain/parts';
import { estimateSample } from '../../../shared/domain/sampleEstimate';
import type { SampleInput } from '../../../shared/domain/sampleTypes';
import { combineSamples } from '../../../shared/domain/structureEstimate';

const left: SampleInput = {
  tissueMassG: 0.5,
  suspensionVolumeMl: 10,
  aliquots: [100, 110, 90, 100].map((nuclei) => ({ nuclei, volumeMl: 1e-4 })),
  neun: { positive: 300, total: 500 },
};

describe('a structure made of samples', () => {
  it('is its only sample, with the same limits', () => {
    const structure = combineSamples([{ input: left, suspensionId: null }]);
    const sample = estimateSample(left);
    expect(structure.cells).toEqual(sample.cells);
    expect(structure.neurons).toEqual(sample.neurons);
    expect(structure.neuronsPerMg).toEqual(sample.neuronsPerMg);
    expect(structure.structureMassG).toBe(0.5);
  });

  it('adds two counted sides with errors in quadrature', () => {
    const structure = combineSamples([{ input: left, suspensionId: 'a' }, { input: left, suspensionId: 'b' }]);
    expect(structure.cells.value).toBe(2e7);
    expect(structure.cells.standardError).toBeCloseTo(Math.SQRT2 * 500_000, 4);
    expect(structure.structureMassG).toBe(1);
    expect(structure.cellsPerMg.value).toBeCloseTo(20_000, 8);
  });

  it('adds volume errors linearly where samples share a suspension, else in quadrature', () => {
    const input = { ...left, suspensionVolumeSe: 0.5 };
    const shared = combineSamples([{ input, suspensionId: 'a' }, { input, suspensionId: 'a' }]);
    const apart = combineSamples([{ input, suspensionId: 'a' }, { input, suspensionId: 'b' }]);
    expect(shared.cells.standardError).toBeCloseTo(Math.sqrt(2 * 500_000 ** 2 + (2 * 500_000) ** 2), 4);
    expect(apart.cells.standardError).toBeCloseTo(Math.sqrt(2 * 500_000 ** 2 + 2 * 500_000 ** 2), 4);
  });

  it('scales each sample before the sum and leaves the density as counted', () => {
    const structure = combineSamples([{ input: { ...left, scaleUp: { kind: 'other-side' } }, suspensionId: null }, { input: left, suspensionId: null }]);
    expect(structure.cells.value).toBe(3e7);
    expect(structure.structureMassG).toBe(1.5);
    expect(structure.tissueMassG).toBe(1);
    expect(structure.cellsPerMg.value).toBeCloseTo(20_000, 8);
    expect(structure.scaleUpFactors).toEqual([2, 1]);
  });

  it('gives the mass and counts of one animal for a sample pooled over four', () => {
    const structure = combineSamples([{ input: left, suspensionId: null, animals: 4 }]);
    expect(structure.cells.value).toBe(2.5e6);
    expect(structure.structureMassG).toBe(0.125);
    expect(structure.cellsPerMg.value).toBeCloseTo(20_000, 8);
    expect(() => combineSamples([{ input: left, suspensionId: null, animals: 0 }])).toThrow(RangeError);
  });

  it('has no neurons where one of its samples has none counted', () => {
    const structure = combineSamples([{ input: left, suspensionId: null }, { input: { ...left, neun: null }, suspensionId: null }]);
    expect(structure.neurons).toEqual({ value: null, standardError: null, lower: null, upper: null });
    expect(structure.cells.value).toBe(2e7);
    expect(combineSamples([]).cells.value).toBeNull();
  });
});

describe('the NeuN-positive fraction', () => {
  it('takes the variance between fields where it is the larger, and says so', () => {
    const fields = [{ positive: 90, total: 100 }, { positive: 50, total: 100 }, { positive: 40, total: 100 }];
    const fraction = estimateNeuronFraction({ fields });
    // m/(m−1)·Σ(y − p·x)²/(Σx)² with p = 0.6: 1.5·(900 + 100 + 400)/90000.
    expect(fraction?.standardError).toBeCloseTo(Math.sqrt((1.5 * 1400) / 90_000), 12);
    expect(fraction?.varianceKind).toBe('between-fields');
    expect(neunHomogeneity({ fields })?.p).toBeLessThan(1e-6);
  });

  it('keeps the binomial variance where the fields agree or are fewer than three', () => {
    const agreeing = estimateNeuronFraction({ fields: [{ positive: 60, total: 100 }, { positive: 61, total: 100 }, { positive: 59, total: 100 }] });
    expect(agreeing?.varianceKind).toBe('binomial');
    const two = estimateNeuronFraction({ fields: [{ positive: 90, total: 100 }, { positive: 30, total: 100 }] });
    expect(two?.varianceKind).toBe('binomial');
    expect(two?.standardError).toBeCloseTo(Math.sqrt((0.6 * 0.4) / 200), 12);
  });

  it('keeps an error at 0 and at 1, from the width of the Wilson interval', () => {
    const none = estimateNeuronFraction({ positive: 0, total: 100 });
    const z2 = 1.959963984540054 ** 2;
    expect(none?.lower).toBe(0);
    expect(none?.upper).toBeCloseTo(z2 / (100 + z2), 12);
    expect(none?.standardError).toBeCloseTo(z2 / (100 + z2) / 2 / Math.sqrt(z2), 12);
    const all = estimateNeuronFraction({ positive: 100, total: 100 });
    expect(all?.upper).toBe(1);
    expect(all?.standardError).toBeCloseTo(none?.standardError ?? NaN, 12);
  });

  it('is undefined where nothing was counted or a count is impossible', () => {
    expect(estimateNeuronFraction({ positive: 0, total: 0 })).toBeNull();
    expect(estimateNeuronFraction({ positive: 6, total: 5 })).toBeNull();
    expect(estimateNeuronFraction({ positive: 0.5, total: 5 })).toBeNull();
  });
});

describe('parts of one specimen', () => {
  it('add with errors in quadrature, and not at all where one is missing', () => {
    expect(sumParts([{ value: 3, standardError: 3 }, { value: 4, standardError: 4 }])).toEqual({ value: 7, standardError: 5 });
    expect(sumParts([{ value: 3, standardError: null }, { value: 4, standardError: 4 }])).toEqual({ value: 7, standardError: null });
    expect(sumParts([{ value: 3, standardError: 3 }, null])).toBeNull();
    expect(sumParts([])).toBeNull();
  });

  it('leave a rest by complement, but none where they fill the whole', () => {
    const parts = [{ value: 3, standardError: 3 }];
    expect(restByComplement({ value: 10, standardError: 4 }, parts)).toEqual({ value: 7, standardError: 5 });
    expect(restByComplement({ value: 3, standardError: 4 }, parts)).toBeNull();
    expect(restByComplement(null, parts)).toBeNull();
  });
});

describe('the published rat brain', () => {
  const lines = readFileSync(new URL('../../reference/method/rat_brain.csv', import.meta.url), 'utf8').trim().split('\n').slice(1);
  const rows = lines.map((line) => {
    const [, structure = '', , neurons = '', otherCells = ''] = line.split(',');
    return { structure, neurons: Number(neurons), otherCells: Number(otherCells) };
  });
  const parts = rows.filter((row) => ['cerebral_cortex', 'cerebellum', 'rest_of_brain', 'olfactory_bulb'].includes(row.structure));
  const neurons = sumParts(parts.map((row) => ({ value: row.neurons, standardError: null })));
  const otherCells = sumParts(parts.map((row) => ({ value: row.otherCells, standardError: null })));

  it('has about 330 million cells, 200 million of them neurons', () => {
    expect(parts).toHaveLength(4);
    expect(((neurons?.value ?? NaN) + (otherCells?.value ?? NaN)) / 330e6).toBeCloseTo(1, 1);
    expect((neurons?.value ?? NaN) / 200e6).toBeCloseTo(1, 2);
  });

  it('holds almost 70 % of its neurons in the cerebellum', () => {
    const share = (parts.find((row) => row.structure === 'cerebellum')?.neurons ?? NaN) / (neurons?.value ?? NaN);
    expect(share).toBeGreaterThan(0.67);
    expect(share).toBeLessThan(0.71);
  });
});
