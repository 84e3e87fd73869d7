import 'server-only';
import { listAllWorkspaces } from '@/db/queries/all-workspaces';
import { waitingMails } from '@/db/queries/mails';
import { withScope } from '@/db/scope';
import type { WorkspaceId } from '@/lib/contracts/ids';
import { readClock } from '@/lib/services/clock';
import { jobQueue } from '@/lib/services/jobs';

const PATIENCE_MS = 10 * 60_000;

/** Puts mail back in line whose job was lost: the process ended between the commit and the hand-over to the queue. */
export async function sweepMail(): Promise<void> {
  const before = new Date(readClock().getTime() - PATIENCE_MS);
  const workspaces = await withScope({ system: true }, listAllWorkspaces);
  const scopes: (WorkspaceId | undefined)[] = [undefined, ...workspaces.map(({ id }) => id)];
  for (const workspaceId of scopes) {
    const waiting = await withScope({ workspaceId }, (tx) => waitingMails(tx, before));
    // Mail of the sign-in has no workspace and is seen under every identity: it is swept once.
    const own = waiting.filter((mail) => mail.workspaceId === (workspaceId ?? null));
    for (const mail of own)
      await jobQueue.send('mail.send', { mailId: mail.id, workspaceId: mail.workspaceId });
  }
}
