import { sql } from 'drizzle-orm';
import { timestamp, uuid } from 'drizzle-orm/pg-core';

/** Columns that every table writes the same way. Times are UTC to the millisecond, so that a cursor taken from a JS Date skips nothing. */
export const id = () => uuid('id').primaryKey().default(sql`gen_random_uuid()`);
export const at = (name: string) => timestamp(name, { withTimezone: true, precision: 3, mode: 'date' });
export const createdAt = () => at('created_at').notNull().defaultNow();
export const updatedAt = () => at('updated_at').notNull().defaultNow();

/** SQL list of quoted words for a check constraint, from a closed vocabulary. */
export const wordsIn = (column: string, words: readonly string[]) =>
  sql.raw(`${column} in (${words.map((word) => `'${word.replaceAll("'", "''")}'`).join(', ')})`);
