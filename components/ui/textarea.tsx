'use client';

import type { ComponentProps } from 'react';
import { useFieldProps } from './field-context';
import { inputClasses } from './input-classes';

/** Several lines of text; grows with what is written where the browser can. */
export function Textarea({ className, rows = 3, ...rest }: ComponentProps<'textarea'>) {
  const props = useFieldProps(rest);
  return (
    <textarea
      rows={rows}
      {...props}
      className={inputClasses(`field-sizing-content max-h-80 ${className ?? ''}`)}
    />
  );
}
