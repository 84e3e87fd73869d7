'use client';

import { CircleAlert } from 'lucide-react';
import { useId, type ReactNode } from 'react';
import { classNames } from './class-names';
import { FieldContext } from './field-context';

export type FieldProps = {
  label: ReactNode;
  /** Said before the person types: format, unit, what it is for. */
  hint?: ReactNode;
  /** Said after: what is wrong and what would be right. */
  error?: ReactNode;
  optional?: boolean;
  required?: boolean;
  hideLabel?: boolean;
  className?: string;
  children: ReactNode;
};

/**
 * Label, control, hint and error, tied together. The control inside (any input of this folder) takes its id and
 * description from here: `<Field label="Weight" error={errors.weight?.message}><TextInput {...register('weight')} /></Field>`.
 */
export function Field({
  label,
  hint,
  error,
  optional,
  required,
  hideLabel,
  className,
  children,
}: FieldProps) {
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const describedBy = [error ? errorId : null, hint ? hintId : null].filter(Boolean).join(' ') || undefined;
  return (
    <FieldContext value={{ id, describedBy, invalid: Boolean(error), required: Boolean(required) }}>
      <div className={classNames('flex min-w-0 flex-col gap-1', className)}>
        <label htmlFor={id} className={hideLabel ? 'sr-only' : 'text-sm font-semibold text-ink'}>
          {label}
          {optional ? <span className="font-normal text-ink-3"> (optional)</span> : null}
        </label>
        {hint ? (
          <p id={hintId} className="text-sm text-ink-3">
            {hint}
          </p>
        ) : null}
        {children}
        {error ? (
          <p id={errorId} className="flex items-start gap-1.5 text-sm font-medium text-alarm">
            <CircleAlert aria-hidden className="mt-0.5 size-3.5 shrink-0" />
            <span>{error}</span>
          </p>
        ) : null}
      </div>
    </FieldContext>
  );
}
