import 'server-only';
import { lockMail, updateMail } from '@/db/queries/mails';
import { withScope } from '@/db/scope';
import type { MailId, WorkspaceId } from '@/lib/contracts/ids';
import { readClock } from '@/lib/services/clock';
import { deliverMail } from '@/lib/services/mail/deliver-mail';
import { contentOf } from '@/lib/services/mail/mail-content';
import type { MailData, MailTemplate } from '@/lib/services/mail/mail-data';
import { renderMail } from '@/lib/services/mail/render-mail';

/**
 * Sends a mail that was asked for, once. What went wrong is kept with it, and the error goes on to the queue, which
 * tries again later.
 */
export async function sendMail({
  mailId,
  workspaceId,
}: {
  mailId: string;
  workspaceId: string | null;
}): Promise<void> {
  const id = mailId as MailId;
  const failure = await withScope(
    { workspaceId: (workspaceId as WorkspaceId | null) ?? undefined },
    async (tx) => {
      const mail = await lockMail(tx, id);
      if (!mail || mail.status === 'sent') return null;
      const attempts = mail.attempts + 1;
      try {
        const template = mail.template as MailTemplate;
        const content = await renderMail(contentOf(template, mail.data as MailData[MailTemplate]));
        const messageId = await deliverMail({ id, to: mail.recipient, subject: mail.subject, ...content });
        await updateMail(tx, id, {
          status: 'sent',
          sentAt: readClock(),
          messageId,
          attempts,
          lastError: null,
        });
        return null;
      } catch (error) {
        const lastError = error instanceof Error ? error.message : String(error);
        await updateMail(tx, id, { attempts, lastError: lastError.slice(0, 500) });
        return error;
      }
    },
  );
  if (failure) throw failure;
}
