import { describe, expect, it } from 'vitest';
import { specimenContentSchema, type SpecimenContent } from '../../../../shared/contracts/content';
import type { CheckContext } from '../../../../shared/domain/checks/context';
import { explanationKey, hasBlocks, unexplainedWarnings } from '../../../../shared/domain/checks/outcome';
import { checkSpecimenContent } from '../../../../shared/domain/checks/specimenContent';
import { changed, plainSpecimen, spoken } from './content';

const context: CheckContext = { today: '2026-06-01' };

type Case = [name: string, code: string, triggers: Parameters<typeof changed>[0], path: string, justNot: Parameters<typeof changed>[0], context?: Partial<CheckContext>];

const nuclei = (...counts: string[]) => (_content: SpecimenContent, sample: SpecimenContent['structures'][number]['samples'][number]) => {
  sample.aliquots = counts.map((count) => ({ nuclei: count, squares: '4', excluded: null, note: '' }));
};
const neun = (...fields: [string, string][]) => (_content: SpecimenContent, sample: SpecimenContent['structures'][number]['samples'][number]) => {
  sample.neun = fields.map(([positive, total]) => ({ positive, total }));
};
const first = 'structures.0.samples.0';
const weigh = (index: number, text: string) => (content: SpecimenContent) => {
  const structure = content.structures[index];
  if (structure) structure.mass = { text, unit: 'g' };
};

const cases: Case[] = [
  // Impossible.
  ['a tissue mass of zero', 'mass-not-positive', (_c, s) => { s.tissueMass.text = '0'; }, `${first}.tissueMass`, (_c, s) => { s.tissueMass.text = '0.001'; }],
  ['a negative structure mass', 'mass-not-positive', weigh(4, '-1.9'), 'structures.4.mass', weigh(4, '1.9')],
  ['a body mass of zero', 'mass-not-positive', (c) => { c.specimen.bodyMass.text = '0'; }, 'specimen.bodyMass', (c) => { c.specimen.bodyMass.text = '2'; }],
  ['more NeuN-positive nuclei than counted', 'fraction-outside', neun(['601', '600']), `${first}.neun.0.positive`, neun(['600', '600'])],
  ['a part heavier than the whole', 'part-heavier-than-whole', weigh(0, '1.93'), 'structures.0.mass', weigh(0, '1.92')],
  ['a brain heavier than the body', 'part-heavier-than-whole', (c) => { c.specimen.bodyMass.text = '1.91'; }, 'structures.4.mass', (c) => { c.specimen.bodyMass.text = '1.92'; }],
  ['half a nucleus', 'not-a-whole-number', nuclei('412', '438.5', '395', '421'), `${first}.aliquots.1.nuclei`, nuclei('412', '438', '395', '421')],
  ['half a NeuN-positive nucleus', 'not-a-whole-number', neun(['240.5', '600']), `${first}.neun.0.positive`, neun(['240', '600'])],
  ['a death in the future', 'date-in-the-future', (c) => { c.specimen.diedOn = '2026-06-02'; }, 'specimen.diedOn', (c) => { c.specimen.diedOn = '2026-03-02'; }],
  ['a count in the future', 'date-in-the-future', (_c, s) => { s.countedOn = '2026-06-02'; }, `${first}.countedOn`, (_c, s) => { s.countedOn = '2026-06-01'; }],
  ['fixation before death', 'dates-out-of-order', (c) => { c.specimen.fixedOn = '2026-02-28'; }, 'specimen.fixedOn', (c) => { c.specimen.fixedOn = '2026-03-01'; }],
  ['a count before fixation', 'dates-out-of-order', (_c, s) => { s.countedOn = '2026-03-01'; }, `${first}.countedOn`, (_c, s) => { s.countedOn = '2026-03-02'; }],
  ['31 June', 'date-malformed', (c) => { c.specimen.diedOn = '2025-06-31'; }, 'specimen.diedOn', (c) => { c.specimen.diedOn = '2025-06-30'; }],
  ['an embargo without a date', 'date-malformed', (c) => { c.provenance.embargoUntil = 'next year'; }, 'provenance.embargoUntil', (c) => { c.provenance.embargoUntil = '2027-01-01'; }],
  ['a malformed DOI', 'doi-malformed', (c) => { c.provenance.protocolDoi = '10.17504'; }, 'provenance.protocolDoi', (c) => { c.provenance.protocolDoi = '10.17504/protocols.io.x'; }],
  ['a malformed ORCID iD', 'orcid-malformed', () => undefined, 'orcid', () => undefined, { orcids: [{ path: 'orcid', text: '0000-0002-1825-0098' }] }],
  ['the code of another animal', 'specimen-code-taken', (c) => { c.specimen.code = 'ab-02 '; }, 'specimen.code', (c) => { c.specimen.code = 'AB-03'; }, { labSpecimenCodes: ['AB-02'] }],
  ['a structure entered twice', 'structure-twice', (c) => { c.structures[1]!.structure = 'cerebral_cortex'; }, 'structures.1.structure', (c) => { c.structures[1]!.structure = 'cerebellum'; }],
  ['a doubled midline structure', 'midline-doubled', (_c, s) => { s.side = 'midline'; s.scaleUp.kind = 'other-side'; }, `${first}.scaleUp.kind`, (_c, s) => { s.side = 'left'; s.scaleUp.kind = 'other-side'; }],
  ['both sides counted and doubled', 'both-sides-doubled', (_c, s) => { s.scaleUp.kind = 'other-side'; }, `${first}.scaleUp.kind`, (_c, s) => { s.side = 'right'; s.scaleUp.kind = 'other-side'; }],
  ['a scale-up below 1', 'scale-up-factor', (_c, s) => { s.scaleUp = { kind: 'mass-fraction', factor: '0.5', factorSe: '' }; }, `${first}.scaleUp.factor`, (_c, s) => { s.scaleUp = { kind: 'mass-fraction', factor: '1.5', factorSe: '' }; }],
  ['a dilution below 1', 'dilution-below-one', (_c, s) => { s.dilution = '0.2'; }, `${first}.dilution`, (_c, s) => { s.dilution = '1'; }],
  ['a dilution typed as a proportion', 'not-readable', (_c, s) => { s.dilution = '1 : 5'; }, `${first}.dilution`, (_c, s) => { s.dilution = '5'; }],
  ['a comma in a mass', 'not-readable', (c) => { c.specimen.bodyMass.text = '0,3'; }, 'specimen.bodyMass', (c) => { c.specimen.bodyMass.text = '30'; }],
  ['no squares counted', 'volume-not-positive', (_c, s) => { s.aliquots[0]!.squares = '0'; }, `${first}.aliquots.0.squares`, (_c, s) => { s.aliquots[0]!.squares = '4'; }],
  ['a day of death of a human donor', 'human-donor', (c) => { c.specimen.taxon = 'homo-sapiens'; c.specimen.fixedOn = '2026'; }, 'specimen.diedOn', (c) => { c.specimen.taxon = 'homo-sapiens'; c.specimen.diedOn = '2026'; c.specimen.fixedOn = '2026'; }],
  // Doubtful.
  ['scatter beyond counting error', 'excess-cv', nuclei('60', '95', '140', '75'), `${first}.aliquots`, nuclei('86', '95', '110', '82')],
  ['a wide CV', 'aliquot-cv', nuclei('400', '560', '400', '400'), `${first}.aliquots`, nuclei('400', '520', '400', '400')],
  ['a dispersion that is too small', 'dispersion-too-small', nuclei('400', '404', '409', '404'), `${first}.aliquots`, nuclei('400', '404', '410', '404')],
  ['identical aliquots', 'dispersion-too-small', nuclei('400', '400', '400'), `${first}.aliquots`, nuclei('400', '404', '396')],
  ['few nuclei per square', 'nuclei-per-square', nuclei('39', '38', '40', '42'), `${first}.aliquots`, nuclei('41', '38', '40', '42')],
  ['many nuclei per square', 'nuclei-per-square', nuclei('801', '820', '790', '795'), `${first}.aliquots`, nuclei('801', '820', '785', '794')],
  ['three aliquots', 'few-aliquots', nuclei('400', '420', '385'), `${first}.aliquots`, nuclei('400', '420', '385', '401')],
  ['few nuclei for NeuN', 'few-neun-nuclei', neun(['200', '499']), `${first}.neun`, neun(['200', '500'])],
  ['NeuN fields that disagree', 'neun-fields-disagree', neun(['120', '200'], ['80', '200'], ['60', '200']), `${first}.neun`, neun(['90', '200'], ['80', '200'], ['75', '200'])],
  ['a NeuN-positive fraction near 1', 'neun-near-the-ends', neun(['481', '600']), `${first}.neun`, neun(['480', '600'])],
  ['a NeuN-positive fraction near 0', 'neun-near-the-ends', neun(['11', '600']), `${first}.neun`, neun(['12', '600'])],
  ['the volume of one square where four were counted', 'volume-of-one-square', (_c, s) => { s.aliquots.forEach((aliquot) => { aliquot.squares = '1'; }); }, `${first}.aliquots`, (_c, s) => { s.aliquots.forEach((aliquot) => { aliquot.squares = '1'; aliquot.nuclei = '200'; }); }],
  ['one square in one aliquot that counts like the others', 'volume-of-one-square', (_c, s) => { s.aliquots[0]!.squares = '1'; s.aliquots[0]!.nuclei = '190'; s.aliquots.slice(1).forEach((a) => { a.nuclei = '200'; }); }, `${first}.aliquots`, (_c, s) => { s.aliquots[0]!.squares = '1'; s.aliquots[0]!.nuclei = '100'; s.aliquots.slice(1).forEach((a) => { a.nuclei = '200'; }); }],
  ['parts that sum to less than 0.92 of the whole', 'parts-and-whole', weigh(4, '2.07'), 'structures.4.mass', weigh(4, '2.06')],
  ['parts that sum to more than 1.03 of the whole', 'parts-and-whole', weigh(4, '1.84'), 'structures.4.mass', weigh(4, '1.85')],
  ['a second specimen far above the first', 'second-specimen', () => undefined, 'structures.0', () => undefined, { otherSpecimens: [{ code: 'AB-00', structure: 'cerebral_cortex', neurons: 2.4e6 }] }],
  ['parts bounded by different criteria', 'delineation-mixed', (c) => { mixed(c, 'topographic-map'); }, 'structures.1.delineation', (c) => { mixed(c, 'cytoarchitecture'); }],
  ['a criterion unlike the register’s', 'delineation-mixed', (c) => { c.structures[0]!.delineation = ['gross-landmarks']; }, 'structures.0.delineation', (c) => { c.structures[0]!.delineation = ['cytoarchitecture']; }, { delineations: { cerebral_cortex: ['cytoarchitecture'] } }],
  ['a malformed RRID', 'rrid-malformed', (_c, s) => { s.antibodyRrid = 'MAB377'; }, `${first}.antibodyRrid`, (_c, s) => { s.antibodyRrid = 'AB_2298772'; }],
  // A side that was not doubled, sought within the specimen.
  ['one declared side and nothing scaled', 'side-not-doubled', (_c, s) => { s.side = 'left'; }, 'structures.0.samples', (_c, s) => { s.side = 'left'; s.scaleUp.kind = 'other-side'; }],
  ['a structure that weighs twice its samples', 'side-not-doubled', weigh(0, '1.6'), 'structures.0.samples', weigh(0, '1.4')],
  ['parts that fit the brain once this one is doubled', 'side-not-doubled', (c, s) => { s.tissueMass.text = '0.4'; c.structures[4]!.mass.text = '1.92'; }, 'structures.0.samples', (c, s) => { s.tissueMass.text = '0.67'; c.structures[4]!.mass.text = '1.92'; }],
  ['a side twice as heavy as the other', 'side-not-doubled', (c, s) => { sides(c, s, '0.5'); }, 'structures.0.samples', (c, s) => { sides(c, s, '0.3'); }],
  ['a silent part among doubled ones', 'side-not-doubled', (c, s) => { doubleOthers(c); s.side = 'not-stated'; }, 'structures.0.samples', (c, s) => { doubleOthers(c); s.side = 'both'; }],
];

function mixed(content: SpecimenContent, criterion: 'topographic-map' | 'cytoarchitecture'): void {
  content.structures[0]!.structure = 'primary_visual_cortex';
  content.structures[0]!.delineation = ['cytoarchitecture'];
  content.structures[1]!.structure = 'primary_auditory_cortex';
  content.structures[1]!.delineation = [criterion];
}

function sides(content: SpecimenContent, sample: SpecimenContent['structures'][number]['samples'][number], otherMass: string): void {
  sample.side = 'left';
  sample.tissueMass.text = '0.25';
  content.structures[0]!.samples.push({ ...structuredClone(sample), id: 'right', side: 'right', tissueMass: { text: otherMass, unit: 'g' } });
}

function doubleOthers(content: SpecimenContent): void {
  for (const structure of content.structures.slice(1)) {
    for (const sample of structure.samples) {
      sample.side = 'left';
      sample.scaleUp.kind = 'other-side';
    }
  }
}

/** Contexts of the cases whose difference lies there: the one that just does not trigger. */
const justNotContext: Readonly<Record<string, Partial<CheckContext>>> = {
  'a malformed ORCID iD': { orcids: [{ path: 'orcid', text: '0000-0002-1825-0097' }] },
  'a second specimen far above the first': { otherSpecimens: [{ code: 'AB-00', structure: 'cerebral_cortex', neurons: 2.5e6 }] },
};

describe('a specimen without fault', () => {
  it('meets no check that blocks or warns, and passes those that apply', () => {
    const checks = checkSpecimenContent(plainSpecimen(), context);
    expect(checks.filter((check) => check.level !== 'passes')).toEqual([]);
    expect(checks.map((check) => check.code)).toContain('parts-and-whole');
  });
});

describe.each(cases)('%s', (name, code, triggers, path, justNot, extra = {}) => {
  it(`is found by ${code} at ${path}`, () => {
    const checks = checkSpecimenContent(changed(triggers), { ...context, ...extra });
    expect(spoken(checks, code).map((result) => result.split(' ')[1])).toContain(path);
    for (const check of checks) expect(check.message).toMatch(/[.?]$/);
  });

  it('is not found where it just is not so', () => {
    const checks = checkSpecimenContent(changed(justNot), { ...context, ...extra, ...justNotContext[name] });
    expect(spoken(checks, code).filter((result) => result.endsWith(` ${path}`))).toEqual([]);
  });
});

describe('what a specimen cannot be submitted without', () => {
  it('is named all at once for an empty form', () => {
    const empty = specimenContentSchema.parse({ kind: 'specimen', specimen: {}, provenance: {} });
    const paths = checkSpecimenContent(empty, context).filter((check) => check.code === 'missing').map((check) => check.path);
    expect(paths).toEqual([
      'specimen.nameAsEntered', 'specimen.taxon', 'specimen.code', 'specimen.origin', 'specimen.sex', 'specimen.ageClass', 'specimen.bodyMassKind',
      'massState', 'fixation', 'specimen.diedOn', 'structures', 'provenance.approvalKind', 'provenance.licenceAccepted',
    ]);
  });

  it.each<[string, Parameters<typeof changed>[0]]>([
    ['structures.0.structure', (c) => { c.structures[0]!.structure = ''; }],
    ['structures.0.mass', (_c, s) => { s.tissueMass.text = ''; }],
    [`${first}.side`, (_c, s) => { s.side = null; }],
    [`${first}.suspensionVolume`, (_c, s) => { s.suspensionVolume.text = ''; }],
    [`${first}.aliquots`, (_c, s) => { s.aliquots = []; }],
    [`${first}.aliquots.0.squares`, (_c, s) => { s.aliquots[0]!.squares = ''; }],
    [`${first}.neun.0.total`, (_c, s) => { s.neun[0]!.total = ''; }],
    ['specimen.bodyMass', (c) => { c.specimen.bodyMass.text = ''; }],
    ['specimen.strain', (c) => { c.specimen.origin = 'strain'; }],
    ['provenance.approvalText', (c) => { c.provenance.approvalKind = 'exempt'; c.provenance.approvalText = ' '; }],
    ['provenance.citation', (c) => { c.provenance.approvalKind = 'see-source'; }],
    ['provenance.doi', (c) => { c.provenance.published = true; }],
  ])('includes %s', (path, change) => {
    expect(spoken(checkSpecimenContent(changed(change), context), 'missing')).toEqual([`blocks ${path}`]);
  });

  it('does not include a body mass that is said to be unknown', () => {
    const content = changed((c) => { c.specimen.bodyMassKind = 'unknown'; c.specimen.bodyMass.text = ''; });
    expect(spoken(checkSpecimenContent(content, context), 'missing')).toEqual([]);
  });
});

describe('a list of checks', () => {
  it('puts the impossible first and is the same for the same content', () => {
    const content = changed((c, s) => { c.specimen.diedOn = '2027'; s.aliquots.length = 2; });
    const checks = checkSpecimenContent(content, context);
    const levels = checks.map((check) => check.level);
    expect(levels).toEqual([...levels].sort((a, b) => ['blocks', 'warns', 'passes'].indexOf(a) - ['blocks', 'warns', 'passes'].indexOf(b)));
    expect(hasBlocks(checks)).toBe(true);
    expect(checkSpecimenContent(structuredClone(content), context)).toEqual(checks);
  });

  it('asks for a word on each doubt until it is given', () => {
    const checks = checkSpecimenContent(changed((_c, s) => { s.aliquots.length = 3; }), context);
    const [warning, ...others] = unexplainedWarnings(checks, {});
    expect([warning?.code, others]).toEqual(['few-aliquots', []]);
    const key = explanationKey({ code: 'few-aliquots', path: `${first}.aliquots` });
    expect(unexplainedWarnings(checks, { [key]: ' ' })).toHaveLength(1);
    expect(unexplainedWarnings(checks, { [key]: 'the suspension was used up' })).toEqual([]);
  });

  it('finds the row of the form where empty rows stand before it', () => {
    const content = changed((_c, s) => { s.aliquots.unshift({ nuclei: '', squares: '', excluded: null, note: '' }); s.aliquots[2]!.nuclei = '3.5'; });
    expect(spoken(checkSpecimenContent(content, context), 'not-a-whole-number')).toEqual([`blocks ${first}.aliquots.2.nuclei`]);
  });

  it('says nothing of parts against a whole that are not all there', () => {
    const content = changed((c) => { c.structures.splice(0, 1); });
    expect(spoken(checkSpecimenContent(content, context), 'parts-and-whole')).toEqual([]);
  });
});
