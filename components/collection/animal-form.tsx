'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { useForm } from 'react-hook-form';
import { toast } from 'sonner';
import type { z } from 'zod';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Button } from '@/components/ui/button';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { useAnimal, useCreateAnimal, useEditAnimal } from '@/lib/client/collection';
import { useSpeciesList } from '@/lib/client/species';
import { useWorkspace } from '@/lib/client/workspace';
import { createAnimal, editAnimal, type AnimalRecord } from '@/lib/contracts/animal-record';
import type { AnimalId } from '@/lib/contracts/ids';
import { AnimalFormFields } from './animal-form-fields';
import {
  changedFields,
  createBody,
  editBody,
  emptyValues,
  valuesOf,
  type AnimalFormValues,
} from './animal-form-values';

/** The form for a new animal. */
export function NewAnimalScreen() {
  const { slug, me } = useWorkspace();
  const species = useSpeciesList().data?.species ?? [];
  const router = useRouter();
  const create = useCreateAnimal();
  const [initial] = useState(() =>
    emptyValues(me.partyId, species.length === 1 ? (species[0]?.id ?? '') : ''),
  );
  return (
    <>
      <PageHeader title="Add an animal" back={{ href: `/${slug}/collection`, label: 'Collection' }} />
      <PageBody className="max-w-4xl">
        <AnimalForm
          initial={initial}
          isNew
          busy={create.isPending}
          problem={create.error?.problem ?? null}
          check={(values) => createAnimal.body.safeParse(createBody(values)).error ?? null}
          onSave={(values, done) =>
            create.mutate(
              { params: { workspace: slug }, body: createBody(values) },
              {
                onSuccess: ({ id, code }) => {
                  done();
                  toast.success(`${code} added`);
                  router.push(`/${slug}/collection/${id}`);
                },
              },
            )
          }
          onCancel={() => router.push(`/${slug}/collection`)}
        />
      </PageBody>
    </>
  );
}

/** The form for an animal that is there. */
export function EditAnimalScreen({ id }: { id: AnimalId }) {
  const { slug } = useWorkspace();
  const query = useAnimal(id);
  // What the person began with; a refetch in the background changes nothing under their hands.
  const [base, setBase] = useState<AnimalRecord | null>(query.data ?? null);
  if (!base && query.data) setBase(query.data);
  if (!base) return null;
  return (
    <>
      <PageHeader
        title={`Edit ${base.code}`}
        back={{ href: `/${slug}/collection/${id}`, label: base.code }}
      />
      <PageBody className="max-w-4xl">
        <EditAnimal base={base} onRebase={setBase} />
      </PageBody>
    </>
  );
}

function EditAnimal({ base, onRebase }: { base: AnimalRecord; onRebase: (record: AnimalRecord) => void }) {
  const { slug } = useWorkspace();
  const router = useRouter();
  const edit = useEditAnimal();
  const query = useAnimal(base.id);
  const [initial] = useState(() => valuesOf(base));
  const before = valuesOf(base);
  const [theirs, setTheirs] = useState<AnimalRecord | null>(null);
  const isStale = edit.error?.problem.type === '/problems/stale';

  const save = (values: AnimalFormValues, done: () => void) =>
    edit.mutate(
      { params: { workspace: slug, animal: base.id }, body: editBody(values, before, base.version) },
      {
        onSuccess: () => {
          done();
          toast.success(`${values.code} saved`);
          router.push(`/${slug}/collection/${base.id}`);
        },
        onError: (error) => {
          if (error.problem.type === '/problems/stale')
            void query.refetch().then(({ data }) => setTheirs(data ?? null));
        },
      },
    );

  return (
    <>
      {isStale && theirs ? (
        <Notice
          tone="straw"
          title="Somebody saved this animal while you were editing"
          action={
            <div className="flex flex-wrap gap-2">
              <Button
                size="sm"
                onClick={() => {
                  onRebase(theirs);
                  setTheirs(null);
                  edit.reset();
                }}
              >
                Keep what I typed and look it over
              </Button>
              <Button size="sm" tone="plain" onClick={() => window.location.reload()}>
                Throw mine away
              </Button>
            </div>
          }
        >
          <p>Nothing of yours was saved, and nothing of yours is lost. Changed in the meantime:</p>
          <ul className="mt-1 list-disc pl-5">
            {changedFields(before, valuesOf(theirs)).map((change) => (
              <li key={change.label}>
                {change.label}: <s>{change.before}</s> → <strong>{change.now}</strong>
              </li>
            ))}
          </ul>
        </Notice>
      ) : null}
      <AnimalForm
        initial={initial}
        isNew={false}
        busy={edit.isPending}
        problem={isStale ? null : (edit.error?.problem ?? null)}
        check={(values) => editAnimal.body.safeParse(editBody(values, before, base.version)).error ?? null}
        onSave={save}
        onCancel={() => router.push(`/${slug}/collection/${base.id}`)}
      />
    </>
  );
}

interface AnimalFormProps {
  initial: AnimalFormValues;
  isNew: boolean;
  busy: boolean;
  problem: { detail: string; errors: { field: string; message: string }[] } | null;
  check: (values: AnimalFormValues) => z.ZodError | null;
  onSave: (values: AnimalFormValues, done: () => void) => void;
  onCancel: () => void;
}

function AnimalForm({ initial, isNew, busy, problem, check, onSave, onCancel }: AnimalFormProps) {
  const form = useForm<AnimalFormValues>({ defaultValues: initial });
  const [local, setLocal] = useState<Record<string, string>>({});
  const { isDirty } = form.formState;
  const [isSaved, setSaved] = useState(false);

  useEffect(() => {
    if (!isDirty || isSaved) return undefined;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isDirty, isSaved]);

  const errors = Object.keys(local).length
    ? Object.entries(local).map(([field, message]) => ({ field, message }))
    : (problem?.errors ?? []);
  const messageFor = (field: string) => errors.find((error) => error.field === field)?.message;

  const submit = form.handleSubmit((values) => {
    if (busy) return;
    const issues = check(values)?.issues ?? [];
    setLocal(Object.fromEntries(issues.map((issue) => [issue.path.join('.'), plainMessage(issue)])));
    if (issues.length === 0) onSave(values, () => setSaved(true));
  });

  return (
    <form onSubmit={(event) => void submit(event)} className="flex flex-col gap-5" noValidate>
      <FormErrorSummary
        message={errors.length ? undefined : problem?.detail}
        errors={errors.map(({ message }) => ({ message }))}
      />
      <AnimalFormFields form={form} isNew={isNew} messageFor={messageFor} />
      <Panel>
        <div className="flex flex-wrap justify-end gap-2">
          <Button
            onClick={() =>
              !isDirty || window.confirm('Leave without saving what you typed?') ? onCancel() : undefined
            }
          >
            Cancel
          </Button>
          <Button type="submit" tone="primary" busy={busy}>
            {isNew ? 'Add the animal' : 'Save'}
          </Button>
        </div>
      </Panel>
    </form>
  );
}

/** An id that is missing reads as a choice that was not made. */
function plainMessage(issue: { code: string; message: string; path: PropertyKey[] }): string {
  if (issue.code === 'invalid_format' && issue.path.some((part) => String(part).endsWith('Id')))
    return 'Choose one.';
  if (issue.code === 'invalid_format') return 'Write a whole date.';
  return issue.message;
}
