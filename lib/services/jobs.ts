import 'server-only';
import PgBoss from 'pg-boss';
import { configuration } from './configuration';
import { log } from './log';

/** Work that is done outside of a request, with what it needs to know. */
interface JobData {
  'mail.send': { mailId: string; workspaceId: string | null };
  /** Puts mail whose job was lost (a crash between commit and hand-over) back in line. */
  'mail.sweep': Record<string, never>;
}
type JobName = keyof JobData;

export interface JobQueue {
  send<Name extends JobName>(name: Name, data: JobData[Name]): Promise<void>;
}

export type JobHandlers = { [Name in JobName]: (data: JobData[Name]) => Promise<void> };

const names: JobName[] = ['mail.send', 'mail.sweep'];
const retry = { retryLimit: 8, retryDelay: 2, retryBackoff: true };

const kept = globalThis as { moietyJobs?: Promise<PgBoss> };

/** The queue of this process, started when first used; its tables are made by the migration. */
function openQueue(): Promise<PgBoss> {
  kept.moietyJobs ??= (async () => {
    const boss = new PgBoss({ connectionString: configuration().database.url, migrate: false, max: 3 });
    boss.on('error', (error) => log.error({ error }, 'job queue'));
    await boss.start();
    for (const name of names)
      if (!(await boss.getQueue(name))) await boss.createQueue(name, { name, ...retry });
    return boss;
  })();
  return kept.moietyJobs;
}

export const jobQueue: JobQueue = {
  async send(name, data) {
    const boss = await openQueue();
    await boss.send(name, data, retry);
  },
};

/** Takes work from the queue in this process until it ends. */
export async function startWorking(handlers: JobHandlers): Promise<void> {
  const boss = await openQueue();
  for (const name of names) {
    const handle = handlers[name] as (data: object) => Promise<void>;
    await boss.work(name, { pollingIntervalSeconds: 0.5, batchSize: 1 }, async ([job]) => {
      if (job) await handle(job.data as object);
    });
  }
  await boss.schedule('mail.sweep', '* * * * *');
}

/** Stops working and lets running jobs finish; for the end of the process and for tests. */
export async function stopWorking(): Promise<void> {
  const open = kept.moietyJobs;
  kept.moietyJobs = undefined;
  await (await open)?.stop({ graceful: true, timeout: 5000 });
}
