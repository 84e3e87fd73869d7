'use client';

import { useState } from 'react';
import { ShareStrip } from '@/components/drawings/share-strip';
import { sayDay } from '@/components/drawings/season-days';
import { Button } from '@/components/ui/button';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { AnimalRecord } from '@/lib/contracts/animal-record';
import { formatMoney } from '@/lib/money/minor-units';
import { OwnershipDialog } from './ownership-dialog';
import { useShares } from './shares-of';
import { reasonWords } from './words';

/** Who held which parts from when until when, and how that came about. */
export function OwnersSection({ animal }: { animal: AnimalRecord }) {
  const { currency } = useWorkspace();
  const shares = useShares(animal.parties);
  const mayTransfer = useMay('ownership.transfer');
  const [changes, setChanges] = useState(false);
  // A set that was corrected on its own first day held on no day.
  const held = animal.ownership.filter((set) => set.untilDay !== set.fromDay);
  return (
    <section>
      <div className="mb-2 flex items-baseline justify-between gap-3">
        <h3 className="text-lg">Owners over time</h3>
        {mayTransfer ? (
          <Button size="sm" tone="link" onClick={() => setChanges(true)}>
            Change owners
          </Button>
        ) : null}
      </div>
      <ol className="flex flex-col gap-3">
        {held.map((set) => (
          <li key={set.id} className="border-b border-rule-2 pb-3 last:border-b-0 last:pb-0">
            <div className="mb-1 flex flex-wrap items-baseline justify-between gap-x-3">
              <span className="font-semibold">{reasonWords[set.reason]}</span>
              <span className="text-sm text-ink-3">
                {set.untilDay
                  ? `${sayDay(set.fromDay)} – ${sayDay(set.untilDay)}`
                  : `since ${sayDay(set.fromDay)}`}
              </span>
            </div>
            <ShareStrip
              shares={shares(set.parts)}
              labels="parts"
              size="sm"
              label={`From ${sayDay(set.fromDay)}`}
            />
            {set.price !== null ? (
              <p className="mt-1 font-mono text-sm">{formatMoney(set.price, currency)}</p>
            ) : null}
            {set.note ? <p className="mt-1 text-sm text-ink-2">{set.note}</p> : null}
            {set.derivation?.length ? (
              <details className="mt-1 text-sm text-ink-2">
                <summary className="cursor-pointer text-slate">How these parts came about</summary>
                <ol className="mt-1 list-decimal space-y-0.5 pl-5">
                  {set.derivation.map((step) => (
                    <li key={step}>{step}</li>
                  ))}
                </ol>
              </details>
            ) : null}
            {set.recordedBy ? (
              <p className="mt-0.5 text-sm text-ink-3">recorded by {set.recordedBy}</p>
            ) : null}
          </li>
        ))}
      </ol>
      {held.length === 0 ? <p className="text-base text-ink-3">Nobody is recorded as an owner.</p> : null}
      {changes ? <OwnershipDialog animal={animal} onClose={() => setChanges(false)} /> : null}
    </section>
  );
}
