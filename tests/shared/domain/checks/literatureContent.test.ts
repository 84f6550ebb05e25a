import { describe, expect, it } from 'vitest';
import { literatureContentSchema } from '../../../../shared/contracts/content';
import { checkLiteratureContent } from '../../../../shared/domain/checks/literatureContent';
import { readLiteratureValue } from '../../../../shared/domain/literatureReading';
import { plainLiterature, spoken } from './content';

const context = { today: '2026-06-01' };
type Change = Parameters<typeof plainLiterature>[0];

const cases: [name: string, code: string, triggers: Change, path: string, justNot: Change][] = [
  ['a mass of zero', 'mass-not-positive', (c) => { c.values[0]!.structureMass.text = '0'; }, 'values.0.structureMass.text', (c) => { c.values[0]!.structureMass.text = '0.2'; }],
  ['a negative count', 'count-negative', (c) => { c.values[0]!.neurons.text = '-1'; }, 'values.0.neurons.text', (c) => { c.values[0]!.neurons.text = '0'; }],
  ['a comma in a count', 'not-readable', (c) => { c.values[0]!.neurons.text = '31,017,192'; }, 'values.0.neurons.text', (c) => { c.values[0]!.neurons.text = '31 017 192'; }],
  ['an unknown unit', 'not-readable', (c) => { c.values[0]!.structureMass.unit = 'oz'; }, 'values.0.structureMass.text', (c) => { c.values[0]!.structureMass.unit = 'mg'; }],
  ['no animals', 'not-readable', (c) => { c.values[0]!.structureMass.n = '0'; }, 'values.0.structureMass.n', (c) => { c.values[0]!.structureMass.n = ''; }],
  ['a negative spread', 'spread-negative', (c) => { c.values[0]!.structureMass.spreadText = '-0.1'; }, 'values.0.structureMass.spreadText', (c) => { c.values[0]!.structureMass.spreadText = '0'; }],
  ['a spread larger than its mean', 'spread-exceeds-mean', (c) => { c.values[0]!.structureMass.spreadText = '0.77'; }, 'values.0.structureMass.spreadText', (c) => { c.values[0]!.structureMass.spreadText = '0.769'; }],
  ['cells that are not the sum', 'cells-not-the-sum', (c) => { c.values[0]!.cells.text = '79200000'; }, 'values.0.cells', (c) => { c.values[0]!.cells.text = '79000000'; }],
  ['a publication in the future', 'date-in-the-future', (c) => { c.source.year = '2027'; }, 'source.year', (c) => { c.source.year = '2026'; }],
  ['a malformed DOI', 'doi-malformed', (c) => { c.source.doi = 'pnas.0604911103'; }, 'source.doi', (c) => { c.source.doi = 'https://doi.org/10.1073/pnas.0604911103'; }],
  ['a species and structure given twice', 'listed-twice', (c) => { c.values.push(structuredClone(c.values[0]!)); }, 'values.1.structure', (c) => { c.values.push({ ...structuredClone(c.values[0]!), structure: 'cerebellum' }); }],
];

describe('values of a source without fault', () => {
  it('meet no check that blocks or warns', () => {
    expect(checkLiteratureContent(plainLiterature(), context).filter((check) => check.level !== 'passes')).toEqual([]);
  });
});

describe.each(cases)('%s', (_name, code, triggers, path, justNot) => {
  it(`is found by ${code} at ${path}`, () => {
    expect(spoken(checkLiteratureContent(plainLiterature(triggers), context), code).map((result) => result.split(' ')[1])).toContain(path);
  });

  it('is not found where it just is not so', () => {
    expect(spoken(checkLiteratureContent(plainLiterature(justNot), context), code)).toEqual([]);
  });
});

describe('values of a source', () => {
  it('name everything that is missing at once', () => {
    const empty = literatureContentSchema.parse({ kind: 'literature', source: {}, values: [{ id: 'v' }], provenance: {} });
    expect(spoken(checkLiteratureContent(empty, context), 'missing')).toEqual([
      'blocks source.doi', 'blocks provenance.licenceAccepted', 'blocks values.0.nameAsEntered', 'blocks values.0.taxon', 'blocks values.0.structure', 'blocks values.0.structureMass',
    ]);
  });

  it('are never held against a whole, because means may be of different animals', () => {
    const content = plainLiterature((c) => {
      c.values.push({ ...structuredClone(c.values[0]!), id: 'w', structure: 'whole_brain', structureMass: { ...structuredClone(c.values[0]!.structureMass), text: '0.5' } });
    });
    const codes = checkLiteratureContent(content, context).map((check) => check.code);
    expect(codes).not.toContain('part-heavier-than-whole');
    expect(codes).not.toContain('parts-and-whole');
  });

  it('are read into grams with SD and n, a range kept as text', () => {
    const content = plainLiterature((c) => {
      c.values[0]!.structureMass = { ...c.values[0]!.structureMass, text: '769', unit: 'mg', spreadText: '113' };
      c.values[0]!.neurons = { ...c.values[0]!.neurons, spreadText: '28–34 million', spreadKind: 'range' };
    });
    const read = readLiteratureValue(content.values[0]!, 'values.0');
    expect(read.structureMassG).toEqual({ value: 0.769, spread: 0.113, n: 4 });
    expect(read.neurons).toEqual({ value: 31_017_192, spread: null, n: null });
    expect(read.problems).toEqual([]);
  });
});
