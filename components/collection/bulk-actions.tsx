'use client';

import { ChevronDown, Download } from 'lucide-react';
import { useState } from 'react';
import { toast } from 'sonner';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { DropdownMenu, MenuItem } from '@/components/ui/dropdown-menu';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Select } from '@/components/ui/select';
import { useChangeAnimals, useFileAddresses, useTubs } from '@/lib/client/collection';
import { useMay, useWorkspace, useWorkspaceSlug } from '@/lib/client/workspace';
import { animalStatus } from '@/lib/contracts/animal';
import type { changeAnimals } from '@/lib/contracts/animal-list';
import type { AnimalId } from '@/lib/contracts/ids';
import { statusWords } from './words';

type Change = z.input<typeof changeAnimals.body>['change'];
type Kind = Change['kind'];

const titles: Record<Kind, string> = {
  status: 'Set the status',
  tub: 'Set the place',
  project: 'Add to a project',
};

/** What can be done with the ticked rows: place, status, project, export. */
export function BulkActions({ ids, onDone }: { ids: string[]; onDone: () => void }) {
  const [kind, setKind] = useState<Kind | null>(null);
  const mayEdit = useMay('animal.edit');
  const mayPlace = useMay('tub.see');
  const mayAdd = useMay('project.edit');
  const { csv } = useFileAddresses();
  return (
    <div className="flex flex-wrap items-center gap-2">
      <span className="text-sm font-semibold" aria-live="polite">
        {ids.length} ticked
      </span>
      {mayEdit ? (
        <DropdownMenu
          align="start"
          label="Change the ticked animals"
          trigger={
            <Button size="sm">
              Change <ChevronDown aria-hidden />
            </Button>
          }
        >
          <MenuItem onSelect={() => setKind('status')}>Set the status</MenuItem>
          {mayPlace ? <MenuItem onSelect={() => setKind('tub')}>Set the place</MenuItem> : null}
          {mayAdd ? <MenuItem onSelect={() => setKind('project')}>Add to a project</MenuItem> : null}
        </DropdownMenu>
      ) : null}
      <Button asChild size="sm">
        <a href={csv({ ids: ids.join(','), sort: 'code' })}>
          <Download aria-hidden /> Export
        </a>
      </Button>
      <Button size="sm" tone="plain" onClick={onDone}>
        Untick all
      </Button>
      {kind ? (
        <ChangeDialog
          key={kind}
          kind={kind}
          ids={ids as AnimalId[]}
          onClose={() => setKind(null)}
          onDone={onDone}
        />
      ) : null}
    </div>
  );
}

function ChangeDialog({
  kind,
  ids,
  onClose,
  onDone,
}: {
  kind: Kind;
  ids: AnimalId[];
  onClose: () => void;
  onDone: () => void;
}) {
  const workspace = useWorkspaceSlug();
  const { projects } = useWorkspace();
  const tubs = useTubs(kind === 'tub').data?.tubs ?? [];
  const change = useChangeAnimals();
  const [value, setValue] = useState('');
  const options =
    kind === 'status'
      ? animalStatus.options.map((status) => ({ value: status, label: statusWords[status] }))
      : kind === 'tub'
        ? [
            { value: 'none', label: 'No place' },
            ...tubs.map(({ id, label, rack, room }) => ({ value: id, label: `${label} · ${rack}, ${room}` })),
          ]
        : projects.map(({ id, name }) => ({ value: id, label: name }));

  const save = () => {
    const made =
      kind === 'status'
        ? { kind, status: value }
        : kind === 'tub'
          ? { kind, tubId: value === 'none' ? null : value }
          : { kind, projectId: value };
    change.mutate(
      { params: { workspace }, body: { ids, change: made as Change } },
      {
        onSuccess: ({ changed }) => {
          toast.success(`${changed} ${changed === 1 ? 'animal' : 'animals'} changed`);
          onClose();
          onDone();
        },
      },
    );
  };

  return (
    <Dialog
      open
      size="sm"
      onOpenChange={(open) => (open ? undefined : onClose())}
      title={titles[kind]}
      description={`For ${ids.length} ${ids.length === 1 ? 'animal' : 'animals'}: all of them, or none if one can't be changed.`}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button tone="primary" busy={change.isPending} disabled={value === ''} onClick={save}>
            Save
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-3">
        <FormErrorSummary message={change.error?.problem.detail} />
        <Field label={kind === 'status' ? 'Status' : kind === 'tub' ? 'Place' : 'Project'}>
          <Select
            value={value}
            placeholder="Choose …"
            options={options}
            onChange={(event) => setValue(event.target.value)}
          />
        </Field>
      </div>
    </Dialog>
  );
}
