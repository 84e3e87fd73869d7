'use client';

import { useState, type FormEvent } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { useCreateCombination } from '@/lib/client/species';
import { useWorkspace } from '@/lib/client/workspace';
import type { SpeciesDetail } from '@/lib/contracts/species-catalogue';
import { looksOfLocus } from './locus-form-values';

/** Gives looks at several loci together one name. */
export function CombinationDialog({ species, onClose }: { species: SpeciesDetail; onClose: () => void }) {
  const { slug } = useWorkspace();
  const create = useCreateCombination();
  const [name, setName] = useState('');
  const [looks, setLooks] = useState<Record<string, string>>({});
  const save = (event: FormEvent) => {
    event.preventDefault();
    if (create.isPending) return;
    const phenotypes = Object.fromEntries(Object.entries(looks).filter(([, look]) => look));
    create.mutate(
      { params: { workspace: slug, species: species.id }, body: { name, phenotypes } },
      {
        onSuccess: () => {
          toast.success(`${name} saved`);
          onClose();
        },
      },
    );
  };
  return (
    <Dialog
      open
      title="Name a combination"
      description="Animals that look so at all of these loci are called by the name."
      onOpenChange={(open) => (open ? undefined : onClose())}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button form="combination" type="submit" tone="primary" busy={create.isPending}>
            Save
          </Button>
        </>
      }
    >
      <form id="combination" onSubmit={save} className="flex flex-col gap-4">
        <FormErrorSummary
          message={create.error && !create.error.messageFor('name') ? create.error.problem.detail : undefined}
        />
        <Field label="Name" error={create.error?.messageFor('name')}>
          <TextInput value={name} onChange={(event) => setName(event.target.value)} />
        </Field>
        <div className="grid gap-3 sm:grid-cols-2">
          {species.loci.map((locus) => (
            <Field key={locus.id} label={locus.name}>
              <Select
                value={looks[locus.id] ?? ''}
                placeholder="any"
                onChange={(event) => setLooks({ ...looks, [locus.id]: event.target.value })}
                options={looksOfLocus(locus).map((look) => ({ value: look, label: look }))}
              />
            </Field>
          ))}
        </div>
      </form>
    </Dialog>
  );
}
