import { z } from 'zod';
import { findStructures, findTrees } from '../../db/queries/taxa';
import { structureSchema, treeItemSchema } from '../../shared/contracts/register';
import { defineRoute } from '../routing';

const matchSchema = structureSchema.shape.definitions.element;

export const vocabularyRoutes = [
  defineRoute({
    method: 'get',
    path: '/structures',
    action: 'read-published',
    summary: 'Structures with their definitions: what each includes and excludes',
    answer: z.object({ items: z.array(structureSchema) }),
    handle: async ({ context }) => {
      const found = await findStructures(context.db);
      return {
        items: found.map(({ key, name, parent, animalClass, midline, byComplement, definitions }) => ({ key, name, parent, animalClass, midline, byComplement, definitions: definitions.map((definition) => matchSchema.parse(definition)) })),
      };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/trees',
    action: 'read-published',
    summary: 'Phylogenies that the register keeps',
    answer: z.object({ items: z.array(treeItemSchema) }),
    handle: async ({ context }) => ({ items: await findTrees(context.db) }),
  }),
];
