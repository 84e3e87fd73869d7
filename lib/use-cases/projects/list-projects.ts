import 'server-only';
import { listProjectRecords } from '@/db/queries/projects';
import { listProjects } from '@/lib/contracts/project';
import { workspaceUseCase } from '../world';
import { presentProjects } from './present-projects';

/** A member reads the joint projects that they see; a partner's are those that their party is in. */
export const listProjectsUseCase = workspaceUseCase(listProjects, async (world, { query }) => {
  const rows = await presentProjects(world, await listProjectRecords(world.tx, world.sees, query));
  return { rows, total: rows.length };
});
