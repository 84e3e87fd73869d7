import type { LocusClaim } from '@/lib/contracts/animal';

/** One locus in a cell: "Clown: looks normal, carries +/c = 2/3, +/+ = 1/3 (stated)". */
export function claimToText(locus: string, claim: LocusClaim): string {
  const looks = claim.shows === null ? [] : [`looks ${claim.shows || 'normal'}`];
  const odds = Object.entries(claim.carries?.genotypes ?? {}).map(([genotype, odd]) =>
    odd === '1' ? genotype : `${genotype} = ${odd}`,
  );
  const carries = claim.carries ? [`carries ${odds.join(', ')} (${claim.carries.basis})`] : [];
  return `${locus}: ${[...looks, ...carries].join(', ')}`;
}

const form =
  /^(?:looks (?<looks>[^,]+?))?(?:,?\s*carries (?<odds>.+?)(?: \((?<basis>stated|tested|proven)\))?)?$/;

export interface ClaimText {
  locus: string;
  claim: LocusClaim;
}

/**
 * Loci of a cell, separated by "|". Without a basis what is carried counts as stated.
 * @returns the loci, or the piece that could not be read
 */
export function claimsFromText(cell: string): { claims: ClaimText[] } | { unreadable: string } {
  const claims: ClaimText[] = [];
  for (const piece of cell
    .split('|')
    .map((part) => part.trim())
    .filter(Boolean)) {
    const colon = piece.indexOf(':');
    const found = colon > 0 ? form.exec(piece.slice(colon + 1).trim())?.groups : undefined;
    if (!found || (!found.looks && !found.odds)) return { unreadable: piece };
    const genotypes: Record<string, string> = {};
    for (const odd of (found.odds ?? '')
      .split(',')
      .map((part) => part.trim())
      .filter(Boolean)) {
      const [genotype = '', probability = '1'] = odd.split('=').map((part) => part.trim());
      if (!/^\d+(\/[1-9]\d*)?$/.test(probability)) return { unreadable: piece };
      genotypes[genotype] = probability;
    }
    const shows = found.looks === undefined ? null : /^normal$/i.test(found.looks) ? '' : found.looks;
    const basis = (found.basis ?? 'stated') as 'stated' | 'tested' | 'proven';
    claims.push({
      locus: piece.slice(0, colon).trim(),
      claim: { shows, carries: found.odds ? { genotypes, basis } : null },
    });
  }
  return { claims };
}
