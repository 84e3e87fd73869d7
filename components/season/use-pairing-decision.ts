'use client';

import { toast } from 'sonner';
import { useDecidePairing } from '@/lib/client/season';
import { useWorkspaceSlug } from '@/lib/client/workspace';
import type { PairingDetail } from '@/lib/contracts/pairing';
import type { Answer } from './decision-buttons';

/** Sends the caller's answer to the version in sight. */
export function usePairingDecision(pairing: PairingDetail | undefined) {
  const workspace = useWorkspaceSlug();
  const decide = useDecidePairing();
  const answer = ({ decision, comment }: Answer, done: () => void) => {
    const version = pairing?.versions[0];
    if (!pairing || !version) return;
    decide.mutate(
      { params: { workspace, pairing: pairing.id }, body: { versionId: version.id, decision, comment } },
      {
        onSuccess: ({ status, agreed, of }) => {
          done();
          toast.success(
            status === 'agreed'
              ? 'Agreed by all: the pairing is locked.'
              : decision === 'agreed'
                ? `${agreed} of ${of} agreed.`
                : 'The others are told what you ask for.',
          );
        },
      },
    );
  };
  return { answer, busy: decide.isPending, error: decide.error };
}
