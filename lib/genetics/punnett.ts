import type Fraction from 'fraction.js';
import { HALF, ONE, ZERO } from './fractions';
import { GeneticsError } from './genetics-error';
import { allelesOf, copiesOf, isLethal, isSexLinked, joinAlleles, normaliseGenotype } from './genotype';
import type { KnownSex } from './cross';
import { gametesOfHaplotypes, linkageBlocks, type LinkedLoci } from './linkage';
import { NORMAL, type Genotype, type LocusDefinition, type Phenotype, type SexSystem } from './locus';
import { phenotypeClasses } from './offspring';

/** A gamete at the head of a row or column. */
export interface Gamete {
  /** Allele per locus, in the order of the loci; null where this gamete holds the chromosome without the locus. */
  alleles: readonly (string | null)[];
  /** The sex it gives the young, where a locus is sex-linked and this parent decides. */
  sex: KnownSex | null;
  chance: Fraction;
}

export interface PunnettCell {
  genotypes: readonly Genotype[];
  sex: KnownSex | null;
  /** What it shows, likeliest first; one entry unless penetrance is incomplete. */
  phenotypes: readonly { phenotypes: Readonly<Record<string, Phenotype>>; chance: Fraction }[];
  chance: Fraction;
  lethal: boolean;
}

export interface PunnettSquare {
  /** Columns. */
  sire: readonly Gamete[];
  /** Rows. */
  dam: readonly Gamete[];
  /** Row by row: `cells[dam][sire]`. */
  cells: readonly (readonly PunnettCell[])[];
}

/**
 * The classical square for one or two loci of parents whose genotypes are known (R. C. Punnett, Mendelism, 1905).
 * @param sire genotype by locus id; for linked loci the alleles of a genotype are read as its chromosomes, in order
 * @throws {GeneticsError} 'too-large' for another number of loci; 'genotype' or 'unknown-allele' for a bad genotype
 */
export function punnettSquare(
  sexSystem: SexSystem,
  loci: readonly LocusDefinition[],
  sire: Readonly<Record<string, Genotype>>,
  dam: Readonly<Record<string, Genotype>>,
  linked: readonly LinkedLoci[] = [],
): PunnettSquare {
  if (loci.length < 1 || loci.length > 2) {
    throw new GeneticsError('too-large', 'punnett', 'A Punnett square is drawn for one or two loci.');
  }
  const columns = gametes(sexSystem, loci, sire, 'male', linked);
  const rows = gametes(sexSystem, loci, dam, 'female', linked);
  const cells = rows.map((maternal) =>
    columns.map((paternal): PunnettCell => {
      const genotypes = loci.map((locus, i) =>
        joinAlleles(
          locus,
          [paternal.alleles[i], maternal.alleles[i]].filter((symbol) => symbol != null),
        ),
      );
      return {
        genotypes,
        sex: paternal.sex ?? maternal.sex,
        phenotypes: phenotypeClasses(loci, genotypes)
          .map(({ values, chance }) => ({ phenotypes: values, chance }))
          .toSorted((a, b) => b.chance.compare(a.chance)),
        chance: paternal.chance.mul(maternal.chance),
        lethal: loci.some((locus, i) => isLethal(locus, genotypes[i] ?? NORMAL)),
      };
    }),
  );
  return { sire: columns, dam: rows, cells };
}

function gametes(
  system: SexSystem,
  loci: readonly LocusDefinition[],
  genotypes: Readonly<Record<string, Genotype>>,
  sex: KnownSex,
  linked: readonly LinkedLoci[],
): Gamete[] {
  const decides = loci.some(isSexLinked) && (system === 'XY' ? sex === 'male' : sex === 'female');
  const young: readonly (KnownSex | null)[] = decides ? ['male', 'female'] : [null];
  return young.flatMap((youngSex) => {
    let found: { alleles: Map<string, string>; chance: Fraction }[] = [
      { alleles: new Map(), chance: youngSex ? HALF : ONE },
    ];
    for (const block of linkageBlocks(loci, linked)) {
      const [first] = block.loci;
      if (youngSex && first && isSexLinked(first) && copiesOf(first, youngSex, system) === 1) continue;
      const written = block.loci.map((locus) => {
        const genotype = genotypes[locus.id] ?? '';
        normaliseGenotype(locus, genotype, sex, system);
        return allelesOf(genotype);
      });
      const haplotypes = (written[0] ?? []).map((_, copy) => written.map((alleles) => alleles[copy] ?? ''));
      const handedOn = gametesOfHaplotypes(haplotypes, block.recombination);
      found = found.flatMap(({ alleles, chance }) =>
        handedOn.map(({ haplotype, chance: p }) => ({
          alleles: new Map([...alleles, ...block.loci.map(({ id }, i) => [id, haplotype[i] ?? ''] as const)]),
          chance: chance.mul(p),
        })),
      );
    }
    return found
      .filter(({ chance }) => chance.gt(ZERO))
      .map(({ alleles, chance }) => ({
        alleles: loci.map(({ id }) => alleles.get(id) ?? null),
        sex: youngSex,
        chance,
      }));
  });
}
