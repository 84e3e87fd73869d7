import 'server-only';
import type { WorkspaceId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { workspaces } from '../schema/workspace';

/** Every workspace; needs the identity of the product itself. */
export async function listAllWorkspaces(
  tx: Transaction,
): Promise<{ id: WorkspaceId; slug: string; timeZone: string }[]> {
  return tx
    .select({ id: workspaces.id, slug: workspaces.slug, timeZone: workspaces.timeZone })
    .from(workspaces);
}
