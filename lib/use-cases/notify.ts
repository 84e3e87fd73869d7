import 'server-only';
import { insertNotifications, membersOfParties } from '@/db/queries/notifications';
import type { Transaction } from '@/db/scope';
import type { MemberId, PartyId, WorkspaceId } from '@/lib/contracts/ids';

export interface Notice {
  kind: string;
  title: string;
  body?: string;
  /** Path inside the workspace, such as "season/pairings/…". */
  href: string;
}

/** A member who is told something, with the address for a mail. */
export interface Recipient {
  memberId: MemberId;
  partyId: PartyId | null;
  name: string;
  email: string;
}

/**
 * Tells the members who act for these parties in the product, except the one who caused it.
 * @returns the recipients, so that the caller can send each a mail too
 */
export async function notifyParties(
  { tx, workspace }: { tx: Transaction; workspace: { id: WorkspaceId } },
  partyIds: readonly PartyId[],
  notice: Notice,
  except?: MemberId,
): Promise<Recipient[]> {
  const recipients = (await membersOfParties(tx, partyIds)).filter((member) => member.memberId !== except);
  await insertNotifications(
    tx,
    recipients.map(({ memberId }) => ({ workspaceId: workspace.id, memberId, body: '', ...notice })),
  );
  return recipients;
}
