'use client';

import { useState, type FormEvent } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { DateInput } from '@/components/ui/date-input';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { MoneyInput } from '@/components/ui/money-input';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { useAnimal, useRecordOwnership } from '@/lib/client/collection';
import { useWorkspace } from '@/lib/client/workspace';
import { chosenReason } from '@/lib/contracts/animal-ownership';
import type { AnimalRecord } from '@/lib/contracts/animal-record';
import { exponentOf } from '@/lib/money/minor-units';
import { PartsFields, partsOf, type PartLine } from './parts-fields';
import { reasonWords } from './words';

type Reason = (typeof chosenReason.options)[number];

/** Parts change hands from a day on: a buy-in, a transfer, a gift. */
export function OwnershipDialog({ animal, onClose }: { animal: AnimalRecord; onClose: () => void }) {
  const workspace = useWorkspace();
  const refresh = useAnimal(animal.id).refetch;
  const record = useRecordOwnership();
  // What the person saw when the form was opened; a later change by somebody else makes the save fail.
  const [seen, setSeen] = useState(() => animal.ownership.find((set) => set.untilDay === null) ?? null);
  const [lines, setLines] = useState<PartLine[]>(
    () =>
      seen?.parts.map(({ partyId, parts }) => ({ partyId, parts: String(parts) })) ?? [
        { partyId: '', parts: '1' },
      ],
  );
  const [reason, setReason] = useState<Reason>('transfer');
  const [fromDay, setFromDay] = useState(workspace.today);
  const [price, setPrice] = useState<number | null>(null);
  const [note, setNote] = useState('');
  const parties = [
    ...new Map([...animal.parties, ...workspace.parties].map((party) => [party.id, party])).values(),
  ];
  const isStale = record.error?.problem.type === '/problems/stale';
  const messageFor = (field: string) => record.error?.messageFor(field);
  const named = record.error?.problem.errors.length ?? 0;

  const save = (event: FormEvent) => {
    event.preventDefault();
    if (record.isPending) return;
    record.mutate(
      {
        params: { workspace: workspace.slug, animal: animal.id },
        body: { fromDay, reason, parts: partsOf(lines), price, note, seen: seen?.id ?? null },
      },
      {
        onSuccess: () => {
          toast.success(`Owners of ${animal.code} recorded`);
          onClose();
        },
      },
    );
  };

  const lookAgain = async () => {
    const now = (await refresh()).data?.ownership.find((set) => set.untilDay === null) ?? null;
    setSeen(now);
    setLines(now?.parts.map(({ partyId, parts }) => ({ partyId, parts: String(parts) })) ?? lines);
    record.reset();
  };

  return (
    <Dialog
      open
      onOpenChange={(open) => (open ? undefined : onClose())}
      title={`Owners of ${animal.code}`}
      description="From the chosen day on these parts hold. What held before stays in the history; young that are already there keep their own owners."
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button form="ownership" type="submit" tone="primary" busy={record.isPending}>
            Record
          </Button>
        </>
      }
    >
      <form id="ownership" onSubmit={save} className="flex flex-col gap-4">
        {record.error && (isStale || named === 0) ? (
          <div className="flex flex-col items-start gap-2">
            <FormErrorSummary message={record.error.problem.detail} />
            {isStale ? (
              <Button size="sm" onClick={() => void lookAgain()}>
                Look at the parts as they are now
              </Button>
            ) : null}
          </div>
        ) : null}
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Why" error={messageFor('reason')}>
            <Select
              value={reason}
              onChange={(event) => setReason(event.target.value as Reason)}
              options={chosenReason.options.map((value) => ({ value, label: reasonWords[value] }))}
            />
          </Field>
          <Field label="From" error={messageFor('fromDay')}>
            <DateInput
              value={fromDay}
              max={workspace.today}
              onChange={(event) => setFromDay(event.target.value)}
            />
          </Field>
        </div>
        <PartsFields
          field="parts"
          lines={lines}
          onChange={setLines}
          parties={parties}
          messageFor={messageFor}
        />
        {reason === 'gift' ? null : (
          <Field
            label="Price"
            optional
            hint="For the record only; nothing is posted to the ledger."
            error={messageFor('price')}
          >
            <MoneyInput
              currency={workspace.currency}
              exponent={exponentOf(workspace.currency)}
              value={price}
              onChange={setPrice}
            />
          </Field>
        )}
        <Field label="Note" optional error={messageFor('note')}>
          <Textarea rows={2} value={note} onChange={(event) => setNote(event.target.value)} />
        </Field>
      </form>
    </Dialog>
  );
}
