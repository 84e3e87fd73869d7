import { placeIn, type OrderedPedigree } from './pedigree-order';

/** Kinship of founders with one another, where it is known: by place, symmetric. */
export type FounderKinship = (a: number, b: number) => number;
const UNRELATED: FounderKinship = () => 0;

/**
 * Kinship φ (0 to 1) between the given animals by the tabular method (recursion over the younger one's parents, every
 * pair computed once): the chance that an allele taken from one and an allele taken from the other are copies of one
 * ancestral allele. φ of an animal with itself is (1 + F)/2.
 * @param founders φ of two different founders; 0 if left out
 * @returns φ by place in the pedigree, computed on demand and remembered
 */
export function kinshipTable(
  pedigree: OrderedPedigree,
  founders: FounderKinship = UNRELATED,
): (a: number, b: number) => number {
  const { sire, dam, ids } = pedigree;
  const n = ids.length;
  const known = new Map<number, number>();
  const isFounder = (place: number) => (sire[place] ?? -1) < 0 && (dam[place] ?? -1) < 0;
  /** The pairs that a pair is computed from, or its value when it needs none. */
  const needs = (a: number, b: number): [number, number][] => {
    const [s, d] = [sire[a] ?? -1, dam[a] ?? -1];
    if (a === b) return [[s, d]];
    return [
      [s, b],
      [d, b],
    ];
  };
  const keyOf = (a: number, b: number) => (a > b ? a * n + b : b * n + a);
  const valueOf = (a: number, b: number) => (a < 0 || b < 0 ? 0 : known.get(keyOf(a, b)));
  return (first, second) => {
    const stack: [number, number][] = [[first, second]];
    while (stack.length > 0) {
      const pair = stack.at(-1) as [number, number];
      const a = Math.max(...pair);
      const b = Math.min(...pair);
      if (valueOf(a, b) !== undefined) {
        stack.pop();
        continue;
      }
      if (a !== b && isFounder(a) && isFounder(b)) {
        known.set(keyOf(a, b), founders(a, b));
        continue;
      }
      const parts = needs(a, b);
      const missing = parts.filter(([x, y]) => valueOf(x, y) === undefined);
      if (missing.length > 0) {
        stack.push(...missing);
        continue;
      }
      const total = parts.reduce((sum, [x, y]) => sum + (valueOf(x, y) ?? 0), 0);
      known.set(keyOf(a, b), a === b ? (1 + total) / 2 : total / 2);
    }
    return valueOf(first, second) ?? 0;
  };
}

/**
 * Kinship of two animals by id.
 * @throws {PedigreeError} 'unknown-animal'
 */
export function kinshipOf(pedigree: OrderedPedigree, a: string, b: string): number {
  return kinshipTable(pedigree)(placeIn(pedigree, a), placeIn(pedigree, b));
}

/** Inbreeding coefficient (0 to 1) that the young of a pairing would have: the kinship of its parents. */
export function inbreedingOfClutch(pedigree: OrderedPedigree, sire: string, dam: string): number {
  return kinshipOf(pedigree, sire, dam);
}

/**
 * Mean kinship of each of a set of animals with all of the set, itself included: the lower, the more its line is worth
 * keeping (J. D. Ballou and R. C. Lacy, in: Population Management for Survival and Recovery, 1995).
 * @returns by id, lowest first
 */
export function meanKinships(
  pedigree: OrderedPedigree,
  living: readonly string[],
): { id: string; meanKinship: number }[] {
  const kinship = kinshipTable(pedigree);
  const places = living.map((id) => placeIn(pedigree, id));
  return living
    .map((id, i) => {
      const total = places.reduce((sum, other) => sum + kinship(places[i] ?? 0, other), 0);
      return { id, meanKinship: total / places.length };
    })
    .toSorted((a, b) => a.meanKinship - b.meanKinship);
}

/**
 * Kinship at a locus on the X (males have one copy, of their dam) or, with `single` "female", on the Z (females have
 * one copy, of their sire). An animal with one copy has φ = 1 with itself.
 * @param sexOf by place
 */
export function sexLinkedKinshipTable(
  pedigree: OrderedPedigree,
  sexOf: (place: number) => 'male' | 'female',
  single: 'male' | 'female',
): (a: number, b: number) => number {
  const { sire, dam, ids } = pedigree;
  const known = new Map<number, number>();
  const compute = (x: number, y: number): number => {
    if (x < 0 || y < 0) return 0;
    const [a, b] = x > y ? [x, y] : [y, x];
    const key = a * ids.length + b;
    const remembered = known.get(key);
    if (remembered !== undefined) return remembered;
    const [s, d] = [sire[a] ?? -1, dam[a] ?? -1];
    const oneCopy = sexOf(a) === single;
    const giver = single === 'male' ? d : s;
    let value: number;
    if (a === b) value = oneCopy ? 1 : (1 + compute(s, d)) / 2;
    else value = oneCopy ? compute(giver, b) : (compute(s, b) + compute(d, b)) / 2;
    known.set(key, value);
    return value;
  };
  return compute;
}
