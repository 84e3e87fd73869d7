import 'server-only';
import { withScope } from '@/db/scope';
import { configuration } from '@/lib/services/configuration';
import { jobQueue, startWorking, stopWorking } from '@/lib/services/jobs';
import { setSignInMail } from '@/lib/services/sign-in';
import { jobHandlers } from './jobs/job-handlers';
import { queueMail } from './queue-mail';
import { takeAfterCommit } from './after-commit';

/**
 * Makes a server process ready: checks the configuration (a wrong one ends the process with its names), tells the
 * sign-in how to send mail, and takes jobs unless this instance is told not to.
 */
export async function startServer(): Promise<void> {
  const { runsJobs } = configuration();
  connectSignInMail();
  if (!runsJobs) return;
  await startWorking(jobHandlers);
  process.once('SIGTERM', () => void stopWorking());
}

/** Lets the sign-in send its mails through the queue. */
function connectSignInMail(): void {
  setSignInMail(async (template, to, data) => {
    const later = await withScope({}, async (tx) => {
      await queueMail({ tx, services: { jobs: jobQueue } }, { workspaceId: null, template, to, data });
      return takeAfterCommit(tx);
    });
    for (const work of later) await work();
  });
}
