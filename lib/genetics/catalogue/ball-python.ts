import { defineDominant, defineIncompleteDominant, defineRecessive } from '../define-locus';
import type { Source } from '../locus';
import { COMMON_PRACTICE, type CatalogueSpecies } from './species';

const BROWN: Source = { citation: 'Brown et al., PLoS ONE 17(10):e0276376, 2022', certainty: 'read' };

export const ballPython: CatalogueSpecies = {
  id: 'python-regius',
  name: 'Ball python',
  scientificName: 'Python regius',
  sexSystem: 'XY',
  source: { citation: 'Gamble et al., Current Biology 27:2148–2153, 2017', certainty: 'memory' },
  loci: [
    defineRecessive({
      id: 'albino',
      name: 'Albino',
      allele: 'alb',
      source: { ...BROWN, citation: `TYR: ${BROWN.citation}` },
    }),
    defineRecessive({
      id: 'lavender-albino',
      name: 'Lavender Albino',
      allele: 'lav',
      source: { ...BROWN, citation: `OCA2: ${BROWN.citation}` },
    }),
    defineRecessive({
      id: 'ultramel',
      name: 'Ultramel',
      allele: 'ult',
      source: { ...BROWN, citation: `TYRP1: ${BROWN.citation}` },
    }),
    defineRecessive({
      id: 'piebald',
      name: 'Piebald',
      allele: 'pied',
      source: {
        citation: 'TFEC: Garcia-Elfring et al., Current Biology 33:755–763, 2023',
        certainty: 'memory',
      },
    }),
    defineRecessive({ id: 'clown', name: 'Clown', allele: 'clown', source: COMMON_PRACTICE }),
    defineIncompleteDominant({ id: 'pastel', name: 'Pastel', allele: 'Pas', source: COMMON_PRACTICE }),
    defineIncompleteDominant({
      id: 'coral-glow',
      name: 'Coral Glow',
      allele: 'CG',
      source: {
        citation:
          'Mallery and Carrillo, Phyllomedusa 15:29–42, 2016 (linked to sex with recombination: sexes differ from the odds given here)',
        certainty: 'read',
      },
    }),
    defineDominant({
      id: 'spider',
      name: 'Spider',
      allele: 'Spi',
      lethalDouble: true,
      welfare: [
        {
          text: 'Neurological signs in carriers (head tremor, poor balance); malformed inner ear. Ask a veterinarian.',
          source:
            'Rose and Williams, J. Exotic Pet Medicine 23:234–239, 2014; Starck et al., PLoS ONE 17(8):e0262788, 2022 (from memory)',
        },
      ],
      source: {
        citation:
          'Rose and Williams, J. Exotic Pet Medicine 23:234–239, 2014; the homozygote is not known alive',
        certainty: 'memory',
      },
    }),
  ],
  combinations: [],
};
