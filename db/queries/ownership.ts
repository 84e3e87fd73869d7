import 'server-only';
import { and, asc, desc, eq, inArray, isNull } from 'drizzle-orm';
import type { AnimalId, PartyId } from '@/lib/contracts/ids';
import type { Transaction, Workspace } from '../scope';
import { users } from '../schema/auth';
import { ownershipParts, ownerships } from '../schema/collection';
import { members, parties } from '../schema/workspace';

/** Every set of parts of an animal that the caller has already been let see, newest first. */
export async function listOwnership(tx: Transaction, animalId: AnimalId) {
  const sets = await tx
    .select({ set: ownerships, recordedBy: users.name })
    .from(ownerships)
    .leftJoin(
      members,
      and(eq(members.workspaceId, ownerships.workspaceId), eq(members.id, ownerships.recordedBy)),
    )
    .leftJoin(users, eq(users.id, members.userId))
    .where(eq(ownerships.animalId, animalId))
    .orderBy(desc(ownerships.fromDay), desc(ownerships.recordedAt));
  const parts = sets.length
    ? await tx
        .select({
          ownershipId: ownershipParts.ownershipId,
          partyId: ownershipParts.partyId,
          parts: ownershipParts.parts,
        })
        .from(ownershipParts)
        .where(
          inArray(
            ownershipParts.ownershipId,
            sets.map(({ set }) => set.id),
          ),
        )
        .orderBy(asc(ownershipParts.partyId))
    : [];
  return sets.map(({ set, recordedBy }) => ({
    ...set,
    recordedBy,
    parts: parts
      .filter(({ ownershipId }) => ownershipId === set.id)
      .map(({ partyId, parts: held }) => ({ partyId, parts: held })),
  }));
}

/**
 * The set in force, locked until the end of the transaction, so that of two changes at once the second waits and then
 * finds that what it saw is no longer in force.
 */
export async function lockOwnershipInForce(tx: Transaction, animalId: AnimalId) {
  const [set] = await tx
    .select({ id: ownerships.id, fromDay: ownerships.fromDay })
    .from(ownerships)
    .where(and(eq(ownerships.animalId, animalId), isNull(ownerships.untilDay)))
    .for('update');
  if (!set) return null;
  const parts = await tx
    .select({ partyId: ownershipParts.partyId, parts: ownershipParts.parts })
    .from(ownershipParts)
    .where(eq(ownershipParts.ownershipId, set.id));
  return { ...set, parts };
}

export async function endOwnership(tx: Transaction, id: string, untilDay: string): Promise<void> {
  await tx.update(ownerships).set({ untilDay }).where(eq(ownerships.id, id));
}

/** Records who holds an animal from a day on. */
export async function insertOwnership(
  tx: Transaction,
  workspace: Pick<Workspace, 'id'>,
  set: Omit<typeof ownerships.$inferInsert, 'workspaceId' | 'id'>,
  parts: readonly { partyId: PartyId; parts: number }[],
): Promise<string> {
  const id = crypto.randomUUID();
  await tx.insert(ownerships).values({ ...set, workspaceId: workspace.id, id });
  await tx.insert(ownershipParts).values(
    parts.map((part) => ({
      workspaceId: workspace.id,
      ownershipId: id,
      partyId: part.partyId,
      parts: part.parts,
    })),
  );
  return id;
}

/** All parties with their marks; who is named to whom is for the caller to decide. */
export async function listPartyMarks(tx: Transaction) {
  return tx
    .select({ id: parties.id, name: parties.name, kind: parties.kind, mark: parties.mark })
    .from(parties)
    .orderBy(asc(parties.mark), asc(parties.name));
}
