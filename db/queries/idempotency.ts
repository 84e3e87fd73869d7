import 'server-only';
import { eq } from 'drizzle-orm';
import type { WorkspaceId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { idempotencyKeys } from '../schema/activity';

/**
 * Takes a key for the running transaction. While another transaction holds it, this waits for its end.
 * @returns whether the key is new
 */
export async function reserveKey(
  tx: Transaction,
  row: { workspaceId: WorkspaceId; key: string; useCase: string; inputHash: string },
): Promise<boolean> {
  const inserted = await tx
    .insert(idempotencyKeys)
    .values(row)
    .onConflictDoNothing()
    .returning({ key: idempotencyKeys.key });
  return inserted.length === 1;
}

export async function findAnswer(
  tx: Transaction,
  key: string,
): Promise<{ inputHash: string; response: unknown } | null> {
  const [row] = await tx
    .select({ inputHash: idempotencyKeys.inputHash, response: idempotencyKeys.response })
    .from(idempotencyKeys)
    .where(eq(idempotencyKeys.key, key));
  return row ?? null;
}

export async function keepAnswer(tx: Transaction, key: string, response: unknown): Promise<void> {
  await tx.update(idempotencyKeys).set({ response }).where(eq(idempotencyKeys.key, key));
}
