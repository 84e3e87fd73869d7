import { checkLocus } from './check-locus';
import { fractionText, ONE, parseProbability } from './fractions';
import type { Genotype, LocusDefinition, Phenotype, Source, WelfareNote } from './locus';

/** The usual two-allele locus in short. */
export interface SimpleLocus {
  id: string;
  name: string;
  /** Symbol of the mutant allele; the wild type is "+". */
  allele: string;
  chromosome?: LocusDefinition['chromosome'];
  linkage?: LocusDefinition['linkage'];
  /** How a single copy looks, if not as the locus is named. */
  single?: Phenotype;
  /** How two copies look, if not as the locus is named ("super" form for an incomplete dominant). */
  double?: Phenotype;
  /** Two copies die in the egg. */
  lethalDouble?: boolean;
  /** Chance that a genotype that shows, shows; the rest look normal. A fraction in text, such as "9/10". */
  penetrance?: string;
  welfare?: readonly { text: string; source: string; genotypes?: readonly Genotype[] }[];
  source: Source;
}

function define(
  form: SimpleLocus,
  dominance: LocusDefinition['dominance'],
  single: Phenotype,
  double: Phenotype,
): LocusDefinition {
  const chromosome = form.chromosome ?? 'autosomal';
  const a = form.allele;
  const [het, hom] = [`+/${a}`, `${a}/${a}`];
  const phenotypes: Record<Genotype, Phenotype> = { [hom]: double };
  if (single) phenotypes[het] = single;
  // An animal with one copy of the chromosome has nothing to mask the allele.
  if (chromosome !== 'autosomal') phenotypes[a] = form.double ?? form.name;
  const chance = form.penetrance;
  const penetrance = chance
    ? Object.fromEntries(
        Object.entries(phenotypes).map(([genotype, shown]) => [
          genotype,
          { [shown]: chance, '': complement(chance, form.id) },
        ]),
      )
    : {};
  const welfare: WelfareNote[] = (form.welfare ?? []).map((note) => ({
    text: note.text,
    source: note.source,
    genotypes: note.genotypes ?? Object.keys(phenotypes),
  }));
  const locus: LocusDefinition = {
    id: form.id,
    name: form.name,
    symbol: a,
    chromosome,
    linkage: form.linkage ?? null,
    alleles: [
      { symbol: '+', name: 'wild type' },
      { symbol: a, name: form.name },
    ],
    phenotypes,
    penetrance,
    lethal: form.lethalDouble ? [hom] : [],
    dominance,
    welfare,
    source: form.source,
  };
  checkLocus(locus);
  return locus;
}

function complement(text: string, record: string): string {
  return fractionText(ONE.sub(parseProbability(text, record)));
}

/** A locus whose mutant shows in two copies only. */
export function defineRecessive(form: SimpleLocus): LocusDefinition {
  return define(form, 'recessive', '', form.double ?? form.name);
}

/** A locus whose mutant shows alike in one copy and in two. */
export function defineDominant(form: SimpleLocus): LocusDefinition {
  return define(form, 'dominant', form.single ?? form.name, form.double ?? form.name);
}

/** A locus whose single and double copies show differently; two copies are called "Super …" if not named. */
export function defineIncompleteDominant(form: SimpleLocus): LocusDefinition {
  return define(form, 'incomplete dominant', form.single ?? form.name, form.double ?? `Super ${form.name}`);
}
