import type { Logger } from 'pino';
import type { Database } from '../db/client';
import type { FoundActor } from '../db/queries/people';
import type { Config } from './config';
import type { Mailer } from './integrations/mail';
import type { ObjectStore } from './integrations/storage';
import type { JobQueue } from './jobs/queue';

/** The person who asks, with the lab of today's membership. */
export type Actor = FoundActor;

/** What every service gets first: the world, wired once at the start and replaced piece by piece in tests. */
export interface Context {
  db: Database;
  config: Config;
  logger: Logger;
  clock: () => Date;
  mailer: Mailer;
  storage: ObjectStore;
  jobs: JobQueue;
  /** Named points between writes at which a test lets the process die; does nothing outside tests. */
  killPoint: (name: string) => void;
  /** Whether this is a demonstration register; chosen at the first start and kept in the database. */
  demo: boolean;
}

/** Today in UTC, ISO. */
export const today = (context: Context): string => context.clock().toISOString().slice(0, 10);
