'use client';

import { useShares } from '@/components/collection/shares-of';
import { sayGrams } from '@/components/collection/words';
import { ShareStrip } from '@/components/drawings/share-strip';
import { Combobox } from '@/components/ui/combobox';
import { Field } from '@/components/ui/field';
import type { BreederChoice } from '@/lib/contracts/season';
import { sayMonths } from './odds-words';

/** Chooses a sire or a dam among the animals that could be paired, with what stands against it. */
export function BreederPicker({
  label,
  options,
  value,
  onChange,
  error,
  loading,
}: {
  label: string;
  options: readonly BreederChoice[];
  value: string | null;
  onChange: (id: string | null) => void;
  error?: string;
  loading: boolean;
}) {
  const shares = useShares();
  const chosen = options.find(({ id }) => id === value);
  return (
    <div className="flex min-w-0 flex-col gap-2">
      <Field label={label} error={error} required>
        <Combobox
          value={value}
          onChange={onChange}
          loading={loading}
          placeholder={`Choose the ${label.toLowerCase()} …`}
          emptyText="No such animal is here"
          options={options.map((one) => ({
            value: one.id,
            label: `${one.code} ${one.name} ${one.description}`.replace(/\s+/g, ' '),
            body: (
              <span className="flex min-w-0 flex-col">
                <span>
                  <span className="font-mono font-semibold">{one.code}</span> {one.name}
                </span>
                <span className="truncate text-sm text-ink-2">{one.description}</span>
              </span>
            ),
            hint: one.warnings.length > 0 ? 'see warnings' : one.inProject ? 'in project' : undefined,
          }))}
        />
      </Field>
      {chosen ? (
        <div className="text-sm text-ink-2">
          <p>
            {sayMonths(chosen.ageMonths)} · {chosen.grams === null ? 'not weighed' : sayGrams(chosen.grams)}
          </p>
          <ShareStrip
            shares={shares(chosen.parts)}
            size="xs"
            label={`${chosen.code} is owned by`}
            className="mt-1"
          />
        </div>
      ) : null}
    </div>
  );
}
