/** The rule that a definition, a genotype or a pedigree breaks. */
export type GeneticsRule =
  | 'alleles'
  | 'unknown-allele'
  | 'genotype'
  | 'chromosome'
  | 'phenotype'
  | 'probability'
  | 'penetrance'
  | 'lethal'
  | 'welfare'
  | 'linkage'
  | 'parent-sex'
  | 'parent-missing'
  | 'parent-order'
  | 'evidence'
  | 'too-large';

/** Bad input, with the rule it breaks and the record that breaks it. */
export class GeneticsError extends Error {
  override readonly name = 'GeneticsError';
  constructor(
    readonly rule: GeneticsRule,
    /** Id of the locus or animal. */
    readonly record: string,
    message: string,
  ) {
    super(message);
  }
}
