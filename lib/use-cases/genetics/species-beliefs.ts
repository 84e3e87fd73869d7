import type { AnimalId, LocusId, SpeciesId } from '@/lib/contracts/ids';
import type { LocusDefinition, SexSystem } from '@/lib/genetics/locus';

/** A genotype (alleles joined by '/') with its probability, 0–1. */
export interface GenotypeOdds {
  genotype: string;
  probability: number;
}

/** What is thought of one animal at one locus, from its own record and its relatives'. */
export interface LocusBelief {
  locusId: LocusId;
  /** Every genotype that is possible, likeliest first; the probabilities add up to 1. */
  genotypes: readonly GenotypeOdds[];
  /** What is recorded as seen: a phenotype, '' for normal, null when not judged. */
  shows: string | null;
  /** Whether a person recorded something here, or it all follows from relatives. */
  source: 'recorded' | 'relatives' | 'nothing';
}

/** A locus of the species with its id in the workspace. */
export interface BeliefLocus {
  id: LocusId;
  name: string;
  definition: LocusDefinition;
}

/** What every animal of a species probably carries, computed over the whole pedigree of the workspace. */
export interface SpeciesBeliefs {
  speciesId: SpeciesId;
  sexSystem: SexSystem;
  loci: readonly BeliefLocus[];
  /** In the trade's words: what it looks like, then what it carries or may carry, such as "Clown, 66% het Albino". */
  describe(animalId: AnimalId): string;
  /** @throws {RangeError} for an animal or locus of another species */
  belief(animalId: AnimalId, locusId: LocusId): LocusBelief;
  /** Whether the animal surely shows something other than normal here. */
  shows(belief: LocusBelief): boolean;
  /** "66% het", "visual", "no copy". */
  words(belief: LocusBelief): string;
}
