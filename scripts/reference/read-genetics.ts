import { readBelief, type Belief } from '@/lib/genetics/belief';
import { checkLocus } from '@/lib/genetics/check-locus';
import type { CrossInput, ParentGenetics } from '@/lib/genetics/cross';
import type { LinkedLoci } from '@/lib/genetics/linkage';
import { NORMAL, type LocusDefinition, type SexSystem } from '@/lib/genetics/locus';
import { asList, asObject, asText, type Json, type JsonObject } from './case-kind';
import { readFraction } from './compare';

/** The case format's word for what the core keeps as ''. */
export function phenotypeFromCase(word: string): string {
  return word === 'normal' ? NORMAL : word;
}

export function phenotypeForCase(phenotype: string): string {
  return phenotype === NORMAL ? 'normal' : phenotype;
}

export function readSexSystem(value: Json | undefined): SexSystem {
  if (value === 'XY' || value === 'ZW' || value === 'TSD' || value === 'unknown') return value;
  throw new Error(`sex_system: ${JSON.stringify(value)} is not known.`);
}

export function readLoci(input: JsonObject): LocusDefinition[] {
  const system = readSexSystem(input.sex_system);
  return asList(input.loci, 'loci').map((entry) => {
    const given = asObject(entry, 'a locus');
    const id = asText(given.id, 'id of a locus');
    const chromosome = given.chromosome ?? 'autosomal';
    if (chromosome !== 'autosomal' && chromosome !== 'X' && chromosome !== 'Z')
      throw new Error(`${id}: chromosome?`);
    const phenotypes = Object.entries(asObject(given.phenotypes ?? {}, 'phenotypes'))
      .map(([genotype, shown]) => [genotype, phenotypeFromCase(asText(shown, 'phenotype'))] as const)
      .filter(([, shown]) => shown !== NORMAL);
    const penetrance = Object.entries(asObject(given.penetrance ?? {}, 'penetrance')).map(
      ([genotype, chances]) => {
        const entries = Object.entries(asObject(chances, 'penetrance'));
        return [
          genotype,
          Object.fromEntries(entries.map(([shown, p]) => [phenotypeFromCase(shown), asText(p, 'chance')])),
        ];
      },
    );
    const locus: LocusDefinition = {
      id,
      name: id,
      symbol: id,
      chromosome,
      linkage: null,
      alleles: asList(given.alleles, 'alleles').map((symbol) => ({
        symbol: asText(symbol, 'allele'),
        name: asText(symbol, 'allele'),
      })),
      phenotypes: Object.fromEntries(phenotypes),
      penetrance: Object.fromEntries(penetrance),
      lethal: asList(given.lethal ?? [], 'lethal').map((genotype) => asText(genotype, 'lethal genotype')),
      dominance: 'recessive',
      welfare: [],
      source: { citation: 'case file', certainty: 'read' },
    };
    checkLocus(locus, system);
    return locus;
  });
}

export function readCross(input: JsonObject): CrossInput {
  const sexSystem = readSexSystem(input.sex_system);
  const loci = readLoci(input);
  const linked: LinkedLoci[] = [];
  if (input.linkage !== undefined) {
    const linkage = asObject(input.linkage, 'linkage');
    linked.push({
      loci: asList(linkage.loci, 'linkage.loci').map((id) => asText(id, 'locus')),
      recombination: asList(linkage.recombination, 'recombination').map((r) =>
        readFraction(r, 'recombination'),
      ),
    });
  }
  const parent = (side: 'sire' | 'dam'): ParentGenetics => {
    const sex = side === 'sire' ? 'male' : 'female';
    const beliefs = new Map<string, Belief>();
    for (const [id, value] of Object.entries(asObject(input[side] ?? {}, side))) {
      const locus = loci.find((each) => each.id === id);
      if (!locus) throw new Error(`${side}: "${id}" is no locus of this case.`);
      const chances = typeof value === 'string' ? { [value]: '1' } : asObject(value, `${side} at ${id}`);
      const texts = Object.entries(chances).map(([genotype, p]) => [genotype, asText(p, 'chance')]);
      beliefs.set(id, readBelief(locus, sex, sexSystem, Object.fromEntries(texts)));
    }
    const haplotypes = input[`${side}_haplotypes`];
    if (haplotypes === undefined) return { beliefs };
    const chromosomes = asList(haplotypes, 'haplotypes').map((each) =>
      asList(each, 'haplotype').map((a) => asText(a, 'allele')),
    );
    return { beliefs, phases: [{ loci: linked[0]?.loci ?? [], haplotypes: chromosomes }] };
  };
  return { sexSystem, loci, linked, sire: parent('sire'), dam: parent('dam') };
}
