import { z } from 'zod';
import { pageQuery, personRefSchema, timeSchema } from './common';
import { recheckAnswerKindSchema, recheckStatusSchema } from './vocabulary';

export const recheckEventSchema = z.object({ kind: z.enum(['asked', 'answered', 'reopened', 'closed']), answer: recheckAnswerKindSchema.nullable(), text: z.string(), by: personRefSchema, at: timeSchema, submissionRevision: z.number().int().nullable() });
export const recheckSchema = z.object({
  id: z.string(),
  record: z.string(),
  species: z.string(),
  slug: z.string(),
  structure: z.string(),
  lab: z.string().nullable(),
  status: recheckStatusSchema,
  question: z.string(),
  fieldPath: z.string(),
  flag: z.string().nullable().meta({ description: 'The flag it was asked from, in words' }),
  askedBy: personRefSchema,
  at: timeSchema,
  submissionId: z.string(),
  events: z.array(recheckEventSchema),
  demonstration: z.boolean(),
  may: z.object({ answer: z.boolean(), close: z.boolean(), whyNot: z.string().nullable() }),
});
export type Recheck = z.infer<typeof recheckSchema>;
export const rechecksQuerySchema = z.object({ status: recheckStatusSchema.optional(), ...pageQuery });
export const recheckAskSchema = z.object({ question: z.string().trim().min(1, 'Say what is to be checked').max(4000), flagId: z.uuid().nullish(), fieldPath: z.string().max(300).default('') });
export const recheckAnswerSchema = z.object({ answer: recheckAnswerKindSchema, text: z.string().trim().min(1, 'Say what was found').max(4000), attachmentId: z.uuid().nullish() });
export const recheckCloseSchema = z.object({ outcome: z.enum(['close', 'reopen']).default('close'), text: z.string().trim().min(1, 'Give the reason in a sentence').max(4000) });
