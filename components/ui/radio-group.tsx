'use client';

import { useId, type ReactNode } from 'react';
import { classNames } from './class-names';

export type RadioOption<V extends string> = {
  value: V;
  label: ReactNode;
  hint?: ReactNode;
  disabled?: boolean;
};

/** One of few, all in sight. `boxed` gives each a frame, for a choice that matters; arrow keys move as everywhere. */
export function RadioGroup<V extends string>({
  legend,
  hideLegend,
  hint,
  error,
  options,
  value,
  onChange,
  name,
  boxed = false,
  inline = false,
}: {
  legend: ReactNode;
  hideLegend?: boolean;
  hint?: ReactNode;
  error?: ReactNode;
  options: readonly RadioOption<V>[];
  value: V | null | undefined;
  onChange: (value: V) => void;
  name?: string;
  boxed?: boolean;
  inline?: boolean;
}) {
  const id = useId();
  return (
    <fieldset
      className="min-w-0"
      aria-describedby={
        [error ? `${id}-error` : null, hint ? `${id}-hint` : null].filter(Boolean).join(' ') || undefined
      }
    >
      <legend className={hideLegend ? 'sr-only' : 'mb-1 text-sm font-semibold'}>{legend}</legend>
      {hint ? (
        <p id={`${id}-hint`} className="mb-1 text-sm text-ink-3">
          {hint}
        </p>
      ) : null}
      <div
        className={classNames(
          'flex gap-2',
          inline ? 'flex-row flex-wrap gap-x-5' : 'flex-col',
          !boxed && !inline && 'gap-0.5',
        )}
      >
        {options.map((option) => (
          <label
            key={option.value}
            className={classNames(
              'flex items-start gap-2.5 text-base has-disabled:opacity-50',
              boxed
                ? 'flex-1 rounded-lg border border-edge bg-card px-3 py-2.5 has-checked:border-ink has-checked:bg-chosen'
                : 'py-1 pointer-coarse:min-h-11 pointer-coarse:py-2.5',
            )}
          >
            <input
              type="radio"
              name={name ?? id}
              value={option.value}
              checked={value === option.value}
              disabled={option.disabled}
              onChange={() => onChange(option.value)}
              className="size-5 shrink-0 appearance-none rounded-full border border-edge bg-card checked:border-[6px] checked:border-ink"
            />
            <span className="-mt-px min-w-0">
              <span className="block">{option.label}</span>
              {option.hint ? <span className="block text-sm text-ink-3">{option.hint}</span> : null}
            </span>
          </label>
        ))}
      </div>
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm font-medium text-alarm">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
