import 'server-only';
import { insertSpecies } from '@/db/queries/species';
import type { SpeciesId } from '@/lib/contracts/ids';
import { createSpecies } from '@/lib/contracts/species-catalogue';
import { recordAudit } from '../audit';
import { workspaceUseCase } from '../world';

/** The owner adds a species. */
export const createSpeciesUseCase = workspaceUseCase(createSpecies, async (world, { body }) => {
  const id = crypto.randomUUID() as SpeciesId;
  await insertSpecies(world.tx, { workspaceId: world.workspace.id, id, ...body });
  await recordAudit(world, {
    action: 'species.create',
    subject: { kind: 'species', id },
    detail: { name: body.name },
  });
  return { id };
});
