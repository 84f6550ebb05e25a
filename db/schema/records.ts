import { sql } from 'drizzle-orm';
import { boolean, check, date, index, integer, jsonb, pgSequence, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import type { RecordRow, SetAsideScope } from '../../shared/contracts/records';
import { users } from './auth';
import { at, createdAt, id } from './columns';
import { labs } from './people';
import { submissionRevisions, submissions } from './submissions';
import { sources, structures, taxa } from './vocabularies';

/** Record numbers are given at first approval and never reused. */
export const recordNumbers = pgSequence('record_numbers', { startWith: 1 });

/** What the register keeps of one taxon × structure × (specimen or source). */
export const records = pgTable(
  'records',
  {
    id: id(),
    number: integer('number').notNull().unique().default(sql`nextval('record_numbers')`),
    submissionId: uuid('submission_id').notNull().references(() => submissions.id),
    /** Entry of the content from which the record comes; constant over revisions. */
    entryId: text('entry_id').notNull(),
    taxonId: uuid('taxon_id').notNull().references(() => taxa.id),
    structureId: uuid('structure_id').notNull().references(() => structures.id),
    sourceId: uuid('source_id').notNull().references(() => sources.id),
    labId: uuid('lab_id').references(() => labs.id),
    demonstration: boolean('demonstration').notNull().default(false),
    /** Withdrawn records come into no later version; they stay listed. */
    withdrawnAt: at('withdrawn_at'),
    withdrawnReason: text('withdrawn_reason').notNull().default(''),
    /** Revision in force. */
    currentRevision: integer('current_revision').notNull().default(1),
    createdAt: createdAt(),
  },
  (t) => [
    unique('records_entry').on(t.submissionId, t.entryId),
    index('records_taxon').on(t.taxonId),
    index('records_structure').on(t.structureId),
    index('records_lab').on(t.labId),
  ],
);

/** Made by an approved revision of a submission; never changed. */
export const recordRevisions = pgTable(
  'record_revisions',
  {
    id: id(),
    recordId: uuid('record_id').notNull().references(() => records.id),
    revision: integer('revision').notNull(),
    submissionRevisionId: uuid('submission_revision_id').notNull().references(() => submissionRevisions.id),
    /** The row without what changes beside it: set-asides, open re-check. */
    row: jsonb('row').$type<Omit<RecordRow, 'setAside' | 'openRecheck'>>().notNull(),
    embargoUntil: date('embargo_until'),
    createdAt: createdAt(),
  },
  (t) => [
    unique('record_revisions_number').on(t.recordId, t.revision),
    index('record_revisions_submission').on(t.submissionRevisionId),
    check('record_revisions_positive', sql`${t.revision} > 0`),
  ],
);

/** A record left out of fits by a curator's decision, for all to read; lifted, never deleted. */
export const setAsides = pgTable(
  'set_asides',
  {
    id: id(),
    recordId: uuid('record_id').notNull().references(() => records.id),
    scope: jsonb('scope').$type<SetAsideScope>().notNull(),
    reason: text('reason').notNull(),
    decidedBy: uuid('decided_by').notNull().references(() => users.id),
    createdAt: createdAt(),
    liftedAt: at('lifted_at'),
    liftedBy: uuid('lifted_by').references(() => users.id),
    liftedReason: text('lifted_reason').notNull().default(''),
  },
  (t) => [index('set_asides_record').on(t.recordId), check('set_asides_reason', sql`length(${t.reason}) > 0`)],
);
