'use client';

import { useDeferredValue, useState } from 'react';
import { Combobox } from '@/components/ui/combobox';
import { useAnimals } from '@/lib/client/collection';
import type { SpeciesId } from '@/lib/contracts/ids';
import type { ParentChoice } from './animal-form-values';
import { sexSigns } from './words';

/** Finds an animal by code, name or looks; only those that could be this parent by species and sex are offered. */
export function ParentPicker({
  as,
  speciesId,
  value,
  onChange,
  label,
}: {
  as: 'sire' | 'dam';
  speciesId: string;
  value: ParentChoice;
  onChange: (choice: ParentChoice) => void;
  label?: string;
}) {
  const [text, setText] = useState('');
  const search = useDeferredValue(text);
  const found = useAnimals({
    species: (speciesId || undefined) as SpeciesId | undefined,
    search: search || undefined,
    limit: 60,
    sort: 'code',
  });
  const rows = (found.data?.rows ?? []).filter(({ sex }) => sex !== (as === 'sire' ? 'female' : 'male'));
  return (
    <Combobox
      aria-label={label}
      value={value === 'hidden' ? 'hidden' : (value?.id ?? null)}
      selectedLabel={value === 'hidden' ? 'Not shown to you' : value?.label}
      placeholder="Not known"
      clearable
      loading={found.isFetching}
      onSearchChange={setText}
      emptyText={`No ${as === 'sire' ? 'male' : 'female'} of this species matches.`}
      options={rows.map((row) => ({
        value: row.id,
        label: `${sexSigns[row.sex]} ${row.code}`,
        hint: row.description,
      }))}
      onChange={(id) => {
        const row = rows.find((one) => one.id === id);
        onChange(id === null ? null : row ? { id, label: row.code } : value);
      }}
    />
  );
}
