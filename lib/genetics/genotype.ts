import Fraction from 'fraction.js';
import { ONE, parseProbability } from './fractions';
import { GeneticsError } from './genetics-error';
import {
  NORMAL,
  type Genotype,
  type LocusDefinition,
  type Phenotype,
  type Sex,
  type SexSystem,
} from './locus';

/**
 * How many copies of a locus an animal of a known sex has: 2, or 1 for X in an XY male and Z in a ZW female.
 * @throws {GeneticsError} 'chromosome' when the species has no such chromosome
 */
export function copiesOf(locus: LocusDefinition, sex: 'male' | 'female', system: SexSystem): 1 | 2 {
  if (locus.chromosome === 'autosomal') return 2;
  if (locus.chromosome === 'X' && system === 'XY') return sex === 'male' ? 1 : 2;
  if (locus.chromosome === 'Z' && system === 'ZW') return sex === 'female' ? 1 : 2;
  throw new GeneticsError(
    'chromosome',
    locus.id,
    `${locus.name} lies on the ${locus.chromosome} chromosome, which a species with sex determination "${system}" does not have.`,
  );
}

/** Whether the locus lies on a sex chromosome. */
export function isSexLinked(locus: LocusDefinition): boolean {
  return locus.chromosome !== 'autosomal';
}

/**
 * Joins alleles in the declared order of the locus.
 * @throws {GeneticsError} 'unknown-allele'
 */
export function joinAlleles(locus: LocusDefinition, alleles: readonly string[]): Genotype {
  const indexed = alleles.map((symbol) => {
    const index = locus.alleles.findIndex((allele) => allele.symbol === symbol);
    if (index < 0) {
      throw new GeneticsError('unknown-allele', locus.id, `${locus.name} has no allele "${symbol}".`);
    }
    return { symbol, index };
  });
  return indexed
    .sort((a, b) => a.index - b.index)
    .map(({ symbol }) => symbol)
    .join('/');
}

/** The alleles of a genotype: two, or one where the animal has one copy. */
export function allelesOf(genotype: Genotype): string[] {
  return genotype.split('/');
}

/** Every genotype with so many copies, wild type first. */
export function genotypesWithCopies(locus: LocusDefinition, copies: 1 | 2): Genotype[] {
  const symbols = locus.alleles.map(({ symbol }) => symbol);
  if (copies === 1) return symbols;
  return symbols.flatMap((first, i) => symbols.slice(i).map((second) => `${first}/${second}`));
}

/** Every genotype that an animal may have; for an unknown sex at a sex-linked locus those of both sexes. */
export function genotypesOf(locus: LocusDefinition, sex: Sex, system: SexSystem): Genotype[] {
  if (sex !== 'unknown' || !isSexLinked(locus)) {
    return genotypesWithCopies(locus, copiesOf(locus, sex === 'unknown' ? 'female' : sex, system));
  }
  copiesOf(locus, 'female', system);
  return [...genotypesWithCopies(locus, 2), ...genotypesWithCopies(locus, 1)];
}

/**
 * Puts a genotype in the declared order and checks that the animal can have it.
 * @throws {GeneticsError} 'unknown-allele' or 'genotype' (for example a pair at Z in a ZW female)
 */
export function normaliseGenotype(
  locus: LocusDefinition,
  genotype: Genotype,
  sex: Sex,
  system: SexSystem,
): Genotype {
  const joined = joinAlleles(locus, allelesOf(genotype));
  if (!genotypesOf(locus, sex, system).includes(joined)) {
    const fits = genotypesOf(locus, sex, system).slice(0, 3).join(', ');
    throw new GeneticsError(
      'genotype',
      locus.id,
      `A ${sex === 'unknown' ? 'reptile of this species' : sex} cannot be "${genotype}" at ${locus.name} (${locus.chromosome}); possible are ${fits} …`,
    );
  }
  return joined;
}

/** Whether eggs of this genotype die. */
export function isLethal(locus: LocusDefinition, genotype: Genotype): boolean {
  return locus.lethal.includes(genotype);
}

/** What a genotype shows, with its exact chance; one entry unless penetrance is incomplete. */
export function phenotypeChances(locus: LocusDefinition, genotype: Genotype): Map<Phenotype, Fraction> {
  const penetrance = locus.penetrance[genotype];
  if (penetrance) {
    return new Map(
      Object.entries(penetrance).map(([shown, chance]) => [shown, parseProbability(chance, locus.id)]),
    );
  }
  return new Map([[locus.phenotypes[genotype] ?? NORMAL, ONE]]);
}

/** Every phenotype that the locus can show, normal first where it is among them. */
export function phenotypesOf(locus: LocusDefinition): Phenotype[] {
  const found = new Set<Phenotype>();
  for (const copies of locus.chromosome === 'autosomal' ? ([2] as const) : ([2, 1] as const)) {
    for (const genotype of genotypesWithCopies(locus, copies)) {
      for (const shown of phenotypeChances(locus, genotype).keys()) found.add(shown);
    }
  }
  return [...found].sort((a, b) => Number(b === NORMAL) - Number(a === NORMAL));
}

/** Whether a genotype holds an allele other than the wild type. */
export function isMutant(locus: LocusDefinition, genotype: Genotype): boolean {
  return allelesOf(genotype).some((symbol) => symbol !== locus.alleles[0]?.symbol);
}

/** Alleles that a parent's genotype hands on at a single locus, each with its chance (Mendel's first law). */
export function gametesOf(genotype: Genotype): Map<string, Fraction> {
  const alleles = allelesOf(genotype);
  const gametes = new Map<string, Fraction>();
  const each = new Fraction(1, alleles.length);
  for (const symbol of alleles) gametes.set(symbol, (gametes.get(symbol) ?? new Fraction(0)).add(each));
  return gametes;
}
