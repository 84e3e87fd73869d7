import type { PartyId } from '@/lib/contracts/ids';
import type { PairingFigures } from '@/lib/contracts/pairing-figures';
import type { TermsContent } from '@/lib/contracts/terms-content';
import { partsOfYoung, splitSale } from '../projects/split-by-terms';

type Parts = readonly { partyId: PartyId; parts: number }[];

/** Whose the young and the expected proceeds of a pairing would be, as the parties see it before they answer. */
export function splitByTerms(
  content: TermsContent,
  parents: { sire: Parts; dam: Parts },
  expected: number,
  parties: readonly { id: PartyId; name: string }[],
): {
  steps: PairingFigures['proceeds']['steps'];
  shares: PairingFigures['proceeds']['shares'];
  youngParts: PairingFigures['youngParts'];
} {
  const nameOf = (id: PartyId) => parties.find((party) => party.id === id)?.name ?? 'Another party';
  const young = partsOfYoung(content, parents);
  const of = young.reduce((sum, { parts }) => sum + parts, 0);
  // Neither card fees nor costs are known before the sale: the expectation is of what is divided besides them.
  const cuts = splitSale(
    content,
    young,
    { price: expected, cardFee: 0, costs: 0, costsPaidBy: null },
    nameOf,
  ).flatMap((step) => step.cuts);
  const house = cuts.find(({ label }) => label === 'House share');
  const amountOf = (id: PartyId) => cuts.find((cut) => cut !== house && cut.partyId === id)?.amount ?? 0;
  return {
    steps: house
      ? [{ label: `House share, ${house.note}`, amount: house.amount, partyId: house.partyId }]
      : [],
    shares: young.map(({ partyId, parts, why }) => ({
      partyId,
      name: nameOf(partyId),
      amount: amountOf(partyId),
      parts,
      of,
      why: why.join(', '),
    })),
    youngParts: {
      parts: young.map(({ partyId, parts }) => ({ partyId, parts })),
      steps: young.map(
        ({ partyId, parts, why }) => `${nameOf(partyId)}: ${parts} of ${of}, ${why.join(' and ')}`,
      ),
    },
  };
}
