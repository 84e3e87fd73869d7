import 'server-only';
import { appendAudit, lastAuditHash, lockAudit } from '@/db/queries/audit';
import type { Transaction } from '@/db/scope';
import type { MemberId, WorkspaceId } from '@/lib/contracts/ids';
import { chainHash } from './hash';

export interface AuditLine {
  /** What was done, such as "pairing.propose". */
  action: string;
  subject: { kind: string; id: string };
  detail?: Record<string, unknown>;
  reason?: string;
}

interface Doer {
  tx: Transaction;
  now: Date;
  workspace: { id: WorkspaceId };
  /** Null when the product itself acts. */
  actor: { memberId: MemberId; name: string } | null;
}

/**
 * Adds a line to the workspace's audit log: who did what when and why, chained by hash to the line before.
 * Lines of one workspace are written one after the other, so the chain has no forks.
 */
export async function recordAudit({ tx, now, workspace, actor }: Doer, line: AuditLine): Promise<void> {
  await lockAudit(tx, workspace.id);
  const previousHash = await lastAuditHash(tx);
  const content = {
    at: now.toISOString(),
    memberId: actor?.memberId ?? null,
    actor: actor?.name ?? 'Moiety',
    action: line.action,
    subjectKind: line.subject.kind,
    subjectId: line.subject.id,
    detail: line.detail ?? {},
    reason: line.reason ?? '',
  };
  await appendAudit(tx, {
    workspaceId: workspace.id,
    ...content,
    previousHash,
    hash: chainHash(previousHash, content),
  });
}
