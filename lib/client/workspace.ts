'use client';

import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'next/navigation';
import type { Action } from '@/lib/contracts/actions';
import { showWorkspace } from '@/lib/contracts/session';
import { optionsOf } from './queries';

/** The slug of the workspace that the address names. */
export function useWorkspaceSlug(): string {
  return String(useParams().workspace);
}

/** The workspace of the address, filled by its layout. */
export function useWorkspace() {
  return useSuspenseQuery(optionsOf(showWorkspace, { params: { workspace: useWorkspaceSlug() } })).data;
}

/** Whether the caller's role includes an action; the server decides again. */
export function useMay(action: Action): boolean {
  return useWorkspace().actions.includes(action);
}

/** The workspace's parties by id, for names and marks. */
export function useParties() {
  const { parties } = useWorkspace();
  return new Map(parties.map((party) => [party.id, party]));
}
