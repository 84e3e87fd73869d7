import 'server-only';
import { listTubs as queryTubs } from '@/db/queries/tubs';
import { listTubs } from '@/lib/contracts/tub';
import { reachOf } from '../permissions';
import { workspaceUseCase } from '../world';

/** A member looks at the tubs; how many animals live in each counts those that they may see. */
export const listTubsUseCase = workspaceUseCase(listTubs, async ({ tx, actor }) => {
  const sees =
    reachOf(actor.role, 'animal.see') === 'all'
      ? ({ everything: true } as const)
      : ({ everything: false, partyId: actor.partyId, projectIds: actor.projectIds } as const);
  return { tubs: await queryTubs(tx, sees) };
});
