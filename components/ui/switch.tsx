'use client';

import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names';

/** On or off, at once. For what is saved with a form use `Checkbox`. */
export function Switch({
  label,
  hint,
  className,
  ...rest
}: Omit<ComponentProps<'input'>, 'type'> & { label: ReactNode; hint?: ReactNode }) {
  return (
    <label
      className={classNames(
        'flex items-start gap-3 py-1 text-base pointer-coarse:min-h-11 pointer-coarse:py-2.5',
        className,
      )}
    >
      <span className="relative inline-block h-6 w-10 shrink-0">
        <input
          {...rest}
          type="checkbox"
          role="switch"
          className="peer h-6 w-10 appearance-none rounded-full border border-edge bg-track checked:border-moss checked:bg-moss disabled:opacity-50"
        />
        <span
          aria-hidden
          className="pointer-events-none absolute top-1 left-1 size-4 rounded-full bg-ink-2 transition-transform peer-checked:translate-x-4 peer-checked:bg-on-moss"
        />
      </span>
      <span className="min-w-0">
        <span className="block">{label}</span>
        {hint ? <span className="block text-sm text-ink-3">{hint}</span> : null}
      </span>
    </label>
  );
}
