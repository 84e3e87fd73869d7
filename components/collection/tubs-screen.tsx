'use client';

import { useState, type FormEvent } from 'react';
import { toast } from 'sonner';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Panel } from '@/components/ui/panel';
import { PlainTable } from '@/components/ui/plain-table';
import { Select } from '@/components/ui/select';
import { Skeleton } from '@/components/ui/skeleton';
import { TextInput } from '@/components/ui/text-input';
import { useCreateTub, useTubs } from '@/lib/client/collection';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import { tubPurpose } from '@/lib/contracts/tub';

const purposes: Record<(typeof tubPurpose.options)[number], string> = {
  adult: 'Adults',
  grower: 'Growing on',
  hatchling: 'Hatchlings',
  incubator: 'Incubator',
  quarantine: 'Quarantine',
};

/** The places that animals live in, by room and rack. */
export function TubsScreen() {
  const { slug } = useWorkspace();
  const mayEdit = useMay('tub.edit');
  const query = useTubs();
  const [adds, setAdds] = useState(false);
  const tubs = query.data?.tubs ?? [];
  const racks = [...new Set(tubs.map(({ room, rack }) => `${room} · ${rack}`))];
  return (
    <>
      <PageHeader
        title="Tubs"
        back={{ href: `/${slug}/collection`, label: 'Collection' }}
        meta={
          query.data ? `${tubs.length} in ${racks.length} ${racks.length === 1 ? 'rack' : 'racks'}` : null
        }
        actions={
          mayEdit ? (
            <Button tone="primary" onClick={() => setAdds(true)}>
              Add a tub
            </Button>
          ) : null
        }
      />
      <PageBody className="max-w-5xl">
        {query.isPending ? <Skeleton className="h-64 w-full" /> : null}
        {query.isError ? (
          <ErrorState onRetry={() => void query.refetch()}>{query.error.problem?.detail}</ErrorState>
        ) : null}
        {query.data && tubs.length === 0 ? (
          <EmptyState
            title="No tubs yet"
            action={mayEdit ? <Button onClick={() => setAdds(true)}>Add the first tub</Button> : null}
          >
            A tub is a place in a rack with a label. Animals get one in their record, or many at once from the
            list.
          </EmptyState>
        ) : null}
        {racks.map((rack) => (
          <Panel key={rack} title={rack}>
            <PlainTable
              label={`Tubs of ${rack}`}
              rows={tubs.filter((tub) => `${tub.room} · ${tub.rack}` === rack)}
              rowKey={(tub) => tub.id}
              columns={[
                { id: 'label', header: 'Tub', mono: true, cell: (tub) => tub.label },
                {
                  id: 'place',
                  header: 'Row, column',
                  mono: true,
                  cell: (tub) => `${tub.rowNumber}, ${tub.columnNumber}`,
                },
                { id: 'purpose', header: 'For', cell: (tub) => purposes[tub.purpose] },
                { id: 'animals', header: 'Animals', align: 'end', cell: (tub) => tub.animals || '–' },
              ]}
            />
          </Panel>
        ))}
      </PageBody>
      {adds ? <TubDialog start={tubs.at(-1)} onClose={() => setAdds(false)} /> : null}
    </>
  );
}

function TubDialog({
  start,
  onClose,
}: {
  start?: { room: string; rack: string; rowNumber: number; columnNumber: number };
  onClose: () => void;
}) {
  const { slug } = useWorkspace();
  const create = useCreateTub();
  const [values, setValues] = useState({
    room: start?.room ?? '',
    rack: start?.rack ?? '',
    label: '',
    rowNumber: String(start?.rowNumber ?? 1),
    columnNumber: String((start?.columnNumber ?? 0) + 1),
    purpose: 'adult',
  });
  const field = (name: keyof typeof values) => ({
    value: values[name],
    onChange: (event: { target: { value: string } }) => setValues({ ...values, [name]: event.target.value }),
  });
  const wrong = (name: keyof typeof values) => create.error?.messageFor(name);
  const save = (event: FormEvent) => {
    event.preventDefault();
    if (create.isPending) return;
    const body = {
      ...values,
      rowNumber: Number(values.rowNumber),
      columnNumber: Number(values.columnNumber),
      purpose: tubPurpose.catch('adult').parse(values.purpose),
    };
    create.mutate(
      { params: { workspace: slug }, body },
      {
        onSuccess: () => {
          toast.success(`Tub ${values.label} added`);
          onClose();
        },
      },
    );
  };
  return (
    <Dialog
      open
      size="sm"
      title="Add a tub"
      onOpenChange={(open) => (open ? undefined : onClose())}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button form="tub" type="submit" tone="primary" busy={create.isPending}>
            Add
          </Button>
        </>
      }
    >
      <form id="tub" onSubmit={save} className="grid grid-cols-2 gap-4">
        {create.error && create.error.problem.errors.length === 0 ? (
          <div className="col-span-2">
            <FormErrorSummary message={create.error.problem.detail} />
          </div>
        ) : null}
        <Field label="Room" error={wrong('room')}>
          <TextInput {...field('room')} />
        </Field>
        <Field label="Rack" error={wrong('rack')}>
          <TextInput {...field('rack')} />
        </Field>
        <Field label="Label" error={wrong('label')}>
          <TextInput mono autoFocus {...field('label')} />
        </Field>
        <Field label="For" error={wrong('purpose')}>
          <Select
            {...field('purpose')}
            options={tubPurpose.options.map((value) => ({ value, label: purposes[value] }))}
          />
        </Field>
        <Field label="Row" error={wrong('rowNumber')}>
          <TextInput mono inputMode="numeric" {...field('rowNumber')} />
        </Field>
        <Field label="Column" error={wrong('columnNumber')}>
          <TextInput mono inputMode="numeric" {...field('columnNumber')} />
        </Field>
      </form>
    </Dialog>
  );
}
