'use client';

import { useShares } from '@/components/collection/shares-of';
import { ShareStrip } from '@/components/drawings/share-strip';
import { PartnerName } from '@/components/drawings/partner-name';
import { useParties } from '@/lib/client/workspace';
import type { PairingFigures } from '@/lib/contracts/pairing-figures';
import { formatMoney } from '@/lib/money/minor-units';

type Proceeds = PairingFigures['proceeds'];

/** What each party would get of the expected proceeds by the terms, step by step. */
export function WorthSplit({ proceeds, termsNumber }: { proceeds: Proceeds; termsNumber: number }) {
  const parties = useParties();
  const shares = useShares();
  const money = (amount: number) => formatMoney(amount, proceeds.currency);
  const strip = [
    ...shares(proceeds.shares.map(({ partyId, amount }) => ({ partyId, parts: amount }))),
    ...proceeds.steps.map(({ partyId, amount }) => ({
      partner: partyId ? (parties.get(partyId)?.mark ?? 6) : 6,
      name: 'House share',
      parts: amount,
    })),
  ];
  return (
    <div className="flex flex-col gap-3">
      <p className="flex justify-between gap-4 text-base font-semibold">
        <span>Expected proceeds</span>
        <span className="font-mono">{money(proceeds.expected)}</span>
      </p>
      {proceeds.expected > 0 ? (
        <ShareStrip
          shares={strip}
          size="lg"
          label={`Shares of the proceeds by terms version ${termsNumber}`}
        />
      ) : null}
      <ul className="divide-y divide-rule-2 text-base">
        {proceeds.steps.map((step) => (
          <li key={step.label} className="flex items-baseline justify-between gap-4 py-1.5">
            <span className="min-w-0 text-ink-2">{step.label}</span>
            <span className="font-mono whitespace-nowrap">{money(step.amount)}</span>
          </li>
        ))}
        {proceeds.shares.map((share) => (
          <li key={share.partyId} className="flex items-baseline justify-between gap-4 py-1.5">
            <span className="min-w-0">
              <PartnerName partner={parties.get(share.partyId)?.mark ?? 6} name={share.name} />{' '}
              <span className="text-sm text-ink-2">
                {share.parts} of {share.of}: {share.why}
              </span>
            </span>
            <span className="font-mono whitespace-nowrap">{money(share.amount)}</span>
          </li>
        ))}
      </ul>
    </div>
  );
}
