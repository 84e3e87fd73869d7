import 'server-only';
import { findAnimals } from '@/db/queries/animals';
import type { Relative } from '@/lib/contracts/animal-record';
import type { AnimalId } from '@/lib/contracts/ids';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';
import type { WorkspaceWorld } from '../world';

/** Shows relatives by id: with their codes as far as they are seen, otherwise only that there is one. */
export async function loadRelatives(
  { tx, sees }: Pick<WorkspaceWorld, 'tx' | 'sees'>,
  beliefs: SpeciesBeliefs,
  ids: readonly (AnimalId | null)[],
): Promise<(id: AnimalId) => Relative> {
  const known = await findAnimals(tx, sees, [...new Set(ids.filter((id) => id !== null))]);
  const byId = new Map(known.map((row) => [row.id, row]));
  return (id) => {
    const row = byId.get(id);
    if (!row) return { shown: false };
    return {
      shown: true,
      id: row.id,
      code: row.code,
      name: row.name,
      sex: row.sex,
      description: beliefs.describe(row.id),
    };
  };
}
