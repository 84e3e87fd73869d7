'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { listAnimals } from '@/lib/contracts/animal-list';
import {
  layClutch,
  listClutches,
  listPairingEvents,
  logHatchlings,
  logPairingEvent,
  retractPairingEvent,
  showClutch,
} from '@/lib/contracts/clutch';
import type { ClutchId, PairingId } from '@/lib/contracts/ids';
import { showPairing } from '@/lib/contracts/pairing';
import { showSeason } from '@/lib/contracts/season';
import { optionsOf, useContractMutation } from './queries';
import { useWorkspaceSlug } from './workspace';

/** Answers that change with what is logged of a pairing or a clutch. */
const answers = [listClutches, showClutch, listPairingEvents, showPairing, showSeason, listAnimals];

export type ClutchesQuery = z.input<typeof listClutches.query>;

/** Clutches that match; what was shown before stays in sight while the next are fetched. */
export function useClutches(query: ClutchesQuery) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(listClutches, { params: { workspace }, query }),
    placeholderData: keepPreviousData,
  });
}

export function useClutch(clutch: ClutchId) {
  const workspace = useWorkspaceSlug();
  return useQuery(optionsOf(showClutch, { params: { workspace, clutch } }));
}

export function usePairingEvents(pairing: PairingId) {
  const workspace = useWorkspaceSlug();
  return useQuery(optionsOf(listPairingEvents, { params: { workspace, pairing } }));
}

export const useLogPairingEvent = () => useContractMutation(logPairingEvent, answers);
export const useRetractPairingEvent = () => useContractMutation(retractPairingEvent, answers);
export const useLayClutch = () => useContractMutation(layClutch, answers);
export const useLogHatchlings = () => useContractMutation(logHatchlings, answers);
