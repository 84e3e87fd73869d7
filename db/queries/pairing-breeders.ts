import 'server-only';
import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { AnimalId, ProjectId, SpeciesId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals, weights } from '../schema/collection';
import { projectAnimals } from '../schema/projects';
import { visibleAnimal, type Visibility } from './visibility';

/** The newest weight of each animal that has one. */
export async function listLatestWeights(tx: Transaction, ids: readonly AnimalId[]) {
  if (ids.length === 0) return [];
  return tx
    .selectDistinctOn([weights.animalId], {
      animalId: weights.animalId,
      grams: weights.grams,
      weighedOn: weights.weighedOn,
    })
    .from(weights)
    .where(inArray(weights.animalId, [...ids]))
    .orderBy(weights.animalId, desc(weights.weighedOn), desc(weights.id));
}

/** Animals of a species that are seen, are here and have a known sex, by code. */
export async function listBreedersOf(tx: Transaction, sees: Visibility, speciesId: SpeciesId) {
  return tx
    .select({
      id: animals.id,
      code: animals.code,
      name: animals.name,
      sex: animals.sex,
      status: animals.status,
      hatchedOn: animals.hatchedOn,
    })
    .from(animals)
    .where(
      and(
        eq(animals.speciesId, speciesId),
        inArray(animals.sex, ['male', 'female']),
        inArray(animals.status, ['here', 'on_loan', 'quarantine']),
        visibleAnimal(tx, sees),
      ),
    )
    .orderBy(asc(animals.code));
}

export async function idsInProject(tx: Transaction, projectId: ProjectId): Promise<Set<AnimalId>> {
  const rows = await tx
    .select({ id: projectAnimals.animalId })
    .from(projectAnimals)
    .where(eq(projectAnimals.projectId, projectId));
  return new Set(rows.map(({ id }) => id));
}
