import { joinAlleles } from '@/lib/genetics/genotype';
import type { LocusDefinition, Sex } from '@/lib/genetics/locus';
import type { LocusClaim } from '@/lib/contracts/animal';
import type { PartyId } from '@/lib/contracts/ids';
import { pick } from '../random';
import type { SownSpecies } from './species';

/** The two alleles of an animal per locus of the catalogue; a locus that is left out is wild type. */
export type Alleles = Readonly<Record<string, readonly [string, string]>>;
export type Parts = readonly { partyId: PartyId; parts: number }[];

/** An animal of the scenario with its true genotype, which the product is not told. */
export interface Simulated {
  code: string;
  name: string;
  species: SownSpecies;
  sex: Exclude<Sex, 'unknown'>;
  /** Days from the day of seeding, negative. */
  hatched: number;
  alleles: Alleles;
  parts: Parts;
  generation: number;
  dam?: Simulated;
  sire?: Simulated;
  clutch?: { code: string; number: number };
}

const WILD = ['+', '+'] as const;

function genotypeOf(animal: Simulated, locus: LocusDefinition): string {
  return joinAlleles(locus, animal.alleles[locus.id] ?? WILD);
}

export function phenotypeOf(animal: Simulated, locus: LocusDefinition): string {
  return locus.phenotypes[genotypeOf(animal, locus)] ?? '';
}

/** What is recorded: what it looks like and, for a founder, what its breeder said it carries without showing. */
export function claimOf(animal: Simulated, locus: LocusDefinition): LocusClaim {
  const shows = phenotypeOf(animal, locus);
  const genotype = genotypeOf(animal, locus);
  const isHidden = animal.generation === 0 && shows === '' && genotype !== joinAlleles(locus, WILD);
  return { shows, carries: isHidden ? { genotypes: { [genotype]: '1' }, basis: 'stated' } : null };
}

/** Draws one allele of each parent per locus, again where the outcome dies in the egg. */
export function drawYoung(
  random: () => number,
  { dam, sire }: { dam: Simulated; sire: Simulated },
): { alleles: Alleles; sex: 'male' | 'female' } {
  const alleles: Record<string, readonly [string, string]> = {};
  for (const locus of dam.species.catalogue.loci) {
    let drawn: readonly [string, string];
    do {
      drawn = [pick(random, dam.alleles[locus.id] ?? WILD), pick(random, sire.alleles[locus.id] ?? WILD)];
    } while (locus.lethal.includes(joinAlleles(locus, drawn)));
    alleles[locus.id] = drawn;
  }
  return { alleles, sex: pick(random, ['male', 'female'] as const) };
}

const divisor = (a: number, b: number): number => (b === 0 ? a : divisor(b, a % b));
const total = (parts: Parts) => parts.reduce((sum, one) => sum + one.parts, 0);

/** The parts of the young: each side's share goes to the owners of that parent in proportion to their parts. */
export function partsOfYoung(
  dam: Parts,
  sire: Parts,
  sides: { damSide: number; sireSide: number },
): { partyId: PartyId; parts: number }[] {
  const sums = new Map<PartyId, number>();
  const add = (parts: Parts, weight: number) => {
    for (const one of parts) sums.set(one.partyId, (sums.get(one.partyId) ?? 0) + one.parts * weight);
  };
  add(dam, sides.damSide * total(sire));
  add(sire, sides.sireSide * total(dam));
  const common = [...sums.values()].reduce(divisor, 0);
  return [...sums]
    .map(([partyId, parts]) => ({ partyId, parts: parts / common }))
    .filter(({ parts }) => parts > 0);
}
