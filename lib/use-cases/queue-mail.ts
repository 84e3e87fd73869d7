import 'server-only';
import { insertMail } from '@/db/queries/mails';
import type { Transaction } from '@/db/scope';
import type { ContactId, WorkspaceId } from '@/lib/contracts/ids';
import type { MailData, MailTemplate } from '@/lib/services/mail/mail-data';
import { subjectOf } from '@/lib/services/mail/mail-data';
import type { JobQueue } from '@/lib/services/jobs';
import { afterCommit } from './after-commit';

/** Asks for a mail: kept with the transaction, sent by a job after its commit, tried again until it is out. */
export async function queueMail<Template extends MailTemplate>(
  { tx, services }: { tx: Transaction; services: { jobs: JobQueue } },
  mail: {
    workspaceId: WorkspaceId | null;
    template: Template;
    to: string;
    data: MailData[Template];
    contactId?: ContactId;
  },
): Promise<void> {
  const mailId = await insertMail(tx, {
    workspaceId: mail.workspaceId,
    contactId: mail.contactId ?? null,
    template: mail.template,
    recipient: mail.to,
    subject: subjectOf(mail.template, mail.data),
    data: { ...mail.data },
  });
  afterCommit(tx, () => services.jobs.send('mail.send', { mailId, workspaceId: mail.workspaceId }));
}
