import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '../../shared/contracts/problems';
import type { SpeciesItem, SpeciesPage } from '../../shared/contracts/register';
import { startTestApp, type TestApp } from '../support/testApp';

interface SpeciesList { items: SpeciesItem[]; nextCursor: string | null }
let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ seed: 'published' });
});
afterAll(() => app.close());

const list = async (query: string) => (await app.anonymous.get<SpeciesList>(`/species?${query}`)).body;

describe('GET /species', () => {
  it('gives every species once, page by page, in order of name', async () => {
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: SpeciesList = await list(`limit=20${cursor === '' ? '' : `&cursor=${cursor}`}`);
      expect(page.items.length).toBeLessThanOrEqual(20);
      seen.push(...page.items.map(({ species }) => species));
      cursor = page.nextCursor;
    }
    expect(seen).toEqual([...new Set(seen)].sort());
    expect(seen).toContain('Homo sapiens');
    expect(seen.length).toBeGreaterThan(63);
  });

  it('finds a species by part of its name and by a common name', async () => {
    expect((await list('query=heterocephalus')).items.map(({ slug }) => slug)).toEqual(['heterocephalus-glaber']);
    expect((await list('query=agouti')).items.map(({ slug }) => slug)).toContain('dasyprocta-prymnolopha');
  });

  it('keeps to a clade, with the clade for colours and the order beside each', async () => {
    const { items } = await list('clade=glires&structure=cerebral_cortex&limit=200');
    expect(items).toHaveLength(11);
    expect(items.find(({ slug }) => slug === 'oryctolagus-cuniculus')).toMatchObject({ clade: 'glires', cladeName: 'Glires', order: 'Lagomorpha' });
    expect(items.find(({ slug }) => slug === 'mus-musculus')).toMatchObject({ clade: 'rodentia', order: 'Rodentia' });
  });

  it('sorts by neurons of the cortex, with those that have none last', async () => {
    const { items } = await list('sort=-neurons&limit=200');
    const neurons = items.map(({ cortexNeurons }) => cortexNeurons);
    const known = neurons.filter((value) => value !== null);
    expect(known).toEqual([...known].sort((a, b) => b - a));
    expect(neurons.slice(0, known.length)).toEqual(known);
    expect(items[0]?.slug).toBe('homo-sapiens');
  });

  it('refuses clades and structures that do not exist, both at once', async () => {
    const { status, body } = await app.anonymous.get<Problem>('/species?clade=unicorns&structure=horn');
    expect(status).toBe(400);
    expect(body.errors.map(({ path }) => path)).toEqual(['clade', 'structure']);
    expect((await app.anonymous.get('/species?cursor=nonsense')).status).toBe(400);
  });
});

describe('GET /species/:slug', () => {
  it('places the human cortex at 2.51 times the line of the other primates, inside its interval', async () => {
    const { body } = await app.anonymous.get<SpeciesPage>('/species/homo-sapiens');
    const cortex = body.structures.find(({ key }) => key === 'cerebral_cortex');
    expect(cortex?.mean).toMatchObject({ structureMassG: 1232.93, errorKind: 'SD' });
    expect(cortex?.place?.ratio.toFixed(2)).toBe('2.51');
    expect(cortex?.place).toMatchObject({ clade: 'primates', n: 11, inside: true });
    expect(body).toMatchObject({ version: '1', from: null, clade: 'primates', demonstration: false });
    expect(body.lineage.map(({ slug }) => slug)).toContain('primates');
    expect(body.sources.length).toBeGreaterThan(0);
  });

  it('says why a structure has no place', async () => {
    const { body } = await app.anonymous.get<SpeciesPage>('/species/homo-sapiens');
    for (const { place, noPlace } of body.structures) expect(place === null).toBe(noPlace !== null);
    expect(body.structures.some(({ noPlace }) => noPlace !== null)).toBe(true);
  });

  it('never mixes the brain of one table with that of another', async () => {
    const { body } = await app.anonymous.get<SpeciesPage>('/species/macaca-mulatta');
    const masses = body.structures.filter(({ key }) => key.includes('brain') && key !== 'rest_of_brain').map(({ key, mean }) => [key, mean.structureMassG]);
    expect(masses).toContainEqual(['brain_not_specified', 179]);
    expect(masses).toContainEqual(['whole_brain_without_olfactory_bulb', 87.346]);
  });

  it('leads a former name on to the species', async () => {
    const former = await app.context.db.query.taxonSynonyms.findFirst();
    const { status, body } = await app.anonymous.get<SpeciesPage>(`/species/${former?.slug ?? ''}`);
    expect(status).toBe(200);
    expect(body.from).toBe(former?.slug);
    expect(body.synonyms).toContain(former?.name);
    expect(body.slug).not.toBe(former?.slug);
  });

  it('answers a species without records, and one of an unknown version, with 404', async () => {
    expect((await app.anonymous.get('/species/nobody-here')).status).toBe(404);
    expect((await app.anonymous.get('/species/rodentia')).status).toBe(404);
    expect((await app.anonymous.get('/species/homo-sapiens?version=7')).status).toBe(404);
  });
});
