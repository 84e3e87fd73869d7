'use client';

import { Plus, X } from 'lucide-react';
import { ShareStrip } from '@/components/drawings/share-strip';
import { Button } from '@/components/ui/button';
import { IconButton } from '@/components/ui/icon-button';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import type { PartyId } from '@/lib/contracts/ids';
import { useShares } from './shares-of';

export interface PartLine {
  partyId: string;
  parts: string;
}

/** Lines of parts as they go over the wire; what is no whole number goes as 0 and is refused there. */
export const partsOf = (lines: readonly PartLine[]) =>
  lines
    .filter(({ partyId }) => partyId)
    .map(({ partyId, parts }) => ({
      partyId: partyId as PartyId,
      parts: /^\d+$/.test(parts.trim()) ? Number(parts) : 0,
    }));

/** Who holds how many parts, drawn while it is typed. */
export function PartsFields({
  lines,
  onChange,
  parties,
  messageFor,
  field,
}: {
  lines: readonly PartLine[];
  onChange: (lines: PartLine[]) => void;
  parties: readonly { id: PartyId; name: string; mark: number }[];
  messageFor: (field: string) => string | undefined;
  /** Name of the list in the request, for its errors. */
  field: string;
}) {
  const shares = useShares(parties);
  const set = (index: number, change: Partial<PartLine>) =>
    onChange(lines.map((line, at) => (at === index ? { ...line, ...change } : line)));
  const valid = partsOf(lines).filter(({ parts }) => parts > 0);
  const messages = [
    messageFor(field),
    ...lines.flatMap((_, index) => [
      messageFor(`${field}.${index}.partyId`),
      messageFor(`${field}.${index}.parts`),
    ]),
  ].filter(Boolean);
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-1 text-sm font-semibold">Owners and their parts</legend>
      <ShareStrip shares={shares(valid)} size="md" labels="parts" label="Owned by" />
      {lines.map((line, index) => (
        <div key={index} className="grid grid-cols-[minmax(0,1fr)_5rem_auto] items-center gap-2">
          <Select
            aria-label={`Owner ${index + 1}`}
            placeholder="Choose …"
            value={line.partyId}
            onChange={(event) => set(index, { partyId: event.target.value })}
            options={parties.map(({ id, name }) => ({ value: id, label: name }))}
          />
          <TextInput
            aria-label={`Parts of owner ${index + 1}`}
            mono
            inputMode="numeric"
            value={line.parts}
            onChange={(event) => set(index, { parts: event.target.value })}
          />
          <IconButton
            label={`Remove owner ${index + 1}`}
            disabled={lines.length < 2}
            onClick={() => onChange(lines.filter((_, at) => at !== index))}
          >
            <X aria-hidden />
          </IconButton>
        </div>
      ))}
      {messages.map((message) => (
        <p key={message} className="text-sm font-medium text-alarm">
          {message}
        </p>
      ))}
      <div>
        <Button
          size="sm"
          icon={<Plus aria-hidden />}
          onClick={() => onChange([...lines, { partyId: '', parts: '1' }])}
        >
          Another owner
        </Button>
      </div>
    </fieldset>
  );
}
