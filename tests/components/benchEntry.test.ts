import { describe, expect, it } from 'vitest';
import { emptyEntry, nextAliquot, readBench, requestBody, type BenchEntry } from '../../components/bench/benchEntry';
import { dispersionSentence } from '../../components/bench/dispersionSentence';
import { estimateRequestSchema } from '../../shared/contracts/samples';
import { estimateSample } from '../../shared/domain/sampleEstimate';

/** 24 mL, diluted five times, four squares an aliquot. */
function counted(counts: readonly string[], more: Partial<BenchEntry['sample']> = {}): BenchEntry {
  const entry = emptyEntry();
  const aliquots = counts.map((nuclei) => ({ ...nextAliquot(entry.sample), nuclei }));
  return { ...entry, sample: { ...entry.sample, suspensionVolume: { text: '24', unit: 'mL' }, dilution: '5', aliquots, ...more } };
}

describe('the sample calculator', () => {
  it('gives suspension volume × dilution × nuclei ÷ counted volume', () => {
    const { estimate } = readBench(counted(['412', '438', '395', '421']));
    expect(estimate?.cells.value).toBeCloseTo((24 * 5 * 1666) / (4 * 4e-4), 0);
  });

  it('reads a mass in mg and a volume in µL as the same sample', () => {
    const inGrams = readBench(counted(['412', '438'], { tissueMass: { text: '5.5', unit: 'g' } }));
    const inMilligrams = readBench(counted(['412', '438'], { tissueMass: { text: '5500', unit: 'mg' }, suspensionVolume: { text: '24000', unit: 'µL' } }));
    expect(inMilligrams.estimate?.cellsPerMg.value).toBeCloseTo(inGrams.estimate?.cellsPerMg.value ?? Number.NaN, 6);
  });

  it('sends the register numbers from which it computes the same', () => {
    const { input, estimate } = readBench(counted(['412', '438', '395'], { tissueMass: { text: '5.50', unit: 'g' }, scaleUp: { kind: 'other-side', factor: '2', factorSe: '' }, neun: [{ positive: '256', total: '500' }] }));
    if (!input || !estimate) throw new Error('the entry gives a number');
    const answer = estimateSample(estimateRequestSchema.parse(requestBody(input)));
    expect(answer.neurons).toEqual(estimate.neurons);
    expect(answer.cellsPerMg).toEqual(estimate.cellsPerMg);
    expect(answer.aliquotsStillNeeded).toBe(estimate.aliquotsStillNeeded);
  });

  it('says at the field how a dilution is written', () => {
    expect(readBench(counted(['412'], { dilution: '1:5' })).problems['dilution']).toMatch(/5, not 1 : 5/);
    expect(readBench(counted(['412'], { dilution: '0.2' })).problems['dilution']).toMatch(/1 or more/);
  });

  it('gives no number while an entry cannot be read, rather than one without it', () => {
    expect(readBench(counted(['412'], { dilution: '1:5' })).estimate).toBeNull();
    expect(readBench(counted(['412'], { dilution: '' })).estimate).toBeNull();
    expect(readBench(counted(['412', '4l0'])).estimate).toBeNull();
    expect(readBench(counted(['412'])).estimate?.nucleiCounted).toBe(412);
  });

  it('puts what is impossible at the row that was typed, past rows left empty', () => {
    const { problems } = readBench(counted(['', '41.5']));
    expect(Object.keys(problems)).toEqual(['aliquots.1.nuclei']);
  });

  it('says what is missing for a first number', () => {
    const reading = readBench(emptyEntry());
    expect(reading.estimate).toBeNull();
    expect(reading.missing).toEqual(['the suspension volume', 'the nuclei of one aliquot']);
  });

  it('leaves an excluded aliquot out of the count and in the list', () => {
    const entry = counted(['412', '438', '900']);
    const aliquots = entry.sample.aliquots.map((aliquot, index) => (index === 2 ? { ...aliquot, excluded: 'clump' as const } : aliquot));
    const { input, estimate } = readBench({ ...entry, sample: { ...entry.sample, aliquots } });
    expect(input?.aliquots).toHaveLength(3);
    expect(estimate?.nucleiCounted).toBe(850);
  });

  it('never reads four agreeing aliquots as proof that nothing clumps', () => {
    const { estimate } = readBench(counted(['412', '438', '395', '421']));
    if (!estimate) throw new Error('the entry gives a number');
    expect(dispersionSentence(estimate)).toMatch(/no sign of clumping; four aliquots show little/);
    const clumped = readBench(counted(['200', '600', '210', '800'])).estimate;
    if (!clumped) throw new Error('the entry gives a number');
    expect(dispersionSentence(clumped)).toMatch(/more than counting error explains/);
  });
});
