import type { CatalogueSpecies } from './species';

export const boa: CatalogueSpecies = {
  id: 'boa-constrictor',
  name: 'Boa',
  scientificName: 'Boa constrictor',
  sexSystem: 'XY',
  source: { citation: 'Gamble et al., Current Biology 27:2148–2153, 2017', certainty: 'memory' },
  loci: [],
  combinations: [],
};
