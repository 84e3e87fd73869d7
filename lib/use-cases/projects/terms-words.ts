import type { ClauseLine } from '@/lib/contracts/terms';
import type { TermsContent } from '@/lib/contracts/terms-content';

const divisions: Record<TermsContent['division'], string> = {
  proceeds: 'The young are sold and the proceeds are divided.',
  picks: 'The young are picked in turns, in order of rank.',
  parts: 'Each party holds its parts of each of the young.',
};
const fees: Record<TermsContent['cardFees'], string> = {
  off_the_top: 'Fees of card payments come off the top.',
  house: 'Fees of card payments come out of the house share.',
};

/** Basis points as a percentage without needless zeros: 850 is "8.5%". */
export const percentOf = (basisPoints: number) => `${String(basisPoints / 100)}%`;

/** Terms clause by clause in words. */
export function termsWords(
  content: Omit<TermsContent, 'parties'> & { parties: readonly { id: string; rank: number }[] },
  nameOf: (id: string) => string,
): { title: string; text: string }[] {
  const { damSide, sireSide, houseShare } = content;
  const all = damSide + sireSide;
  const order = [...content.parties].sort((a, b) => a.rank - b.rank).map(({ id }) => nameOf(id));
  return [
    { title: 'Parties, in order of rank', text: order.join(', ') },
    { title: 'Dam side', text: `${damSide} of ${all}, to the owners of the dam by their parts` },
    { title: 'Sire side', text: `${sireSide} of ${all}, to the owners of the sire by their parts` },
    {
      title: 'House share',
      text: houseShare
        ? `${percentOf(houseShare.basisPoints)} off the top, to ${nameOf(houseShare.partyId)}`
        : 'none',
    },
    {
      title: 'Costs',
      text: content.costsFirst
        ? 'Recorded costs of a clutch are recovered first.'
        : 'Costs stay with who paid them.',
    },
    { title: 'Card fees', text: fees[content.cardFees] },
    { title: 'Division', text: divisions[content.division] },
    { title: 'If an animal dies', text: content.clauses.death || 'not said' },
    { title: 'Exit and buy-out', text: content.clauses.exit || 'not said' },
    { title: 'Notice and duration', text: content.clauses.notice || 'not said' },
  ];
}

/** Clauses beside those of the version before. */
export function compareClauses(
  now: readonly { title: string; text: string }[],
  before: readonly { title: string; text: string }[] | null,
): ClauseLine[] {
  return now.map(({ title, text }) => {
    const earlier = before?.find((clause) => clause.title === title)?.text ?? null;
    return { title, text, before: earlier, changed: before !== null && earlier !== text };
  });
}
