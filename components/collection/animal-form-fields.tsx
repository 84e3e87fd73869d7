'use client';

import { Plus, X } from 'lucide-react';
import { useWatch, type UseFormReturn } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { DateInput } from '@/components/ui/date-input';
import { Field } from '@/components/ui/field';
import { IconButton } from '@/components/ui/icon-button';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { Textarea } from '@/components/ui/textarea';
import { useProposedCode, useTubs } from '@/lib/client/collection';
import { useSpeciesList } from '@/lib/client/species';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import { animalStatus } from '@/lib/contracts/animal';
import type { SpeciesId } from '@/lib/contracts/ids';
import type { AnimalFormValues } from './animal-form-values';
import { LociFields } from './loci-fields';
import { ParentPicker } from './parent-picker';
import { PartsFields } from './parts-fields';
import { sexedByWords, statusWords } from './words';

/** Everything that a person can record of an animal, in the order in which they know it. */
export function AnimalFormFields({
  form,
  isNew,
  messageFor,
}: {
  form: UseFormReturn<AnimalFormValues>;
  isNew: boolean;
  messageFor: (field: string) => string | undefined;
}) {
  const { register, setValue, control } = form;
  const values = useWatch({ control }) as AnimalFormValues;
  const workspace = useWorkspace();
  const species = useSpeciesList().data?.species ?? [];
  const proposed = useProposedCode(isNew ? (values.speciesId as SpeciesId | '') : '').data?.code;
  const seesTubs = useMay('tub.see');
  const tubs = useTubs(seesTubs).data?.tubs ?? [];
  const mayAdd = useMay('project.edit');
  const set = <Name extends keyof AnimalFormValues>(name: Name, value: AnimalFormValues[Name]) =>
    setValue(name, value as never, { shouldDirty: true });

  return (
    <>
      <Panel title="What it is">
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Species" required error={messageFor('speciesId')}>
            <Select
              {...register('speciesId')}
              placeholder="Choose …"
              options={species.map(({ id, name }) => ({ value: id, label: name }))}
            />
          </Field>
          <Field
            label="Code"
            hint={isNew && proposed ? `Left empty, it becomes ${proposed}, the next free one.` : undefined}
            error={messageFor('code')}
          >
            <TextInput
              mono
              autoComplete="off"
              placeholder={isNew ? proposed : undefined}
              {...register('code')}
            />
          </Field>
          <Field label="Name" optional error={messageFor('name')}>
            <TextInput {...register('name')} />
          </Field>
          <div className="grid grid-cols-2 gap-3">
            <Field label="Sex" error={messageFor('sex')}>
              <Select
                {...register('sex')}
                options={[
                  { value: 'male', label: 'Male' },
                  { value: 'female', label: 'Female' },
                  { value: 'unknown', label: 'Unknown' },
                ]}
              />
            </Field>
            <Field label="Known by" optional error={messageFor('sexedBy')}>
              <Select
                {...register('sexedBy')}
                placeholder="–"
                options={Object.entries(sexedByWords).map(([value, label]) => ({ value, label }))}
              />
            </Field>
          </div>
          <div className="grid grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)] gap-3">
            <Field label="Hatched" optional error={messageFor('hatchedOn')}>
              <HatchedInput values={values} onChange={(day) => set('hatchedOn', day)} />
            </Field>
            <Field label="Known to the">
              <Select
                value={values.hatchedPrecision}
                onChange={(event) => {
                  const precision = event.target.value as AnimalFormValues['hatchedPrecision'];
                  set('hatchedPrecision', precision);
                  const length = { day: 10, month: 7, year: 4 }[precision];
                  set('hatchedOn', values.hatchedOn.length > length ? values.hatchedOn.slice(0, length) : '');
                }}
                options={[
                  { value: 'day', label: 'day' },
                  { value: 'month', label: 'month' },
                  { value: 'year', label: 'year' },
                ]}
              />
            </Field>
          </div>
          <Field label="Origin" error={messageFor('origin')}>
            <Select
              {...register('origin')}
              options={[
                { value: 'captive_bred', label: 'Captive-bred' },
                { value: 'wild_caught', label: 'Wild-caught' },
                { value: 'unknown', label: 'Unknown' },
              ]}
            />
          </Field>
        </div>
        {values.origin === 'wild_caught' ? (
          <Notice tone="straw" className="mt-4">
            Taking, importing and selling wild-caught animals is regulated. Keep the permits with its papers
            and ask the authority in charge.
          </Notice>
        ) : null}
      </Panel>

      <Panel
        title="What it looks like and carries"
        aside="A locus without a line counts as normal, or follows from the parents."
      >
        <LociFields
          lines={values.loci}
          onChange={(lines) => set('loci', lines)}
          speciesId={values.speciesId}
          sex={values.sex}
          messageFor={messageFor}
        />
      </Panel>

      <Panel title="Parents">
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Sire" optional error={messageFor('sireId')}>
            <ParentPicker
              as="sire"
              speciesId={values.speciesId}
              value={values.sire}
              onChange={(choice) => set('sire', choice)}
            />
          </Field>
          <Field label="Dam" optional error={messageFor('damId')}>
            <ParentPicker
              as="dam"
              speciesId={values.speciesId}
              value={values.dam}
              onChange={(choice) => set('dam', choice)}
            />
          </Field>
        </div>
        {values.sire === null ? (
          <div className="mt-4 flex flex-col gap-2">
            {values.possibleSires.length ? (
              <p className="text-sm font-semibold">Possible sires, with their odds against each other</p>
            ) : null}
            {values.possibleSires.map((line, index) => (
              <div key={index} className="grid grid-cols-[minmax(0,1fr)_5rem_auto] items-center gap-2">
                <ParentPicker
                  as="sire"
                  label={`Possible sire ${index + 1}`}
                  speciesId={values.speciesId}
                  value={line.choice}
                  onChange={(choice) =>
                    set(
                      'possibleSires',
                      values.possibleSires.map((one, at) => (at === index ? { ...one, choice } : one)),
                    )
                  }
                />
                <TextInput
                  mono
                  inputMode="numeric"
                  aria-label={`Odds of possible sire ${index + 1}`}
                  value={line.weight}
                  onChange={(event) =>
                    set(
                      'possibleSires',
                      values.possibleSires.map((one, at) =>
                        at === index ? { ...one, weight: event.target.value } : one,
                      ),
                    )
                  }
                />
                <IconButton
                  label={`Remove possible sire ${index + 1}`}
                  onClick={() =>
                    set(
                      'possibleSires',
                      values.possibleSires.filter((_, at) => at !== index),
                    )
                  }
                >
                  <X aria-hidden />
                </IconButton>
                {['animalId', 'weight']
                  .map((part) => messageFor(`possibleSires.${index}.${part}`))
                  .filter(Boolean)
                  .map((message) => (
                    <p key={message} className="col-span-full text-sm font-medium text-alarm">
                      {message}
                    </p>
                  ))}
              </div>
            ))}
            {messageFor('possibleSires') ? (
              <p className="text-sm font-medium text-alarm">{messageFor('possibleSires')}</p>
            ) : null}
            <div>
              <Button
                size="sm"
                icon={<Plus aria-hidden />}
                onClick={() => {
                  const line = { choice: null, weight: '1' };
                  set('possibleSires', [
                    ...values.possibleSires,
                    ...(values.possibleSires.length ? [line] : [line, line]),
                  ]);
                }}
              >
                {values.possibleSires.length ? 'Another possible sire' : 'It was one of several sires'}
              </Button>
            </div>
          </div>
        ) : null}
      </Panel>

      {isNew ? (
        <Panel title="Whose it is">
          <div className="flex flex-col gap-4">
            <PartsFields
              field="owners"
              lines={values.owners}
              onChange={(lines) => set('owners', lines)}
              parties={workspace.parties}
              messageFor={messageFor}
            />
            <div className="grid gap-4 sm:grid-cols-2">
              <Field
                label="Held from"
                optional
                hint="Its hatch date or today when left empty."
                error={messageFor('ownedFrom')}
              >
                <DateInput max={workspace.today} {...register('ownedFrom')} />
              </Field>
              {mayAdd && workspace.projects.length ? (
                <Field label="Project" optional error={messageFor('projectId')}>
                  <Select
                    {...register('projectId')}
                    placeholder="None"
                    options={workspace.projects.map(({ id, name }) => ({ value: id, label: name }))}
                  />
                </Field>
              ) : null}
            </div>
          </div>
        </Panel>
      ) : null}

      <Panel title="Where it is">
        <div className="grid gap-4 sm:grid-cols-3">
          <Field label="Status" error={messageFor('status')}>
            <Select
              {...register('status')}
              options={animalStatus.options.map((value) => ({ value, label: statusWords[value] }))}
            />
          </Field>
          <Field label="Since" optional error={messageFor('statusSince')}>
            <DateInput max={workspace.today} {...register('statusSince')} />
          </Field>
          {seesTubs ? (
            <Field label="Place" optional error={messageFor('tubId')}>
              <Select
                {...register('tubId')}
                placeholder="None"
                options={tubs.map(({ id, label, rack, room }) => ({
                  value: id,
                  label: `${label} · ${rack}, ${room}`,
                }))}
              />
            </Field>
          ) : null}
        </div>
        <div className="mt-4 flex flex-col gap-4">
          <Checkbox label="Held back: not for sale" {...register('heldBack')} />
          <Field label="Notes" optional error={messageFor('notes')}>
            <Textarea rows={4} {...register('notes')} />
          </Field>
        </div>
      </Panel>
    </>
  );
}

/** A day, a month or a year, as exactly as it is known. */
function HatchedInput({ values, onChange }: { values: AnimalFormValues; onChange: (day: string) => void }) {
  const { today } = useWorkspace();
  const { hatchedPrecision, hatchedOn } = values;
  if (hatchedPrecision === 'day')
    return <DateInput value={hatchedOn} max={today} onChange={(event) => onChange(event.target.value)} />;
  const isMonth = hatchedPrecision === 'month';
  return (
    <TextInput
      mono
      inputMode={isMonth ? undefined : 'numeric'}
      type={isMonth ? 'month' : 'text'}
      placeholder={isMonth ? '2022-07' : '2022'}
      maxLength={isMonth ? 7 : 4}
      value={hatchedOn}
      onChange={(event) => onChange(event.target.value)}
    />
  );
}
