import { sql } from 'drizzle-orm';
import { bigint, boolean, check, date, index, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core';
import type { CheckResult } from '../../shared/contracts/checks';
import type { SubmissionContent } from '../../shared/contracts/content';
import { attachmentTypes, decisionKinds, revisionStatuses, submissionKinds } from '../../shared/contracts/vocabulary';
import { users } from './auth';
import { at, createdAt, id, updatedAt, wordsIn } from './columns';
import { labs } from './people';

export const submissions = pgTable(
  'submissions',
  {
    id: id(),
    kind: text('kind').$type<(typeof submissionKinds)[number]>().notNull(),
    /** Decided by membership on the day of submission; null for the system actor. */
    labId: uuid('lab_id').references(() => labs.id),
    createdBy: uuid('created_by').notNull().references(() => users.id),
    demonstration: boolean('demonstration').notNull().default(false),
    createdAt: createdAt(),
  },
  (t) => [
    check('submissions_kind', wordsIn('kind', submissionKinds)),
    index('submissions_lab').on(t.labId),
    index('submissions_creator').on(t.createdBy),
  ],
);

/** Revision 1, 2, … of a submission. The status row of the state machine; immutable in all else once submitted. */
export const submissionRevisions = pgTable(
  'submission_revisions',
  {
    id: id(),
    submissionId: uuid('submission_id').notNull().references(() => submissions.id),
    revision: integer('revision').notNull(),
    status: text('status').$type<(typeof revisionStatuses)[number]>().notNull().default('draft'),
    content: jsonb('content').$type<SubmissionContent>().notNull(),
    /** Quality checks as they stood at submission. */
    checks: jsonb('checks').$type<CheckResult[]>(),
    /** Counts up with each change of a draft; the entity tag of If-Match. */
    draftVersion: integer('draft_version').notNull().default(1),
    /** Re-check that this revision answers. */
    answersRecheckId: uuid('answers_recheck_id'),
    submittedBy: uuid('submitted_by').references(() => users.id),
    submittedAt: at('submitted_at'),
    decidedAt: at('decided_at'),
    embargoUntil: date('embargo_until'),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (t) => [
    unique('submission_revisions_number').on(t.submissionId, t.revision),
    check('submission_revisions_status', wordsIn('status', revisionStatuses)),
    check('submission_revisions_positive', sql`${t.revision} > 0`),
    check('submission_revisions_submitted', sql`${t.status} in ('draft', 'withdrawn') or (${t.submittedAt} is not null and ${t.submittedBy} is not null)`),
    index('submission_revisions_status_at').on(t.status, t.submittedAt),
  ],
);

/** What happened to a submission, append-only, newest last. */
export const submissionEvents = pgTable(
  'submission_events',
  {
    id: id(),
    seq: bigint('seq', { mode: 'number' }).generatedAlwaysAsIdentity(),
    submissionId: uuid('submission_id').notNull().references(() => submissions.id),
    revisionId: uuid('revision_id').notNull().references(() => submissionRevisions.id),
    kind: text('kind').notNull(),
    actorId: uuid('actor_id').notNull().references(() => users.id),
    reason: text('reason').notNull().default(''),
    createdAt: createdAt(),
  },
  (t) => [index('submission_events_submission').on(t.submissionId, t.seq)],
);

/** One decision a revision; two reviewers deciding at once meet this key. */
export const decisions = pgTable(
  'decisions',
  {
    id: id(),
    revisionId: uuid('revision_id').notNull().unique().references(() => submissionRevisions.id),
    kind: text('kind').$type<(typeof decisionKinds)[number]>().notNull(),
    comment: text('comment').notNull(),
    checklist: jsonb('checklist').$type<Record<string, boolean>>().notNull(),
    decidedBy: uuid('decided_by').notNull().references(() => users.id),
    createdAt: createdAt(),
  },
  () => [check('decisions_kind', wordsIn('kind', decisionKinds))],
);

/** A comment anchored at a field of a revision, or an answer to one. */
export const comments = pgTable(
  'comments',
  {
    id: id(),
    submissionId: uuid('submission_id').notNull().references(() => submissions.id),
    revisionId: uuid('revision_id').notNull().references(() => submissionRevisions.id),
    fieldPath: text('field_path').notNull(),
    authorId: uuid('author_id').notNull().references(() => users.id),
    text: text('text').notNull(),
    createdAt: createdAt(),
  },
  (t) => [index('comments_submission').on(t.submissionId, t.createdAt), check('comments_text', sql`length(${t.text}) between 1 and 4000`)],
);

export const attachments = pgTable(
  'attachments',
  {
    id: id(),
    submissionId: uuid('submission_id').notNull().references(() => submissions.id),
    fieldPath: text('field_path').notNull().default(''),
    name: text('name').notNull(),
    caption: text('caption').notNull().default(''),
    mediaType: text('media_type').notNull(),
    bytes: bigint('bytes', { mode: 'number' }).notNull(),
    /** SHA-256 of what is stored (location data already removed). */
    sha256: text('sha256').notNull(),
    storageKey: text('storage_key').notNull(),
    uploadedBy: uuid('uploaded_by').notNull().references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [
    check('attachments_type', wordsIn('media_type', attachmentTypes)),
    check('attachments_size', sql`${t.bytes} between 1 and 26214400`),
    check('attachments_sha', sql`${t.sha256} ~ '^[0-9a-f]{64}$'`),
    index('attachments_submission').on(t.submissionId),
  ],
);

/** Which evidence belongs to which revision. */
export const revisionAttachments = pgTable(
  'revision_attachments',
  {
    revisionId: uuid('revision_id').notNull().references(() => submissionRevisions.id),
    attachmentId: uuid('attachment_id').notNull().references(() => attachments.id),
  },
  (t) => [primaryKey({ columns: [t.revisionId, t.attachmentId] })],
);
