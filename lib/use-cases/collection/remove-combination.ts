import 'server-only';
import { deleteCombination, findCombination } from '@/db/queries/species';
import { removeCombination } from '@/lib/contracts/locus';
import { recordAudit } from '../audit';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** The owner removes the name of a combination; its animals are told by their loci again. */
export const removeCombinationUseCase = workspaceUseCase(removeCombination, async (world, { params }) => {
  const combination = await findCombination(world.tx, params.combination);
  if (!combination) throw notFound('combination');
  await deleteCombination(world.tx, combination.id);
  await recordAudit(world, {
    action: 'combination.remove',
    subject: { kind: 'combination', id: combination.id },
    detail: { name: combination.name },
  });
  return { done: true as const };
});
