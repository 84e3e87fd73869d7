'use client';

import { useShares } from '@/components/collection/shares-of';
import { SeasonKey, SeasonRibbon, type RibbonLane } from '@/components/drawings/season-ribbon';
import { ShareStrip } from '@/components/drawings/share-strip';
import { useWorkspace } from '@/lib/client/workspace';
import type { PairingRow } from '@/lib/contracts/pairing';
import type { Season } from '@/lib/contracts/season';
import { PairCodes } from './pair-codes';
import { sayPairingState } from './pairing-state';

const stateTones = {
  moss: 'text-moss',
  straw: 'text-straw',
  alarm: 'text-alarm',
  neutral: 'text-ink-3',
  slate: 'text-slate',
  ember: 'text-ember',
};

/** Every pairing of the season as a lane of the ribbon. */
export function SeasonLanes({
  season,
  chosen,
  onOpen,
}: {
  season: Season;
  chosen: string | null;
  onOpen: (id: string) => void;
}) {
  const { today } = useWorkspace();
  const lanes: RibbonLane[] = season.rows.map((row) => ({
    id: row.id,
    name: `${row.sire.code} × ${row.dam.code}, ${row.title}, ${sayPairingState(row).text}`,
    heading: <LaneHead row={row} />,
    phases: row.phases,
    moments: row.moments.map((moment) => ({ ...moment, certainty: 'observed' as const })),
    muted: row.status === 'draft' || row.status === 'withdrawn',
  }));
  return (
    <div className="flex flex-col gap-3">
      <SeasonRibbon
        from={season.span.from}
        to={season.span.to}
        today={today}
        lanes={lanes}
        label="Pairings of the season"
        activeId={chosen}
        onOpen={onOpen}
      />
      <SeasonKey />
    </div>
  );
}

function LaneHead({ row }: { row: PairingRow }) {
  const shares = useShares();
  const state = sayPairingState(row);
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <div className="flex items-baseline justify-between gap-2">
        <PairCodes sire={row.sire.code} dam={row.dam.code} />
        <span className={`text-sm font-semibold whitespace-nowrap ${stateTones[state.tone]}`}>
          {row.status === 'proposed' ? `${row.agreed} of ${row.of}` : state.text}
        </span>
      </div>
      <p className="line-clamp-2 text-sm leading-4.5">{row.title}</p>
      <ShareStrip shares={shares(row.youngParts)} size="xs" label="The young would be owned by" />
    </div>
  );
}
