'use client';

import { useState } from 'react';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { TextInput } from '@/components/ui/text-input';
import { useWithdrawPairing } from '@/lib/client/season';
import { useWorkspaceSlug } from '@/lib/client/workspace';
import type { PairingDetail } from '@/lib/contracts/pairing';

/** Takes back a proposed pairing, after a question. */
export function WithdrawButton({ pairing }: { pairing: PairingDetail }) {
  const workspace = useWorkspaceSlug();
  const withdraw = useWithdrawPairing();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  return (
    <>
      <Button tone="quiet" size="sm" className="self-start" onClick={() => setOpen(true)}>
        Withdraw this pairing
      </Button>
      <ConfirmDialog
        open={open}
        onOpenChange={setOpen}
        title="Withdraw this pairing?"
        description="It can’t be agreed any more. What was proposed and answered stays on record, and the two can be proposed again."
        confirmLabel="Withdraw"
        busy={withdraw.isPending}
        onConfirm={() =>
          withdraw.mutate(
            { params: { workspace, pairing: pairing.id }, body: { version: pairing.version, reason } },
            { onSuccess: () => setOpen(false) },
          )
        }
      >
        {withdraw.isError ? (
          <FormErrorSummary title="This was not withdrawn" message={withdraw.error.problem.detail} />
        ) : null}
        <Field label="Reason" optional>
          <TextInput value={reason} maxLength={500} onChange={(event) => setReason(event.target.value)} />
        </Field>
      </ConfirmDialog>
    </>
  );
}
