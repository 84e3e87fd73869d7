import 'server-only';
import { findAnimal, insertWeights } from '@/db/queries/animals';
import { addWeight } from '@/lib/contracts/animal-record';
import { recordAudit } from '../audit';
import { invalid, notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** A member records what an animal weighs. */
export const addWeightUseCase = workspaceUseCase(addWeight, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, today } = world;
  const animal = await findAnimal(tx, sees, params.animal);
  if (!animal) throw notFound('animal');
  if (body.weighedOn > today) throw invalid('weighedOn', 'This day has not come yet.');
  if (animal.hatchedOn && animal.hatchedPrecision === 'day' && body.weighedOn < animal.hatchedOn) {
    throw invalid('weighedOn', `${animal.code} hatched on ${animal.hatchedOn}.`);
  }
  const id = crypto.randomUUID();
  await insertWeights(tx, [
    { workspaceId: workspace.id, id, animalId: animal.id, ...body, recordedBy: actor.memberId },
  ]);
  await recordAudit(world, {
    action: 'animal.weigh',
    subject: { kind: 'animal', id: animal.id },
    detail: { code: animal.code, ...body },
  });
  return { id };
});
