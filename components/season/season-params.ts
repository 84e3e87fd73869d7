import { parseAsInteger, parseAsString, parseAsStringLiteral } from 'nuqs/server';
import { pairingState } from '@/lib/contracts/pairing';
import type { showSeason } from '@/lib/contracts/season';
import type { z } from 'zod';

/** What stands in the address of the season: its year, the filters and the chosen pairing. */
export const seasonParams = {
  season: parseAsInteger,
  project: parseAsString,
  party: parseAsString,
  state: parseAsStringLiteral(pairingState.options),
  pairing: parseAsString,
};

export type SeasonState = {
  season: number | null;
  project: string | null;
  party: string | null;
  state: (typeof pairingState.options)[number] | null;
  pairing: string | null;
};

/** The query of an address; `of` leaves out what is only for the eye. */
export function seasonQueryOf({
  season,
  project,
  party,
  state,
}: Omit<SeasonState, 'pairing'>): z.input<typeof showSeason.query> {
  return {
    season: season ?? undefined,
    project: project ?? undefined,
    party: party ?? undefined,
    state: state ?? undefined,
  };
}

export const isFiltered = ({ project, party, state }: Pick<SeasonState, 'project' | 'party' | 'state'>) =>
  Boolean(project ?? party ?? state);
