import 'server-only';
import { and, eq, inArray, isNull } from 'drizzle-orm';
import type { MemberId, PartyId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { notifications } from '../schema/activity';
import { users } from '../schema/auth';
import { members } from '../schema/workspace';

/** The members who act for any of the parties today. */
export async function membersOfParties(
  tx: Transaction,
  partyIds: readonly PartyId[],
): Promise<{ memberId: MemberId; partyId: PartyId | null; name: string; email: string }[]> {
  if (partyIds.length === 0) return [];
  return tx
    .select({ memberId: members.id, partyId: members.partyId, name: users.name, email: users.email })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(inArray(members.partyId, [...partyIds]), isNull(members.endedAt)));
}

export async function insertNotifications(
  tx: Transaction,
  rows: (typeof notifications.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await tx.insert(notifications).values(rows);
}
