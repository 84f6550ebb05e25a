import { z } from 'zod';
import { idParams, pageOf, timeSchema } from '../../shared/contracts/common';
import { recheckAnswerSchema, recheckAskSchema, recheckCloseSchema, rechecksQuerySchema, recheckSchema } from '../../shared/contracts/rechecks';
import { notAllowed } from '../errors';
import { decodeCursor, encodeCursor } from '../paging';
import { defineRoute } from '../routing';
import { knowRecheck, whyNotAnswer } from '../services/rechecks/access';
import { answerRecheck } from '../services/rechecks/answerRecheck';
import { askRecheck, knowQuestionedRecord } from '../services/rechecks/askRecheck';
import { closeRecheck, refuseUnlessCloser } from '../services/rechecks/closeRecheck';
import { listRechecks, readRecheck } from '../services/rechecks/describe';

const placeSchema = z.object({ at: timeSchema, id: z.uuid() });
const numberParams = z.object({ id: z.string().max(20) });

export const recheckRoutes = [
  defineRoute({
    method: 'get',
    path: '/rechecks',
    action: 'read-rechecks',
    summary: 'Re-checks, newest first; contributors see those of their own laboratory',
    query: rechecksQuerySchema,
    answer: pageOf(recheckSchema),
    handle: async ({ context, actor, query }) => {
      const place = query.cursor === undefined ? null : decodeCursor(query.cursor, placeSchema);
      const before = place === null ? null : { at: new Date(place.at), id: place.id };
      const found = await listRechecks(context, actor, { status: query.status, before, limit: query.limit + 1 });
      const items = found.slice(0, query.limit);
      const last = items.at(-1);
      return { items, nextCursor: found.length > items.length && last !== undefined ? encodeCursor({ at: last.at, id: last.id }) : null };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/rechecks/:id',
    action: 'read-rechecks',
    summary: 'One re-check with everything said in it',
    params: idParams,
    answer: recheckSchema,
    load: ({ context, actor, params }) => readRecheck(context, actor, params.id),
    handle: async ({ loaded }) => loaded,
  }),
  defineRoute({
    method: 'post',
    path: '/records/:id/rechecks',
    action: 'ask-recheck',
    summary: 'Puts a question about a record (AK-…) to its laboratory, from a flag or by hand',
    params: numberParams,
    body: recheckAskSchema,
    answer: recheckSchema,
    status: 201,
    load: ({ context, actor, params }) => knowQuestionedRecord(context, actor, params.id),
    handle: ({ context, actor, params, body }) => askRecheck(context, actor, params.id, body),
  }),
  defineRoute({
    method: 'post',
    path: '/rechecks/:id/answers',
    action: 'answer-recheck',
    summary: 'Answers for the record’s laboratory: confirmed, corrected by a new revision, or withdrawn',
    params: idParams,
    body: recheckAnswerSchema,
    answer: recheckSchema,
    status: 201,
    load: ({ context, actor, params }) => knowRecheck(context.db, actor, params.id),
    authorize: ({ actor, loaded }) => {
      const refusal = whyNotAnswer(actor, loaded);
      if (refusal !== null) throw notAllowed(refusal);
    },
    handle: ({ context, actor, params, body }) => answerRecheck(context, actor, params.id, body),
  }),
  defineRoute({
    method: 'post',
    path: '/rechecks/:id/close',
    action: 'close-recheck',
    summary: 'Closes an answered re-check, or opens it again, with the reason',
    params: idParams,
    body: recheckCloseSchema,
    answer: recheckSchema,
    load: ({ context, actor, params }) => knowRecheck(context.db, actor, params.id),
    authorize: ({ context, actor, params }) => refuseUnlessCloser(context, actor, params.id),
    handle: ({ context, actor, params, body }) => closeRecheck(context, actor, params.id, body),
  }),
];
