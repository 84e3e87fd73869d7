import 'server-only';
import { and, asc, eq } from 'drizzle-orm';
import type { PairingId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { users } from '../schema/auth';
import { pairingEvents, pairings } from '../schema/season';
import { members } from '../schema/workspace';
import { inVisibleProject, type Visibility } from './visibility';

/** A pairing with what is needed to log about it; null when it is not seen. */
export async function findPairingForLog(tx: Transaction, sees: Visibility, pairingId: PairingId) {
  const [row] = await tx
    .select()
    .from(pairings)
    .where(and(eq(pairings.id, pairingId), inVisibleProject(sees, pairings.projectId)));
  return row ?? null;
}

const eventColumns = {
  id: pairingEvents.id,
  kind: pairingEvents.kind,
  seenOn: pairingEvents.seenOn,
  minutes: pairingEvents.minutes,
  note: pairingEvents.note,
  by: users.name,
  retractedAt: pairingEvents.retractedAt,
};

function selectEvents(tx: Transaction) {
  return tx
    .select(eventColumns)
    .from(pairingEvents)
    .innerJoin(
      members,
      and(eq(members.workspaceId, pairingEvents.workspaceId), eq(members.id, pairingEvents.recordedBy)),
    )
    .innerJoin(users, eq(users.id, members.userId));
}

/** What was seen of a pairing, oldest first; retracted rows too. */
export async function listEventsOfPairing(tx: Transaction, pairingId: PairingId) {
  return selectEvents(tx)
    .where(eq(pairingEvents.pairingId, pairingId))
    .orderBy(asc(pairingEvents.seenOn), asc(pairingEvents.recordedAt));
}

export async function findPairingEvent(tx: Transaction, pairingId: PairingId, id: string) {
  const [row] = await selectEvents(tx).where(
    and(eq(pairingEvents.pairingId, pairingId), eq(pairingEvents.id, id)),
  );
  return row ?? null;
}

export async function insertPairingEvent(
  tx: Transaction,
  row: typeof pairingEvents.$inferInsert,
): Promise<string> {
  const id = crypto.randomUUID();
  await tx.insert(pairingEvents).values({ ...row, id });
  return id;
}

export async function markPairingEventRetracted(tx: Transaction, id: string, at: Date): Promise<void> {
  await tx.update(pairingEvents).set({ retractedAt: at }).where(eq(pairingEvents.id, id));
}
