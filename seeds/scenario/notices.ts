import { addDays } from 'date-fns';
import { gte } from 'drizzle-orm';
import { mails, notifications } from '@/db/schema/activity';
import { withScope } from '@/db/scope';
import { workspaceId } from './house';

/**
 * Gives what members were told since the seeding began the day on which it happened in the scenario. Its mail counts as
 * sent: nobody is to get it now.
 * @param day from the day of seeding, negative
 * @param isRead whether the members have seen it meanwhile
 */
export async function dateNotices(now: Date, day: number, isRead: boolean): Promise<void> {
  const then = addDays(now, day);
  await withScope({ workspaceId }, async (tx) => {
    await tx
      .update(notifications)
      .set({ createdAt: then, readAt: isRead ? addDays(then, 1) : null })
      .where(gte(notifications.createdAt, now));
    await tx
      .update(mails)
      .set({ status: 'sent', createdAt: then, sentAt: then })
      .where(gte(mails.createdAt, now));
  });
}
