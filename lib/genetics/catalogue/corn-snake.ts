import { defineRecessive } from '../define-locus';
import type { LocusDefinition } from '../locus';
import { COMMON_PRACTICE, type CatalogueSpecies } from './species';

/** One locus, two recessive alleles; which shows in an animal with one of each is common practice. */
const pattern: LocusDefinition = {
  id: 'motley',
  name: 'Motley and stripe',
  symbol: 'mot',
  chromosome: 'autosomal',
  linkage: null,
  alleles: [
    { symbol: '+', name: 'wild type' },
    { symbol: 'mot', name: 'Motley' },
    { symbol: 'str', name: 'Stripe' },
  ],
  phenotypes: { 'mot/mot': 'Motley', 'mot/str': 'Motley', 'str/str': 'Stripe' },
  penetrance: {},
  lethal: [],
  dominance: 'recessive',
  welfare: [],
  source: {
    citation: 'CLCN2: Montandon et al., Genome Biology 26:73, 2025; motley over stripe is common practice',
    certainty: 'read',
  },
};

export const cornSnake: CatalogueSpecies = {
  id: 'pantherophis-guttatus',
  name: 'Corn snake',
  scientificName: 'Pantherophis guttatus',
  sexSystem: 'ZW',
  source: { citation: 'ZW as in other colubrids; no citation at hand', certainty: 'memory' },
  loci: [
    defineRecessive({
      id: 'amelanistic',
      name: 'Amelanistic',
      allele: 'amel',
      source: { citation: 'OCA2: Saenko et al., Scientific Reports 5:17118, 2015', certainty: 'memory' },
    }),
    defineRecessive({ id: 'anerythristic', name: 'Anerythristic', allele: 'anery', source: COMMON_PRACTICE }),
    defineRecessive({
      id: 'lavender',
      name: 'Lavender',
      allele: 'lav',
      source: { citation: 'LYST: Ullate-Agote et al., PNAS 117:26307–26317, 2020', certainty: 'memory' },
    }),
    pattern,
  ],
  combinations: [
    { name: 'Snow', phenotypes: { amelanistic: 'Amelanistic', anerythristic: 'Anerythristic' } },
  ],
};
