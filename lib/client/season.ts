'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { listComments, writeComment, type CommentSubject } from '@/lib/contracts/comment';
import type { PairingId, ProjectId } from '@/lib/contracts/ids';
import {
  decidePairing,
  listPairings,
  previewPairing,
  proposePairing,
  proposePairingAgain,
  showPairing,
  withdrawPairing,
} from '@/lib/contracts/pairing';
import { listProjects, showProject } from '@/lib/contracts/project';
import { listBreeders, showSeason } from '@/lib/contracts/season';
import { optionsOf, useContractMutation } from './queries';
import { request, type RequestError } from './request';
import { useWorkspaceSlug } from './workspace';

/** Answers that change with a pairing. */
const pairingAnswers = [showSeason, showPairing, listPairings, listProjects, showProject, listComments];

export type SeasonQuery = z.input<typeof showSeason.query>;

/** A season with its pairings; what was shown before stays in sight while the next is fetched. */
export function useSeason(query: SeasonQuery) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(showSeason, { params: { workspace }, query }),
    placeholderData: keepPreviousData,
  });
}

export function usePairing(pairing: PairingId | null) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(showPairing, { params: { workspace, pairing: pairing ?? '' } }),
    enabled: pairing !== null,
  });
}

export function useBreeders(project: ProjectId | null) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(listBreeders, { params: { workspace }, query: { project: project ?? '' } }),
    enabled: project !== null,
  });
}

export type PreviewInput = z.input<typeof previewPairing.body>;

/** The figures of a pairing that is being chosen; asked again as the choice changes, the last ones stay meanwhile. */
export function usePairingPreview(body: PreviewInput | null) {
  const workspace = useWorkspaceSlug();
  return useQuery<z.output<typeof previewPairing.response>, RequestError>({
    queryKey: [previewPairing.id, workspace, body],
    queryFn: ({ signal }) =>
      request(previewPairing, { params: { workspace }, body: body as PreviewInput }, { signal }),
    enabled: body !== null,
    placeholderData: keepPreviousData,
    retry: false,
  });
}

export const useProposePairing = () => useContractMutation(proposePairing, pairingAnswers);
export const useProposePairingAgain = () => useContractMutation(proposePairingAgain, pairingAnswers);
export const useDecidePairing = () => useContractMutation(decidePairing, pairingAnswers);
export const useWithdrawPairing = () => useContractMutation(withdrawPairing, pairingAnswers);

export function useComments(kind: CommentSubject, subject: string) {
  const workspace = useWorkspaceSlug();
  return useQuery({
    ...optionsOf(listComments, { params: { workspace, kind, subject } }),
    refetchInterval: 30_000,
  });
}
export const useWriteComment = () => useContractMutation(writeComment, [listComments]);
