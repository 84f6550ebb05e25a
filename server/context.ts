import type { Logger } from 'pino';
import type { Role } from '../shared/contracts/vocabulary';
import type { Database } from '../db/client';
import type { Config } from './config';
import type { Mailer } from './integrations/mail';
import type { ObjectStore } from './integrations/storage';
import type { JobQueue } from './jobs/queue';

/** The person who asks. */
export interface Actor {
  id: string;
  name: string;
  email: string;
  emailVerified: boolean;
  orcid: string | null;
  roles: Role[];
  /** Lab of today's membership. */
  labId: string | null;
  labName: string | null;
  demonstration: boolean;
}

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
