import 'server-only';
import type { Transaction } from '@/db/scope';
import type { AnimalId, SpeciesId } from '@/lib/contracts/ids';
import { loadBeliefs } from './pedigree-beliefs';

/** Animals of any species in the trade's words, such as "Clown, 66% het Albino"; '' for one that was not asked for. */
export async function describeAnimals(
  tx: Transaction,
  animals: readonly { id: AnimalId; speciesId: SpeciesId }[],
): Promise<(id: AnimalId) => string> {
  const words = new Map<AnimalId, string>();
  for (const speciesId of new Set(animals.map((animal) => animal.speciesId))) {
    const beliefs = await loadBeliefs(tx, speciesId);
    for (const animal of animals)
      if (animal.speciesId === speciesId) words.set(animal.id, beliefs.describe(animal.id));
  }
  return (id) => words.get(id) ?? '';
}
