import { z } from 'zod';
import { pageOf } from '../../shared/contracts/common';
import { synonymCreateSchema, taxaQuerySchema, taxonDecisionSchema, taxonProposalSchema, taxonSchema } from '../../shared/contracts/register';
import type { Actor, Context } from '../context';
import { decodeCursor, encodeCursor } from '../paging';
import { defineRoute } from '../routing';
import { addSynonym, decideOnTaxon, listTaxa, proposeTaxon, readTaxon } from '../services/taxa/taxa';

const placeSchema = z.object({ name: z.string(), id: z.uuid() });
const taxonParams = z.object({ id: z.string().min(1).max(160) });
const loadTaxon = ({ context, actor, params }: { context: Context; actor: Actor; params: { id: string } }) => readTaxon(context, actor.id === '' ? null : actor, params.id);

export const taxonRoutes = [
  defineRoute({
    method: 'get',
    path: '/taxa',
    action: 'read-published',
    summary: 'Taxa whose name, common name or synonym holds the text; proposals only for those who work with records',
    query: taxaQuerySchema,
    answer: pageOf(taxonSchema),
    handle: async ({ context, visitor, query }) => {
      const after = query.cursor === undefined ? null : decodeCursor(query.cursor, placeSchema);
      const found = await listTaxa(context, visitor, { query: query.query.trim(), rank: query.rank, status: query.status, after, limit: query.limit + 1 });
      const items = found.slice(0, query.limit);
      const last = items.at(-1);
      return { items, nextCursor: found.length > items.length && last !== undefined ? encodeCursor({ name: last.name, id: last.id }) : null };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/taxa/:id',
    action: 'read-published',
    summary: 'One taxon by id, address or the address of a synonym',
    params: taxonParams,
    answer: taxonSchema,
    load: loadTaxon,
    handle: async ({ loaded }) => loaded,
  }),
  defineRoute({
    method: 'post',
    path: '/taxa',
    action: 'propose-taxon',
    summary: 'Proposes a taxon; a curator’s own is accepted at once',
    body: taxonProposalSchema,
    answer: taxonSchema,
    status: 201,
    handle: ({ context, actor, body }) => proposeTaxon(context, actor, body),
  }),
  defineRoute({
    method: 'post',
    path: '/taxa/:id/decisions',
    action: 'curate',
    summary: 'Accepts or refuses a proposed taxon',
    params: taxonParams,
    body: taxonDecisionSchema,
    answer: taxonSchema,
    load: loadTaxon,
    handle: ({ context, actor, body, loaded }) => decideOnTaxon(context, actor, loaded.id, body),
  }),
  defineRoute({
    method: 'post',
    path: '/taxa/:id/synonyms',
    action: 'curate',
    summary: 'Adds a former or alternative name, whose address leads on to the taxon',
    params: taxonParams,
    body: synonymCreateSchema,
    answer: taxonSchema,
    status: 201,
    load: loadTaxon,
    handle: ({ context, actor, body, loaded }) => addSynonym(context, actor, loaded, body),
  }),
];
