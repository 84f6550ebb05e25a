import { z } from 'zod';
import { findAuditEntries } from '../../db/queries/audit';
import { pageOf, timeSchema } from '../../shared/contracts/common';
import { auditEntrySchema, auditQuerySchema } from '../../shared/contracts/people';
import { decodeCursor, encodeCursor } from '../paging';
import { defineRoute } from '../routing';

const placeSchema = z.object({ at: timeSchema, id: z.uuid() });
const detailSchema = z.record(z.string(), z.unknown());

export const auditRoutes = [
  defineRoute({
    method: 'get',
    path: '/audit',
    action: 'read-audit',
    summary: 'Acts of those with power over others’ data, newest first',
    query: auditQuerySchema,
    answer: pageOf(auditEntrySchema),
    handle: async ({ context, query }) => {
      const place = query.cursor === undefined ? null : decodeCursor(query.cursor, placeSchema);
      const before = place === null ? null : { at: new Date(place.at), id: place.id };
      const found = await findAuditEntries(context.db, { action: query.action, before, limit: query.limit + 1 });
      const page = found.slice(0, query.limit);
      const last = page.at(-1);
      return {
        items: page.map(({ at, actor, detail, ...entry }) => ({ ...entry, at: at.toISOString(), actor: actor ?? 'the register', detail: detailSchema.parse(detail) })),
        nextCursor: found.length > page.length && last !== undefined ? encodeCursor({ at: last.at.toISOString(), id: last.id }) : null,
      };
    },
  }),
];
