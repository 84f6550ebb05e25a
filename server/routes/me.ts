import { z } from 'zod';
import { findActor } from '../../db/queries/people';
import { findNotices, markNoticesRead } from '../../db/queries/notices';
import { meSchema, noticeSchema, profilePatchSchema } from '../../shared/contracts/account';
import { pageOf, pageQuery } from '../../shared/contracts/common';
import { firstAccountSchema } from '../../shared/contracts/people';
import { today } from '../context';
import { AppError } from '../errors';
import { decodeCursor, encodeCursor } from '../paging';
import { defineRoute } from '../routing';
import { makeFirstAccount } from '../services/account/firstAccount';
import { changeProfile, describeMe } from '../services/account/me';

const timeText = z.iso.datetime();

export const meRoutes = [
  defineRoute({
    method: 'get',
    path: '/me',
    action: 'read-published',
    summary: 'Who is asking, with roles, laboratory and what waits; also without a session',
    answer: meSchema,
    handle: ({ context, visitor }) => describeMe(context, visitor),
  }),
  defineRoute({
    method: 'patch',
    path: '/me',
    action: 'own-account',
    summary: 'Changes the own name or ORCID iD',
    body: profilePatchSchema,
    answer: meSchema,
    handle: async ({ context, actor, body }) => {
      await changeProfile(context, actor, body);
      return describeMe(context, await findActor(context.db, actor.id, today(context)));
    },
  }),
  defineRoute({
    method: 'get',
    path: '/notices',
    action: 'own-account',
    summary: 'What the person was told, newest first',
    query: z.object(pageQuery),
    answer: pageOf(noticeSchema),
    handle: async ({ context, actor, query }) => {
      const before = query.cursor === undefined ? null : new Date(decodeCursor(query.cursor, timeText));
      const found = await findNotices(context.db, actor.id, before, query.limit + 1);
      const page = found.slice(0, query.limit);
      const last = page.at(-1);
      return {
        items: page.map(({ id, kind, subject, body, href, createdAt, readAt }) => ({ id, kind, subject, body, href, createdAt: createdAt.toISOString(), readAt: readAt?.toISOString() ?? null })),
        nextCursor: found.length > page.length && last !== undefined ? encodeCursor(last.createdAt.toISOString()) : null,
      };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/notices/read',
    action: 'own-account',
    summary: 'Marks every own notice as read',
    status: 204,
    handle: ({ context, actor }) => markNoticesRead(context.db, actor.id, context.clock()),
  }),
  defineRoute({
    method: 'post',
    path: '/first-account',
    action: 'read-published',
    summary: 'Turns the printed one-time link into the first administrator, once',
    body: firstAccountSchema,
    status: 201,
    answer: z.object({ email: z.string() }),
    handle: async ({ context, body }) => {
      if (context.demo) throw new AppError('not-found', 'A demonstration register has its accounts already.');
      await makeFirstAccount(context, body);
      return { email: body.email.toLowerCase() };
    },
  }),
];
