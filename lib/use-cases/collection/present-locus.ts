import type { LocusEntry } from '@/lib/contracts/locus';
import type { LocusId } from '@/lib/contracts/ids';
import { allelesOf, genotypesOf, phenotypeChances } from '@/lib/genetics/genotype';
import { NORMAL, type LocusDefinition, type Sex, type SexSystem } from '@/lib/genetics/locus';

/** A locus with what an animal of each sex may be there, in words. Genotypes that die in the egg are left out. */
export function presentLocus(
  row: { id: LocusId; name: string; version: number; definition: LocusDefinition; recorded: number },
  system: SexSystem,
): LocusEntry {
  const { id, name, version, recorded } = row;
  const { id: _id, name: _name, ...kept } = row.definition;
  const genotypes = (sex: Sex) =>
    genotypesOf(row.definition, sex, system)
      .filter((genotype) => !row.definition.lethal.includes(genotype))
      .map((genotype) => describeGenotype(row.definition, genotype));
  const definition = {
    ...kept,
    alleles: kept.alleles.map((allele) => ({ ...allele })),
    phenotypes: { ...kept.phenotypes },
    lethal: [...kept.lethal],
  };
  return {
    id,
    name,
    version,
    recorded,
    definition: {
      ...definition,
      penetrance: Object.fromEntries(
        Object.entries(kept.penetrance).map(([genotype, chances]) => [genotype, { ...chances }]),
      ),
      welfare: kept.welfare.map((note) => ({ ...note, genotypes: [...note.genotypes] })),
    },
    genotypes: { male: genotypes('male'), female: genotypes('female'), unknown: genotypes('unknown') },
  };
}

function describeGenotype(locus: LocusDefinition, genotype: string): LocusEntry['genotypes']['male'][number] {
  const wild = locus.alleles[0]?.symbol;
  const mutants = allelesOf(genotype).filter((symbol) => symbol !== wild);
  const likeliest = [...phenotypeChances(locus, genotype)].reduce((best, next) =>
    next[1].gt(best[1]) ? next : best,
  );
  const names = mutants.map(
    (symbol) => locus.alleles.find((allele) => allele.symbol === symbol)?.name ?? symbol,
  );
  const [first = '', second] = names;
  const words =
    names.length === 0
      ? 'no copy'
      : second === undefined
        ? allelesOf(genotype).length === 1
          ? `the one copy is ${first}`
          : likeliest[0] === NORMAL
            ? `het ${first}`
            : `one copy of ${first}`
        : first === second
          ? `two copies of ${first}`
          : `${first} with ${second}`;
  return { genotype, phenotype: likeliest[0], copies: mutants.length, words };
}
