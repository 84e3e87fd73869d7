import { copiesOf, genotypesOf, phenotypeChances } from '@/lib/genetics/genotype';
import type { LocusDefinition, SexSystem } from '@/lib/genetics/locus';

/** An animal as the brute force sees it: known sex, both parents or none. */
export interface PlainAnimal {
  id: string;
  sex: 'male' | 'female';
  sire: string | null;
  dam: string | null;
  /** Several possible sires with prior chances; `sire` is then null. */
  sires?: Record<string, number>;
  sireGroup?: string;
  parthenogenetic?: boolean;
  retention?: number;
  phenotype?: string;
  test?: { genotype: string; error: number };
}

/**
 * Posteriors by listing every joint assignment of ordered allele pairs to every animal (and of sires to groups): slow
 * and plain, sharing no inference code with the product. It works with ordered pairs (paternal, maternal), the product
 * with unordered genotypes.
 */
export function listAllAssignments(
  animals: readonly PlainAnimal[],
  locus: LocusDefinition,
  system: SexSystem,
  frequencies: Readonly<Record<string, number>>,
): { total: number; genotypes: Map<string, Map<string, number>>; sires: Map<string, Map<string, number>> } {
  const symbols = locus.alleles.map(({ symbol }) => symbol);
  const genotypes = new Map(animals.map(({ id }) => [id, new Map<string, number>()]));
  const sires = new Map<string, Map<string, number>>();
  const groups = new Map<string, Record<string, number>>();
  for (const animal of animals)
    if (animal.sires) groups.set(animal.sireGroup ?? `own:${animal.id}`, animal.sires);
  let total = 0;
  const half = (pair: readonly string[], allele: string) =>
    pair.filter((each) => each === allele).length / pair.length;

  const name = (pair: readonly string[]) =>
    pair.toSorted((a, b) => symbols.indexOf(a) - symbols.indexOf(b)).join('/');
  const evidence = (animal: PlainAnimal, genotype: string): number => {
    if (locus.lethal.includes(genotype)) return 0;
    let weight = 1;
    if (animal.phenotype !== undefined) {
      weight *= phenotypeChances(locus, genotype).get(animal.phenotype)?.valueOf() ?? 0;
    }
    if (animal.test) {
      const others = genotypesOf(locus, animal.sex, system).length - 1;
      weight *= animal.test.genotype === genotype ? 1 - animal.test.error : animal.test.error / others;
    }
    return weight;
  };

  const assign = (
    index: number,
    pairs: Map<string, string[]>,
    chosen: Map<string, string>,
    weight: number,
  ): void => {
    if (weight === 0) return;
    const animal = animals[index];
    if (!animal) {
      total += weight;
      for (const [id, pair] of pairs) {
        const known = genotypes.get(id);
        known?.set(name(pair), (known.get(name(pair)) ?? 0) + weight);
      }
      for (const [group, sire] of chosen) {
        const known = sires.get(group) ?? new Map<string, number>();
        sires.set(group, known.set(sire, (known.get(sire) ?? 0) + weight));
      }
      return;
    }
    const sireId = animal.sires ? chosen.get(animal.sireGroup ?? `own:${animal.id}`) : animal.sire;
    const sire = sireId == null ? null : (pairs.get(sireId) ?? null);
    const dam = animal.dam == null ? null : (pairs.get(animal.dam) ?? null);
    const place = (pair: string[], p: number) => {
      assign(
        index + 1,
        new Map(pairs).set(animal.id, pair),
        chosen,
        weight * p * evidence(animal, name(pair)),
      );
    };
    if (copiesOf(locus, animal.sex, system) === 1) {
      const giver = system === 'XY' ? dam : sire;
      for (const a of symbols) place([a], giver ? half(giver, a) : (frequencies[a] ?? 0));
      return;
    }
    for (const a of symbols) {
      for (const b of symbols) {
        if (animal.parthenogenetic && dam) {
          const [x = '', y = x] = dam;
          const keep = animal.retention ?? 0;
          // Ordered (x, y) with the retention, otherwise either allele twice.
          const p = (a === x && b === y ? keep : 0) + (a === b ? (1 - keep) * half([x, y], a) : 0);
          place([a, b], p);
          continue;
        }
        place(
          [a, b],
          (sire ? half(sire, a) : (frequencies[a] ?? 0)) * (dam ? half(dam, b) : (frequencies[b] ?? 0)),
        );
      }
    }
  };
  const chooseSires = (
    left: [string, Record<string, number>][],
    chosen: Map<string, string>,
    weight: number,
  ): void => {
    const [next, ...rest] = left;
    if (!next) {
      assign(0, new Map(), chosen, weight);
      return;
    }
    for (const [sire, p] of Object.entries(next[1]))
      chooseSires(rest, new Map(chosen).set(next[0], sire), weight * p);
  };
  chooseSires([...groups], new Map(), 1);
  const normalise = (all: Map<string, Map<string, number>>) => {
    for (const chances of all.values()) for (const [key, p] of chances) chances.set(key, p / total);
  };
  normalise(genotypes);
  normalise(sires);
  return { total, genotypes, sires };
}
