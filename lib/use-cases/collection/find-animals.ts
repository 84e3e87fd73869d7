import 'server-only';
import { listAnimalRecords, type AnimalListRecord } from '@/db/queries/animals';
import type { z } from 'zod';
import type { animalFilter } from '@/lib/contracts/animal-list';
import type { AnimalId, SpeciesId } from '@/lib/contracts/ids';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import type { LocusBelief, SpeciesBeliefs } from '../genetics/species-beliefs';
import { carriesProbability } from '../genetics/copies';
import type { WorkspaceWorld } from '../world';

export type AnimalFilter = z.output<typeof animalFilter>;
export type FoundAnimal = AnimalListRecord & { description: string };

/**
 * Animals that are seen and match, sorted. What an animal looks like and carries is computed, so searching in it,
 * filtering by a locus and sorting by it happen here, after the database has narrowed the rest.
 */
export async function findAnimals(
  world: Pick<WorkspaceWorld, 'tx' | 'sees'>,
  filter: AnimalFilter,
  ids?: readonly AnimalId[],
): Promise<FoundAnimal[]> {
  const { search, locus, at, sort, ...narrow } = filter;
  const rows = await listAnimalRecords(world.tx, world.sees, { ...narrow, ids });
  const beliefs = await beliefsOf(
    world,
    rows.map((row) => row.speciesId),
  );
  const described = rows.map((row) => ({
    ...row,
    description: beliefs.get(row.speciesId)?.describe(row.id) ?? '',
  }));
  const words = (search ?? '').toLowerCase().split(/\s+/).filter(Boolean);
  return described
    .filter((row) =>
      words.every((word) => `${row.code} ${row.name} ${row.description}`.toLowerCase().includes(word)),
    )
    .filter((row) => {
      if (!locus) return true;
      const of = beliefs.get(row.speciesId);
      if (!of?.loci.some(({ id }) => id === locus)) return false;
      return matchesAt(of, of.belief(row.id, locus), at);
    })
    .sort(byColumn(sort));
}

export async function beliefsOf(
  { tx }: Pick<WorkspaceWorld, 'tx'>,
  speciesIds: readonly SpeciesId[],
): Promise<Map<SpeciesId, SpeciesBeliefs>> {
  const beliefs = new Map<SpeciesId, SpeciesBeliefs>();
  for (const id of new Set(speciesIds)) beliefs.set(id, await loadBeliefs(tx, id));
  return beliefs;
}

function matchesAt(of: SpeciesBeliefs, belief: LocusBelief, at: AnimalFilter['at']): boolean {
  const carries = carriesProbability(of, belief);
  switch (at) {
    case 'shows':
      return of.shows(belief);
    case 'free':
      return carries === 0;
    case 'possible':
      return carries > 0 && carries < 1;
    default:
      return carries === 1;
  }
}

type Comparable = string | number | null;
const columns: Record<string, (row: FoundAnimal) => Comparable> = {
  code: (row) => row.code,
  name: (row) => row.name || null,
  species: (row) => row.speciesName,
  sex: (row) => row.sex,
  hatched: (row) => row.hatchedOn,
  status: (row) => row.status,
  looks: (row) => row.description,
  place: (row) => row.tubLabel,
  weight: (row) => row.grams,
};
const inOrder = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** Rows without a value come last whichever way it is sorted; equal ones by their code. */
function byColumn(sort: AnimalFilter['sort']) {
  const falls = sort.startsWith('-');
  const value = columns[falls ? sort.slice(1) : sort] ?? ((row: FoundAnimal) => row.code);
  return (a: FoundAnimal, b: FoundAnimal): number => {
    const [x, y] = [value(a), value(b)];
    if (x === null || y === null) return x === y ? inOrder.compare(a.code, b.code) : x === null ? 1 : -1;
    const order =
      typeof x === 'number' && typeof y === 'number' ? x - y : inOrder.compare(String(x), String(y));
    return (falls ? -order : order) || inOrder.compare(a.code, b.code);
  };
}
