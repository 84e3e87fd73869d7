import Fraction from 'fraction.js';
import { HALF, ONE, ZERO } from './fractions';
import { GeneticsError } from './genetics-error';
import type { LocusDefinition } from './locus';

/** Loci that are handed on together, in order, with the recombination fraction between each and the next (0 to 1/2). */
export interface LinkedLoci {
  loci: readonly string[];
  recombination: readonly Fraction[];
}

/** Loci of one linkage block; a block of one locus is independent of all others. */
export interface LinkageBlock {
  loci: readonly LocusDefinition[];
  recombination: readonly Fraction[];
}

/**
 * Recombination fraction for a map distance by Haldane's function r = (1 − e^(−2d)) / 2 (J. B. S. Haldane, Journal of
 * Genetics 8, 1919), which takes crossovers to be independent. Rounded to millionths, so that crosses stay exact.
 * @param centimorgans 0 or more
 */
export function recombinationFromDistance(centimorgans: number): Fraction {
  const r = (1 - Math.exp((-2 * Math.abs(centimorgans)) / 100)) / 2;
  return new Fraction(Math.round(r * 1_000_000), 1_000_000);
}

/**
 * Parts loci into independent blocks.
 * @param linked measured recombination, which takes precedence over positions on the map
 * @throws {GeneticsError} 'linkage'
 */
export function linkageBlocks(
  loci: readonly LocusDefinition[],
  linked: readonly LinkedLoci[] = [],
): LinkageBlock[] {
  const byId = new Map(loci.map((locus) => [locus.id, locus]));
  const placed = new Set<string>();
  const blocks: LinkageBlock[] = [];
  for (const { loci: ids, recombination } of linked) {
    if (recombination.length !== ids.length - 1) {
      throw new GeneticsError(
        'linkage',
        ids.join(', '),
        'Give one recombination fraction less than linked loci.',
      );
    }
    const members = ids.map((id) => {
      const locus = byId.get(id);
      if (!locus || placed.has(id)) {
        throw new GeneticsError('linkage', id, `"${id}" is linked twice or is no locus of this cross.`);
      }
      placed.add(id);
      return locus;
    });
    blocks.push(checked({ loci: members, recombination }));
  }
  const groups = new Map<string, LocusDefinition[]>();
  for (const locus of loci) {
    if (placed.has(locus.id)) continue;
    if (!locus.linkage) {
      blocks.push({ loci: [locus], recombination: [] });
      continue;
    }
    groups.set(locus.linkage.group, [...(groups.get(locus.linkage.group) ?? []), locus]);
  }
  for (const members of groups.values()) {
    const ordered = members.toSorted((a, b) => (a.linkage?.position ?? 0) - (b.linkage?.position ?? 0));
    const recombination = ordered
      .slice(1)
      .map((locus, i) =>
        recombinationFromDistance((locus.linkage?.position ?? 0) - (ordered[i]?.linkage?.position ?? 0)),
      );
    blocks.push(checked({ loci: ordered, recombination }));
  }
  return blocks;
}

function checked(block: LinkageBlock): LinkageBlock {
  const [first] = block.loci;
  if (block.loci.some((locus) => locus.chromosome !== first?.chromosome)) {
    throw new GeneticsError('linkage', first?.id ?? '', 'Linked loci lie on the same chromosome.');
  }
  if (block.recombination.some((r) => r.lt(ZERO) || r.gt(HALF))) {
    throw new GeneticsError('linkage', first?.id ?? '', 'A recombination fraction lies between 0 and 1/2.');
  }
  return block;
}

/** One parental chromosome's alleles over the loci of a block. */
export type Haplotype = readonly string[];

/**
 * What a parent with these chromosomes hands on, with chances: the strand may change between two loci with their
 * recombination fraction. One chromosome (of a hemizygous parent) is handed on whole.
 */
export function gametesOfHaplotypes(
  haplotypes: readonly Haplotype[],
  recombination: readonly Fraction[],
): { haplotype: Haplotype; chance: Fraction }[] {
  const [first, second] = haplotypes;
  if (!first) return [];
  if (!second) return [{ haplotype: first, chance: ONE }];
  const strands = [first, second] as const;
  // Paths over the loci: which strand each allele was taken from.
  let paths = [0, 1].map((strand) => ({ strand, haplotype: [strands[strand]?.[0] ?? ''], chance: HALF }));
  recombination.forEach((r, i) => {
    paths = paths.flatMap((path) =>
      [path.strand, 1 - path.strand].map((strand) => ({
        strand,
        haplotype: [...path.haplotype, strands[strand]?.[i + 1] ?? ''],
        chance: path.chance.mul(strand === path.strand ? ONE.sub(r) : r),
      })),
    );
    paths = merge(paths, (path) => `${path.strand} ${path.haplotype.join(' ')}`);
  });
  return merge(paths, (path) => path.haplotype.join(' ')).map(({ haplotype, chance }) => ({
    haplotype,
    chance,
  }));
}

function merge<T extends { chance: Fraction }>(entries: readonly T[], keyOf: (entry: T) => string): T[] {
  const merged = new Map<string, T>();
  for (const entry of entries) {
    if (entry.chance.equals(ZERO)) continue;
    const key = keyOf(entry);
    const known = merged.get(key);
    merged.set(key, known ? { ...known, chance: known.chance.add(entry.chance) } : entry);
  }
  return [...merged.values()];
}
