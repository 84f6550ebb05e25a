import { z } from 'zod';
import { checkResultSchema } from './checks';
import { estimateSchema, pageQuery, personRefSchema, timeSchema } from './common';
import { submissionContentSchema } from './content';
import { placeSchema } from './fits';
import { decisionKindSchema, revisionStatusSchema, submissionKinds } from './vocabulary';

export const submissionCreateSchema = z.object({ kind: z.enum(submissionKinds), content: submissionContentSchema.optional() });
export const submissionsQuerySchema = z.object({ status: revisionStatusSchema.optional(), ...pageQuery });

export const submissionItemSchema = z.object({
  id: z.string(),
  kind: z.enum(submissionKinds),
  title: z.string().meta({ description: 'Species and specimen code, or citation' }),
  species: z.string(),
  code: z.string(),
  structures: z.array(z.string()),
  status: revisionStatusSchema,
  revision: z.number().int(),
  /** True where an earlier revision was sent back and this one answers it. */
  answered: z.boolean(),
  clade: z.string().nullable(),
  cladeName: z.string().nullable(),
  lab: z.string().nullable(),
  by: personRefSchema,
  updatedAt: timeSchema,
  submittedAt: timeSchema.nullable(),
  demonstration: z.boolean(),
  openRecheck: z.string().nullable(),
});
export type SubmissionItem = z.infer<typeof submissionItemSchema>;

/** What follows from a structure's entries: the sum of its samples, by shared/domain. */
export const derivedStructureSchema = z.object({
  entryId: z.string(),
  structure: z.string(),
  structureMassG: z.number().nullable(),
  cells: estimateSchema,
  neurons: estimateSchema,
  otherCells: estimateSchema,
  cellsPerMg: estimateSchema,
  neuronsPerMg: estimateSchema,
  doubled: z.boolean(),
  place: placeSchema.nullable(),
  noPlace: z.string().nullable(),
});
export type DerivedStructure = z.infer<typeof derivedStructureSchema>;

/** POST /submissions/preview and part of every submission: derived values, checks and places, computed from the content. */
export const previewSchema = z.object({
  structures: z.array(derivedStructureSchema),
  checks: z.array(checkResultSchema),
});
export type Preview = z.infer<typeof previewSchema>;
/** `submissionId`: the submission that the content belongs to, so that its own code is not held against it. */
export const previewRequestSchema = z.object({ content: submissionContentSchema, submissionId: z.uuid().nullish() });
export const reviseSchema = z.object({ recheckId: z.uuid().nullish() });

export const attachmentSchema = z.object({
  id: z.string(),
  name: z.string(),
  caption: z.string(),
  mediaType: z.string(),
  bytes: z.number().int(),
  sha256: z.string(),
  fieldPath: z.string(),
  uploadedBy: z.string(),
  createdAt: timeSchema,
});
export type AttachmentView = z.infer<typeof attachmentSchema>;

export const commentSchema = z.object({ id: z.string(), revision: z.number().int(), fieldPath: z.string(), author: personRefSchema, text: z.string(), createdAt: timeSchema });
export type CommentView = z.infer<typeof commentSchema>;
export const commentCreateSchema = z.object({ revision: z.number().int().min(1), fieldPath: z.string().max(300), text: z.string().trim().min(1).max(4000) });

export const decisionCreateSchema = z.object({
  revision: z.number().int().min(1),
  decision: decisionKindSchema,
  comment: z.string().trim().min(1, 'Give the reason in a sentence').max(4000),
  checklist: z.object({ rawCounts: z.boolean(), derivedValues: z.boolean(), checks: z.boolean(), evidence: z.boolean(), provenance: z.boolean() }),
});
export const decisionSchema = z.object({ revision: z.number().int(), decision: decisionKindSchema, comment: z.string(), checklist: z.record(z.string(), z.boolean()), by: personRefSchema, at: timeSchema });

export const submissionEventSchema = z.object({ kind: z.string(), revision: z.number().int(), by: personRefSchema, reason: z.string(), at: timeSchema });

/** A field that a revision changed, with both texts. */
export const changeSchema = z.object({ path: z.string(), before: z.string(), after: z.string() });
export type Change = z.infer<typeof changeSchema>;

export const submissionDetailSchema = submissionItemSchema.extend({
  /** Newest revision; its entity tag for If-Match is `etag`. */
  content: submissionContentSchema,
  etag: z.string(),
  preview: previewSchema,
  revisions: z.array(z.object({ revision: z.number().int(), status: revisionStatusSchema, submittedAt: timeSchema.nullable() })),
  changes: z.array(changeSchema).meta({ description: 'Against the previous revision' }),
  attachments: z.array(attachmentSchema),
  comments: z.array(commentSchema),
  decisions: z.array(decisionSchema),
  events: z.array(submissionEventSchema),
  records: z.array(z.object({ number: z.string(), structure: z.string() })),
  recheck: z.object({ id: z.string(), question: z.string(), status: z.string() }).nullable(),
  may: z.object({ edit: z.boolean(), submit: z.boolean(), withdraw: z.boolean(), revise: z.boolean(), comment: z.boolean(), decide: z.boolean(), whyNotDecide: z.string().nullable() }),
});
export type SubmissionDetail = z.infer<typeof submissionDetailSchema>;

export const submissionPatchSchema = z.object({ content: submissionContentSchema });
/** Answer 409 `stale-revision` to PATCH carries the newer state in `current`. */
export const staleProblemExtra = z.object({ current: submissionDetailSchema });
export const reasonSchema = z.object({ reason: z.string().trim().max(2000).default('') });

/** What the register holds for the species of a submission, beside it in the review view. */
export const heldRecordSchema = z.object({ number: z.string(), structure: z.string(), source: z.string(), structureMassG: z.number().nullable(), neurons: z.number().nullable(), neuronsError: z.number().nullable(), cells: z.number().nullable() });
export const reviewViewSchema = submissionDetailSchema.extend({ held: z.array(heldRecordSchema) });
export type ReviewView = z.infer<typeof reviewViewSchema>;
