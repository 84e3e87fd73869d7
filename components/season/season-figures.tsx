'use client';

import { useShares } from '@/components/collection/shares-of';
import { ShareStrip } from '@/components/drawings/share-strip';
import { Figure } from '@/components/ui/figure';
import { useWorkspace } from '@/lib/client/workspace';
import type { Season } from '@/lib/contracts/season';
import { formatMoney } from '@/lib/money/minor-units';
import { sayCount } from './odds-words';

/** The season in figures: agreed, expected young with their range, expected proceeds and whose. */
export function SeasonFigures({ season }: { season: Season }) {
  const { currency } = useWorkspace();
  const shares = useShares();
  const { hatchlings, proceeds, agreed, of } = season;
  return (
    <div className="flex flex-wrap items-start gap-x-10 gap-y-4">
      <Figure
        label="Agreed"
        value={`${agreed} of ${of}`}
        tone={of > 0 && agreed === of ? 'moss' : undefined}
      />
      <Figure
        label={
          <span title="Eight in ten seasons like this would fall into the range.">Hatchlings expected</span>
        }
        value={sayCount(hatchlings.expected)}
        aside={hatchlings.from < hatchlings.to ? `${hatchlings.from}–${hatchlings.to}` : undefined}
      />
      {proceeds ? (
        <>
          <Figure label="Expected proceeds" value={formatMoney(proceeds.expected, currency)} />
          {proceeds.expected > 0 ? (
            <div className="min-w-56 flex-1 basis-64">
              <p className="mb-1 text-sm text-ink-3">whose share</p>
              <ShareStrip
                shares={shares(proceeds.shares.map(({ partyId, amount }) => ({ partyId, parts: amount })))}
                size="md"
                labels="percent"
                label="Expected proceeds"
              />
            </div>
          ) : null}
        </>
      ) : null}
    </div>
  );
}
