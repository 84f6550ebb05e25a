import { describe, expect, it } from 'vitest';
import { placeOnLine } from '../../../shared/stats/placeOnLine';
import { cladePoints, csvRows, referenceFits, referencePoints } from './reference';
import { fitOne } from './support';

// Sources: tests/reference/README.md; figures in words from the papers as read in cell_counts.csv.

describe('published exponents from the table of cell counts', () => {
  const rows = csvRows('reproducible_exponents.csv');

  it('holds eight rows to reproduce', () => {
    expect(rows).toHaveLength(8);
  });

  it.each(rows)('$clade $structure without "$without"', (row) => {
    expect([row.y, row.x]).toEqual(['structure_mass_g', 'neurons']);
    const points = cladePoints(row.clade!, row.structure!, row.without ? row.without.split('; ') : []);
    const fit = fitOne(points);
    expect(fit.n).toBe(Number(row.n));
    expect(Math.abs(fit.exponent!.estimate - Number(row.exponent))).toBeLessThan(1e-5);
    expect(Math.abs(fit.exponent!.standardError! - Number(row.standard_error))).toBeLessThan(1e-5);
  });
});

describe('the naked mole-rat among Glires and Rodentia (cortex)', () => {
  const glires = fitOne(cladePoints('Glires', 'cerebral_cortex'));
  const moleRat = glires.points.find(({ id }) => id === 'Heterocephalus glaber')!;

  it('is on watch and influential but no outlier', () => {
    expect(glires.n).toBe(11);
    expect(glires.exponent!.estimate).toBeCloseTo(1.519, 3);
    expect(glires.exponent!.standardError).toBeCloseTo(0.112, 3);
    expect(moleRat.studentised).toBeCloseTo(3.24, 2);
    expect(moleRat.cooksDistance).toBeCloseTo(1.68, 2);
    expect(moleRat.flags).toEqual(['influential', 'watch']);
    expect(moleRat.flag).toBe('influential');
    expect(moleRat.bonferroniP).toBeGreaterThan(0.05);
    expect(glires.leaveOneOut).toMatchObject({ mostMoving: 'Heterocephalus glaber' });
    expect(glires.leaveOneOut!.upper).toBeCloseTo(1.699192, 5);
  });

  it('says why in words, with the Bonferroni limit of 3.90', () => {
    expect(moleRat.reasons).toEqual([
      "Moves the line by itself: Cook's distance 1.68 is above 0.75.",
      'Far above the line: studentised residual 3.24 is beyond ±2.31 (the limit for the largest of 11 is 3.90).',
      'Far out in x: leverage 0.40 is above 4/n = 0.36; a remark, no flag.',
    ]);
  });

  it('moves the rodents from 1.512 ± 0.120 to 1.692 ± 0.102 when set aside', () => {
    const all = fitOne(cladePoints('Rodentia', 'cerebral_cortex'));
    const without = fitOne(cladePoints('Rodentia', 'cerebral_cortex', ['Heterocephalus glaber']));
    expect([all.n, without.n]).toEqual([10, 9]);
    expect(all.exponent!.estimate).toBeCloseTo(1.512, 3);
    expect(all.exponent!.standardError).toBeCloseTo(0.12, 3);
    expect(without.exponent!.estimate).toBeCloseTo(1.692, 3);
    expect(without.exponent!.standardError).toBeCloseTo(0.102, 3);
  });

  it('carries the far-out remark without a flag for the capybara', () => {
    const capybara = glires.points.find(({ id }) => id === 'Hydrochoerus hydrochaeris')!;
    expect(capybara.flag).toBe('none');
    expect(capybara.reasons).toEqual(['Far out in x: leverage 0.44 is above 4/n = 0.36; a remark, no flag.']);
  });
});

describe('the human cortex against the primates', () => {
  const primates = cladePoints('Primates', 'cerebral_cortex');
  const human = primates.find(({ id }) => id === 'Homo sapiens')!;

  it('is 2.51 times the line fitted without it and inside its interval', () => {
    const place = placeOnLine(human, primates);
    if (place.kind === 'unfit') throw new Error(place.unfit.message);
    expect(place.ratio).toBeCloseTo(2.51, 2);
    expect(place).toMatchObject({ n: 11, df: 9, inside: true, side: 'above', extrapolated: true });
    expect(place.prediction.upper! / place.expected!).toBeCloseTo(place.upperRatio!, 9);
    expect(place.prediction.lower! / place.expected!).toBeCloseTo(place.lowerRatio!, 9);
    expect(place.upperRatio).toBeGreaterThan(place.ratio!);
    expect(place.exponent.estimate).toBeCloseTo(0.989, 3);
    expect(place.exponent.standardError).toBeCloseTo(0.08, 3);
  });

  it('has the externally studentised residual of the whole fit as its distance', () => {
    const place = placeOnLine(human, primates);
    const inFit = fitOne(primates).points.find(({ id }) => id === 'Homo sapiens')!;
    expect(place.kind === 'placed' && place.studentised).toBeCloseTo(inFit.studentised!, 9);
  });

  it('gets a wider interval when it is one specimen', () => {
    const mean = placeOnLine(human, primates);
    const specimen = placeOnLine(human, primates, { withinSpeciesVariance: 0.01 });
    if (mean.kind === 'unfit' || specimen.kind === 'unfit') throw new Error('no line');
    expect(specimen.ratio).toBe(mean.ratio);
    const halfWidth = (place: typeof mean): number => Math.log10(place.prediction.upper! / place.prediction.lower!) / 2;
    const t = halfWidth(mean) / (mean.log10Ratio / mean.studentised!);
    expect(halfWidth(specimen) ** 2).toBeCloseTo(halfWidth(mean) ** 2 + t ** 2 * 0.01, 10);
  });
});

describe('animals28', () => {
  const points = referencePoints(referenceFits('animals28')[0]![1]);
  const dinosaurs = ['Dipliodocus', 'Triceratops', 'Brachiosaurus'];

  it.each(['ols', 'sma'] as const)('finds the three dinosaurs together although they hide one another (%s)', (method) => {
    const fit = fitOne(points, method);
    expect(fit.points.filter(({ flag }) => flag === 'outlier').map(({ id }) => id)).toEqual(dinosaurs);
    // The classical test finds none of them.
    expect(fit.points.every(({ bonferroniP }) => bonferroniP! > 0.5)).toBe(true);
  });

  it('has a slope of 0.752 without them, and then no outlier', () => {
    const fit = fitOne(points.filter(({ id }) => !dinosaurs.includes(id)));
    expect(fit.exponent!.estimate).toBeCloseTo(0.752, 3);
    expect(fit.points.filter(({ flag }) => flag === 'outlier')).toEqual([]);
  });
});

describe('carnivora112', () => {
  it('flags the weasel with a lost decimal in its body mass', () => {
    const fit = fitOne(referencePoints(referenceFits('carnivora112')[0]![1]));
    const weasel = fit.points.find(({ id }) => id === 'Mustelafrenata')!;
    expect(weasel.flag).toBe('outlier');
    expect(weasel.studentised).toBeCloseTo(-5.58, 2);
    expect(weasel.bonferroniP! / 2.0e-5).toBeCloseTo(1, 1);
  });
});
