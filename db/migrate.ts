import { readFileSync } from 'node:fs';
import path from 'node:path';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';

const migrationLock = 7_205_001;

/** The database was written by another state of the program; the message says what to do. */
export class DatabaseStateError extends Error {}

type Journal = { entries: { when: number; tag: string }[] };

/** Folder of the migrations; the server bundle runs from elsewhere and finds it from the working directory. */
export const migrationsFolder = path.resolve(process.cwd(), 'db/migrations');

async function refuseForeignState(client: pg.Client, journal: Journal): Promise<void> {
  const known = await client.query("select to_regclass('drizzle.__drizzle_migrations') as name");
  if (known.rows[0]?.name === null) {
    const tables = await client.query("select count(*)::int as count from information_schema.tables where table_schema = 'public'");
    if (tables.rows[0].count > 0) {
      throw new DatabaseStateError('The database holds tables that are not this register\'s. Point DATABASE_URL at an empty database, or run "npm run reset".');
    }
    return;
  }
  const applied = await client.query<{ created_at: string }>('select created_at from drizzle.__drizzle_migrations order by created_at');
  const mine = new Set(journal.entries.map((entry) => entry.when));
  const foreign = applied.rows.filter((row) => !mine.has(Number(row.created_at)));
  if (foreign.length === 0) return;
  const newest = Math.max(...mine);
  const word = foreign.some((row) => Number(row.created_at) > newest) ? 'a newer' : 'an older, unreleased';
  throw new DatabaseStateError(`The database was made by ${word} state of this program. Use that state, or run "npm run reset" to make the register anew (its content is lost).`);
}

/**
 * Brings a database to the schema of this program, under an advisory lock so that two starters do not collide.
 * @throws DatabaseStateError when the database belongs to another state of the program.
 */
export async function migrateDatabase(databaseUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [migrationLock]);
    const journal = JSON.parse(readFileSync(path.join(migrationsFolder, 'meta/_journal.json'), 'utf8')) as Journal;
    await refuseForeignState(client, journal);
    await migrate(drizzle(client), { migrationsFolder });
  } finally {
    await client.end();
  }
}
