import { z } from 'zod';
import { timeSchema } from './common';
import { roleSchema } from './vocabulary';

/** GET /me: who is asking, what waits for them, and what kind of register this is. */
export const meSchema = z.object({
  register: z.object({ demo: z.boolean(), currentVersion: z.string().nullable() }),
  person: z
    .object({
      id: z.string(),
      name: z.string(),
      email: z.string(),
      emailVerified: z.boolean(),
      orcid: z.string().nullable(),
      roles: z.array(roleSchema),
      lab: z.object({ id: z.string(), name: z.string() }).nullable(),
    })
    .nullable(),
  waiting: z.object({
    submissions: z.number().int(),
    review: z.number().int(),
    curate: z.number().int(),
    notices: z.number().int(),
  }),
});
export type Me = z.infer<typeof meSchema>;

export const profilePatchSchema = z.object({ name: z.string().trim().min(1).max(120).optional(), orcid: z.string().trim().max(40).nullable().optional() });

export const noticeSchema = z.object({
  id: z.string(),
  kind: z.string(),
  subject: z.string(),
  body: z.string(),
  href: z.string(),
  createdAt: timeSchema,
  readAt: timeSchema.nullable(),
});
export type Notice = z.infer<typeof noticeSchema>;

/** A thing that waits for the person who asks, for the Register page. */
export const waitingItemSchema = z.object({
  kind: z.enum(['changes-requested', 'recheck-open', 'recheck-answered', 'draft', 'to-review', 'to-freeze', 'flag']),
  title: z.string(),
  species: z.string(),
  detail: z.string(),
  href: z.string(),
  since: timeSchema,
  demonstration: z.boolean(),
});
export type WaitingItem = z.infer<typeof waitingItemSchema>;
