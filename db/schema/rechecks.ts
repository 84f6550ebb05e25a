import { sql } from 'drizzle-orm';
import { bigint, check, index, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { recheckAnswerKinds, recheckStatuses } from '../../shared/contracts/vocabulary';
import { users } from './auth';
import { at, createdAt, id, wordsIn } from './columns';
import { flags } from './fits';
import { records } from './records';
import { attachments, submissionRevisions } from './submissions';

/** A question put to the lab of a record, from a flag or by hand. */
export const rechecks = pgTable(
  'rechecks',
  {
    id: id(),
    recordId: uuid('record_id').notNull().references(() => records.id),
    flagId: uuid('flag_id').references(() => flags.id),
    fieldPath: text('field_path').notNull().default(''),
    status: text('status').$type<(typeof recheckStatuses)[number]>().notNull().default('open'),
    question: text('question').notNull(),
    askedBy: uuid('asked_by').notNull().references(() => users.id),
    createdAt: createdAt(),
    closedAt: at('closed_at'),
  },
  (t) => [
    check('rechecks_status', wordsIn('status', recheckStatuses)),
    check('rechecks_question', sql`length(${t.question}) between 1 and 4000`),
    uniqueIndex('rechecks_one_open').on(t.recordId).where(sql`status <> 'closed'`),
    index('rechecks_status_at').on(t.status, t.createdAt),
  ],
);

/** asked, answered, reopened, closed: append-only. */
export const recheckEvents = pgTable(
  'recheck_events',
  {
    id: id(),
    seq: bigint('seq', { mode: 'number' }).generatedAlwaysAsIdentity(),
    recheckId: uuid('recheck_id').notNull().references(() => rechecks.id),
    kind: text('kind').notNull(),
    answer: text('answer').$type<(typeof recheckAnswerKinds)[number]>(),
    text: text('text').notNull().default(''),
    attachmentId: uuid('attachment_id').references(() => attachments.id),
    submissionRevisionId: uuid('submission_revision_id').references(() => submissionRevisions.id),
    actorId: uuid('actor_id').notNull().references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [
    check('recheck_events_kind', sql`${t.kind} in ('asked', 'answered', 'reopened', 'closed')`),
    check('recheck_events_answer', sql`${t.answer} is null or ${wordsIn('answer', recheckAnswerKinds)}`),
    index('recheck_events_recheck').on(t.recheckId, t.seq),
  ],
);
