'use client';

import { useState, type FormEvent } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Select } from '@/components/ui/select';
import { Sheet } from '@/components/ui/sheet';
import { TextInput } from '@/components/ui/text-input';
import { useCreateSpecies, useEditSpecies } from '@/lib/client/species';
import { useWorkspace } from '@/lib/client/workspace';
import { createSpecies, sexSystem, type SpeciesDetail } from '@/lib/contracts/species-catalogue';
import { profileOf, speciesFigures, valuesOfSpecies, type FigureName } from './species-form-values';

const systems = {
  XY: 'XY (males XY)',
  ZW: 'ZW (females ZW)',
  TSD: 'by temperature',
  unknown: 'not known',
} as const;

/** A species: its names, how its sex is decided, and what is usual for it, each with its source. */
export function SpeciesForm({
  species,
  onClose,
  onCreated,
}: {
  species: SpeciesDetail | null;
  onClose: () => void;
  onCreated?: (id: string) => void;
}) {
  const { slug } = useWorkspace();
  const create = useCreateSpecies();
  const edit = useEditSpecies();
  const [values, setValues] = useState(() => valuesOfSpecies(species));
  const [local, setLocal] = useState<{ field: string; message: string }[]>([]);
  const saving = species ? edit : create;
  const errors = local.length ? local : (saving.error?.problem.errors ?? []);
  const messageFor = (field: string) => errors.find((error) => error.field === field)?.message;
  const text = (name: 'name' | 'scientificName' | 'codePrefix' | 'source' | FigureName) => ({
    value: values[name],
    onChange: (event: { target: { value: string } }) => setValues({ ...values, [name]: event.target.value }),
  });

  const save = (event: FormEvent) => {
    event.preventDefault();
    if (saving.isPending) return;
    const { name, scientificName, codePrefix } = values;
    const body = {
      name,
      scientificName,
      codePrefix,
      sexSystem: values.sexSystem,
      profile: profileOf(values, species?.profile ?? null),
    };
    const issues = createSpecies.body.safeParse(body).error?.issues ?? [];
    setLocal(
      issues.map(({ path, message }) => ({
        field: path.join('.'),
        message: path[0] === 'profile' ? `${path.slice(1).join(' ')}: ${message}` : message,
      })),
    );
    if (issues.length) return;
    const done = (id?: string) => {
      toast.success(`${name} saved`);
      if (id) onCreated?.(id);
      onClose();
    };
    if (species)
      edit.mutate(
        { params: { workspace: slug, species: species.id }, body: { ...body, version: species.version } },
        { onSuccess: () => done() },
      );
    else create.mutate({ params: { workspace: slug }, body }, { onSuccess: ({ id }) => done(id) });
  };

  return (
    <Sheet
      open
      size="lg"
      title={species ? `Edit ${species.name}` : 'Add a species'}
      onOpenChange={(open) => (open ? undefined : onClose())}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button form="species" type="submit" tone="primary" busy={saving.isPending}>
            Save
          </Button>
        </>
      }
    >
      <form id="species" onSubmit={save} className="flex flex-col gap-5" noValidate>
        <FormErrorSummary
          message={errors.length ? undefined : saving.error?.problem.detail}
          errors={errors.map(({ message }) => ({ message }))}
        />
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Name" error={messageFor('name')}>
            <TextInput {...text('name')} />
          </Field>
          <Field label="Scientific name" optional error={messageFor('scientificName')}>
            <TextInput {...text('scientificName')} />
          </Field>
          <Field label="Sex is decided" error={messageFor('sexSystem')}>
            <Select
              value={values.sexSystem}
              onChange={(event) =>
                setValues({ ...values, sexSystem: sexSystem.catch('unknown').parse(event.target.value) })
              }
              options={sexSystem.options.map((value) => ({ value, label: systems[value] }))}
            />
          </Field>
          <Field label="Codes begin with" error={messageFor('codePrefix')}>
            <TextInput mono {...text('codePrefix')} />
          </Field>
        </div>
        <fieldset>
          <legend className="mb-1 text-lg">What is usual</legend>
          <p className="mb-3 text-sm text-ink-3">
            Forecasts start from these figures; what is logged here replaces them.
          </p>
          <div className="grid grid-cols-2 gap-3 sm:grid-cols-3">
            {speciesFigures.map(({ name, label, unit }) => (
              <Field key={name} label={label}>
                <TextInput mono inputMode="decimal" suffix={unit} {...text(name)} />
              </Field>
            ))}
          </div>
        </fieldset>
        <Field label="Where these figures are from" hint='A citation, or "common practice".'>
          <TextInput {...text('source')} />
        </Field>
      </form>
    </Sheet>
  );
}
