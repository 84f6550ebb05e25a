import { openDatabase } from '../db/client';
import { migrateDatabase } from '../db/migrate';
import { chooseDemoMode } from '../db/queries/settings';
import type { Config } from './config';
import type { Context } from './context';
import { connectMailer } from './integrations/mail';
import { connectStorage } from './integrations/storage';
import { createJobQueue } from './jobs/queue';
import { createKillPoint } from './killPoint';
import { createLogger } from './logger';

/** Something that stops the start, in a sentence for the person who starts the server. */
export class StartError extends Error {}

/**
 * Wires the world once: migrated database, services by their SDK, queue. Demo mode is chosen by the first start on an
 * empty database and stands from then on.
 */
export async function createContext(config: Config): Promise<{ context: Context; close: () => Promise<void> }> {
  const logger = createLogger(config.logLevel);
  await migrateDatabase(config.databaseUrl);
  const { db, pool } = openDatabase(config.databaseUrl, (error) => logger.error({ err: error }, 'database connection lost'));
  const demo = await chooseDemoMode(db, config.demo);
  if (demo !== config.demo) {
    await pool.end();
    throw new StartError(
      demo
        ? 'This register was made in demo mode and stays in it; start it with KARYA_DEMO=on, or give another DATABASE_URL for a real one.'
        : 'This register was made outside demo mode; start it with KARYA_DEMO=off.',
    );
  }
  const storage = connectStorage(config.storage);
  await storage.checkBucket({ create: demo });
  const context: Context = {
    db,
    config,
    logger,
    clock: () => new Date(),
    mailer: connectMailer(config.mail),
    storage,
    jobs: createJobQueue(config.databaseUrl, logger),
    killPoint: createKillPoint(config.killAt, config.killLog),
    demo,
  };
  return {
    context,
    close: async () => {
      await context.jobs.stop();
      storage.close();
      await pool.end();
    },
  };
}
