import { pageOf } from '../../../shared/contracts/common';
import { previewRequestSchema, previewSchema, submissionCreateSchema, submissionDetailSchema, submissionItemSchema, submissionsQuerySchema } from '../../../shared/contracts/submissions';
import { defineRoute } from '../../routing';
import { createSubmission } from '../../services/submissions/drafts';
import { listSubmissions } from '../../services/submissions/items';
import { previewContent } from '../../services/submissions/previewContent';

export const submissionCollectionRoutes = [
  defineRoute({
    method: 'get',
    path: '/submissions',
    action: 'draft',
    summary: 'One’s own submissions and those of one’s laboratory, last changed first',
    query: submissionsQuerySchema,
    answer: pageOf(submissionItemSchema),
    handle: ({ context, actor, query }) => listSubmissions(context, actor, query),
  }),
  defineRoute({
    method: 'post',
    path: '/submissions',
    action: 'draft',
    summary: 'Begin a submission as a draft: one specimen with its structures, or the values of one source',
    body: submissionCreateSchema,
    answer: submissionDetailSchema,
    status: 201,
    handle: async ({ context, actor, body, response }) => {
      const detail = await createSubmission(context, actor, body);
      response.setHeader('ETag', detail.etag);
      response.location(`/api/v1/submissions/${detail.id}`);
      return detail;
    },
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/preview',
    action: 'draft',
    summary: 'Derived values, checks and places of entries, without saving them',
    body: previewRequestSchema,
    answer: previewSchema,
    handle: ({ context, actor, body }) => previewContent(context, actor, body.content, body.submissionId ?? null),
  }),
];
