import { sql } from 'drizzle-orm';
import { boolean, check, date, index, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core';
import { roles } from '../../shared/contracts/vocabulary';
import { users } from './auth';
import { createdAt, id, wordsIn } from './columns';

export const labs = pgTable('labs', {
  id: id(),
  name: text('name').notNull().unique(),
  place: text('place').notNull().default(''),
  demonstration: boolean('demonstration').notNull().default(false),
  createdAt: createdAt(),
});

/** Membership is dated: what a person's lab is, is decided on the day of submission. */
export const labMemberships = pgTable(
  'lab_memberships',
  {
    id: id(),
    userId: uuid('user_id').notNull().references(() => users.id),
    labId: uuid('lab_id').notNull().references(() => labs.id),
    fromDay: date('from_day').notNull(),
    untilDay: date('until_day'),
    grantedBy: uuid('granted_by').references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [
    unique('lab_memberships_once').on(t.userId, t.labId, t.fromDay),
    check('lab_memberships_order', sql`${t.untilDay} is null or ${t.untilDay} >= ${t.fromDay}`),
    index('lab_memberships_lab').on(t.labId),
  ],
);

/** A person's roles: sets of permissions, not a ladder. */
export const userRoles = pgTable(
  'user_roles',
  {
    userId: uuid('user_id').notNull().references(() => users.id),
    role: text('role').notNull(),
    grantedBy: uuid('granted_by').references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.userId, t.role] }), check('user_roles_role', wordsIn('role', roles))],
);
