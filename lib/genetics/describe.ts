import type { NumericBelief } from './belief';
import { allelesOf, genotypesWithCopies, phenotypeChances } from './genotype';
import { NORMAL, type CombinationName, type Genotype, type LocusDefinition, type Phenotype } from './locus';

/** An allele that an animal has or may have without showing it. */
export interface Carried {
  locusId: string;
  allele: string;
  name: string;
  /** One hidden copy, two copies where one would look the same, or a hidden copy on the only chromosome. */
  form: 'het' | 'homozygous' | 'carries';
  /** 0 to 1; 1 is certain. */
  probability: number;
}

/** A probability this close to 1 is told as certain. */
const CERTAIN = 1 - 1e-9;

/**
 * What an animal has beyond what its looks tell.
 * @param shown what it shows here ('' is normal)
 * @param belief its genotypes given that it shows this
 */
export function carriedAlleles(locus: LocusDefinition, shown: Phenotype, belief: NumericBelief): Carried[] {
  const copies: readonly (1 | 2)[] = [
    ...new Set([...belief.keys()].map((genotype) => (allelesOf(genotype).length === 1 ? 1 : 2))),
  ];
  const showing = copies
    .flatMap((count) => genotypesWithCopies(locus, count))
    .filter((genotype) => (phenotypeChances(locus, genotype).get(shown)?.valueOf() ?? 0) > 0);
  return locus.alleles.slice(1).flatMap(({ symbol, name }) => {
    const count = (genotype: Genotype) => allelesOf(genotype).filter((allele) => allele === symbol).length;
    const chance = (wanted: (genotype: Genotype) => boolean) =>
      [...belief].reduce((total, [genotype, p]) => total + (wanted(genotype) ? p : 0), 0);
    const told = showing.length > 0 && showing.every((genotype) => count(genotype) > 0);
    const toldTwice =
      showing.length > 0 && showing.every((genotype) => count(genotype) === allelesOf(genotype).length);
    const found: Carried[] = [];
    const add = (form: Carried['form'], probability: number) => {
      if (probability > 0) found.push({ locusId: locus.id, allele: symbol, name, form, probability });
    };
    if (!told)
      add(
        'het',
        chance((genotype) => allelesOf(genotype).length === 2 && count(genotype) === 1),
      );
    if (!toldTwice)
      add(
        'homozygous',
        chance((genotype) => count(genotype) === 2),
      );
    if (!told)
      add(
        'carries',
        chance((genotype) => allelesOf(genotype).length === 1 && count(genotype) === 1),
      );
    return found;
  });
}

/** A probability in the trade's whole percents, rounded down ("66%" is two in three); below 1 % is "possible". */
function percent(probability: number): string {
  const whole = Math.floor(probability * 100 + 1e-6);
  return whole < 1 ? 'possible' : `${whole}%`;
}

/** "het Clown", "66% het Clown", "homozygous Spider". */
export function carriedWords({ form, name, probability }: Carried): string {
  return probability >= CERTAIN ? `${form} ${name}` : `${percent(probability)} ${form} ${name}`;
}

/**
 * What is seen in the trade's words: the phenotypes in the order of the loci, those that have a common name together
 * under it (the largest set first); "Normal" for none.
 */
export function looksWords(
  loci: readonly LocusDefinition[],
  phenotypes: Readonly<Record<string, Phenotype>>,
  combinations: readonly CombinationName[] = [],
): string {
  const left = new Map(loci.flatMap(({ id }) => (phenotypes[id] ? [[id, phenotypes[id]] as const] : [])));
  const words: string[] = [];
  const bySize = combinations.toSorted(
    (a, b) => Object.keys(b.phenotypes).length - Object.keys(a.phenotypes).length,
  );
  for (const { name, phenotypes: needed } of bySize) {
    const parts = Object.entries(needed);
    if (parts.length === 0 || parts.some(([id, shown]) => left.get(id) !== shown)) continue;
    words.push(name);
    for (const [id] of parts) left.delete(id);
  }
  return [...words, ...left.values()].join(' ') || 'Normal';
}

/** Looks and what is carried in one line: "Pastel het Clown", "Piebald, 66% het Clown". */
export function joinDescription(looksLike: string, carried: readonly Carried[]): string {
  const certain = carried.filter(({ probability }) => probability >= CERTAIN).map(carriedWords);
  const possible = carried.filter(({ probability }) => probability < CERTAIN).map(carriedWords);
  return [[looksLike, certain.join(', ')].filter(Boolean).join(' '), ...possible].join(', ');
}

export interface DescribedLocus {
  locus: LocusDefinition;
  /** What is seen; null when not judged: then only what all its genotypes show is told. */
  shown: Phenotype | null;
  belief: NumericBelief;
}

/**
 * An animal in the trade's words.
 * @param threshold chances of carrying below this (0 to 1) are left out
 */
export function describeAnimal(
  loci: readonly DescribedLocus[],
  combinations: readonly CombinationName[] = [],
  threshold = 0,
): string {
  const phenotypes: Record<string, Phenotype> = {};
  for (const { locus, shown, belief } of loci)
    phenotypes[locus.id] = shown ?? impliedPhenotype(locus, belief);
  const carried = loci.flatMap(({ locus, belief }) =>
    carriedAlleles(locus, phenotypes[locus.id] ?? NORMAL, belief),
  );
  return joinDescription(
    looksWords(
      loci.map(({ locus }) => locus),
      phenotypes,
      combinations,
    ),
    carried.filter(({ probability }) => probability >= threshold),
  );
}

function impliedPhenotype(locus: LocusDefinition, belief: NumericBelief): Phenotype {
  const chances = new Map<Phenotype, number>();
  for (const [genotype, p] of belief) {
    for (const [shown, chance] of phenotypeChances(locus, genotype)) {
      chances.set(shown, (chances.get(shown) ?? 0) + p * chance.valueOf());
    }
  }
  return [...chances].find(([, chance]) => chance >= CERTAIN)?.[0] ?? NORMAL;
}
