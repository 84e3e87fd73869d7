import 'server-only';
import { eq, sql } from 'drizzle-orm';
import type { WorkspaceId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { workspaces } from '../schema/workspace';

/**
 * The next invoice number of a workspace. The row stays locked to the end of the transaction: a number is taken only
 * if the invoice is kept, so the numbers have no gaps.
 */
export async function takeInvoiceNumber(tx: Transaction, workspaceId: WorkspaceId): Promise<number> {
  const [row] = await tx
    .update(workspaces)
    .set({ nextInvoiceNumber: sql`${workspaces.nextInvoiceNumber} + 1` })
    .where(eq(workspaces.id, workspaceId))
    .returning({ next: workspaces.nextInvoiceNumber });
  if (!row) throw new Error('The workspace is gone.');
  return row.next - 1;
}

/** The next number of a journal entry, gapless in the same way. */
export async function takeEntryNumber(tx: Transaction, workspaceId: WorkspaceId): Promise<number> {
  const [row] = await tx
    .update(workspaces)
    .set({ nextEntryNumber: sql`${workspaces.nextEntryNumber} + 1` })
    .where(eq(workspaces.id, workspaceId))
    .returning({ next: workspaces.nextEntryNumber });
  if (!row) throw new Error('The workspace is gone.');
  return row.next - 1;
}
