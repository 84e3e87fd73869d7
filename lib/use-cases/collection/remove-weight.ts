import 'server-only';
import { deleteWeight, findAnimal } from '@/db/queries/animals';
import { removeWeight } from '@/lib/contracts/animal-record';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** A member takes back a weight that was recorded by mistake; the audit log keeps that it was. */
export const removeWeightUseCase = workspaceUseCase(removeWeight, async (world, { params }) => {
  const animal = await findAnimal(world.tx, world.sees, params.animal);
  if (!animal || !(await deleteWeight(world.tx, animal.id, params.weight))) throw notFound('weight');
  await recordAudit(world, {
    action: 'animal.unweigh',
    subject: { kind: 'animal', id: animal.id },
    detail: { code: animal.code, weight: params.weight },
  });
  return { done: true as const };
});
