import { z } from 'zod';
import { pageOf } from '../../shared/contracts/common';
import { recordRowSchema } from '../../shared/contracts/records';
import { recordPageSchema, recordsQuerySchema } from '../../shared/contracts/register';
import { markFrozen } from '../frozenAnswer';
import { defineRoute } from '../routing';
import { exportRecords, listRecords } from '../services/dataset/recordList';
import { describeRecord, knowRecord } from '../services/dataset/recordPage';

const recordPages = pageOf(recordRowSchema);

export const recordRoutes = [
  defineRoute({
    method: 'get',
    path: '/records',
    action: 'read-published',
    summary: 'Records of a frozen version; every match as one table by Accept: text/csv',
    query: recordsQuerySchema,
    answer: recordPages,
    handle: async ({ context, query, request, response }) => {
      response.vary('Accept');
      if (request.accepts(['application/json', 'text/csv']) !== 'text/csv') {
        const { page, tag, explicit } = await listRecords(context, query);
        markFrozen(response, tag, { explicit });
        return page;
      }
      const { text, tag, explicit, name } = await exportRecords(context, query);
      markFrozen(response, tag, { explicit });
      response.attachment(name).type('text/csv; charset=utf-8').send(text);
      return { items: [], nextCursor: null };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/records/:number',
    action: 'read-published',
    summary: 'One record with raw counts, flags, place on the line and trail',
    params: z.object({ number: z.string().max(20) }),
    query: z.object({ version: z.string().max(10).optional() }),
    answer: recordPageSchema,
    handle: async ({ context, actor, params, query }) => describeRecord(context, actor, await knowRecord(context, actor, params.number, query.version)),
  }),
];
