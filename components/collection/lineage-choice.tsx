'use client';

import { useDeferredValue, useState } from 'react';
import { Combobox } from '@/components/ui/combobox';
import { useAnimals } from '@/lib/client/collection';
import { sexSigns } from './words';

/** Chooses the animal whose lineage is shown. */
export function LineageChoice({
  animal,
  label,
  onChange,
}: {
  animal: string;
  label?: string;
  onChange: (animal: string) => void;
}) {
  const [text, setText] = useState('');
  const search = useDeferredValue(text);
  const found = useAnimals({ search: search || undefined, limit: 60, sort: 'code' });
  return (
    <div className="w-48 max-sm:w-full">
      <Combobox
        aria-label="Animal"
        placeholder="Choose an animal"
        value={animal || null}
        selectedLabel={label}
        loading={found.isFetching}
        onSearchChange={setText}
        emptyText="No animal matches."
        options={(found.data?.rows ?? []).map((row) => ({
          value: row.id,
          label: `${sexSigns[row.sex]} ${row.code}`,
          hint: row.name,
        }))}
        onChange={(id) => (id ? onChange(id) : undefined)}
      />
    </div>
  );
}
