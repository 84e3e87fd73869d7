import type { z } from 'zod';
import type { locusDefinition, LocusEntry } from '@/lib/contracts/locus';
import type { SpeciesDetail } from '@/lib/contracts/species-catalogue';

export type Definition = z.infer<typeof locusDefinition>;

export interface LocusFormValues {
  name: string;
  symbol: string;
  chromosome: Definition['chromosome'];
  dominance: Definition['dominance'];
  linkageGroup: string;
  linkagePosition: string;
  alleles: { symbol: string; name: string }[];
  /** Per genotype: how it looks, in how many it shows (a fraction, '' for all), whether its eggs die. */
  genotypes: Record<string, { look: string; penetrance: string; lethal: boolean }>;
  welfare: { text: string; source: string; genotypes: string }[];
  citation: string;
  certainty: Definition['source']['certainty'];
}

export function valuesOfLocus(locus: LocusEntry | null): LocusFormValues {
  if (!locus) {
    return {
      name: '',
      symbol: '',
      chromosome: 'autosomal',
      dominance: 'recessive',
      linkageGroup: '',
      linkagePosition: '',
      alleles: [
        { symbol: '+', name: 'wild type' },
        { symbol: '', name: '' },
      ],
      genotypes: {},
      welfare: [],
      citation: '',
      certainty: 'read',
    };
  }
  const { definition } = locus;
  const genotypes: LocusFormValues['genotypes'] = {};
  for (const genotype of new Set([
    ...Object.keys(definition.phenotypes),
    ...Object.keys(definition.penetrance),
    ...definition.lethal,
  ])) {
    const look = definition.phenotypes[genotype] ?? '';
    genotypes[genotype] = {
      look,
      penetrance: definition.penetrance[genotype]?.[look] ?? '',
      lethal: definition.lethal.includes(genotype),
    };
  }
  return {
    name: locus.name,
    symbol: definition.symbol,
    chromosome: definition.chromosome,
    dominance: definition.dominance,
    linkageGroup: definition.linkage?.group ?? '',
    linkagePosition: definition.linkage ? String(definition.linkage.position) : '',
    alleles: definition.alleles,
    genotypes,
    welfare: definition.welfare.map((note) => ({ ...note, genotypes: note.genotypes.join(' ') })),
    citation: definition.source.citation,
    certainty: definition.source.certainty,
  };
}

/** Every genotype of the alleles as typed, but the wild type; single ones too where the locus is sex-linked. */
export function genotypesOfValues({
  alleles,
  chromosome,
}: Pick<LocusFormValues, 'alleles' | 'chromosome'>): string[] {
  const symbols = alleles.map(({ symbol }) => symbol.trim()).filter(Boolean);
  const pairs = symbols.flatMap((first, index) => symbols.slice(index).map((second) => `${first}/${second}`));
  const all = [...pairs, ...(chromosome === 'autosomal' ? [] : symbols)];
  const wild = symbols[0] ?? '';
  return all.filter((genotype) => genotype !== `${wild}/${wild}` && genotype !== wild);
}

/** The rest of a chance, as a fraction: 9/10 leaves 1/10. */
function rest(fraction: string): string {
  const [top = 0, bottom = 1] = fraction.split('/').map(Number);
  return `${bottom - top}/${bottom}`;
}

export function definitionOf(values: LocusFormValues): Definition {
  const possible = new Set(genotypesOfValues(values));
  const entries = Object.entries(values.genotypes).filter(([genotype]) => possible.has(genotype));
  const shown = entries.filter(([, { look }]) => look.trim() !== '');
  return {
    symbol: values.symbol || (values.alleles[1]?.symbol ?? ''),
    chromosome: values.chromosome,
    dominance: values.dominance,
    linkage: values.linkageGroup
      ? { group: values.linkageGroup, position: Number(values.linkagePosition || Number.NaN) }
      : null,
    alleles: values.alleles,
    phenotypes: Object.fromEntries(shown.map(([genotype, { look }]) => [genotype, look.trim()])),
    penetrance: Object.fromEntries(
      shown
        .filter(([, { penetrance }]) => penetrance.trim() !== '' && penetrance.trim() !== '1')
        .map(([genotype, { look, penetrance }]) => [
          genotype,
          { [look.trim()]: penetrance.trim(), '': rest(penetrance.trim()) },
        ]),
    ),
    lethal: entries.filter(([, { lethal }]) => lethal).map(([genotype]) => genotype),
    welfare: values.welfare.map(({ text, source, genotypes }) => ({
      text,
      source,
      genotypes: genotypes.split(/[\s,]+/).filter(Boolean),
    })),
    source: { citation: values.citation, certainty: values.certainty },
  };
}

/** Looks of a species' locus other than normal, to choose from. */
export function looksOfLocus(locus: SpeciesDetail['loci'][number]): string[] {
  return [...new Set(Object.values(locus.definition.phenotypes))];
}
