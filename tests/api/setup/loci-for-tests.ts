import type { LocusId } from '@/lib/contracts/ids';
import { defineRecessive as define } from '@/lib/genetics/define-locus';
import type { LocusDefinition } from '@/lib/genetics/locus';

/** A made-up recessive locus of two alleles, "+" and `allele`; two copies look as the locus is named. */
export function defineRecessive(id: LocusId, name: string, allele: string): LocusDefinition {
  return define({
    id,
    name,
    allele,
    source: { citation: 'made up for the tests', certainty: 'common practice' },
  });
}
