import type { LocusClaim } from '@/lib/contracts/animal';
import type { LocusOfAnimal } from '@/lib/contracts/animal-record';
import type { AnimalId, LocusId } from '@/lib/contracts/ids';
import { drawnCopies } from '../genetics/copies';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';

/** Every locus of the species as the record shows it for one animal. */
export function presentLoci(
  beliefs: SpeciesBeliefs,
  animal: { id: AnimalId },
  claims: readonly { locusId: LocusId; claim: LocusClaim }[],
): LocusOfAnimal[] {
  const recorded = new Map(claims.map(({ locusId, claim }) => [locusId, claim]));
  return beliefs.loci.map(({ id, name }) => {
    const belief = beliefs.belief(animal.id, id);
    return {
      locusId: id,
      name,
      claim: recorded.get(id) ?? null,
      ...drawnCopies(beliefs, belief),
      words: beliefs.words(belief),
      source: belief.source,
      genotypes: belief.genotypes.map(({ genotype, probability }) => ({ genotype, probability })),
    };
  });
}
