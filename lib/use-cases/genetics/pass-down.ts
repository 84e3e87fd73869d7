import { beliefFromStatements, toNumbers } from '@/lib/genetics/belief';
import { parseProbability } from '@/lib/genetics/fractions';
import { gametesOf, genotypesOf, isSexLinked, joinAlleles, phenotypeChances } from '@/lib/genetics/genotype';
import type { LocusDefinition, Sex, SexSystem } from '@/lib/genetics/locus';
import type { LocusClaim } from '@/lib/contracts/animal';

/** Probability per genotype; adds up to 1. */
export type Odds = ReadonlyMap<string, number>;

/** What an animal's own record says, before its relatives are asked. */
export interface OwnRecord {
  sex: Sex;
  claim: LocusClaim | null;
  /** Odds of each known parent's genotype; null for an unknown one, who counts as wild type. */
  sire: Odds | null;
  dam: Odds | null;
}

/**
 * What an animal probably is at a locus, from its parents' odds by Mendel's first law and from its own record by
 * Bayes' rule. What is recorded as carried stands as it is recorded.
 */
export function inferGenotype(
  locus: LocusDefinition,
  system: SexSystem,
  { sex, claim, sire, dam }: OwnRecord,
): Odds {
  if (claim?.carries) {
    return normalise(
      Object.entries(claim.carries.genotypes).map(([genotype, text]) => [
        genotype,
        parseProbability(text, locus.id).valueOf(),
      ]),
    );
  }
  const prior =
    sire || dam
      ? fromParents(locus, system, sex, sire, dam)
      : founder(locus, system, sex, claim?.shows ?? null);
  const shows = claim?.shows ?? null;
  if (shows === null) return prior;
  const seen = [...prior].map(([genotype, odds]): [string, number] => [
    genotype,
    odds * (phenotypeChances(locus, genotype).get(shows)?.valueOf() ?? 0),
  ]);
  // Seen against all odds: a parent carries more than is known. The record of one's own eyes wins.
  return seen.some(([, odds]) => odds > 0) ? normalise(seen) : founder(locus, system, sex, shows);
}

function normalise(entries: readonly [string, number][]): Odds {
  const total = entries.reduce((sum, [, odds]) => sum + odds, 0);
  return new Map(entries.filter(([, odds]) => odds > 0).map(([genotype, odds]) => [genotype, odds / total]));
}

/** An animal without known parents, by the trade's convention: as many mutant copies as what is seen of it needs. */
function founder(locus: LocusDefinition, system: SexSystem, sex: Sex, shows: string | null): Odds {
  return toNumbers(
    beliefFromStatements(locus, sex, system, shows === null ? [] : [{ kind: 'shows', phenotype: shows }]),
  );
}

/** Which alleles a parent hands on: its odds over its gametes, the wild type for an unknown one. */
function gametes(locus: LocusDefinition, odds: Odds | null): [string, number][] {
  if (!odds) return [[locus.alleles[0]?.symbol ?? '+', 1]];
  const total = new Map<string, number>();
  for (const [genotype, probability] of odds) {
    for (const [symbol, chance] of gametesOf(genotype))
      total.set(symbol, (total.get(symbol) ?? 0) + probability * chance.valueOf());
  }
  return [...total];
}

function fromParents(
  locus: LocusDefinition,
  system: SexSystem,
  sex: Sex,
  sire: Odds | null,
  dam: Odds | null,
): Odds {
  const [fromSire, fromDam] = [gametes(locus, sire), gametes(locus, dam)];
  const both = fromSire.flatMap(([a, x]) =>
    fromDam.map(([b, y]): [string, number] => [joinAlleles(locus, [a, b]), x * y]),
  );
  // X passes from a father to daughters only, Z from a mother to sons only; the other parent gives to every young.
  const one = locus.chromosome === 'X' ? fromDam : fromSire;
  const isSingleSex = (which: 'male' | 'female') =>
    isSexLinked(locus) && genotypesOf(locus, which, system).every((genotype) => !genotype.includes('/'));
  const ofSex = (which: 'male' | 'female') => (isSingleSex(which) ? one : both);
  const entries =
    sex === 'unknown' && isSexLinked(locus)
      ? [...ofSex('male'), ...ofSex('female')]
      : ofSex(sex === 'unknown' ? 'female' : sex);
  const merged = new Map<string, number>();
  // Eggs of a lethal genotype do not become animals.
  for (const [genotype, odds] of entries)
    if (!locus.lethal.includes(genotype)) merged.set(genotype, (merged.get(genotype) ?? 0) + odds);
  return normalise([...merged]);
}

/** Odds of several possible parents, weighed by how likely each one is. */
export function mixOdds(parents: readonly { odds: Odds; weight: number }[]): Odds | null {
  if (parents.length === 0) return null;
  const total = new Map<string, number>();
  for (const { odds, weight } of parents)
    for (const [genotype, p] of odds) total.set(genotype, (total.get(genotype) ?? 0) + p * weight);
  return normalise([...total]);
}
