import { sql } from 'drizzle-orm';
import { bigint, boolean, check, index, integer, jsonb, pgTable, primaryKey, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { RecordRow } from '../../shared/contracts/records';
import { users } from './auth';
import { at, createdAt, id } from './columns';
import { recordRevisions, records } from './records';

/** A frozen, citable state of the dataset. The current version is the frozen one with the greatest number. */
export const versions = pgTable(
  'versions',
  {
    id: id(),
    number: integer('number').notNull().unique(),
    status: text('status').$type<'preparing' | 'frozen'>().notNull().default('preparing'),
    title: text('title').notNull(),
    note: text('note').notNull().default(''),
    /** True where it holds demonstration records: said in title, page and every file. */
    demonstration: boolean('demonstration').notNull().default(false),
    licence: text('licence').notNull().default('CC BY 4.0'),
    /** Everything a page or file says of the version as a whole: counts, contributors, changes since the previous one. */
    summary: jsonb('summary'),
    /** SHA-256 of CHECKSUMS.sha256, the manifest of all files. */
    manifestSha256: text('manifest_sha256'),
    startedBy: uuid('started_by').notNull().references(() => users.id),
    createdAt: createdAt(),
    frozenAt: at('frozen_at'),
  },
  (t) => [
    uniqueIndex('versions_one_preparing').on(t.status).where(sql`status = 'preparing'`),
    check('versions_status', sql`${t.status} in ('preparing', 'frozen')`),
    check('versions_frozen', sql`${t.status} <> 'frozen' or (${t.frozenAt} is not null and ${t.manifestSha256} is not null)`),
    check('versions_positive', sql`${t.number} > 0`),
  ],
);

/** Steps of a freeze, for its progress; append-only. */
export const versionEvents = pgTable(
  'version_events',
  {
    id: id(),
    seq: bigint('seq', { mode: 'number' }).generatedAlwaysAsIdentity(),
    versionId: uuid('version_id').notNull().references(() => versions.id),
    step: text('step').notNull(),
    detail: text('detail').notNull().default(''),
    actorId: uuid('actor_id').references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [index('version_events_version').on(t.versionId, t.seq)],
);

export const versionRows = pgTable(
  'version_rows',
  {
    versionId: uuid('version_id').notNull().references(() => versions.id),
    recordId: uuid('record_id').notNull().references(() => records.id),
    recordRevisionId: uuid('record_revision_id').notNull().references(() => recordRevisions.id),
    number: integer('number').notNull(),
    row: jsonb('row').$type<RecordRow>().notNull(),
  },
  (t) => [primaryKey({ columns: [t.versionId, t.recordId] }), index('version_rows_number').on(t.versionId, t.number)],
);

export const versionFiles = pgTable(
  'version_files',
  {
    versionId: uuid('version_id').notNull().references(() => versions.id),
    name: text('name').notNull(),
    mediaType: text('media_type').notNull(),
    bytes: bigint('bytes', { mode: 'number' }).notNull(),
    sha256: text('sha256').notNull(),
    storageKey: text('storage_key').notNull(),
    rows: integer('rows'),
    position: integer('position').notNull(),
  },
  (t) => [primaryKey({ columns: [t.versionId, t.name] }), check('version_files_sha', sql`${t.sha256} ~ '^[0-9a-f]{64}$'`)],
);

/** State of a version's DOI, apart from the version, which never changes. */
export const versionDois = pgTable(
  'version_dois',
  {
    versionId: uuid('version_id').primaryKey().references(() => versions.id),
    doi: text('doi').notNull().unique(),
    state: text('state').notNull(),
    updatedAt: at('updated_at').notNull().defaultNow(),
  },
  (t) => [check('version_dois_state', sql`${t.state} in ('reserved', 'draft', 'findable')`)],
);
