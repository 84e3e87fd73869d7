import type { CombinationName, LocusDefinition, SexSystem, Source } from '../locus';

/** A species with what is known of its loci. */
export interface CatalogueSpecies {
  id: string;
  name: string;
  scientificName: string;
  sexSystem: SexSystem;
  /** Where the sex determination is from. */
  source: Source;
  loci: readonly LocusDefinition[];
  combinations: readonly CombinationName[];
}

/** What the trade sells under a name without a published locus. */
export const COMMON_PRACTICE: Source = {
  citation: 'common practice, no source',
  certainty: 'common practice',
};
