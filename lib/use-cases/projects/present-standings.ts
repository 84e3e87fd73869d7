import type { Standing as SeenStanding } from '@/lib/contracts/agreement';
import type { Standing } from './agreement';

/** Standings as they cross the wire; comments only for who takes part in the talk. */
export function presentStandings(standings: readonly Standing[], seesComments: boolean): SeenStanding[] {
  return standings.map(({ at, comment, ...standing }) => ({
    ...standing,
    at: at?.toISOString() ?? null,
    comment: seesComments ? comment : '',
  }));
}
