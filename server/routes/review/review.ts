import { idParams, pageOf, pageQuery } from '../../../shared/contracts/common';
import { reviewViewSchema, submissionItemSchema } from '../../../shared/contracts/submissions';
import { z } from 'zod';
import { notFound } from '../../errors';
import { defineRoute } from '../../routing';
import { describeReview, knowReviewed } from '../../services/submissions/describe';
import { listReviewQueue } from '../../services/submissions/items';

export const reviewRoutes = [
  defineRoute({
    method: 'get',
    path: '/review/queue',
    action: 'read-queue',
    summary: 'Submissions that wait for a decision, the longest waiting first',
    query: z.object(pageQuery),
    answer: pageOf(submissionItemSchema),
    handle: ({ context, query }) => listReviewQueue(context, query),
  }),
  defineRoute({
    method: 'get',
    path: '/review/submissions/:id',
    action: 'read-queue',
    summary: 'The review view: raw counts, derived values, checks, evidence, place on the working set’s line, what the register holds',
    params: idParams,
    answer: reviewViewSchema,
    load: async ({ context, actor, params }) => {
      const known = await knowReviewed(context, actor, params.id);
      if (known.revisions.length === 0) throw notFound('This submission');
      return known;
    },
    handle: async ({ context, actor, loaded, response }) => {
      const view = await describeReview(context, actor, loaded);
      response.setHeader('ETag', view.etag);
      return view;
    },
  }),
];
