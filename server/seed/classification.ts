import { speciesSlug } from '../../shared/domain/identifiers';
import { cell, readTable } from './readTable';

export interface ClassificationNode {
  rank: string;
  name: string;
  slug: string;
  path: string;
  parentPath: string | null;
  commonNames: string[];
  authority: string;
  named: boolean;
  ncbiTaxid: string;
  synonyms: string[];
}

const separator = ' > ';
/** Columns from which a node's rank is read, from the root down; a node stands in one of them. */
const rankColumns = ['class', 'superorder', 'clade_below', 'order', 'suborder', 'family', 'genus'] as const;
/** Nodes that the table keeps in the column of another rank. */
const ranksByName: Record<string, string> = { clade_below: 'clade', Neoaves: 'clade', Australaves: 'clade', Marsupialia: 'infraclass', 'Mammalia > Monotremata': 'subclass' };

function rankOf(row: Record<string, string>, depth: number, name: string, path: string): string {
  const filled = rankColumns.filter((column) => cell(row, column) !== '');
  const column = filled[depth];
  if (column === undefined || cell(row, column) !== name) throw new Error(`The lineage of ${cell(row, 'species')} does not agree with its columns at ${name}.`);
  return ranksByName[path] ?? ranksByName[name] ?? ranksByName[column] ?? column;
}

const splitNames = (text: string) => text.split(';').map((part) => part.trim()).filter((part) => part !== '');

function commonNamesOf(row: Record<string, string>): string[] {
  const names = splitNames(cell(row, 'common_name_in_source')).filter((name) => name !== cell(row, 'species'));
  return names.filter((name, index) => names.findIndex((other) => other.toLowerCase() === name.toLowerCase()) === index);
}

/** Older and misspelt binomials of the papers, by species. Common names in their place are no synonyms. */
function synonymsBySpecies(): Map<string, Set<string>> {
  const found = new Map<string, Set<string>>();
  for (const row of readTable('cellcounts')) {
    const species = cell(row, 'species');
    const printed = cell(row, 'name_in_source');
    const binomialsPrinted = cell(row, 'source_table').startsWith('Brain Behav Evol');
    if (printed === species || !binomialsPrinted) continue;
    found.set(species, (found.get(species) ?? new Set()).add(printed));
  }
  return found;
}

/**
 * The nodes of data/published/classification.csv, parents before their children, species last on each path. Rows without a species are
 * left out. A name that stands at two places, such as Monotremata, keeps its plain slug at the upper one and gets its rank behind it below.
 */
export function classificationNodes(): ClassificationNode[] {
  const nodes = new Map<string, ClassificationNode>();
  const slugs = new Set<string>();
  const synonyms = synonymsBySpecies();
  const add = (node: Omit<ClassificationNode, 'slug'>) => {
    if (nodes.has(node.path)) return;
    const plain = speciesSlug(node.name);
    if (plain === null) throw new Error(`The name "${node.name}" makes no address.`);
    const slug = slugs.has(plain) ? `${plain}-${node.rank}` : plain;
    if (slugs.has(slug)) throw new Error(`Two nodes would have the address ${slug}.`);
    slugs.add(slug);
    nodes.set(node.path, { ...node, slug });
  };
  for (const row of readTable('classification')) {
    const species = cell(row, 'species');
    if (species === '') continue;
    const authority = cell(row, 'authority');
    const names = cell(row, 'lineage').split(separator);
    names.forEach((name, depth) => {
      const path = names.slice(0, depth + 1).join(separator);
      const parentPath = depth === 0 ? null : names.slice(0, depth).join(separator);
      add({ rank: rankOf(row, depth, name, path), name, path, parentPath, commonNames: [], authority, named: true, ncbiTaxid: '', synonyms: [] });
    });
    const parentPath = names.join(separator);
    add({
      rank: 'species',
      name: species,
      path: `${parentPath}${separator}${species}`,
      parentPath,
      commonNames: commonNamesOf(row),
      authority,
      named: !species.endsWith(' sp.'),
      ncbiTaxid: cell(row, 'ncbi_taxid'),
      synonyms: [...(synonyms.get(species) ?? [])].sort(),
    });
  }
  return [...nodes.values()];
}

/** Species of a common name of mammals62.csv, where it fits one only. */
export function speciesByCommonName(): Map<string, string> {
  const found = new Map<string, string>();
  for (const row of readTable('classification')) {
    const species = cell(row, 'species');
    if (species === '' || cell(row, 'assigned') !== 'yes' || !cell(row, 'used_in').includes('MASS::mammals')) continue;
    for (const name of splitNames(cell(row, 'common_name_in_source'))) found.set(name, species);
  }
  return found;
}
