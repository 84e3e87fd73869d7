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
  return (
    <div className="flex flex-col gap-3">
      <dl className="text-base">
        <div className="flex justify-between gap-4">
          <dt className="font-semibold">Expected proceeds</dt>
          <dd className="font-mono font-semibold">{money(proceeds.expected)}</dd>
        </div>
        {proceeds.steps.map((step) => (
          <div key={step.label} className="flex justify-between gap-4 text-ink-2">
            <dt>{step.label}</dt>
            <dd className="font-mono">{money(-step.amount)}</dd>
          </div>
        ))}
      </dl>
      <ShareStrip shares={shares(proceeds.shares.map(({ partyId, amount }) => ({ partyId, parts: amount })))} size="lg" label={`Shares of the proceeds by terms version ${termsNumber}`} />
      <ul className="divide-y divide-rule-2 text-base">
        {proceeds.shares.map((share) => (
          <li key={share.partyId} className="flex items-baseline justify-between gap-4 py-1.5">
            <span className="min-w-0">
              <PartnerName partner={parties.get(share.partyId)?.mark ?? 6} name={share.name} />
              <span className="text-ink-2">
                {' '}
                {share.why}
              </span>
            </span>
            <span className="font-mono whitespace-nowrap">{money(share.amount)}</span>
          </li>
        ))}
      </ul>
    </div>
  );
}
