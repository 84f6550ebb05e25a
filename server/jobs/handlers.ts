import type { Context } from '../context';
import { findQueuedMails } from '../../db/queries/notices';
import { findPreparingVersion } from '../../db/queries/versions';
import { findFitRunsToDo, runFitRefresh } from '../services/dataset/fitRefresh';
import { sendQueuedMail } from '../services/sendMail';
import { runFreeze } from '../services/versions/freeze';
import type { JobHandlers } from './queue';

/** What each job of the queue does; every one may run twice. */
export function createJobHandlers(context: Context): JobHandlers {
  return {
    'send-mail': async ({ mailId }) => sendQueuedMail(context, mailId),
    'refresh-fits': async ({ runId }) => runFitRefresh(context, runId),
    'freeze-version': async ({ versionId }) => runFreeze(context, versionId),
    /** Finds work whose request was committed but never enqueued, because the process died in between. */
    sweep: async () => {
      for (const mailId of await findQueuedMails(context.db, 200)) await context.jobs.enqueue('send-mail', { mailId }, mailId);
      for (const runId of await findFitRunsToDo(context)) await context.jobs.enqueue('refresh-fits', { runId }, runId);
      const preparing = await findPreparingVersion(context.db);
      if (preparing !== null) await context.jobs.enqueue('freeze-version', { versionId: preparing.id }, preparing.id);
    },
  };
}
