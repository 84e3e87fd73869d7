import { allelesOf } from '../genotype';
import type { Genotype, LocusDefinition, SexSystem } from '../locus';

/** Chance per allele, in the declared order of the locus. */
export type AlleleChances = readonly number[];

/** What a genotype hands on. */
export function handedOn(locus: LocusDefinition, genotype: Genotype): number[] {
  const alleles = allelesOf(genotype);
  return locus.alleles.map(
    ({ symbol }) => alleles.filter((allele) => allele === symbol).length / alleles.length,
  );
}

/** Chance of a genotype when one allele comes from each side, or the only one from the side that gives it. */
export function chanceOfYoung(
  locus: LocusDefinition,
  system: SexSystem,
  young: Genotype,
  paternal: AlleleChances,
  maternal: AlleleChances,
): number {
  const [first = 0, second] = allelesOf(young).map((allele) =>
    locus.alleles.findIndex(({ symbol }) => symbol === allele),
  );
  // One copy: a son's X is his dam's, a ZW daughter's Z her sire's.
  if (second === undefined) return (system === 'XY' ? maternal : paternal)[first] ?? 0;
  const straight = (paternal[first] ?? 0) * (maternal[second] ?? 0);
  return first === second ? straight : straight + (paternal[second] ?? 0) * (maternal[first] ?? 0);
}

/**
 * Chance of a genotype from a mother alone by terminal-fusion automixis: a heterozygous mother's young stay
 * heterozygous with the retention, and are either homozygote otherwise (W. Booth et al., Biology Letters 7:253–256,
 * 2011, found young homozygous at most loci). A ZW mother's ZZ sons have her only allele twice.
 * @param retention 0 to 1
 */
export function chanceOfParthenogenetic(young: Genotype, mother: Genotype, retention: number): number {
  const [a = '', b = a] = allelesOf(mother);
  const [x = '', y] = allelesOf(young);
  if (y === undefined) return ((a === x ? 1 : 0) + (b === x ? 1 : 0)) / 2;
  if (a === b) return x === a && y === a ? 1 : 0;
  if (x !== y) return (x === a && y === b) || (x === b && y === a) ? retention : 0;
  return x === a || x === b ? (1 - retention) / 2 : 0;
}
