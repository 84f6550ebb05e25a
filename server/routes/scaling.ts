import { scalingAnswerSchema, scalingQuerySchema } from '../../shared/contracts/fits';
import { markFrozen } from '../frozenAnswer';
import { defineRoute } from '../routing';
import { readPublishedScaling, readWorkingScaling } from '../services/dataset/scaling';

export const scalingRoutes = [
  defineRoute({
    method: 'get',
    path: '/scaling',
    action: 'read-published',
    summary: 'Exponents of one variable on another, clade by clade, over the species means of a frozen version',
    query: scalingQuerySchema,
    answer: scalingAnswerSchema,
    handle: async ({ context, query, response }) => {
      const { answer, tag, explicit } = await readPublishedScaling(context, query);
      markFrozen(response, tag, { explicit });
      return answer;
    },
  }),
  defineRoute({
    method: 'get',
    path: '/scaling/working',
    action: 'read-queue',
    summary: 'The same over the working set, for reviewers and curators',
    query: scalingQuerySchema.omit({ version: true }),
    answer: scalingAnswerSchema,
    handle: async ({ context, query }) => readWorkingScaling(context, query),
  }),
];
