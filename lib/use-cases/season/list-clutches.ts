import 'server-only';
import { listClutchRecords } from '@/db/queries/clutches';
import { listClutches, type ClutchRow } from '@/lib/contracts/clutch';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { workspaceUseCase } from '../world';
import { presentClutch } from './present-clutch';

/** A member looks through the clutches of the projects that they see. */
export const listClutchesUseCase = workspaceUseCase(listClutches, async ({ tx, sees, today }, { query }) => {
  const { offset, limit, ...filter } = query;
  const { rows, total } = await listClutchRecords(tx, sees, { ...filter, today }, { offset, limit });
  const shown: ClutchRow[] = [];
  for (const row of rows) shown.push(presentClutch(row, await loadBeliefs(tx, row.speciesId), today));
  return { rows: shown, total };
});
