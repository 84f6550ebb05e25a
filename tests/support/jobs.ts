import type { JobHandlers, JobName, Jobs, JobQueue } from '../../server/jobs/queue';

type Waiting = { [Name in JobName]: { name: Name; data: Jobs[Name] } }[JobName];

/** A queue that keeps the jobs until the test lets them be done, one after the other. */
export function collectJobs(): { queue: JobQueue; drain: (handlers: JobHandlers) => Promise<void> } {
  const waiting = new Map<string, Waiting>();
  const take = (): Waiting | undefined => {
    const [first] = waiting;
    if (first === undefined) return undefined;
    waiting.delete(first[0]);
    return first[1];
  };
  const run = async (handlers: JobHandlers, job: Waiting): Promise<void> => {
    const handler = handlers[job.name] as (data: Jobs[JobName]) => Promise<void>;
    await handler(job.data);
  };
  return {
    queue: {
      async enqueue(name, data, key) {
        waiting.set(`${name}:${key}`, { name, data } as Waiting);
      },
      start: async () => undefined,
      stop: async () => undefined,
    },
    async drain(handlers) {
      // What a job asks for in turn is found by the sweep too, so that it is not only the act that enqueues.
      await handlers.sweep({});
      for (let job = take(); job !== undefined; job = take()) await run(handlers, job);
    },
  };
}
