import 'server-only';
import { deleteLocus, findLocus } from '@/db/queries/loci';
import { listCombinations } from '@/db/queries/species';
import { removeLocus } from '@/lib/contracts/locus';
import { recordAudit } from '../audit';
import { notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';

/** The owner removes a locus that nothing depends on. */
export const removeLocusUseCase = workspaceUseCase(removeLocus, async (world, { params }) => {
  const locus = await findLocus(world.tx, params.locus);
  if (!locus) throw notFound('locus');
  if (locus.recorded > 0)
    throw new Refusal(
      'wrong_state',
      `Something is recorded of ${locus.recorded} animals at ${locus.name}; it can't be removed.`,
    );
  const named = (await listCombinations(world.tx, locus.speciesId)).find(
    ({ phenotypes }) => locus.id in phenotypes,
  );
  if (named)
    throw new Refusal('wrong_state', `The combination ${named.name} uses ${locus.name}; remove that first.`);
  await deleteLocus(world.tx, locus.id);
  await recordAudit(world, {
    action: 'locus.remove',
    subject: { kind: 'locus', id: locus.id },
    detail: { name: locus.name, definition: locus.definition },
  });
  return { done: true as const };
});
