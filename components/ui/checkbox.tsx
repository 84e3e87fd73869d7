'use client';

import { useEffect, useRef, type ComponentProps, type ReactNode, type Ref } from 'react';
import { classNames } from './class-names';

export type CheckboxProps = Omit<ComponentProps<'input'>, 'type' | 'ref'> & {
  /** Beside the box; without it give `aria-label`. */
  label?: ReactNode;
  hint?: ReactNode;
  /** Some of what it stands for is ticked, not all. */
  indeterminate?: boolean;
  ref?: Ref<HTMLInputElement>;
};

/** A box to tick. Works with `register`; with a label the whole line is the target. */
export function Checkbox({ label, hint, indeterminate = false, className, ref, ...rest }: CheckboxProps) {
  const own = useRef<HTMLInputElement | null>(null);
  useEffect(() => {
    if (own.current) own.current.indeterminate = indeterminate;
  }, [indeterminate]);
  const box = (
    <span className="relative inline-grid size-5 shrink-0 place-items-center">
      <input
        {...rest}
        ref={(element) => {
          own.current = element;
          if (typeof ref === 'function') ref(element);
          else if (ref) ref.current = element;
        }}
        type="checkbox"
        className={classNames(
          'peer size-5 appearance-none rounded-sm border border-edge bg-card checked:border-ink checked:bg-ink indeterminate:border-ink indeterminate:bg-ink disabled:opacity-50',
          label ? null : className,
        )}
      />
      <svg
        viewBox="0 0 16 16"
        aria-hidden
        className="pointer-events-none absolute hidden size-4 fill-none stroke-paper stroke-2 peer-checked:block peer-indeterminate:hidden"
      >
        <path d="M3.5 8.5 6.5 11.5 12.5 5" strokeLinecap="round" strokeLinejoin="round" />
      </svg>
      <span
        aria-hidden
        className="pointer-events-none absolute hidden h-0.5 w-2.5 bg-paper peer-indeterminate:block"
      />
    </span>
  );
  if (!label) return box;
  return (
    <label
      className={classNames(
        'flex items-start gap-2.5 py-1 text-base pointer-coarse:min-h-11 pointer-coarse:py-2.5',
        className,
      )}
    >
      {box}
      <span className="min-w-0 -mt-px">
        <span className="block">{label}</span>
        {hint ? <span className="block text-sm text-ink-3">{hint}</span> : null}
      </span>
    </label>
  );
}
