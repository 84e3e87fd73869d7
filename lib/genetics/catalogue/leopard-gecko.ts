import { defineIncompleteDominant, defineRecessive } from '../define-locus';
import { COMMON_PRACTICE, type CatalogueSpecies } from './species';

export const leopardGecko: CatalogueSpecies = {
  id: 'eublepharis-macularius',
  name: 'Leopard gecko',
  scientificName: 'Eublepharis macularius',
  sexSystem: 'TSD',
  source: { citation: 'Viets et al., J. Experimental Zoology 265:679–683, 1993', certainty: 'read' },
  loci: [
    defineRecessive({ id: 'tremper-albino', name: 'Tremper Albino', allele: 'tre', source: COMMON_PRACTICE }),
    defineIncompleteDominant({
      id: 'lemon-frost',
      name: 'Lemon Frost',
      allele: 'LF',
      welfare: [
        {
          text: 'Tumours of pigment cells (iridophoroma) in most carriers. Ask a veterinarian before breeding.',
          source: 'Guo et al., PLoS Genetics 17(6):e1009580, 2021 (from memory)',
        },
      ],
      source: {
        citation: 'SPINT1 region: Guo et al., PLoS Genetics 17(6):e1009580, 2021',
        certainty: 'memory',
      },
    }),
  ],
  combinations: [],
};
