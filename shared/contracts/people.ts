import { z } from 'zod';
import { pageQuery, timeSchema } from './common';
import { roleSchema } from './vocabulary';

export const labSchema = z.object({ id: z.string(), name: z.string(), place: z.string(), members: z.number().int(), demonstration: z.boolean() });
export type Lab = z.infer<typeof labSchema>;
export const labCreateSchema = z.object({ name: z.string().trim().min(2).max(200), place: z.string().trim().max(200).default('') });

export const personSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  emailVerified: z.boolean(),
  orcid: z.string().nullable(),
  kind: z.enum(['person', 'system']),
  demonstration: z.boolean(),
  disabled: z.boolean(),
  roles: z.array(roleSchema),
  memberships: z.array(z.object({ id: z.string(), labId: z.string(), lab: z.string(), fromDay: z.string(), untilDay: z.string().nullable() })),
  createdAt: timeSchema,
});
export type Person = z.infer<typeof personSchema>;
export const peopleQuerySchema = z.object({ query: z.string().max(200).default(''), ...pageQuery });
export const rolesPutSchema = z.object({ roles: z.array(roleSchema).max(4) });
export const membershipCreateSchema = z.object({ labId: z.uuid(), fromDay: z.iso.date() });
export const membershipEndSchema = z.object({ untilDay: z.iso.date() });
export const personPatchSchema = z.object({ disabled: z.boolean() });

export const auditEntrySchema = z.object({ id: z.string(), at: timeSchema, actor: z.string(), action: z.string(), targetType: z.string(), targetId: z.string(), detail: z.record(z.string(), z.unknown()) });
export type AuditEntry = z.infer<typeof auditEntrySchema>;
export const auditQuerySchema = z.object({ action: z.string().max(80).optional(), ...pageQuery });

/** Mail as sent, readable by the administrator of a demonstration register. */
export const outboxMailSchema = z.object({ id: z.string(), to: z.string(), subject: z.string(), text: z.string(), sentAt: timeSchema });
export type OutboxMail = z.infer<typeof outboxMailSchema>;

/** The first account of a register outside demo mode, made by the printed one-time link. */
export const firstAccountSchema = z.object({ token: z.string().min(20).max(200), name: z.string().trim().min(1).max(120), email: z.email().max(200), password: z.string().min(12, 'At least 12 characters').max(200) });
