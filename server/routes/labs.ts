import { z } from 'zod';
import { labCreateSchema, labSchema } from '../../shared/contracts/people';
import { defineRoute } from '../routing';
import { createLab, listLabs } from '../services/people/labs';

export const labRoutes = [
  defineRoute({
    method: 'get',
    path: '/labs',
    action: 'administer',
    summary: 'Laboratories with their members of today',
    answer: z.object({ items: z.array(labSchema) }),
    handle: async ({ context }) => ({ items: await listLabs(context) }),
  }),
  defineRoute({
    method: 'post',
    path: '/labs',
    action: 'administer',
    summary: 'Makes a laboratory',
    body: labCreateSchema,
    answer: labSchema,
    status: 201,
    handle: ({ context, actor, body }) => createLab(context, actor, body),
  }),
];
