import { z } from 'zod';
import { pageOf } from '../../shared/contracts/common';
import { speciesItemSchema, speciesPageSchema, speciesQuerySchema } from '../../shared/contracts/register';
import { markFrozen } from '../frozenAnswer';
import { defineRoute } from '../routing';
import { describeSpecies, listSpecies } from '../services/dataset/species';

export const speciesRoutes = [
  defineRoute({
    method: 'get',
    path: '/species',
    action: 'read-published',
    summary: 'Species of a frozen version, by name, clade and structure',
    query: speciesQuerySchema,
    answer: pageOf(speciesItemSchema),
    handle: async ({ context, query, response }) => {
      const { page, tag, explicit } = await listSpecies(context, query);
      markFrozen(response, tag, { explicit });
      return page;
    },
  }),
  defineRoute({
    method: 'get',
    path: '/species/:slug',
    action: 'read-published',
    summary: 'One species: its structures, records, places on lines and sources; a former name leads on',
    params: z.object({ slug: z.string().min(1).max(120) }),
    query: z.object({ version: z.string().max(10).optional() }),
    answer: speciesPageSchema,
    handle: async ({ context, params, query, response }) => {
      const { answer, tag, explicit } = await describeSpecies(context, params.slug, query.version);
      markFrozen(response, tag, { explicit });
      return answer;
    },
  }),
];
