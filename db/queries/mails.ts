import 'server-only';
import { and, eq, lt } from 'drizzle-orm';
import type { MailId, WorkspaceId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { mails } from '../schema/activity';

export async function insertMail(tx: Transaction, row: typeof mails.$inferInsert): Promise<MailId> {
  // The identifier is made here: a returning clause would need the row to be readable, which mail to others is not.
  const id = crypto.randomUUID() as MailId;
  await tx.insert(mails).values({ ...row, id });
  return id;
}

/** A mail, locked to the end of the transaction: two workers never send it at the same time. */
export async function lockMail(tx: Transaction, id: MailId) {
  const [row] = await tx.select().from(mails).where(eq(mails.id, id)).for('update');
  return row ?? null;
}

export async function updateMail(
  tx: Transaction,
  id: MailId,
  change: Partial<typeof mails.$inferInsert>,
): Promise<void> {
  await tx.update(mails).set(change).where(eq(mails.id, id));
}

/** Mail that still waits although it was asked for before this moment. */
export async function waitingMails(
  tx: Transaction,
  before: Date,
): Promise<{ id: MailId; workspaceId: WorkspaceId | null }[]> {
  return tx
    .select({ id: mails.id, workspaceId: mails.workspaceId })
    .from(mails)
    .where(and(eq(mails.status, 'queued'), lt(mails.createdAt, before)));
}
