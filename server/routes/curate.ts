import { z } from 'zod';
import { idParams, pageOf, pageQuery } from '../../shared/contracts/common';
import { freezePreviewSchema, freezeProgressSchema, setAsideRequestSchema, setAsideViewSchema, waitsSchema } from '../../shared/contracts/versions';
import type { Actor } from '../context';
import { notAllowed } from '../errors';
import { decodeCursor, encodeCursor } from '../paging';
import { isPermitted, neededRoles } from '../permissions';
import { defineRoute } from '../routing';
import { previewFreeze } from '../services/versions/preview';
import { loadFreezeProgress } from '../services/versions/readVersions';
import { liftSetAside, listSetAsides, loadRecordToSetAside, loadSetAside, refuseOwnLab, setAside } from '../services/versions/setAside';
import { loadWaits } from '../services/versions/waits';

const numberParams = z.object({ number: z.string().max(20) });
const placeSchema = z.object({ at: z.iso.datetime(), id: z.uuid() });
const liftSchema = z.object({ reason: z.string().trim().min(1, 'Give the reason that everyone will see').max(2000) });

/** Numbers of records that stand in no version are a curator's to know: everybody else is refused by role, whether or not there is one. */
function asCurator<Found>(actor: Actor, load: () => Promise<Found>): Promise<Found> {
  if (!isPermitted('curate', actor.roles)) throw notAllowed(neededRoles('curate'));
  return load();
}

export const curateRoutes = [
  defineRoute({
    method: 'get',
    path: '/curate/waits',
    action: 'curate',
    summary: 'What waits for a curator',
    answer: waitsSchema,
    handle: ({ context }) => loadWaits(context),
  }),
  defineRoute({
    method: 'get',
    path: '/freeze/preview',
    action: 'curate',
    summary: 'What a freeze would do now',
    answer: freezePreviewSchema,
    handle: ({ context }) => previewFreeze(context),
  }),
  defineRoute({
    method: 'get',
    path: '/freeze/progress',
    action: 'agree-to-freeze',
    summary: 'Steps taken by the newest version',
    answer: freezeProgressSchema,
    handle: ({ context }) => loadFreezeProgress(context),
  }),
  defineRoute({
    method: 'get',
    path: '/set-asides',
    action: 'curate',
    summary: 'Records set aside, newest first, lifted ones too',
    query: z.object(pageQuery),
    answer: pageOf(setAsideViewSchema),
    handle: async ({ context, query }) => {
      const place = query.cursor === undefined ? null : decodeCursor(query.cursor, placeSchema);
      const found = await listSetAsides(context, place === null ? null : { at: new Date(place.at), id: place.id }, query.limit + 1);
      const items = found.slice(0, query.limit);
      const last = items.at(-1);
      return { items, nextCursor: found.length > items.length && last !== undefined ? encodeCursor({ at: last.at, id: last.id }) : null };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/records/:number/set-asides',
    action: 'curate',
    summary: 'Leaves a record out of fits from the next version on; it stays listed',
    params: numberParams,
    body: setAsideRequestSchema,
    answer: setAsideViewSchema,
    status: 201,
    load: ({ context, actor, params }) => asCurator(actor, () => loadRecordToSetAside(context, params.number)),
    authorize: ({ actor, loaded }) => refuseOwnLab(actor, loaded.labId),
    handle: async ({ context, actor, params, body }) => (await setAside(context, actor, params.number, body)).view,
  }),
  defineRoute({
    method: 'post',
    path: '/set-asides/:id/lift',
    action: 'curate',
    summary: 'Takes a record back into the fits from the next version on',
    params: idParams,
    body: liftSchema,
    answer: setAsideViewSchema,
    load: ({ context, actor, params }) => asCurator(actor, () => loadSetAside(context, params.id)),
    authorize: ({ actor, loaded }) => refuseOwnLab(actor, loaded.labId),
    handle: ({ context, actor, params, body }) => liftSetAside(context, actor, params.id, body.reason),
  }),
];
