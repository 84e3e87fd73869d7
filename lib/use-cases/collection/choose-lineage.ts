import type { PedigreeRow } from '@/db/queries/lineage';
import type { AnimalId } from '@/lib/contracts/ids';

export interface PedigreeLinks {
  byId: ReadonlyMap<AnimalId, PedigreeRow>;
  possibleSires: ReadonlyMap<AnimalId, readonly AnimalId[]>;
}

/** Known parents and possible sires of an animal. */
export function parentsOf({ byId, possibleSires }: PedigreeLinks, id: AnimalId): AnimalId[] {
  const row = byId.get(id);
  return [row?.sireId ?? null, row?.damId ?? null, ...(possibleSires.get(id) ?? [])].filter(
    (parent) => parent !== null,
  );
}

/**
 * Which animals a graph shows: the root, its ancestors and its descendants so many generations far, and the other
 * parents of those descendants. A parent that the viewer may not see is kept as an unnamed symbol, and nothing is
 * followed through it; young that may not be seen are left out.
 * @returns ids, those that are not `visible` to be shown without anything of theirs
 */
export function chooseLineage(
  links: PedigreeLinks,
  visible: ReadonlySet<AnimalId>,
  root: AnimalId,
  up: number,
  down: number,
): Set<AnimalId> {
  const chosen = new Set<AnimalId>([root]);
  let level = [root];
  for (let generation = 0; generation < up && level.length; generation += 1) {
    level = [...new Set(level.filter((id) => visible.has(id)).flatMap((id) => parentsOf(links, id)))].filter(
      (id) => !chosen.has(id),
    );
    for (const id of level) chosen.add(id);
  }
  const young = youngByParent(links);
  level = [root];
  for (let generation = 0; generation < down && level.length; generation += 1) {
    level = [...new Set(level.flatMap((id) => young.get(id) ?? []))].filter((id) => visible.has(id));
    for (const id of level) {
      chosen.add(id);
      for (const parent of parentsOf(links, id)) chosen.add(parent);
    }
  }
  return chosen;
}

function youngByParent(links: PedigreeLinks): Map<AnimalId, AnimalId[]> {
  const young = new Map<AnimalId, AnimalId[]>();
  for (const id of links.byId.keys()) {
    for (const parent of parentsOf(links, id)) young.set(parent, [...(young.get(parent) ?? []), id]);
  }
  return young;
}

/** Whether two animals have a common ancestor (each counts as its own), over the whole pedigree. */
export function relationFinder(links: PedigreeLinks): (a: AnimalId, b: AnimalId) => boolean {
  const known = new Map<AnimalId, Set<AnimalId>>();
  const lineOf = (id: AnimalId): Set<AnimalId> => {
    const kept = known.get(id);
    if (kept) return kept;
    const line = new Set<AnimalId>([id]);
    known.set(id, line);
    for (const parent of parentsOf(links, id)) for (const ancestor of lineOf(parent)) line.add(ancestor);
    return line;
  };
  return (a, b) => {
    const [few, many] = [lineOf(a), lineOf(b)].sort((x, y) => x.size - y.size);
    for (const id of few ?? []) if (many?.has(id)) return true;
    return false;
  };
}
