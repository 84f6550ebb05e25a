import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import * as schema from './schema/index';

export type Database = NodePgDatabase<typeof schema>;
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];
/** What queries take first: the pool or a running transaction. */
export type Queryable = Database | Transaction;

/**
 * Opens a pool on the given address.
 * @param onError told of errors of idle connections; without a listener a database restart would end the process.
 */
export function openDatabase(databaseUrl: string, onError: (error: Error) => void, maxConnections = 10): { db: Database; pool: pg.Pool } {
  const pool = new pg.Pool({ connectionString: databaseUrl, max: maxConnections });
  pool.on('error', onError);
  return { db: drizzle(pool, { schema }), pool };
}
