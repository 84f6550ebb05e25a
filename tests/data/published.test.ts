import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { classificationNodes, speciesByCommonName } from '../../server/seed/classification';
import { publishedSources } from '../../server/seed/publishedContent';
import { cell, readTable } from '../../server/seed/readTable';
import { structureList } from '../../server/seed/structureList';
import { parseDoi, speciesSlug } from '../../shared/domain/identifiers';
import { parseMassG, parseNumber } from '../../shared/domain/units';

const tables = ['cellcounts', 'mammals62', 'classification'] as const;
const textOf = (name: string) => readFileSync(new URL(`../../data/published/${name}`, import.meta.url), 'utf8');
const values = publishedSources().flatMap((source) => source.content.values);

describe('the published tables', () => {
  it.each(tables)('%s is UTF-8 with LF line ends and one width', (name) => {
    const text = textOf(`${name}.csv`);
    expect(text).not.toMatch(/\r|\uFFFD/);
    expect(text.endsWith('\n')).toBe(true);
    const rows = readTable(name);
    const width = Object.keys(rows[0] ?? {}).length;
    expect(rows.length).toBeGreaterThan(60);
    expect(rows.every((row) => Object.keys(row).length === width)).toBe(true);
  });

  it.each(tables)('%s has its source written beside it', (name) => {
    expect(textOf(`${name}.source.md`)).toMatch(/no claim is made/i);
  });

  it('holds what its source says: 192 cell counts of 63 species, five structures, 62 mammals', () => {
    const counts = readTable('cellcounts');
    const perStructure = new Map<string, number>();
    for (const row of counts) perStructure.set(cell(row, 'structure'), (perStructure.get(cell(row, 'structure')) ?? 0) + 1);
    expect(Object.fromEntries(perStructure)).toEqual({ cerebral_cortex: 39, cerebellum: 40, rest_of_brain: 39, olfactory_bulb: 29, whole_brain: 32, whole_brain_without_olfactory_bulb: 13 });
    expect(new Set(counts.map((row) => cell(row, 'species'))).size).toBe(63);
    expect(readTable('mammals62')).toHaveLength(62);
  });

  it('gives every row of cell counts a primary source with a DOI', () => {
    for (const row of readTable('cellcounts')) {
      const doi = /doi:(\S+)$/.exec(cell(row, 'source'))?.[1];
      expect(parseDoi(doi ?? ''), cell(row, 'source')).not.toBeNull();
    }
  });

  it('states one row for each species, structure and source', () => {
    const keys = readTable('cellcounts').map((row) => [cell(row, 'species'), cell(row, 'structure'), cell(row, 'source')].join('|'));
    expect(new Set(keys).size).toBe(keys.length);
  });

  it('writes every number so that it is read without a guess', () => {
    for (const row of readTable('cellcounts')) {
      for (const column of ['structure_mass_g', 'structure_mass_sd_g', 'neurons', 'neurons_sd', 'other_cells', 'other_cells_sd', 'body_mass_g', 'body_mass_sd_g', 'n']) {
        const text = cell(row, column);
        if (text !== '') expect(parseNumber(text).value, `${cell(row, 'species')} ${column}`).toBeGreaterThan(0);
      }
    }
  });
});

describe('the classification', () => {
  const nodes = classificationNodes();
  const species = new Map(nodes.filter((node) => node.rank === 'species').map((node) => [node.name, node]));

  it('covers every species of the tables, and no row without a species', () => {
    for (const row of readTable('cellcounts')) expect(species.has(cell(row, 'species')), cell(row, 'species')).toBe(true);
    for (const name of speciesByCommonName().values()) expect(species.has(name), name).toBe(true);
    expect(species.has('')).toBe(false);
  });

  it('gives every node an address and a path of its own, and a parent that stands before it', () => {
    expect(new Set(nodes.map((node) => node.slug)).size).toBe(nodes.length);
    const seen = new Set<string>();
    for (const { path, parentPath } of nodes) {
      expect(seen.has(path)).toBe(false);
      if (parentPath !== null) expect(seen.has(parentPath), path).toBe(true);
      seen.add(path);
    }
  });

  it('keeps the two nodes called Monotremata apart', () => {
    expect(nodes.filter((node) => node.name === 'Monotremata').map((node) => [node.path, node.slug])).toEqual([
      ['Mammalia > Monotremata', 'monotremata'],
      ['Mammalia > Monotremata > Monotremata', 'monotremata-order'],
    ]);
  });

  it('puts each family at one place', () => {
    const families = nodes.filter((node) => node.rank === 'family').map((node) => node.name);
    expect(new Set(families).size).toBe(families.length);
  });

  it('lets older names of the papers lead on, but no common name and no name of another species', () => {
    const synonyms = nodes.flatMap((node) => node.synonyms);
    expect(synonyms).toContain('Cebus apella');
    expect(synonyms).not.toContain('Guinea pig');
    for (const name of synonyms) expect(species.has(name), name).toBe(false);
  });

  it('marks a name at genus level as no species', () => {
    expect(species.get('Cynomys sp.')?.named).toBe(false);
    expect(species.get('Homo sapiens')?.named).toBe(true);
  });
});

describe('the literature submissions made from them', () => {
  it('hold 192 cell counts and the 46 mammals whose name fits one species', () => {
    expect(values).toHaveLength(238);
    expect(values.filter((value) => value.structure === 'brain_not_specified')).toHaveLength(46);
  });

  it('name structures and species of the vocabularies and entries that are unique in their source', () => {
    const keys = new Set(structureList.map((structure) => structure.key));
    const slugs = new Set(classificationNodes().map((node) => node.slug));
    for (const { content } of publishedSources()) {
      expect(new Set(content.values.map((value) => value.id)).size).toBe(content.values.length);
      for (const value of content.values) expect(keys.has(value.structure) && slugs.has(value.taxon), value.id).toBe(true);
    }
  });

  it('leave an unknown number of animals empty and never call it one', () => {
    const mouse = values.find((value) => value.taxon === 'mus-musculus' && value.structure === 'cerebral_cortex');
    expect(mouse?.neurons).toMatchObject({ text: '13688162', n: '', centre: 'arithmetic', spreadText: '2242257', spreadKind: 'SD' });
  });

  it('carry what was printed beside what is used', () => {
    const elephant = values.find((value) => value.taxon === 'loxodonta-africana' && value.structure === 'cerebral_cortex');
    expect(elephant?.structureMass.text).toBe('2847.594');
    expect(elephant?.printedDifferently).toContain('printed 2847594');
  });

  it('enter the body masses of the mammals in kg as printed', () => {
    const cow = values.find((value) => value.taxon === 'bos-taurus');
    expect(cow?.bodyMass).toMatchObject({ text: '465', unit: 'kg' });
    expect(parseMassG(cow?.bodyMass ?? { text: '', unit: 'g' }).value).toBe(465_000);
    expect(cow?.origin).toBe('domestic');
  });

  it('call the pig domestic in both tables', () => {
    expect(values.filter((value) => value.taxon === speciesSlug('Sus scrofa')).map((value) => value.origin)).toSatisfy((origins: string[]) => origins.length > 3 && origins.every((origin) => origin === 'domestic'));
  });

  it('give every source its citation, year and DOI', () => {
    for (const { doi, citation, year } of publishedSources()) {
      expect(parseDoi(doi)).toBe(doi);
      expect(citation).toMatch(/[A-Za-z]+ .*\d{4}/);
      expect(Number(year)).toBeGreaterThan(1970);
    }
  });
});

describe('the structures', () => {
  it('stand after their parents and have keys of their own', () => {
    const seen = new Set<string>();
    for (const { key, parent } of structureList) {
      expect(seen.has(key)).toBe(false);
      if (parent !== null) expect(seen.has(parent), key).toBe(true);
      seen.add(key);
    }
  });

  it('give the cortex of the papers its composition', () => {
    expect(structureList.find((structure) => structure.key === 'cerebral_cortex')?.includes).toEqual(['hippocampus', 'underlying white matter']);
  });
});
