/**
 * How a species' sex is decided: XY (male XY, female XX), ZW (male ZZ, female ZW), by temperature (TSD), or not known.
 */
export type SexSystem = 'XY' | 'ZW' | 'TSD' | 'unknown';
export type Sex = 'male' | 'female' | 'unknown';

/** The textbook's word for how a locus' mutant alleles show; only told to people, never computed with. */
export type Dominance = 'recessive' | 'dominant' | 'incomplete dominant' | 'codominant';

/**
 * Alleles in the locus' declared order joined by '/', such as "+/a"; a single allele where an animal has one copy (X in
 * an XY male, Z in a ZW female).
 */
export type Genotype = string;

/** What is seen. The empty string is normal: nothing at this locus shows. */
export type Phenotype = string;
export const NORMAL: Phenotype = '';

/** A probability as text: a fraction "2/3", a whole number "1" or a decimal "0.25", from 0 to 1. */
export type ProbabilityText = string;

export interface Allele {
  /** Short sign without '/' or spaces, such as "+" or "a"; unique within the locus. */
  symbol: string;
  name: string;
}

/** Published harm that comes with some genotypes. */
export interface WelfareNote {
  text: string;
  /** Citation, or "common practice, no source". */
  source: string;
  /** Genotypes that are affected. */
  genotypes: readonly Genotype[];
}

/** Where a statement comes from, and whether the source was read or recalled. */
export interface Source {
  citation: string;
  certainty: 'read' | 'memory' | 'common practice';
}

/** Everything that is known of a locus, as plain data that can be kept as JSON. */
export interface LocusDefinition {
  id: string;
  name: string;
  /** Short sign for tight places, such as "alb". */
  symbol: string;
  chromosome: 'autosomal' | 'X' | 'Z';
  /** Place on a linkage group in centimorgans; null when the locus is taken to be independent. */
  linkage: { group: string; position: number } | null;
  /** At least two, the wild type first. */
  alleles: readonly Allele[];
  /** What each genotype shows; a genotype that is not named is normal. */
  phenotypes: Readonly<Record<Genotype, Phenotype>>;
  /** Where one genotype shows differently in different animals: chance per phenotype ('' is normal), adding up to 1. */
  penetrance: Readonly<Record<Genotype, Readonly<Record<Phenotype, ProbabilityText>>>>;
  /** Genotypes that die in the egg. */
  lethal: readonly Genotype[];
  dominance: Dominance;
  welfare: readonly WelfareNote[];
  source: Source;
}

/** The trade's name for a set of phenotypes over several loci. */
export interface CombinationName {
  name: string;
  /** Phenotype by locus id; all must be shown. */
  phenotypes: Readonly<Record<string, Phenotype>>;
}
