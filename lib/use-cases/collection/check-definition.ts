import { checkLocus } from '@/lib/genetics/check-locus';
import { GeneticsError, type GeneticsRule } from '@/lib/genetics/genetics-error';
import type { LocusDefinition, SexSystem } from '@/lib/genetics/locus';
import { invalid } from '../refusal';

/** Which part of the form breaks a rule of the core. */
const fields: Partial<Record<GeneticsRule, string>> = {
  alleles: 'definition.alleles',
  'unknown-allele': 'definition.alleles',
  genotype: 'definition.phenotypes',
  chromosome: 'definition.chromosome',
  phenotype: 'definition.phenotypes',
  probability: 'definition.penetrance',
  penetrance: 'definition.penetrance',
  lethal: 'definition.lethal',
  welfare: 'definition.welfare',
  linkage: 'definition.linkage',
};

/** @throws {Refusal} naming the part of the locus that is not sound */
export function refuseUnsoundLocus(definition: LocusDefinition, system: SexSystem): void {
  try {
    checkLocus(definition, system);
  } catch (error) {
    if (!(error instanceof GeneticsError)) throw error;
    throw invalid(fields[error.rule] ?? 'definition', error.message);
  }
}
