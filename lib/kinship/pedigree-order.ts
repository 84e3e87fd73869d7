/** An animal with its parents; null or left out where they are not known. */
export interface PedigreeAnimal {
  id: string;
  sire?: string | null;
  dam?: string | null;
}

/** A pedigree that cannot be: the animal and the rule it breaks. */
export class PedigreeError extends Error {
  override readonly name = 'PedigreeError';
  constructor(
    readonly rule: 'own-ancestor' | 'duplicate' | 'unknown-animal',
    /** The animals concerned; for 'own-ancestor' the circle from young to parent. */
    readonly animals: readonly string[],
    message: string,
  ) {
    super(message);
  }
}

/** A pedigree with parents before their young and places instead of ids: what all computing works on. */
export interface OrderedPedigree {
  ids: readonly string[];
  /** Place of each id. */
  placeOf: ReadonlyMap<string, number>;
  /** Place of the sire of each animal, −1 where unknown. */
  sire: Int32Array;
  dam: Int32Array;
}

/**
 * Puts parents before their young. A parent that is not listed itself is added as a founder.
 * @throws {PedigreeError} 'duplicate', or 'own-ancestor' with the circle of animals
 */
export function orderPedigree(animals: readonly PedigreeAnimal[]): OrderedPedigree {
  const byId = new Map<string, PedigreeAnimal>();
  for (const animal of animals) {
    if (byId.has(animal.id))
      throw new PedigreeError('duplicate', [animal.id], `"${animal.id}" is listed twice.`);
    byId.set(animal.id, animal);
  }
  const ids: string[] = [];
  const placeOf = new Map<string, number>();
  // Walked without recursion: lines may be thousands of generations long in made-up data.
  const onPath = new Set<string>();
  for (const { id: start } of animals) {
    const path: { id: string; parents: string[] }[] = [];
    const enter = (id: string) => {
      if (placeOf.has(id)) return;
      if (onPath.has(id)) {
        const circle = [...path.slice(path.findIndex((step) => step.id === id)).map((step) => step.id), id];
        throw new PedigreeError(
          'own-ancestor',
          circle,
          `"${id}" would be its own ancestor: ${circle.join(' ← ')}.`,
        );
      }
      onPath.add(id);
      const animal = byId.get(id);
      path.push({ id, parents: [animal?.sire, animal?.dam].filter((parent) => parent != null) });
    };
    enter(start);
    for (let top = path.at(-1); top; top = path.at(-1)) {
      const parent = top.parents.pop();
      if (parent !== undefined) {
        enter(parent);
        continue;
      }
      path.pop();
      onPath.delete(top.id);
      placeOf.set(top.id, ids.length);
      ids.push(top.id);
    }
  }
  const place = (id: string | null | undefined) => (id == null ? -1 : (placeOf.get(id) ?? -1));
  return {
    ids,
    placeOf,
    sire: Int32Array.from(ids, (id) => place(byId.get(id)?.sire)),
    dam: Int32Array.from(ids, (id) => place(byId.get(id)?.dam)),
  };
}

/**
 * Place of an animal.
 * @throws {PedigreeError} 'unknown-animal'
 */
export function placeIn(pedigree: OrderedPedigree, id: string): number {
  const place = pedigree.placeOf.get(id);
  if (place === undefined) throw new PedigreeError('unknown-animal', [id], `"${id}" is not in the pedigree.`);
  return place;
}
