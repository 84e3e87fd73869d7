import 'server-only';
import { insertLocus } from '@/db/queries/loci';
import { findSpecies } from '@/db/queries/species';
import type { LocusId } from '@/lib/contracts/ids';
import { createLocus } from '@/lib/contracts/locus';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { refuseUnsoundLocus } from './check-definition';

/** The owner adds a locus to a species. */
export const createLocusUseCase = workspaceUseCase(createLocus, async (world, { params, body }) => {
  const species = await findSpecies(world.tx, params.species);
  if (!species) throw notFound('species');
  const id = crypto.randomUUID() as LocusId;
  const definition = { ...body.definition, id, name: body.name };
  refuseUnsoundLocus(definition, species.sexSystem);
  await insertLocus(world.tx, {
    workspaceId: world.workspace.id,
    id,
    speciesId: species.id,
    name: body.name,
    definition,
  });
  await recordAudit(world, {
    action: 'locus.create',
    subject: { kind: 'locus', id },
    detail: { name: body.name, species: species.name },
  });
  return { id };
});
