import type { Context } from '../context';
import { findUnfinishedFitRuns } from '../../db/queries/fits';
import { findQueuedMails } from '../../db/queries/notices';
import { runFitRefresh } from '../services/dataset/fitRefresh';
import { sendQueuedMail } from '../services/sendMail';
import type { JobHandlers } from './queue';

/** What each job of the queue does; every one may run twice. */
export function createJobHandlers(context: Context): JobHandlers {
  return {
    'send-mail': async ({ mailId }) => sendQueuedMail(context, mailId),
    'refresh-fits': async ({ runId }) => runFitRefresh(context, runId),
    'freeze-version': async () => undefined,
    /** Finds work whose request was committed but never enqueued, because the process died in between. */
    sweep: async () => {
      for (const mailId of await findQueuedMails(context.db, 200)) await context.jobs.enqueue('send-mail', { mailId }, mailId);
      for (const runId of await findUnfinishedFitRuns(context.db, 200)) await context.jobs.enqueue('refresh-fits', { runId }, runId);
    },
  };
}
