'use client';

import { ChevronDown } from 'lucide-react';
import type { ComponentProps } from 'react';
import { classNames } from './class-names';
import { useFieldProps } from './field-context';
import { inputClasses } from './input-classes';

export type SelectOption = { value: string; label: string; disabled?: boolean };

/** A choice of few: the device's own list, which is best on phones. Give `options`, or `<option>` children. */
export function Select({
  options,
  placeholder,
  className,
  children,
  ...rest
}: ComponentProps<'select'> & { options?: readonly SelectOption[]; placeholder?: string }) {
  const props = useFieldProps(rest);
  return (
    <div className={classNames('relative', className)}>
      <select {...props} className={inputClasses('appearance-none pr-9')}>
        {placeholder ? <option value="">{placeholder}</option> : null}
        {options?.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
        {children}
      </select>
      <ChevronDown
        aria-hidden
        className="pointer-events-none absolute top-1/2 right-3 size-4 -translate-y-1/2 text-ink-3"
      />
    </div>
  );
}
