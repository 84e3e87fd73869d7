import 'server-only';
import { desc, sql } from 'drizzle-orm';
import type { WorkspaceId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { auditLog } from '../schema/activity';

/** Lets one transaction at a time write to a workspace's audit log; freed at its end. */
export async function lockAudit(tx: Transaction, workspaceId: WorkspaceId): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`audit ${workspaceId}`}, 0))`);
}

/** @returns the hash of the newest line; '' for an empty log */
export async function lastAuditHash(tx: Transaction): Promise<string> {
  const [row] = await tx
    .select({ hash: auditLog.hash })
    .from(auditLog)
    .orderBy(desc(auditLog.sequence))
    .limit(1);
  return row?.hash ?? '';
}

export async function appendAudit(tx: Transaction, row: typeof auditLog.$inferInsert): Promise<void> {
  await tx.insert(auditLog).values(row);
}
