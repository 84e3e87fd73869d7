'use client';

import { Plus, X } from 'lucide-react';
import { useState, type FormEvent } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { IconButton } from '@/components/ui/icon-button';
import { Select } from '@/components/ui/select';
import { Sheet } from '@/components/ui/sheet';
import { TextInput } from '@/components/ui/text-input';
import { useCreateLocus, useEditLocus } from '@/lib/client/species';
import { useWorkspace } from '@/lib/client/workspace';
import { createLocus, type LocusEntry } from '@/lib/contracts/locus';
import type { SpeciesDetail } from '@/lib/contracts/species-catalogue';
import { definitionOf, genotypesOfValues, valuesOfLocus, type LocusFormValues } from './locus-form-values';

const dominances = ['recessive', 'dominant', 'incomplete dominant', 'codominant'] as const;
const certainties = {
  read: 'I have read it there',
  memory: 'from memory',
  'common practice': 'common practice, no source',
} as const;

/** A locus of one's own: alleles, what each genotype looks like, where it lies, what harms, and where that is known from. */
export function LocusForm({
  species,
  locus,
  onClose,
}: {
  species: SpeciesDetail;
  locus: LocusEntry | null;
  onClose: () => void;
}) {
  const { slug } = useWorkspace();
  const create = useCreateLocus();
  const edit = useEditLocus();
  const [values, setValues] = useState<LocusFormValues>(() => valuesOfLocus(locus));
  const [local, setLocal] = useState<{ field: string; message: string }[]>([]);
  const set = (change: Partial<LocusFormValues>) => setValues({ ...values, ...change });
  const saving = locus ? edit : create;
  const errors = local.length ? local : (saving.error?.problem.errors ?? []);
  const messageFor = (field: string) =>
    errors.find((error) => error.field === field || error.field.startsWith(`${field}.`))?.message;
  const sexChromosome = { XY: 'X', ZW: 'Z', TSD: null, unknown: null }[species.sexSystem];

  const save = (event: FormEvent) => {
    event.preventDefault();
    if (saving.isPending) return;
    const body = { name: values.name, definition: definitionOf(values) };
    const issues = createLocus.body.safeParse(body).error?.issues ?? [];
    setLocal(issues.map(({ path, message }) => ({ field: path.join('.'), message })));
    if (issues.length) return;
    const done = {
      onSuccess: () => {
        toast.success(`${values.name} saved`);
        onClose();
      },
    };
    if (locus)
      edit.mutate(
        { params: { workspace: slug, locus: locus.id }, body: { ...body, version: locus.version } },
        done,
      );
    else create.mutate({ params: { workspace: slug, species: species.id }, body }, done);
  };

  return (
    <Sheet
      open
      size="lg"
      title={locus ? `Edit ${locus.name}` : `A locus of ${species.name}`}
      description={
        locus?.recorded
          ? `Something is recorded of ${locus.recorded} animals here; it has to fit still.`
          : undefined
      }
      onOpenChange={(open) => (open ? undefined : onClose())}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button form="locus" type="submit" tone="primary" busy={saving.isPending}>
            Save the locus
          </Button>
        </>
      }
    >
      <form id="locus" onSubmit={save} className="flex flex-col gap-6" noValidate>
        <FormErrorSummary
          message={errors.length ? undefined : saving.error?.problem.detail}
          errors={errors.map(({ message }) => ({ message }))}
        />
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Name" error={messageFor('name')}>
            <TextInput value={values.name} onChange={(event) => set({ name: event.target.value })} />
          </Field>
          <Field label="Short sign" optional error={messageFor('definition.symbol')}>
            <TextInput mono value={values.symbol} onChange={(event) => set({ symbol: event.target.value })} />
          </Field>
          <Field label="Shows as" error={messageFor('definition.dominance')}>
            <Select
              value={values.dominance}
              onChange={(event) => set({ dominance: event.target.value as LocusFormValues['dominance'] })}
              options={dominances.map((value) => ({ value, label: value }))}
            />
          </Field>
          <Field label="Lies on" error={messageFor('definition.chromosome')}>
            <Select
              value={values.chromosome}
              onChange={(event) => set({ chromosome: event.target.value as LocusFormValues['chromosome'] })}
              options={[
                { value: 'autosomal', label: 'an autosome' },
                ...(sexChromosome
                  ? [{ value: sexChromosome, label: `the ${sexChromosome} chromosome` }]
                  : []),
              ]}
            />
          </Field>
        </div>

        <AlleleFields values={values} set={set} message={messageFor('definition.alleles')} />
        <GenotypeFields
          values={values}
          set={set}
          messages={['definition.phenotypes', 'definition.penetrance', 'definition.lethal']
            .map(messageFor)
            .filter((text) => text !== undefined)}
        />
        <WelfareFields values={values} set={set} message={messageFor('definition.welfare')} />

        <fieldset className="grid gap-4 sm:grid-cols-2">
          <legend className="mb-2 text-lg">Linkage</legend>
          <Field
            label="Group"
            optional
            hint="Loci of one group are inherited together."
            error={messageFor('definition.linkage')}
          >
            <TextInput
              value={values.linkageGroup}
              onChange={(event) => set({ linkageGroup: event.target.value })}
            />
          </Field>
          <Field label="Place" optional hint="In centimorgans from the start of the group.">
            <TextInput
              mono
              inputMode="decimal"
              suffix="cM"
              value={values.linkagePosition}
              onChange={(event) => set({ linkagePosition: event.target.value })}
            />
          </Field>
        </fieldset>
        <fieldset className="grid gap-4 sm:grid-cols-2">
          <legend className="mb-2 text-lg">Where this is known from</legend>
          <Field
            label="Source"
            hint='A citation, or "own observation".'
            error={messageFor('definition.source.citation')}
          >
            <TextInput value={values.citation} onChange={(event) => set({ citation: event.target.value })} />
          </Field>
          <Field label="How sure">
            <Select
              value={values.certainty}
              onChange={(event) => set({ certainty: event.target.value as LocusFormValues['certainty'] })}
              options={Object.entries(certainties).map(([value, label]) => ({ value, label }))}
            />
          </Field>
        </fieldset>
      </form>
    </Sheet>
  );
}

interface PartProps {
  values: LocusFormValues;
  set: (change: Partial<LocusFormValues>) => void;
}

function Wrong({ message }: { message: string | undefined }) {
  return message ? <p className="mt-1 text-sm font-medium text-alarm">{message}</p> : null;
}

function AlleleFields({ values, set, message }: PartProps & { message: string | undefined }) {
  const { alleles } = values;
  const change = (index: number, part: Partial<(typeof alleles)[number]>) =>
    set({ alleles: alleles.map((one, at) => (at === index ? { ...one, ...part } : one)) });
  return (
    <fieldset>
      <legend className="mb-2 text-lg">Alleles, the wild type first</legend>
      <div className="flex flex-col gap-2">
        {alleles.map((allele, index) => (
          <div key={index} className="grid grid-cols-[5rem_minmax(0,1fr)_auto] gap-2">
            <TextInput
              mono
              aria-label={`Sign of allele ${index + 1}`}
              value={allele.symbol}
              onChange={(event) => change(index, { symbol: event.target.value })}
            />
            <TextInput
              aria-label={`Name of allele ${index + 1}`}
              value={allele.name}
              onChange={(event) => change(index, { name: event.target.value })}
            />
            <IconButton
              label={`Remove allele ${index + 1}`}
              disabled={alleles.length < 3 || index === 0}
              onClick={() => set({ alleles: alleles.filter((_, at) => at !== index) })}
            >
              <X aria-hidden />
            </IconButton>
          </div>
        ))}
      </div>
      <Wrong message={message} />
      <Button
        size="sm"
        className="mt-2"
        icon={<Plus aria-hidden />}
        onClick={() => set({ alleles: [...alleles, { symbol: '', name: '' }] })}
      >
        Another allele
      </Button>
    </fieldset>
  );
}

function GenotypeFields({ values, set, messages }: PartProps & { messages: string[] }) {
  const empty = { look: '', penetrance: '', lethal: false };
  const change = (genotype: string, part: Partial<typeof empty>) =>
    set({
      genotypes: { ...values.genotypes, [genotype]: { ...empty, ...values.genotypes[genotype], ...part } },
    });
  return (
    <fieldset>
      <legend className="mb-1 text-lg">What each genotype looks like</legend>
      <p className="mb-2 text-sm text-ink-3">
        Left empty it looks normal. “Shows in” is the share in which it shows at all, such as 9/10; empty for
        all.
      </p>
      <div className="flex flex-col gap-2">
        {genotypesOfValues(values).map((genotype) => {
          const entry = values.genotypes[genotype] ?? empty;
          return (
            <div
              key={genotype}
              className="grid grid-cols-[4.5rem_minmax(0,1fr)_5.5rem] items-center gap-2 sm:grid-cols-[4.5rem_minmax(0,1fr)_6rem_9rem]"
            >
              <span className="font-mono font-semibold">{genotype}</span>
              <TextInput
                aria-label={`${genotype} looks`}
                placeholder="normal"
                value={entry.look}
                onChange={(event) => change(genotype, { look: event.target.value })}
              />
              <TextInput
                mono
                aria-label={`${genotype} shows in`}
                placeholder="all"
                value={entry.penetrance}
                onChange={(event) => change(genotype, { penetrance: event.target.value })}
              />
              <Checkbox
                label="dies in the egg"
                checked={entry.lethal}
                onChange={(event) => change(genotype, { lethal: event.target.checked })}
              />
            </div>
          );
        })}
      </div>
      {messages.map((message) => (
        <Wrong key={message} message={message} />
      ))}
    </fieldset>
  );
}

function WelfareFields({ values, set, message }: PartProps & { message: string | undefined }) {
  const { welfare } = values;
  const change = (index: number, part: Partial<(typeof welfare)[number]>) =>
    set({ welfare: welfare.map((one, at) => (at === index ? { ...one, ...part } : one)) });
  return (
    <fieldset>
      <legend className="mb-1 text-lg">Known harm</legend>
      <p className="mb-2 text-sm text-ink-3">
        Shown wherever a pairing could give it. A veterinarian decides about an animal that suffers.
      </p>
      <div className="flex flex-col gap-3">
        {welfare.map((note, index) => (
          <div key={index} className="grid grid-cols-[minmax(0,1fr)_auto] gap-2">
            <TextInput
              aria-label={`Harm ${index + 1}`}
              placeholder="What the harm is"
              value={note.text}
              onChange={(event) => change(index, { text: event.target.value })}
            />
            <IconButton
              label={`Remove harm ${index + 1}`}
              onClick={() => set({ welfare: welfare.filter((_, at) => at !== index) })}
            >
              <X aria-hidden />
            </IconButton>
            <TextInput
              aria-label={`Source of harm ${index + 1}`}
              placeholder="Where that is published"
              value={note.source}
              onChange={(event) => change(index, { source: event.target.value })}
            />
            <span />
            <TextInput
              mono
              aria-label={`Genotypes of harm ${index + 1}`}
              placeholder="Genotypes, such as s/s"
              value={note.genotypes}
              onChange={(event) => change(index, { genotypes: event.target.value })}
            />
          </div>
        ))}
      </div>
      <Wrong message={message} />
      <Button
        size="sm"
        className="mt-2"
        icon={<Plus aria-hidden />}
        onClick={() => set({ welfare: [...welfare, { text: '', source: '', genotypes: '' }] })}
      >
        Add a caution
      </Button>
    </fieldset>
  );
}
