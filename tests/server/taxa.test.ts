import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { taxa, trees } from '../../db/schema/index';
import type { Structure, Taxon } from '../../shared/contracts/register';
import type { TestClient } from '../support/client';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
let contributor: TestClient;
let curator: TestClient;
beforeAll(async () => {
  app = await startTestApp({ seed: 'vocabularies' });
  contributor = await app.as('contributor');
  curator = await app.as('curator');
});
afterAll(() => app.close());

type Page<Item> = { items: Item[]; nextCursor: string | null };
const search = async (client: TestClient, query: string) => (await client.get<Page<Taxon>>(`/taxa?query=${encodeURIComponent(query)}`)).body.items.map((taxon) => taxon.name);
const proposal = (name: string, more: object = {}) => ({ name, rank: 'species', parent: 'rodentia', ...more });

describe('finding', () => {
  test('structures stand in their order, each part with its parent and definitions', async () => {
    const { items } = (await app.anonymous.get<{ items: Structure[] }>('/structures')).body;
    expect(items.map((structure) => structure.key)).toEqual(expect.arrayContaining(['cerebral_cortex', 'cerebellum', 'rest_of_brain', 'whole_brain']));
    for (const structure of items) expect(structure.definitions.length).toBeGreaterThan(0);
    expect(items.every((structure) => structure.parent === null || items.some((other) => other.key === structure.parent))).toBe(true);
  });

  test('a taxon is found by its name, by a common name and by id', async () => {
    expect(await search(app.anonymous, 'rattus norv')).toEqual(['Rattus norvegicus']);
    const taxon = (await app.anonymous.get<Taxon>('/taxa/rattus-norvegicus')).body;
    expect(taxon.path.split(' > ')).toEqual(expect.arrayContaining(['Glires', 'Rodentia', 'Rattus norvegicus']));
    expect(await search(app.anonymous, taxon.commonNames[0] ?? '-')).toContain('Rattus norvegicus');
    expect((await app.anonymous.get<Taxon>(`/taxa/${taxon.id}`)).body.slug).toBe('rattus-norvegicus');
    expect((await app.anonymous.get('/taxa/no-such-animal')).status).toBe(404);
  });

  test('a clade counts the species below it', async () => {
    const below = await app.context.db.select({ path: taxa.path, rank: taxa.rank }).from(taxa);
    const expected = below.filter((node) => node.rank === 'species' && node.path.includes(' > Rodentia > ')).length;
    expect(expected).toBeGreaterThan(5);
    expect((await app.anonymous.get<Taxon>('/taxa/rodentia')).body.species).toBe(expected);
  });

  test('the list is walked by the cursor without gap or repetition', async () => {
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { body: Page<Taxon> } = await app.anonymous.get<Page<Taxon>>(`/taxa?limit=70${cursor === '' ? '' : `&cursor=${cursor}`}`);
      seen.push(...page.body.items.map((taxon) => taxon.id));
      cursor = page.body.nextCursor;
    }
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen).toHaveLength(await app.context.db.$count(taxa));
  });

  test('phylogenies are listed, none at first', async () => {
    expect((await app.anonymous.get('/trees')).body).toEqual({ items: [] });
    await app.context.db.insert(trees).values({ name: 'A small one', newick: '(a:1,b:1);', tips: 2, dated: true });
    expect((await app.anonymous.get<{ items: object[] }>('/trees')).body.items).toMatchObject([{ name: 'A small one', tips: 2, dated: true, source: null }]);
  });
});

describe('proposing', () => {
  test('a contributor’s taxon waits, unseen by the public, until a curator accepts it and its proposer is told', async () => {
    const made = await contributor.post<Taxon>('/taxa', proposal('Rattus novus'));
    expect(made.status).toBe(201);
    expect(made.body).toMatchObject({ status: 'proposed', slug: 'rattus-novus', named: true });
    expect((await app.anonymous.get('/taxa/rattus-novus')).status).toBe(404);
    expect(await search(app.anonymous, 'Rattus novus')).toEqual([]);
    expect(await search(contributor, 'Rattus novus')).toEqual(['Rattus novus']);
    expect((await curator.post<Taxon>('/taxa/rattus-novus/decisions', { decision: 'accept' })).body.status).toBe('accepted');
    expect((await app.anonymous.get('/taxa/rattus-novus')).status).toBe(200);
    expect((await curator.post('/taxa/rattus-novus/decisions', { decision: 'refuse', reason: 'Too late.' })).status).toBe(409);
    const told = (await contributor.get<Page<{ subject: string }>>('/notices')).body.items;
    expect(told[0]?.subject).toBe('Rattus novus was accepted');
  });

  test('a refusal carries its reason', async () => {
    await contributor.post('/taxa', proposal('Rattus dubius'));
    expect((await curator.post('/taxa/rattus-dubius/decisions', { decision: 'refuse' })).status).toBe(400);
    expect((await curator.post<Taxon>('/taxa/rattus-dubius/decisions', { decision: 'refuse', reason: 'A misprint of Rattus rattus.' })).body.status).toBe('refused');
  });

  test('a curator’s own is accepted at once; a name at genus level is kept as one that enters no fit', async () => {
    expect((await curator.post<Taxon>('/taxa', proposal('Cavia sp.'))).body).toMatchObject({ status: 'accepted', slug: 'cavia-sp', named: false });
  });

  test.each([
    ['a name that is no binomial', proposal('rattus'), 'name'],
    ['a name with a sign of the path', proposal('Rattus > alter'), 'name'],
    ['an unknown parent', proposal('Rattus alter', { parent: 'nowhere' }), 'parent'],
    ['a species as parent', proposal('Rattus alter', { parent: 'rattus-norvegicus' }), 'parent'],
  ])('refuses %s and names the field', async (_what, body, field) => {
    const answer = await curator.post<{ errors: { path: string }[] }>('/taxa', body);
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error) => error.path)).toEqual([field]);
  });

  test('a name that stands already is not entered twice, nor over a synonym', async () => {
    expect((await contributor.post('/taxa', proposal('Rattus norvegicus'))).status).toBe(409);
    const added = await curator.post<Taxon>('/taxa/rattus-norvegicus/synonyms', { name: 'Mus decumanus', reason: 'Pallas 1779' });
    expect(added.body.synonyms).toContain('Mus decumanus');
    expect((await app.anonymous.get<Taxon>('/taxa/mus-decumanus')).body.slug).toBe('rattus-norvegicus');
    expect(await search(app.anonymous, 'decumanus')).toEqual(['Rattus norvegicus']);
    expect((await contributor.post('/taxa', proposal('Mus decumanus'))).status).toBe(409);
  });
});
