import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { MeanInput, PairQuestion } from '../../../shared/domain/meanInput';
import { formSpeciesMeans, speciesMeans } from '../../../shared/domain/speciesMean';
import { withinSpeciesVariance } from '../../../shared/domain/withinSpeciesVariance';

const noValues = { bodyMassG: null, structureMassG: null, cells: null, neurons: null, otherCells: null, neuronsPerMg: null, cellsPerMg: null, otherToNeuronRatio: null };
let serial = 0;

function record(part: Partial<Omit<MeanInput, 'values'>> & { values?: Partial<MeanInput['values']> } = {}): MeanInput {
  serial += 1;
  return {
    recordNumber: `AK-${String(serial).padStart(6, '0')}`,
    taxonSlug: 'aus-bus', speciesName: 'Aus bus',
    sourceKey: 'paper', sourceKind: 'literature', specimenKey: null,
    n: 4, structure: 'cerebral_cortex', definitionVersion: 1, composition: 'with hippocampus',
    setAside: [], sharesAnimalsWith: [], year: 2010,
    ...part,
    values: { ...noValues, structureMassG: 1, neurons: 100, ...part.values },
  };
}

const cortex: PairQuestion = { x: { variable: 'neurons', structure: 'cerebral_cortex' }, y: { variable: 'structureMassG', structure: 'cerebral_cortex' } };

describe('a species mean', () => {
  it('of one publication is what the publication prints', () => {
    const [mean] = speciesMeans([record({ values: { structureMassG: 0.769, neurons: 31_017_192 } })], cortex);
    expect(mean).toMatchObject({ taxonSlug: 'aus-bus', x: 31_017_192, y: 0.769, sources: 1, n: 4 });
    expect(mean?.contributions.map((part) => [part.axis, part.weight])).toEqual([['both', 1]]);
  });

  it('of one lab is the geometric mean of its specimens', () => {
    const lab = { sourceKey: 'lab', sourceKind: 'specimen', n: 1 } as const;
    const [mean] = speciesMeans(
      [record({ ...lab, specimenKey: 'a', values: { structureMassG: 1, neurons: 100 } }), record({ ...lab, specimenKey: 'b', values: { structureMassG: 4, neurons: 400 } })],
      cortex,
    );
    expect(mean?.x).toBeCloseTo(200, 9);
    expect(mean?.y).toBeCloseTo(2, 12);
    expect(mean?.n).toBe(2);
    expect(mean?.isSingleSpecimen).toBe(false);
  });

  it('adds the parts of a specimen before any mean', () => {
    const lab = { sourceKey: 'lab', sourceKind: 'specimen', n: 1, specimenKey: 'a' } as const;
    const parts = [record({ ...lab, values: { structureMassG: 1, neurons: 100, neuronsPerMg: 0.1 } }), record({ ...lab, values: { structureMassG: 3, neurons: 500, neuronsPerMg: 0.5 / 3 } })];
    const [mean] = speciesMeans(parts, cortex);
    expect([mean?.x, mean?.y, mean?.isSingleSpecimen]).toEqual([600, 4, true]);
    const [density] = speciesMeans(parts, { x: { variable: 'neurons', structure: 'cerebral_cortex' }, y: { variable: 'neuronsPerMg', structure: 'cerebral_cortex' } });
    expect(density?.y).toBeCloseTo(600 / 4000, 12);
  });

  it('weights independent sources by their animals', () => {
    const [mean] = speciesMeans([record({ n: 1, values: { neurons: 100 } }), record({ sourceKey: 'other', n: 3, values: { neurons: 10_000 } })], cortex);
    expect(mean?.x).toBeCloseTo(10 ** (0.25 * 2 + 0.75 * 4), 6);
    expect(mean?.weighting).toBe('animals');
    expect(mean?.contributions.map((part) => part.weight).sort()).toEqual([0.25, 0.75]);
  });

  it('weights sources equally where any number of animals is unknown, and never takes unknown for one', () => {
    const [mean] = speciesMeans([record({ n: null, values: { neurons: 100 } }), record({ sourceKey: 'other', n: 3, values: { neurons: 10_000 } })], cortex);
    expect(mean?.x).toBeCloseTo(1000, 6);
    expect([mean?.weighting, mean?.n]).toEqual(['equal', null]);
  });

  it('takes both values from the same animals and never borrows one', () => {
    const pair: PairQuestion = { x: cortex.x, y: { variable: 'structureMassG', structure: 'cerebellum' } };
    const apart = [record(), record({ sourceKey: 'other', structure: 'cerebellum' })];
    expect(formSpeciesMeans(apart, pair)).toMatchObject({ means: [], emptyReason: expect.stringMatching(/same animals/) });
    const together = [record({ n: 5 }), record({ structure: 'cerebellum', n: 3, values: { structureMassG: 7 } })];
    const [mean] = speciesMeans(together, pair);
    expect([mean?.x, mean?.y, mean?.n]).toEqual([100, 7, 3]);
    expect(mean?.contributions.map((part) => part.axis).sort()).toEqual(['x', 'y']);
  });

  it('takes a body mass from the record of the structure asked for', () => {
    const pair: PairQuestion = { x: { variable: 'bodyMassG', structure: null }, y: { variable: 'structureMassG', structure: 'whole_brain' } };
    const records = [record({ structure: 'whole_brain', values: { structureMassG: 2 } }), record({ sourceKey: 'other', values: { bodyMassG: 300 } })];
    expect(speciesMeans(records, pair)).toEqual([]);
    const [mean] = speciesMeans([record({ structure: 'whole_brain', values: { structureMassG: 2, bodyMassG: 300 } })], pair);
    expect([mean?.x, mean?.y]).toEqual([300, 2]);
  });

  it('says which variable no record holds', () => {
    expect(formSpeciesMeans([record({ values: { neurons: null } })], cortex).emptyReason).toMatch(/on x/);
    expect(formSpeciesMeans([record({ values: { structureMassG: null } })], cortex).emptyReason).toMatch(/on y/);
  });
});

describe('what is set aside', () => {
  const scope = { x: 'structureMassG', y: 'neurons' } as const;

  it('leaves the pair, either variable on x, and stays listed with its value and reason', () => {
    const records = [record({ setAside: [{ scope, reason: 'the published fits leave it out' }] })];
    const { means, leftOut } = formSpeciesMeans(records, cortex);
    expect(means).toHaveLength(1);
    expect(means[0]).toMatchObject({ x: 100, y: 1, setAside: 'the published fits leave it out' });
    expect(leftOut.map((entry) => entry.recordNumber)).toEqual([records[0]?.recordNumber]);
  });

  it('stays in every other pair', () => {
    const records = [record({ setAside: [{ scope, reason: 'r' }], values: { cells: 300 } })];
    const pair: PairQuestion = { x: { variable: 'cells', structure: 'cerebral_cortex' }, y: cortex.y };
    expect(speciesMeans(records, pair)[0]?.setAside).toBeUndefined();
    const otherStructure = [record({ setAside: [{ scope: { ...scope, xStructure: 'cerebellum', yStructure: 'cerebellum' }, reason: 'r' }] })];
    expect(speciesMeans(otherStructure, cortex)[0]?.setAside).toBeUndefined();
  });

  it('leaves the other records of the species to form the mean', () => {
    const records = [record({ setAside: [{ scope: 'all', reason: 'r' }], values: { neurons: 900 } }), record({ sourceKey: 'other', values: { neurons: 100 } })];
    const [mean] = speciesMeans(records, cortex);
    expect([mean?.x, mean?.setAside, mean?.contributions.length]).toEqual([100, undefined, 1]);
  });
});

describe('sources that share animals', () => {
  const later = { sourceKey: 'later', year: 2015 } as const;

  it.each(['same', 'partly', 'unknown'] as const)('(%s) enter once, by the one with most animals', (overlap) => {
    const records = [record({ n: 6, values: { neurons: 100 } }), record({ ...later, n: 3, sharesAnimalsWith: [{ sourceKey: 'paper', overlap }], values: { neurons: 900 } })];
    const { means, leftOut } = formSpeciesMeans(records, cortex);
    expect([means[0]?.x, means[0]?.sources]).toEqual([100, 1]);
    expect(leftOut[0]?.recordNumber).toBe(records[1]?.recordNumber);
  });

  it('enter by the later one on a tie, and both where they share none', () => {
    const tie = [record({ values: { neurons: 100 } }), record({ ...later, sharesAnimalsWith: [{ sourceKey: 'paper', overlap: 'same' }], values: { neurons: 900 } })];
    expect(speciesMeans(tie, cortex)[0]?.x).toBe(900);
    const apart = [record(), record({ ...later, sharesAnimalsWith: [{ sourceKey: 'paper', overlap: 'none' }] })];
    expect(speciesMeans(apart, cortex)[0]?.sources).toBe(2);
  });

  it('do not count where one of them is set aside: the other enters', () => {
    const records = [
      record({ n: 6, values: { neurons: 100 }, setAside: [{ scope: 'all', reason: 'r' }] }),
      record({ ...later, n: 3, sharesAnimalsWith: [{ sourceKey: 'paper', overlap: 'same' }], values: { neurons: 900 } }),
    ];
    expect(speciesMeans(records, cortex)[0]?.x).toBe(900);
  });
});

describe('what enters no mean', () => {
  it('is an unnamed species, another definition, another composition or a value of zero, each with its reason', () => {
    const records = [
      record(), record({ taxonSlug: 'cus-dus', speciesName: 'Cus dus' }),
      record({ taxonSlug: '', speciesName: '' }),
      record({ taxonSlug: 'eus-fus', speciesName: 'Eus fus', definitionVersion: 2 }),
      record({ taxonSlug: 'gus-hus', speciesName: 'Gus hus', composition: 'without hippocampus' }),
      record({ taxonSlug: 'ius-jus', speciesName: 'Ius jus', values: { neurons: 0 } }),
    ];
    const { means, leftOut, definitions } = formSpeciesMeans(records, cortex);
    expect(means.map((mean) => mean.taxonSlug)).toEqual(['aus-bus', 'cus-dus']);
    expect(leftOut).toHaveLength(4);
    expect(definitions.x).toBe('1 · with hippocampus');
  });

  it('follows the definition asked for', () => {
    const records = [record(), record({ taxonSlug: 'eus-fus', speciesName: 'Eus fus', definitionVersion: 2 })];
    const pair: PairQuestion = { x: { ...cortex.x, definitionVersion: 2 }, y: cortex.y };
    expect(speciesMeans(records, pair).map((mean) => mean.taxonSlug)).toEqual(['eus-fus']);
  });

  it('are rows of one source that cannot be paired', () => {
    const pair: PairQuestion = { x: cortex.x, y: { variable: 'structureMassG', structure: 'cerebellum' } };
    const { means, leftOut } = formSpeciesMeans([record(), record(), record({ structure: 'cerebellum' })], pair);
    expect(means).toEqual([]);
    expect(leftOut).toHaveLength(3);
  });

  it('is a question without a structure', () => {
    expect(() => speciesMeans([], { x: { variable: 'bodyMassG', structure: null }, y: { variable: 'bodyMassG', structure: null } })).toThrow(RangeError);
    expect(() => speciesMeans([], { x: { variable: 'neurons', structure: null }, y: cortex.y })).toThrow(RangeError);
  });
});

describe('any set of records', () => {
  const some = fc.array(
    fc.record({
      taxon: fc.constantFrom('aus-bus', 'cus-dus'), source: fc.constantFrom('p', 'q', 'lab'), animal: fc.constantFrom('a', 'b', 'c'),
      n: fc.option(fc.integer({ min: 1, max: 9 })), neurons: fc.integer({ min: 1, max: 1e9 }), mass: fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
      shares: fc.boolean(), aside: fc.boolean(),
    }),
    { minLength: 1, maxLength: 10 },
  ).map((rows) => rows.map((row, i) => record({
    recordNumber: `AK-${String(i + 1).padStart(6, '0')}`, taxonSlug: row.taxon, speciesName: row.taxon, sourceKey: row.source,
    sourceKind: row.source === 'lab' ? 'specimen' : 'literature', specimenKey: row.source === 'lab' ? row.animal : null,
    n: row.source === 'lab' ? 1 : row.n, values: { neurons: row.neurons, structureMassG: row.mass },
    sharesAnimalsWith: row.shares && row.source === 'p' ? [{ sourceKey: 'q', overlap: 'partly' }] : [], setAside: row.aside ? [{ scope: 'all', reason: 'r' }] : [],
  })));

  it('gives the same means in any order, with weights that sum to 1 over animals', () => {
    fc.assert(
      fc.property(some, (records) => {
        const means = speciesMeans(records, cortex);
        expect(speciesMeans([...records].reverse(), cortex)).toEqual(means);
        for (const mean of means) {
          const weightOfAnimals = new Map(mean.contributions.map((part) => [part.specimenKey === null ? part.recordNumber : `${part.sourceKey} ${part.specimenKey}`, part.weight]));
          expect([...weightOfAnimals.values()].reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(1, 12);
        }
      }),
    );
  });

  it('moves with its values: ten times the neurons give ten times the mean', () => {
    fc.assert(
      fc.property(some, (records) => {
        const tenfold = records.map((entry) => ({ ...entry, values: { ...entry.values, neurons: (entry.values.neurons ?? NaN) * 10 } }));
        const means = speciesMeans(records, cortex);
        speciesMeans(tenfold, cortex).forEach((mean, i) => expect(mean.x / (means[i]?.x ?? NaN)).toBeCloseTo(10, 8));
      }),
    );
  });
});

describe('the variance within species', () => {
  const specimen = (taxonSlug: string, specimenKey: string, neurons: number, part: Partial<MeanInput> = {}) =>
    record({ taxonSlug, speciesName: taxonSlug, sourceKey: 'lab', sourceKind: 'specimen', n: 1, specimenKey, values: { neurons }, ...part });

  it('is pooled on log10 over species with two specimens or more, and names them', () => {
    const records = [specimen('aus-bus', 'a', 10), specimen('aus-bus', 'b', 1000), specimen('cus-dus', 'c', 10), specimen('cus-dus', 'd', 10), specimen('cus-dus', 'e', 10), specimen('eus-fus', 'f', 1)];
    // Squares 2 on 1 df, and 0 on 2 df.
    expect(withinSpeciesVariance(records, 'neurons', 'cerebral_cortex')).toEqual({
      variance: 2 / 3, df: 3, species: [{ taxonSlug: 'aus-bus', specimens: 2 }, { taxonSlug: 'cus-dus', specimens: 3 }],
    });
  });

  it('is none where no species has two independent specimens', () => {
    const records = [specimen('aus-bus', 'a', 10), specimen('aus-bus', 'b', 1000, { n: 4 }), specimen('aus-bus', 'c', 10, { setAside: [{ scope: 'all', reason: 'r' }] }), record()];
    expect(withinSpeciesVariance(records, 'neurons', 'cerebral_cortex')).toBeNull();
  });
});
