import { describe, expect, it } from 'vitest';
import type { FitDefinition } from '../../server/services/dataset/standingFits';
import { computeStandingFits } from '../../server/services/dataset/standingFits';
import { lineContext, placeRecord } from '../../server/services/dataset/places';
import { speciesMeansFor } from '../../server/services/dataset/means';
import { standingFitSlug, type Question } from '../../server/services/dataset/questions';
import { lineageOf, makeRow, referenceRows, reproducibleExponents, settingAside } from '../support/referenceRows';

const massOnNeurons = (structure: string): Question => ({ y: 'structureMassG', yStructure: structure, x: 'neurons', xStructure: structure });

function definition(question: Question, clade: string, path: string, method: 'ols' | 'sma' = 'ols'): FitDefinition {
  return { ...question, id: clade, slug: standingFitSlug(question, clade.toLowerCase(), method), method, cladeId: clade, cladeSlug: clade.toLowerCase(), cladeName: clade, cladePath: path };
}

const pathOfClade = (clade: string, member: string) => {
  const lineage = lineageOf(member);
  return lineage.slice(0, lineage.indexOf(clade) + 1).join(' > ');
};
const members: Record<string, string> = { Glires: 'Mus musculus', Rodentia: 'Mus musculus', Primates: 'Homo sapiens', Afrotheria: 'Loxodonta africana' };
const reason = 'Lies far above the line of the other rodents.';
const rows = referenceRows();
const versionOne = settingAside(rows, 'Heterocephalus glaber', 'cerebral_cortex', reason);

describe('standing fits of the published tables', () => {
  it.each(reproducibleExponents())('give back the exponent $published_exponent of $clade, $structure, without "$without"', (expected) => {
    const clade = expected['clade'] ?? '';
    const structure = expected['structure'] ?? '';
    const without = expected['without'] ?? '';
    const chosen = without === '' ? rows : settingAside(rows, without, structure, reason);
    const [fit] = computeStandingFits(chosen, [definition(massOnNeurons(structure), clade, pathOfClade(clade, members[clade] ?? ''))]);
    expect(fit?.result.n).toBe(Number(expected['n']));
    expect(fit?.result.exponent?.estimate).toBeCloseTo(Number(expected['exponent']), 5);
    expect(fit?.result.exponent?.standardError).toBeCloseTo(Number(expected['standard_error']), 5);
    expect(fit?.exclusions.map(({ species }) => species)).toEqual(without === '' ? [] : [without]);
  });

  it('show rodent cortex as 1.692 ± 0.102 without the naked mole-rat and as 1.512 ± 0.120 with it, which is then influential and watched, no outlier', () => {
    const rodents = definition(massOnNeurons('cerebral_cortex'), 'Rodentia', pathOfClade('Rodentia', 'Mus musculus'));
    const [without] = computeStandingFits(versionOne, [rodents]);
    expect([without?.result.n, without?.result.exponent?.estimate.toFixed(3), without?.result.exponent?.standardError?.toFixed(3)]).toEqual([9, '1.692', '0.102']);
    expect(without?.exclusions).toMatchObject([{ species: 'Heterocephalus glaber', reason }]);
    const [withIt] = computeStandingFits(rows, [rodents]);
    expect([withIt?.result.n, withIt?.result.exponent?.estimate.toFixed(3), withIt?.result.exponent?.standardError?.toFixed(3)]).toEqual([10, '1.512', '0.120']);
    const own = withIt?.result.points.find(({ id }) => id === 'heterocephalus-glaber');
    expect(own?.flags).toEqual(['influential', 'watch']);
    const numbers = rows.filter(({ row }) => row.species === 'Heterocephalus glaber' && row.structure === 'cerebral_cortex').map(({ recordId }) => recordId);
    expect(withIt?.flags.filter(({ recordId }) => numbers.includes(recordId)).map(({ kind }) => kind)).toEqual(['influential', 'watch']);
  });

  it('move when one row is altered', () => {
    const rodents = definition(massOnNeurons('cerebral_cortex'), 'Rodentia', pathOfClade('Rodentia', 'Mus musculus'));
    const altered = versionOne.map((one) => (one.row.species === 'Mus musculus' && one.row.structure === 'cerebral_cortex' ? { ...one, row: { ...one.row, structureMassG: 0.346 } } : one));
    const [fit] = computeStandingFits(altered, [rodents]);
    expect(Math.abs((fit?.result.exponent?.estimate ?? 1.692) - 1.692)).toBeGreaterThan(0.01);
  });

  it('answer below five species with the reason instead of a line', () => {
    const [fit] = computeStandingFits(rows, [definition(massOnNeurons('cerebral_cortex'), 'Eulipotyphla', pathOfClade('Eulipotyphla', 'Blarina brevicauda'))]);
    expect(fit?.result).toMatchObject({ n: 4, exponent: null, unfit: { code: 'too-few-points', message: '4 species hold both values here; a fit that the register keeps needs 5.' } });
  });

  it('never pool the brain masses of two tables', () => {
    const brains = speciesMeansFor(rows, { y: 'structureMassG', yStructure: 'brain_not_specified', x: 'bodyMassG', xStructure: null });
    const sources = new Set(brains.points.flatMap(({ contributions }) => contributions.map(({ source }) => source)));
    expect([...sources]).toEqual(['allison-cicchetti-1976']);
    const rhesus = brains.points.find(({ slug }) => slug === 'macaca-mulatta');
    expect(rhesus?.y).toBe(179);
  });
});

describe('the place on a line', () => {
  const human = rows.find(({ row }) => row.species === 'Homo sapiens' && row.structure === 'cerebral_cortex')?.row;
  const thing = { taxonSlug: 'homo-sapiens', lineage: lineageOf('Homo sapiens'), structure: 'cerebral_cortex', definitionVersion: 1, structureMassG: human?.structureMassG ?? null, neurons: human?.neurons ?? null, isSingleSpecimen: false };

  it('puts the human cortex at 2.51 times the line of the other primates, inside its interval', () => {
    const { place } = placeRecord(versionOne, thing);
    expect(place?.ratio.toFixed(2)).toBe('2.51');
    expect(place).toMatchObject({ clade: 'primates', n: 11, inside: true, extrapolated: true, fit: 'structuremassg-cerebral-cortex--neurons-cerebral-cortex--primates--ols' });
    expect(place?.upperRatio).toBeGreaterThan(2.51);
  });

  it('says of a single specimen that its interval lacks the variance within species, and widens it once that is known', () => {
    const lacking = placeRecord(versionOne, { ...thing, isSingleSpecimen: true }).place;
    expect(lacking?.sentence).toContain('lacks the variance within species');
    const specimen = (code: string, structureMassG: number) => makeRow({ kind: 'specimen', specimen: code, species: 'Aotus trivirgatus', structure: 'cerebral_cortex', lineage: lineageOf('Aotus trivirgatus'), sourceKey: 'lab', n: 1, structureMassG });
    const known = placeRecord([...versionOne, specimen('A', 9), specimen('B', 12)], { ...thing, isSingleSpecimen: true }).place;
    expect(known?.sentence).toContain('the variance between specimens of Aotus trivirgatus');
    expect(known?.upperRatio).toBeGreaterThan(lacking?.upperRatio ?? Infinity);
  });

  it('falls back to a wider clade where the lowest has too few others, and says why where none has five', () => {
    expect(placeRecord(versionOne, { ...thing, taxonSlug: 'oryctolagus-cuniculus', lineage: lineageOf('Oryctolagus cuniculus'), structureMassG: 4.45, neurons: 71_450_000 }).place).toMatchObject({ clade: 'glires', n: 9 });
    expect(placeRecord(versionOne, { ...thing, taxonSlug: 'felis-catus', lineage: lineageOf('Felis catus') })).toMatchObject({ place: null, noPlace: 'Fewer than 5 other species of Carnivora hold mass and neurons of the cerebral cortex.' });
    expect(placeRecord(versionOne, { ...thing, neurons: null })).toMatchObject({ place: null, noPlace: 'The neurons of the cerebral cortex are not known.' });
  });

  it('gives the unit-slip check the same ratio as the place', () => {
    const line = lineContext(versionOne, { ...thing, path: 'structures.0' });
    expect(10 ** (line?.log10Ratio ?? 0)).toBeCloseTo(placeRecord(versionOne, thing).place?.ratio ?? 0, 10);
    expect(line).toMatchObject({ path: 'structures.0', cladeName: 'Primates', inside: true });
  });
});
