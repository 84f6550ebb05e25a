import PgBoss from 'pg-boss';
import type { Logger } from 'pino';

/** Jobs of the queue. Each is safe to run twice: it looks at the rows first and does what is still to do. */
export interface Jobs {
  'send-mail': { mailId: string };
  'refresh-fits': { runId: string };
  'freeze-version': { versionId: string };
  sweep: Record<string, never>;
}
export type JobName = keyof Jobs;
export const jobNames = ['send-mail', 'refresh-fits', 'freeze-version', 'sweep'] as const satisfies readonly JobName[];

export type JobHandlers = { [Name in JobName]: (data: Jobs[Name]) => Promise<void> };

export interface JobQueue {
  /** Enqueues after the rows that ask for the work are committed; the sweep finds what a crash in between left. */
  enqueue<Name extends JobName>(name: Name, data: Jobs[Name], key: string): Promise<void>;
  start(handlers: JobHandlers): Promise<void>;
  stop(): Promise<void>;
}

/** pg-boss on the register's own database. Failed jobs are retried with growing pauses; a killed worker's job is taken up again. */
export function createJobQueue(databaseUrl: string, logger: Logger, options: { workersPerQueue?: number } = {}): JobQueue {
  const boss = new PgBoss({ connectionString: databaseUrl, schema: 'jobs', max: 4, monitorStateIntervalSeconds: 10, maintenanceIntervalSeconds: 10 });
  boss.on('error', (error) => logger.error({ err: error }, 'queue failed'));
  let started = false;

  async function work<Name extends JobName>(name: Name, handler: JobHandlers[Name]): Promise<void> {
    const workers = name === 'send-mail' ? (options.workersPerQueue ?? 2) : 1;
    for (let worker = 0; worker < workers; worker += 1) {
      await boss.work<Jobs[Name]>(name, { batchSize: 1, pollingIntervalSeconds: 0.5 }, async ([job]) => {
        if (job === undefined) return;
        try {
          await handler(job.data);
        } catch (error) {
          logger.warn({ err: error, job: name }, 'job failed, will be tried again');
          throw error;
        }
      });
    }
  }

  return {
    async enqueue(name, data, key) {
      if (!started) return;
      await boss.send(name, data, { singletonKey: key, retryLimit: 20, retryDelay: 2, retryBackoff: true, expireInSeconds: 120 });
    },
    async start(handlers) {
      await boss.start();
      for (const name of jobNames) await boss.createQueue(name, { name, policy: 'short' });
      started = true;
      for (const name of jobNames) await work(name, handlers[name]);
      await boss.schedule('sweep', '* * * * *');
      await boss.send('sweep', {}, { singletonKey: 'start' });
    },
    async stop() {
      if (!started) return;
      started = false;
      await boss.stop({ graceful: true, wait: true, timeout: 8_000 });
    },
  };
}
