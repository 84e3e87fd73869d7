'use client';

import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names';
import { useFieldProps } from './field-context';
import { inputClasses } from './input-classes';

export type TextInputProps = Omit<ComponentProps<'input'>, 'prefix'> & {
  /** Stands inside the frame after the text: a unit or a small sign. */
  suffix?: ReactNode;
  /** Stands inside the frame before the text, e.g. an icon. */
  lead?: ReactNode;
  /** Codes, amounts and other figures in the face whose letters keep one width. */
  mono?: boolean;
};

/** A line of text. Works with `register` of react-hook-form and inside `Field`. */
export function TextInput({ suffix, lead, mono, className, ...rest }: TextInputProps) {
  const props = useFieldProps(rest);
  const input = (
    <input
      type="text"
      {...props}
      className={inputClasses(
        classNames(mono && 'font-mono', suffix ? 'pr-12' : null, lead ? 'pl-9' : null, className),
      )}
    />
  );
  if (!suffix && !lead) return input;
  return (
    <div className="relative">
      {lead ? (
        <span
          aria-hidden
          className="pointer-events-none absolute inset-y-0 left-3 flex items-center text-ink-3 [&_svg]:size-4"
        >
          {lead}
        </span>
      ) : null}
      {input}
      {suffix ? (
        <span
          aria-hidden
          className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-sm text-ink-3"
        >
          {suffix}
        </span>
      ) : null}
    </div>
  );
}
