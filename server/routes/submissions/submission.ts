import { idParams, noQuery } from '../../../shared/contracts/common';
import { commentCreateSchema, decisionCreateSchema, reasonSchema, reviseSchema, submissionDetailSchema, submissionPatchSchema } from '../../../shared/contracts/submissions';
import { AppError } from '../../errors';
import { defineRoute } from '../../routing';
import { knowSubmission, whyNotDecide, type KnownSubmission } from '../../services/submissions/access';
import { addComment } from '../../services/submissions/addComment';
import { decideRevision } from '../../services/submissions/decideRevision';
import { describeKnown } from '../../services/submissions/describe';
import { refuseUnlessWriter, reviseSubmission, saveDraft } from '../../services/submissions/drafts';
import { submitRevision } from '../../services/submissions/submitRevision';
import { withdrawSubmission } from '../../services/submissions/withdrawSubmission';
import type { Actor, Context } from '../../context';

interface Asked {
  context: Context;
  actor: Actor;
  params: { id: string };
}
const load = ({ context, actor, params }: Asked): Promise<KnownSubmission> => knowSubmission(context.db, actor, params.id);
const authorize = ({ actor, loaded }: { actor: Actor; loaded: KnownSubmission }): void => refuseUnlessWriter(actor, loaded);

/** What is done with one submission. Each answers the submission as it then stands, with its entity tag. */
export const submissionRoutes = [
  defineRoute({
    method: 'get',
    path: '/submissions/:id',
    action: 'read-submission',
    summary: 'A submission in full: newest revision, derived values, checks, evidence, comments, decisions, events',
    params: idParams,
    query: noQuery,
    answer: submissionDetailSchema,
    load,
    handle: async ({ context, actor, loaded, response }) => {
      const detail = await describeKnown(context, actor, loaded);
      response.setHeader('ETag', detail.etag);
      return detail;
    },
  }),
  defineRoute({
    method: 'patch',
    path: '/submissions/:id',
    action: 'draft',
    summary: 'Save the draft; If-Match names the state that was edited, a stale one answers 409 with the newer in `current`',
    params: idParams,
    body: submissionPatchSchema,
    answer: submissionDetailSchema,
    load,
    authorize,
    handle: async ({ context, actor, params, body, request, response }) => {
      const detail = await saveDraft(context, actor, params.id, { content: body.content, ifMatch: request.get('if-match') });
      response.setHeader('ETag', detail.etag);
      return detail;
    },
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/:id/submit',
    action: 'draft',
    summary: 'Submit the draft for review; every impossible entry and every doubtful one without a word answers 422 at once',
    params: idParams,
    answer: submissionDetailSchema,
    load,
    authorize,
    handle: ({ context, actor, params, request }) => submitRevision(context, actor, params.id, { ifMatch: request.get('if-match')?.trim() }),
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/:id/withdraw',
    action: 'draft',
    summary: 'Withdraw what stands; an approved record comes into no later version and stays listed with the reason',
    params: idParams,
    body: reasonSchema,
    answer: submissionDetailSchema,
    load,
    authorize,
    handle: ({ context, actor, params, body }) => withdrawSubmission(context, actor, params.id, body.reason),
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/:id/revisions',
    action: 'draft',
    summary: 'Begin the next revision as a draft, copied from the one that stands; `recheckId` names the re-check it answers',
    params: idParams,
    body: reviseSchema,
    answer: submissionDetailSchema,
    status: 201,
    load,
    authorize: ({ loaded }) => {
      // Whether a colleague may revise depends on the re-check named in the body; the service decides.
      if (!loaded.inside) throw new AppError('not-allowed', 'Its own laboratory revises a submission.');
    },
    handle: ({ context, actor, params, body }) => reviseSubmission(context, actor, params.id, body),
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/:id/comments',
    action: 'comment',
    summary: 'Comment at a field of a submitted revision, or answer a comment',
    params: idParams,
    body: commentCreateSchema,
    answer: submissionDetailSchema,
    status: 201,
    load,
    handle: ({ context, actor, params, body }) => addComment(context, actor, params.id, body),
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/:id/decisions',
    action: 'decide',
    summary: 'Approve, request changes or decline a revision, with checklist and reason; never of the reviewer’s own laboratory',
    params: idParams,
    body: decisionCreateSchema,
    answer: submissionDetailSchema,
    load,
    authorize: ({ actor, loaded }) => {
      const refusal = whyNotDecide(actor, loaded.submission, loaded.revisions.map((revision) => revision.submittedBy));
      if (refusal !== null) throw new AppError(refusal.code, refusal.text);
    },
    handle: ({ context, actor, params, body }) => decideRevision(context, actor, params.id, body),
  }),
];
