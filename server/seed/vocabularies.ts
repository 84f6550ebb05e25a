import { putCriteria, putIdentifiers, putStructure, putSynonyms, putTaxa, type NewTaxon } from '../../db/queries/seed';
import type { Transaction } from '../../db/client';
import { speciesSlug } from '../../shared/domain/identifiers';
import type { Context } from '../context';
import { classificationNodes, type ClassificationNode } from './classification';
import { criterionList, structureList } from './structureList';

async function seedStructures(tx: Transaction): Promise<void> {
  const ids = new Map<string, string>();
  for (const [position, structure] of structureList.entries()) {
    const { key, name, animalClass, midline = false, byComplement = false } = structure;
    const parentId = structure.parent === null ? null : (ids.get(structure.parent) ?? null);
    if (structure.parent !== null && parentId === null) throw new Error(`${key} stands before its parent ${structure.parent}.`);
    const match = structure.uberon === undefined ? [] : ['UBERON match from memory.'];
    const definition = {
      version: 1,
      includes: structure.includes ?? [],
      excludes: structure.excludes ?? [],
      note: [structure.note ?? '', ...match].filter((part) => part !== '').join(' '),
      uberonId: structure.uberon?.id ?? null,
      uberonMatch: structure.uberon?.match ?? null,
    };
    ids.set(key, await putStructure(tx, { key, name, parentId, animalClass, midline, byComplement, position }, definition));
  }
  await putCriteria(tx, criterionList.map((criterion, position) => ({ ...criterion, position })));
}

const depthOf = (node: ClassificationNode) => node.path.split(' > ').length;

async function seedTaxa(tx: Transaction): Promise<void> {
  const nodes = classificationNodes();
  const ids = new Map<string, string>();
  for (let depth = 1; depth <= Math.max(...nodes.map(depthOf)); depth += 1) {
    const level = nodes.filter((node) => depthOf(node) === depth);
    const rows = level.map(({ parentPath, rank, name, slug, path, commonNames, authority, named }): NewTaxon => {
      return { parentId: parentPath === null ? null : (ids.get(parentPath) ?? null), rank, name, slug, path, commonNames, authority, named };
    });
    for (const [path, id] of await putTaxa(tx, rows)) ids.set(path, id);
  }
  const known = nodes.flatMap((node) => {
    const taxonId = ids.get(node.path);
    return taxonId === undefined ? [] : [{ node, taxonId }];
  });
  await putIdentifiers(tx, known.filter(({ node }) => node.ncbiTaxid !== '').map(({ node, taxonId }) => ({ taxonId, authority: 'NCBI Taxonomy', identifier: node.ncbiTaxid })));
  await putSynonyms(
    tx,
    known.flatMap(({ node, taxonId }) =>
      node.synonyms.flatMap((name) => {
        const slug = speciesSlug(name);
        return slug === null ? [] : [{ taxonId, name, slug, reason: 'name in the source' }];
      }),
    ),
  );
}

/** Structures, delineation criteria and the classification. What is there already stays as it is, so it may run again. */
export async function seedVocabularies(context: Context): Promise<void> {
  await context.db.transaction(async (tx) => {
    await seedStructures(tx);
    await seedTaxa(tx);
  });
}
