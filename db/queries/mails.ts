import 'server-only';
import type { MailId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { mails } from '../schema/activity';

export async function insertMail(tx: Transaction, row: typeof mails.$inferInsert): Promise<MailId> {
  // The identifier is made here: a returning clause would need the row to be readable, which mail to others is not.
  const id = crypto.randomUUID() as MailId;
  await tx.insert(mails).values({ ...row, id });
  return id;
}
