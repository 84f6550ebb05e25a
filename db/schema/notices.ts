import { sql } from 'drizzle-orm';
import { boolean, check, index, integer, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { users } from './auth';
import { at, createdAt, id, updatedAt } from './columns';

/** What a person is told in the register, once each (`dedupeKey`). */
export const notices = pgTable(
  'notices',
  {
    id: id(),
    userId: uuid('user_id').notNull().references(() => users.id),
    kind: text('kind').notNull(),
    subject: text('subject').notNull(),
    body: text('body').notNull().default(''),
    href: text('href').notNull(),
    dedupeKey: text('dedupe_key').notNull().unique(),
    createdAt: createdAt(),
    readAt: at('read_at'),
  },
  (t) => [index('notices_user').on(t.userId, t.createdAt)],
);

/** Mail to be sent or sent. The idempotency key makes a second attempt after a crash harmless. */
export const mails = pgTable(
  'mails',
  {
    id: id(),
    userId: uuid('user_id').references(() => users.id),
    recipient: text('recipient').notNull(),
    kind: text('kind').notNull(),
    subject: text('subject').notNull(),
    body: text('body').notNull(),
    idempotencyKey: text('idempotency_key').notNull().unique(),
    status: text('status').notNull().default('queued'),
    attempts: integer('attempts').notNull().default(0),
    providerId: text('provider_id'),
    createdAt: createdAt(),
    sentAt: at('sent_at'),
  },
  (t) => [check('mails_status', sql`${t.status} in ('queued', 'sent', 'failed')`), index('mails_status_at').on(t.status, t.createdAt)],
);

/** Acts of people with power over others' data, append-only. */
export const auditEntries = pgTable(
  'audit_entries',
  {
    id: id(),
    actorId: uuid('actor_id').references(() => users.id),
    action: text('action').notNull(),
    targetType: text('target_type').notNull(),
    targetId: text('target_id').notNull(),
    detail: jsonb('detail').notNull().default(sql`'{}'::jsonb`),
    requestId: text('request_id'),
    createdAt: createdAt(),
  },
  (t) => [index('audit_entries_at').on(t.createdAt), index('audit_entries_target').on(t.targetType, t.targetId)],
);

/** The register's own settings: `demo` is chosen at the first start. */
export const registerSettings = pgTable('register_settings', {
  key: text('key').primaryKey(),
  value: jsonb('value').notNull(),
  fixed: boolean('fixed').notNull().default(false),
  updatedAt: updatedAt(),
});
