import { z } from 'zod';
import { findMembership } from '../../db/queries/people';
import { idParams, pageOf } from '../../shared/contracts/common';
import { membershipCreateSchema, membershipEndSchema, peopleQuerySchema, personPatchSchema, personSchema, rolesPutSchema, type Person } from '../../shared/contracts/people';
import type { Actor, Context } from '../context';
import { notAllowed, notFound } from '../errors';
import { decodeCursor, encodeCursor } from '../paging';
import { isPermitted, neededRoles } from '../permissions';
import { defineRoute } from '../routing';
import { addMembership, closeMembership, listPeople, loadPerson, setAccess, setRoles } from '../services/people/people';

const placeSchema = z.object({ name: z.string(), id: z.uuid() });

/** Only the administrator knows who has an account: everybody else is refused by role, whether or not the person exists. */
async function personAsKnown({ context, actor, params }: { context: Context; actor: Actor; params: { id: string } }): Promise<Person> {
  if (!isPermitted('administer', actor.roles)) throw notAllowed(neededRoles('administer'));
  return loadPerson(context, params.id);
}

export const peopleRoutes = [
  defineRoute({
    method: 'get',
    path: '/people',
    action: 'administer',
    summary: 'Everybody with an account, with roles and memberships',
    query: peopleQuerySchema,
    answer: pageOf(personSchema),
    handle: async ({ context, query }) => {
      const after = query.cursor === undefined ? null : decodeCursor(query.cursor, placeSchema);
      const found = await listPeople(context, { query: query.query.trim(), after, limit: query.limit + 1 });
      const items = found.slice(0, query.limit);
      const last = items.at(-1);
      return { items, nextCursor: found.length > items.length && last !== undefined ? encodeCursor({ name: last.name, id: last.id }) : null };
    },
  }),
  defineRoute({
    method: 'put',
    path: '/people/:id/roles',
    action: 'administer',
    summary: 'Sets the roles of a person; the last administrator keeps theirs',
    params: idParams,
    body: rolesPutSchema,
    answer: personSchema,
    load: personAsKnown,
    handle: ({ context, actor, body, loaded }) => setRoles(context, actor, loaded, body.roles),
  }),
  defineRoute({
    method: 'patch',
    path: '/people/:id',
    action: 'administer',
    summary: 'Disables an account, which ends its sessions, or lets it in again',
    params: idParams,
    body: personPatchSchema,
    answer: personSchema,
    load: personAsKnown,
    handle: ({ context, actor, body, loaded }) => setAccess(context, actor, loaded, body.disabled),
  }),
  defineRoute({
    method: 'post',
    path: '/people/:id/memberships',
    action: 'administer',
    summary: 'Makes a person a member of a laboratory from a day on',
    params: idParams,
    body: membershipCreateSchema,
    answer: personSchema,
    status: 201,
    load: personAsKnown,
    handle: ({ context, actor, body, loaded }) => addMembership(context, actor, loaded, body),
  }),
  defineRoute({
    method: 'patch',
    path: '/memberships/:id',
    action: 'administer',
    summary: 'Ends a membership on a day, the last of it',
    params: idParams,
    body: membershipEndSchema,
    answer: personSchema,
    load: async ({ context, actor, params }) => {
      if (actor.roles.includes('administrator') && (await findMembership(context.db, params.id)) === null) throw notFound('This membership');
    },
    handle: ({ context, actor, params, body }) => closeMembership(context, actor, params.id, body.untilDay),
  }),
];
