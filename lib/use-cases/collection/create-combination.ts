import 'server-only';
import { listLoci } from '@/db/queries/loci';
import { findSpecies, insertCombination } from '@/db/queries/species';
import type { CombinationId, LocusId } from '@/lib/contracts/ids';
import { createCombination } from '@/lib/contracts/locus';
import { phenotypesOf } from '@/lib/genetics/genotype';
import { recordAudit } from '../audit';
import { invalid, notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** The owner gives a set of looks its name. */
export const createCombinationUseCase = workspaceUseCase(
  createCombination,
  async (world, { params, body }) => {
    const species = await findSpecies(world.tx, params.species);
    if (!species) throw notFound('species');
    const loci = new Map((await listLoci(world.tx, species.id)).map((locus) => [locus.id as string, locus]));
    for (const [locusId, look] of Object.entries(body.phenotypes)) {
      const locus = loci.get(locusId);
      if (!locus) throw invalid('phenotypes', 'One of the loci is not of this species.');
      if (!phenotypesOf(locus.definition).includes(look))
        throw invalid('phenotypes', `${locus.name} has no look "${look}".`);
    }
    const id = crypto.randomUUID() as CombinationId;
    await insertCombination(world.tx, {
      workspaceId: world.workspace.id,
      id,
      speciesId: species.id,
      name: body.name,
      phenotypes: body.phenotypes as Record<LocusId, string>,
    });
    await recordAudit(world, {
      action: 'combination.create',
      subject: { kind: 'combination', id },
      detail: { name: body.name, species: species.name },
    });
    return { id };
  },
);
