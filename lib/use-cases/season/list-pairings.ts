import 'server-only';
import { listPairingRecords } from '@/db/queries/pairings';
import { listPairings } from '@/lib/contracts/pairing';
import { workspaceUseCase } from '../world';
import { isInState, isPartlyOf } from './filter-pairings';
import { presentPairings } from './present-pairings';

/** A member reads pairings of the projects that they see. */
export const listPairingsUseCase = workspaceUseCase(listPairings, async (world, { query }) => {
  const all = await presentPairings(world, await listPairingRecords(world.tx, world.sees, query));
  const rows = all.filter((row) => isInState(row, query.state) && isPartlyOf(row, query.party));
  return { rows, total: rows.length };
});
