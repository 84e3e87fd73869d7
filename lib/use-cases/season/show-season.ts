import 'server-only';
import { listClutchesOfPairings, listPairingRecords, listSeasons } from '@/db/queries/pairings';
import type { PartyId } from '@/lib/contracts/ids';
import type { PairingRow } from '@/lib/contracts/pairing';
import { showSeason } from '@/lib/contracts/season';
import { expectHatchlings, type ExpectedClutch } from '@/lib/season/expect-hatchlings';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { isInState, isPartlyOf } from './filter-pairings';
import { presentPairings, seesWorth } from './present-pairings';

/** A member reads a season: the one asked for, or the one whose young are expected next. */
export const showSeasonUseCase = workspaceUseCase(showSeason, async (world, { query }) => {
  const { tx, sees, today } = world;
  const known = await listSeasons(tx, sees);
  const season = query.season ?? currentSeason(known, today);
  const records = await listPairingRecords(tx, sees, { season, project: query.project });
  const rows = (await presentPairings(world, records)).filter(
    (row) => isInState(row, query.state) && isPartlyOf(row, query.party),
  );
  const standing = rows.filter(({ status }) => status !== 'withdrawn');
  return {
    season,
    seasons: known.includes(season) ? known : [season, ...known].sort((a, b) => b - a),
    agreed: standing.filter(({ status }) => status === 'agreed' || status === 'ended').length,
    of: standing.length,
    hatchlings: expectHatchlings(await loadExpected(world, standing, records)),
    ...(seesWorth(world) ? { proceeds: addProceeds(standing) } : {}),
    span: spanOf(season, standing),
    rows,
  };
});

/** The newest season that has begun or is being planned; next spring's when there is none yet. */
function currentSeason(known: readonly number[], today: string): number {
  const [year = 0, month = 1] = today.split('-').map(Number);
  // From September on, people plan for the young of the next year.
  const planned = month >= 9 ? year + 1 : year;
  return (
    known.find((season) => season === planned) ??
    known.find((season) => season <= planned) ??
    known[0] ??
    planned
  );
}

async function loadExpected(
  { tx }: WorkspaceWorld,
  rows: readonly PairingRow[],
  records: Awaited<ReturnType<typeof listPairingRecords>>,
): Promise<ExpectedClutch[]> {
  const laid = await listClutchesOfPairings(
    tx,
    rows.map(({ id }) => id),
  );
  return rows.flatMap((row): ExpectedClutch[] => {
    const profile = records.find(({ id }) => id === row.id)?.profile;
    const [top = 0, bottom = 1] = (profile?.hatchRate.fraction ?? '0/1').split('/').map(Number);
    const hatchRate = top / bottom;
    const own = laid.filter(({ pairingId }) => pairingId === row.id);
    if (own.length)
      return own.map(({ eggs, hatchedOn, young }) => ({
        eggs,
        eggRange: null,
        hatchRate,
        hatched: hatchedOn ? young : null,
      }));
    return [
      { eggs: row.eggsExpected, eggRange: profile ? profile.clutchSize : null, hatchRate, hatched: null },
    ];
  });
}

function addProceeds(rows: readonly PairingRow[]): {
  expected: number;
  shares: { partyId: PartyId; amount: number }[];
} {
  const sums = new Map<PartyId, number>();
  for (const { proceeds } of rows) {
    for (const { partyId, amount } of proceeds?.shares ?? [])
      sums.set(partyId, (sums.get(partyId) ?? 0) + amount);
  }
  return {
    expected: rows.reduce((sum, { proceeds }) => sum + (proceeds?.expected ?? 0), 0),
    shares: [...sums].map(([partyId, amount]) => ({ partyId, amount })),
  };
}

/** From the month in which the first thing happens to the end of the month of the last; at least twelve months. */
function spanOf(season: number, rows: readonly PairingRow[]): { from: string; to: string } {
  const days = rows
    .flatMap(({ phases, moments }) => [
      ...phases.flatMap(({ from, to }) => [from, to]),
      ...moments.map(({ day }) => day),
    ])
    .sort();
  const first = days[0] ?? `${season - 1}-11-01`;
  const from = `${first.slice(0, 7)}-01`;
  const [year = season, month = 1] = from.split('-').map(Number);
  const yearOn = new Date(Date.UTC(year, month - 1 + 12, 0)).toISOString().slice(0, 10);
  const last = days[days.length - 1] ?? yearOn;
  const [lastYear = season, lastMonth = 1] = last.split('-').map(Number);
  const monthEnd = new Date(Date.UTC(lastYear, lastMonth, 0)).toISOString().slice(0, 10);
  return { from, to: monthEnd > yearOn ? monthEnd : yearOn };
}
