'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { ArrowDown, ArrowUp, X } from 'lucide-react';
import { useRouter } from 'next/navigation';
import { useEffect } from 'react';
import { useController, useForm, useWatch, type Control } from 'react-hook-form';
import { toast } from 'sonner';
import { z } from 'zod';
import { PartnerName } from '@/components/drawings/partner-name';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { DateInput } from '@/components/ui/date-input';
import { ErrorState } from '@/components/ui/error-state';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { IconButton } from '@/components/ui/icon-button';
import { Select } from '@/components/ui/select';
import { SkeletonText } from '@/components/ui/skeleton';
import { TextInput } from '@/components/ui/text-input';
import { Textarea } from '@/components/ui/textarea';
import { useAnimals } from '@/lib/client/collection';
import { useCreateProject, useEditProject, useProject } from '@/lib/client/projects';
import type { RequestError } from '@/lib/client/request';
import { useSpeciesList } from '@/lib/client/species';
import { useParties, useWorkspace } from '@/lib/client/workspace';
import type { AnimalId, PartyId, ProjectId, SpeciesId } from '@/lib/contracts/ids';
import { createProject, type ProjectDetail } from '@/lib/contracts/project';

const formSchema = z.object({
  name: createProject.body.shape.name,
  purpose: z.string().max(2000),
  speciesId: z.string().min(1, 'Choose a species.'),
  parties: z.array(z.string()).min(2, 'A joint project has at least two parties.'),
  animals: z.array(z.string()),
  endedOn: z.string(),
});
type FormValues = z.infer<typeof formSchema>;

/** The form holds plain text; what is chosen in it comes from lists of real ids. */
const idsOf = ({ parties, animals }: Pick<FormValues, 'parties' | 'animals'>) => ({
  parties: parties as PartyId[],
  animals: animals as AnimalId[],
});

/** Starts a joint project. */
export function NewProjectScreen() {
  const { slug, me } = useWorkspace();
  const router = useRouter();
  const create = useCreateProject();
  const values: FormValues = {
    name: '',
    purpose: '',
    speciesId: '',
    parties: me.partyId ? [me.partyId] : [],
    animals: [],
    endedOn: '',
  };
  return (
    <>
      <PageHeader
        title="Start a joint project"
        back={{ href: `/${slug}/projects`, label: 'Joint projects' }}
      />
      <PageBody>
        <ProjectForm
          values={values}
          submitLabel="Start the project"
          busy={create.isPending}
          error={create.error}
          onSubmit={({ endedOn: _endedOn, ...body }) =>
            create.mutate(
              {
                params: { workspace: slug },
                body: { ...body, ...idsOf(body), speciesId: body.speciesId as SpeciesId },
              },
              { onSuccess: ({ id }) => router.push(`/${slug}/projects/${id}`) },
            )
          }
        />
      </PageBody>
    </>
  );
}

/** Changes a joint project. */
export function EditProjectScreen({ id }: { id: ProjectId }) {
  const { slug } = useWorkspace();
  const query = useProject(id);
  const back = { href: `/${slug}/projects/${id}`, label: query.data?.name ?? 'Project' };
  return (
    <>
      <PageHeader title="Edit project" back={back} />
      <PageBody>
        {query.isPending ? <SkeletonText lines={8} /> : null}
        {query.isError ? (
          <ErrorState onRetry={() => void query.refetch()}>{query.error.problem.detail}</ErrorState>
        ) : null}
        {query.data ? <EditForm key={query.data.version} project={query.data} /> : null}
      </PageBody>
    </>
  );
}

function EditForm({ project }: { project: ProjectDetail }) {
  const { slug } = useWorkspace();
  const router = useRouter();
  const edit = useEditProject();
  const values: FormValues = {
    name: project.name,
    purpose: project.purpose,
    speciesId: project.species.id,
    parties: project.parties.filter(({ leftOn }) => leftOn === null).map(({ id }) => id),
    animals: project.animalRows.map(({ id }) => id),
    endedOn: project.endedOn ?? '',
  };
  return (
    <ProjectForm
      values={values}
      project={project}
      submitLabel="Save"
      busy={edit.isPending}
      error={edit.error}
      onSubmit={({ speciesId: _species, endedOn, ...body }) =>
        edit.mutate(
          {
            params: { workspace: slug, project: project.id },
            body: { ...body, ...idsOf(body), endedOn: endedOn || null, version: project.version },
          },
          {
            onSuccess: () => {
              toast.success('Saved');
              router.push(`/${slug}/projects/${project.id}`);
            },
          },
        )
      }
    />
  );
}

function ProjectForm({
  values,
  project,
  submitLabel,
  busy,
  error,
  onSubmit,
}: {
  values: FormValues;
  project?: ProjectDetail;
  submitLabel: string;
  busy: boolean;
  error: RequestError | null;
  onSubmit: (values: FormValues) => void;
}) {
  const form = useForm<FormValues>({ resolver: zodResolver(formSchema), defaultValues: values });
  const { register, control, handleSubmit, formState } = form;
  const species = useSpeciesList();
  const chosenSpecies = useWatch({ control, name: 'speciesId' });
  const messageOf = (field: keyof FormValues) => formState.errors[field]?.message ?? error?.messageFor(field);
  useEffect(() => {
    if (!formState.isDirty || formState.isSubmitSuccessful) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [formState.isDirty, formState.isSubmitSuccessful]);
  return (
    <form noValidate className="flex max-w-3xl flex-col gap-5" onSubmit={handleSubmit(onSubmit)}>
      {error ? (
        <FormErrorSummary
          title={error.problem.status === 409 ? 'Somebody changed this project' : 'This was not saved'}
          message={error.problem.detail}
          errors={error.problem.errors.map(({ message }) => ({ message }))}
        />
      ) : null}
      <Field label="Name" required error={messageOf('name')}>
        <TextInput {...register('name')} />
      </Field>
      <Field
        label="What it is for"
        optional
        hint="The goal of the project: what should hatch in the end."
        error={messageOf('purpose')}
      >
        <Textarea rows={3} {...register('purpose')} />
      </Field>
      {project ? null : (
        <Field label="Species" required error={messageOf('speciesId')}>
          <Select
            placeholder="Choose …"
            {...register('speciesId')}
            options={(species.data?.species ?? []).map(({ id, name }) => ({ value: id, label: name }))}
          />
        </Field>
      )}
      <PartiesField control={control} error={messageOf('parties')} />
      <AnimalsField
        control={control}
        species={chosenSpecies}
        project={project}
        error={messageOf('animals')}
      />
      {project ? (
        <Field
          label="Ended on"
          optional
          hint="No pairings can be proposed after this day."
          error={messageOf('endedOn')}
        >
          <DateInput {...register('endedOn')} />
        </Field>
      ) : null}
      <div>
        <Button type="submit" tone="primary" busy={busy}>
          {submitLabel}
        </Button>
      </div>
    </form>
  );
}

function PartiesField({ control, error }: { control: Control<FormValues>; error?: string }) {
  const { field } = useController({ control, name: 'parties' });
  const parties = useParties();
  const partyOf = (id: string) => parties.get(id as PartyId);
  const rest = [...parties.values()].filter(({ id }) => !field.value.includes(id));
  const move = (index: number, by: -1 | 1) => {
    const order = [...field.value];
    const [moved] = order.splice(index, 1);
    if (moved) order.splice(index + by, 0, moved);
    field.onChange(order);
  };
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-1 text-sm font-semibold">Partners in order of rank</legend>
      <p className="text-sm text-ink-3">
        They are drawn in this order, and of two equal claims the first takes the odd cent.
      </p>
      <ol className="divide-y divide-rule-2 rounded-lg border border-rule bg-card">
        {field.value.map((id, index) => {
          const name = partyOf(id)?.name ?? 'A party';
          return (
            <li key={id} className="flex items-center justify-between gap-2 py-1 pr-1 pl-3">
              <PartnerName partner={partyOf(id)?.mark ?? 6} name={name} />
              <span className="flex">
                <IconButton label={`Move ${name} up`} disabled={index === 0} onClick={() => move(index, -1)}>
                  <ArrowUp aria-hidden />
                </IconButton>
                <IconButton
                  label={`Move ${name} down`}
                  disabled={index === field.value.length - 1}
                  onClick={() => move(index, 1)}
                >
                  <ArrowDown aria-hidden />
                </IconButton>
                <IconButton
                  label={`Take ${name} out`}
                  onClick={() => field.onChange(field.value.filter((other) => other !== id))}
                >
                  <X aria-hidden />
                </IconButton>
              </span>
            </li>
          );
        })}
      </ol>
      {rest.length > 0 ? (
        <Select
          aria-label="Add a partner"
          placeholder="Add a partner …"
          value=""
          onChange={(event) => event.target.value && field.onChange([...field.value, event.target.value])}
          options={rest.map(({ id, name }) => ({ value: id, label: name }))}
        />
      ) : null}
      {error ? <p className="text-sm font-medium text-alarm">{error}</p> : null}
    </fieldset>
  );
}

function AnimalsField({
  control,
  species,
  project,
  error,
}: {
  control: Control<FormValues>;
  species: string;
  project?: ProjectDetail;
  error?: string;
}) {
  const { field } = useController({ control, name: 'animals' });
  const animals = useAnimals({ species: species || undefined, status: 'present', limit: 500 });
  const listed = species ? (animals.data?.rows ?? []) : [];
  // What stands in the project stays in sight, also what is no longer here.
  const kept = (project?.animalRows ?? []).filter(({ id }) => !listed.some((row) => row.id === id));
  const rows = [...kept, ...listed].map(({ id, code, name, description }) => ({
    id,
    code,
    name,
    description,
  }));
  const toggle = (id: AnimalId) =>
    field.onChange(
      field.value.includes(id) ? field.value.filter((other) => other !== id) : [...field.value, id],
    );
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-1 text-sm font-semibold">Animals of the project ({field.value.length})</legend>
      {species === '' ? <p className="text-sm text-ink-3">Choose a species first.</p> : null}
      {species !== '' && rows.length === 0 && !animals.isPending ? (
        <p className="text-sm text-ink-3">No animal of this species is here.</p>
      ) : null}
      {rows.length > 0 ? (
        <div
          className="max-h-80 overflow-y-auto rounded-lg border border-rule bg-card px-3 py-1"
          tabIndex={0}
          role="group"
          aria-label="Animals"
        >
          {rows.map((row) => (
            <Checkbox
              key={row.id}
              checked={field.value.includes(row.id)}
              onChange={() => toggle(row.id)}
              label={
                <>
                  <span className="font-mono font-semibold">{row.code}</span> {row.name}
                </>
              }
              hint={row.description}
            />
          ))}
        </div>
      ) : null}
      {error ? <p className="text-sm font-medium text-alarm">{error}</p> : null}
    </fieldset>
  );
}
