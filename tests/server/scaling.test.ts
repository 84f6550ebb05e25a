import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { reproducibleExponents } from '../support/referenceRows';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
});
afterAll(() => app.close());

const ask = async (query: string) => (await app.anonymous.get<ScalingAnswer>(`/scaling?${query}`)).body;
const cortex = 'x=neurons&xStructure=cerebral_cortex&y=structureMassG&yStructure=cerebral_cortex';
type Problem = { code: string; errors: { path: string; message: string }[] };

describe('GET /scaling on version 1', () => {
  it.each(reproducibleExponents())('gives $published_exponent for $clade, $structure, without "$without"', async (expected) => {
    const { clade, structure, without } = expected as Record<'clade' | 'structure' | 'without', string>;
    const left = without === '' || structure === 'cerebral_cortex' && without === 'Heterocephalus glaber' ? '' : without.toLowerCase().replace(' ', '-');
    const answer = await ask(`clades=${clade.toLowerCase()}&xStructure=${structure}&yStructure=${structure}&without=${left}`);
    expect(answer.fits[0]?.n).toBe(Number(expected['n']));
    expect(answer.fits[0]?.exponent?.estimate).toBeCloseTo(Number(expected['exponent']), 5);
    expect(answer.fits[0]?.exponent?.standardError).toBeCloseTo(Number(expected['standard_error']), 5);
  });

  it('shows rodent cortex as 1.692 ± 0.102 over nine species, with the naked mole-rat listed hollow and its reason given', async () => {
    const answer = await ask(`${cortex}&clades=rodentia,glires`);
    const [rodents, glires] = answer.fits;
    expect([rodents?.n, rodents?.exponent?.estimate.toFixed(3), rodents?.exponent?.standardError?.toFixed(3)]).toEqual([9, '1.692', '0.102']);
    expect(glires?.exponent?.estimate.toFixed(3)).toBe('1.699');
    expect(rodents?.points.map(({ id }) => id)).not.toContain('heterocephalus-glaber');
    const aside = answer.species.filter(({ setAside }) => setAside !== null);
    expect(aside.map(({ slug }) => slug)).toEqual(['heterocephalus-glaber']);
    expect(aside[0]?.setAside).not.toBe('');
    expect(answer.remarks.some((remark) => remark.startsWith('Heterocephalus glaber is set aside: '))).toBe(true);
    expect(answer.sentences).toContainEqual({ clade: 'rodentia', text: 'In Rodentia, mass rises faster than the neurons (exponent above 1): density falls as cortices grow.' });
    expect(answer).toMatchObject({ version: '1', demonstration: false, question: { method: 'ols', level: 0.95 } });
  });

  it('keeps the naked mole-rat in the cerebellum', async () => {
    const answer = await ask('clades=rodentia&xStructure=cerebellum&yStructure=cerebellum');
    expect(answer.fits[0]?.points.map(({ id }) => id)).toContain('heterocephalus-glaber');
  });

  it('moves the primates to 0.989 ± 0.080 when the human is left out by the question, and says so', async () => {
    const answer = await ask(`${cortex}&clades=primates&without=homo-sapiens`);
    expect([answer.fits[0]?.exponent?.estimate.toFixed(3), answer.fits[0]?.exponent?.standardError?.toFixed(3)]).toEqual(['0.989', '0.080']);
    expect(answer.species.find(({ slug }) => slug === 'homo-sapiens')?.setAside).toBe('left out by this question.');
  });

  it('lists with each mean the records it comes from, and a name at genus level with its mark', async () => {
    const answer = await ask(`${cortex}&clades=rodentia`);
    for (const species of answer.species) expect(species.contributions.map(({ record }) => record).every((number) => /^AK-\d{6}$/.test(number))).toBe(true);
    expect(answer.species.find(({ slug }) => slug === 'cynomys-sp')?.marks).toContain('name at genus level');
  });

  it('speaks of a brain whose parts are not specified in words, and of a falling exponent with a minus sign', async () => {
    const [brain] = (await ask('x=bodyMassG&y=structureMassG&yStructure=brain_not_specified&clades=rodentia')).sentences;
    expect(brain?.text).toMatch(/the mass of the brain \(parts not specified\)|constant relative mass/);
    expect(brain?.text).not.toContain('brain not specified');
    const [density] = (await ask('x=neurons&xStructure=cerebral_cortex&y=neuronsPerMg&yStructure=cerebral_cortex&clades=rodentia')).sentences;
    expect(density?.text).toMatch(/an exponent of −0\.\d\d \(−/);
  });

  it('never pools the brain masses of two tables', async () => {
    const answer = await ask('x=bodyMassG&y=structureMassG&yStructure=brain_not_specified&clades=primates');
    const sources = new Set(answer.species.flatMap(({ contributions }) => contributions.map(({ source }) => source)));
    expect(sources.size).toBe(1);
    const cell = await ask('x=neurons&y=structureMassG&yStructure=whole_brain_without_olfactory_bulb&clades=primates');
    const others = cell.species.flatMap(({ contributions }) => contributions.map(({ record }) => record));
    expect(answer.species.flatMap(({ contributions }) => contributions.map(({ record }) => record)).filter((record) => others.includes(record))).toEqual([]);
    expect(cell.species.length).toBeGreaterThan(5);
  });

  it('offers the clades that hold both values, those with standing fits first', async () => {
    const { available } = await ask(cortex);
    expect(available.find(({ slug }) => slug === 'primates')).toEqual({ slug: 'primates', name: 'Primates', rank: 'order', species: 12, standing: true });
    const firstOther = available.findIndex(({ standing }) => !standing);
    expect(available.slice(firstOther).some(({ standing }) => standing)).toBe(false);
    expect(available.map(({ slug }) => slug)).toContain('mammalia');
  });

  it('says of a node above several clades that it pools them', async () => {
    const answer = await ask(`${cortex}&clades=mammalia`);
    expect(answer.remarks.find((remark) => remark.startsWith('Mammalia pools clades'))).toMatch(/Primates/);
  });

  it('answers a clade without the values by the reason instead of a line', async () => {
    const answer = await ask(`${cortex}&clades=psittaciformes`);
    expect(answer.fits[0]).toMatchObject({ n: 0, exponent: null, xRange: null, unfit: { code: 'too-few-points' } });
  });

  it('gives no R² where one variable is made from the other', async () => {
    const answer = await ask('x=neurons&y=neuronsPerMg&xStructure=cerebral_cortex&clades=rodentia&without=heterocephalus-glaber');
    expect(answer.fits[0]?.rSquared).toBeNull();
    const whole = await ask(`${cortex}&clades=rodentia`);
    expect(answer.fits[0]?.exponent?.estimate).toBeCloseTo(1 - (whole.fits[0]?.exponent?.estimate ?? 0), 6);
  });

  it('names every problem of a query at once', async () => {
    const { status, body } = await app.anonymous.get<Problem>('/scaling?x=bodyMassG&xStructure=cerebellum&yStructure=hippocampal&clades=primates,unicorns&without=nobody-here&level=0.95');
    expect(status).toBe(400);
    expect(body.code).toBe('invalid-input');
    expect(body.errors.map(({ path }) => path)).toEqual(['xStructure', 'yStructure', 'clades', 'without']);
    const same = await app.anonymous.get<Problem>('/scaling?x=neurons&y=neurons');
    expect(same.body.errors.map(({ path }) => path)).toEqual(['x']);
    const shape = await app.anonymous.get<Problem>('/scaling?x=weight&method=lasso&level=2');
    expect(shape.body.errors.map(({ path }) => path).sort()).toEqual(['level', 'method', 'x']);
  });

  it('answers an unknown version with 404', async () => {
    for (const version of ['2', '0', 'one']) expect((await app.anonymous.get(`/scaling?version=${version}`)).status).toBe(404);
  });

  it('may be kept for ever under its version, and is asked for again without one', async () => {
    const named = await app.anonymous.get('/scaling?version=1&clades=primates');
    const etag = named.headers.get('etag') ?? '';
    expect(etag).toMatch(/^"[^"]+"$/);
    expect(named.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    const current = await app.anonymous.get('/scaling?clades=primates');
    expect(current.headers.get('cache-control')).toBe('public, no-cache');
    expect(current.headers.get('etag')).toBe(etag);
    const again = await app.anonymous.get('/scaling?clades=primates', { headers: { 'if-none-match': etag, 'cache-control': 'max-age=0' } });
    expect([again.status, again.bytes.length]).toEqual([304, 0]);
  });

  it('keeps the working set to reviewers and curators', async () => {
    expect((await app.anonymous.get('/scaling/working?clades=primates')).status).toBe(401);
    expect((await (await app.as('contributor')).get('/scaling/working?clades=primates')).status).toBe(403);
    const answer = await (await app.as('curator')).get<ScalingAnswer>('/scaling/working?clades=primates');
    expect(answer.body).toMatchObject({ version: 'working', fits: [{ n: 12 }] });
  });
});
