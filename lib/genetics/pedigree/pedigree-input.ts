import type { Genotype, LocusDefinition, Phenotype, Sex, SexSystem } from '../locus';

/** An animal's place in the pedigree. Parents that are not listed themselves are taken as founders. */
export interface PedigreeMember {
  id: string;
  sex: Sex;
  sire?: string | null;
  dam?: string | null;
  /** Where several males may be the sire: chance of each before anything is seen, adding up to 1. */
  sires?: Readonly<Record<string, number>>;
  /** Young of one group share one sire out of `sires`, such as a clutch after two males; alone if left out. */
  sireGroup?: string;
  /** Of the dam alone (terminal-fusion automixis); a sire is ignored. */
  parthenogenetic?: boolean;
  /** Chance that the young of a heterozygous mother stays heterozygous, 0 to 1; 0 if left out. */
  retention?: number;
}

/** One thing that is known of one animal at one locus. */
export type Evidence = {
  animal: string;
  locus: string;
  /** Names the record in contradictions; made from the rest if left out. */
  record?: string;
} & (
  | {
      kind: 'phenotype';
      phenotype: Phenotype;
      /** Chance that something else was seen or the wrong animal was noted, 0 to 1; 0 if left out. */
      mislabelling?: number;
    }
  /** A laboratory's answer; an error (0 to 1) falls evenly on the other genotypes. */
  | { kind: 'test'; genotype: Genotype; error: number }
  /** Chances per genotype that hold for sure; they replace the founders' frequencies for a founder. */
  | { kind: 'prior'; genotypes: Readonly<Record<Genotype, number>> }
  /**
   * A breeder's statement: chances per genotype, adding up to 1, which hold with a confidence (0 to 1); otherwise the
   * statement says nothing. For a founder it stands beside the frequencies, for others it counts as seen.
   */
  | { kind: 'statement'; genotypes: Readonly<Record<Genotype, number>>; confidence: number }
);

export interface PedigreeInput {
  sexSystem: SexSystem;
  loci: readonly LocusDefinition[];
  animals: readonly PedigreeMember[];
  evidence: readonly Evidence[];
  /** Allele frequencies of founders per locus (Hardy–Weinberg); see `rareMutants` for a locus that is left out. */
  frequencies?: Readonly<Record<string, Readonly<Record<string, number>>>>;
  /** Entries of the largest table, if not the usual. */
  largestTable?: number;
}

/** Frequency of each mutant allele among founders of whom nothing is known: common practice, no source. */
export const RARE = 0.005;

/** Frequencies that make each mutant rare. */
export function rareMutants(locus: LocusDefinition, each = RARE): Record<string, number> {
  const mutants = locus.alleles.length - 1;
  return Object.fromEntries(
    locus.alleles.map(({ symbol }, i) => [symbol, i === 0 ? 1 - each * mutants : each]),
  );
}
