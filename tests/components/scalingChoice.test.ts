import { describe, expect, it } from 'vitest';
import { queryOf, readChoice, writeChoice, type ScalingChoice, type ScalingParams } from '../../components/scaling/scalingChoice';
import { constructionWarning, questionTitle } from '../../components/scaling/variables';

/** What stands in the address: entries that are undefined are not written. */
function throughAddress(choice: ScalingChoice): ScalingChoice {
  const params: ScalingParams = Object.fromEntries(Object.entries(writeChoice(choice)).filter(([, value]) => value !== undefined));
  return readChoice(params);
}

const usual = readChoice({});

describe('the choice of a scaling question', () => {
  it('is cortical mass on neurons by least squares where the address says nothing, and then the address stays bare', () => {
    expect(usual).toMatchObject({ y: 'structureMassG', yStructure: 'cerebral_cortex', x: 'neurons', xStructure: 'cerebral_cortex', clades: null, method: 'ols', level: '0.95', confidence: true, prediction: false });
    expect(Object.values(writeChoice(usual)).every((value) => value === undefined)).toBe(true);
  });

  it.each<[string, Partial<ScalingChoice>]>([
    ['one structure on both axes', { yStructure: 'cerebellum', xStructure: 'cerebellum' }],
    ['two structures, the usual one below', { yStructure: 'cerebellum', xStructure: 'cerebral_cortex' }],
    ['two structures, the usual one above', { yStructure: 'cerebral_cortex', xStructure: 'cerebellum' }],
    ['body mass below', { yStructure: 'whole_brain', x: 'bodyMassG', xStructure: null }],
    ['body mass above', { y: 'bodyMassG', yStructure: null, xStructure: 'whole_brain' }],
    ['neurons on mass', { y: 'neurons', x: 'structureMassG' }],
    ['neurons of one structure on those of another', { y: 'neurons', yStructure: 'cerebellum', x: 'neurons', xStructure: 'cerebral_cortex' }],
    ['chosen clades in their order', { clades: ['rodentia', 'primates'] }],
    ['no clade at all', { clades: [] }],
    ['no band', { confidence: false }],
    ['both bands at another level', { prediction: true, level: '0.99' }],
    ['a species left out and one selected', { without: ['homo-sapiens'], species: 'saimiri-sciureus' }],
    ['a version', { version: '1' }],
    ['the working set', { working: true }],
    ['the major axis', { method: 'sma' }],
  ])('comes back from its address: %s', (_what, part) => {
    const choice = { ...usual, ...part };
    expect(throughAddress(choice)).toEqual(choice);
  });

  it('takes what it does not know for what is usual, rather than ask the register for it', () => {
    expect(readChoice({ y: 'weight', method: 'magic', level: '2' })).toMatchObject({ y: 'structureMassG', method: 'ols', level: '0.95' });
  });

  it('never asks for a major axis of density on neurons, and says why', () => {
    const choice = readChoice({ y: 'neuronsPerMg', method: 'sma' });
    expect(queryOf(choice).method).toBe('ols');
    expect(constructionWarning(choice)).toMatch(/exponent is 1 − b/);
    expect(constructionWarning(usual)).toBeNull();
  });

  it('asks the working set without naming a version', () => {
    expect(queryOf({ ...usual, version: '1', working: true }).version).toBeUndefined();
    expect(queryOf({ ...usual, version: '1' }).version).toBe('1');
  });
});

describe('the title of a question', () => {
  it('names a shared structure once', () => {
    expect(questionTitle(usual)).toBe('Mass of the cerebral cortex on its neurons');
  });

  it('names both structures where they differ, and none for body mass', () => {
    expect(questionTitle({ ...usual, yStructure: 'cerebellum' })).toBe('Mass of the cerebellum on neurons in the cerebral cortex');
    expect(questionTitle({ ...usual, yStructure: 'whole_brain', x: 'bodyMassG', xStructure: null })).toBe('Mass of the whole brain on body mass');
  });
});
