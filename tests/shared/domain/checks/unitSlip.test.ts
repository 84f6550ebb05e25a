import { describe, expect, it } from 'vitest';
import type { LineOfEntry } from '../../../../shared/domain/checks/context';
import { lineOfEntry } from '../../../../shared/domain/checks/lineOfEntry';
import { checkSecondSpecimen } from '../../../../shared/domain/checks/speciesChecks';
import { checkSpecimenContent } from '../../../../shared/domain/checks/specimenContent';
import { checkUnitSlip, suggestedFactors } from '../../../../shared/domain/checks/unitSlip';
import { plainSpecimen, spoken } from './content';

const axes = { path: 'structures.0', cladeName: 'Rodentia', x: 'neurons', xStructure: 'cerebral_cortex', y: 'structureMassG', yStructure: 'cerebral_cortex' } as const;
const line = (part: Partial<LineOfEntry>): LineOfEntry => ({ ...axes, exponent: 1.5, log10Ratio: 0, residualSd: 0.1, inside: false, ...part });
const factors = suggestedFactors({ squares: [4, 4], dilutions: [5] });

describe('a unit slip', () => {
  it('is spoken of where a suggested factor brings the value within one residual SD', () => {
    // Counts ÷ 5 put the mass 1.5·log10 5 above the line.
    const check = checkUnitSlip(line({ log10Ratio: 1.5 * Math.log10(5) + 0.02 }), 'cerebral_cortex', factors);
    expect([check.level, check.figure]).toEqual(['warns', 'the counts × 5']);
    expect(check.message).toMatch(/Is the dilution right\?/);
  });

  it('names the number of squares, a decimal point, and mg for g', () => {
    const figureOf = (log10Ratio: number) => checkUnitSlip(line({ log10Ratio }), 'cerebral_cortex', factors).figure;
    expect(figureOf(-1.5 * Math.log10(4))).toBe('the counts ÷ 4');
    expect(figureOf(1)).toBe('the structure mass ÷ 10');
    expect(figureOf(-3)).toBe('the structure mass × 1000');
    expect(figureOf(1.5 * Math.log10(2))).toBe('the counts × 2');
  });

  it('is not spoken of inside the prediction interval, whatever a factor would do', () => {
    expect(checkUnitSlip(line({ log10Ratio: 1, inside: true }), 'cerebral_cortex', factors).level).toBe('passes');
  });

  it('is not spoken of where no factor comes within one residual SD', () => {
    // 0.101 beyond a factor of 10, the nearest of all.
    const tight = { residualSd: 0.1 };
    expect(checkUnitSlip(line({ ...tight, log10Ratio: 1.101 + 0.2 }), 'cerebral_cortex', suggestedFactors({ squares: [], dilutions: [] })).level).toBe('passes');
    expect(checkUnitSlip(line({ ...tight, log10Ratio: 1.099 }), 'cerebral_cortex', suggestedFactors({ squares: [], dilutions: [] })).level).toBe('warns');
  });

  it('moves only the values of its own structure', () => {
    const check = checkUnitSlip(line({ log10Ratio: 1, xStructure: 'cerebellum' }), 'cerebellum', suggestedFactors({ squares: [], dilutions: [] }));
    // The mass is of another structure; only the counts on x move, by 1.5 decades for each factor of 10.
    expect(check.level).toBe('passes');
  });

  it('finds the lost decimal of a body mass', () => {
    const body = line({ x: 'bodyMassG', xStructure: null, y: 'structureMassG', yStructure: 'brain_not_specified', exponent: 0.75, log10Ratio: -0.75 });
    expect(checkUnitSlip(body, 'brain_not_specified', suggestedFactors({ squares: [], dilutions: [] })).figure).toBe('the body mass ÷ 10');
  });

  it('asks of each factor once', () => {
    expect(suggestedFactors({ squares: [1, 4, 4], dilutions: [1, 10] }).map(({ factor }) => factor)).toEqual([2, 4, 10, 1000]);
  });
});

describe('the line of an entry', () => {
  const others = [1, 2, 3, 4, 5, 6].map((i) => ({ id: `s${i}`, x: 10 ** i, y: 10 ** (1.5 * i + (i % 2 === 0 ? 0.05 : -0.05)) }));

  it('is fitted without its species', () => {
    const own = { id: 'own', x: 1e4, y: 10 ** 7 };
    const alone = lineOfEntry(axes, own, others);
    const among = lineOfEntry(axes, own, [...others, { id: 'own', x: 1e4, y: 1 }]);
    expect(among).toEqual(alone);
    expect(alone?.inside).toBe(false);
    expect(alone?.log10Ratio).toBeGreaterThan(0.9);
    expect(alone?.exponent).toBeCloseTo(1.5, 1);
  });

  it('is none where the others give no line', () => {
    expect(lineOfEntry(axes, { id: 'own', x: 1, y: 1 }, others.slice(0, 2))).toBeNull();
  });
});

describe('the checks of a specimen on its line', () => {
  it('speak at the structure whose line is given', () => {
    const lines = [line({ path: 'structures.0', log10Ratio: 1 }), line({ path: 'structures.1', log10Ratio: 0, inside: true })];
    const checks = checkSpecimenContent(plainSpecimen(), { today: '2026-06-01', lines });
    expect(spoken(checks, 'unit-slip')).toEqual(['warns structures.0']);
  });

  it('do not take a halved mass with halved neurons for a slip: it moves along a line of exponent 1', () => {
    const check = checkUnitSlip(line({ exponent: 1, log10Ratio: 0.05, inside: true }), 'cerebral_cortex', factors);
    expect(check.level).toBe('passes');
  });
});

describe('a second specimen', () => {
  const own = (structure: string, neurons: number) => ({ path: 'structures.0', structure, neurons });
  const other = (structure: string) => [{ code: 'A', structure, neurons: 100 }];

  it.each([
    ['cerebral_cortex', 171, 'warns'],
    ['cerebral_cortex', 169, 'passes'],
    ['cerebral_cortex', 58, 'warns'],
    ['cerebral_cortex', 59, 'passes'],
    ['olfactory_bulb', 201, 'warns'],
    ['olfactory_bulb', 199, 'passes'],
    ['rest_of_brain', 199, 'passes'],
  ])('of %s with %d against 100 neurons %s', (structure, neurons, level) => {
    expect(checkSecondSpecimen(own(structure, neurons), other(structure))?.level).toBe(level);
  });

  it('is compared with its own structure only', () => {
    expect(checkSecondSpecimen(own('cerebellum', 900), other('cerebral_cortex'))).toBeNull();
  });
});
