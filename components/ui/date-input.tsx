'use client';

import type { ComponentProps } from 'react';
import { useFieldProps } from './field-context';
import { inputClasses } from './input-classes';

/** A calendar day. Its value is an ISO day (`2027-08-12`) or empty; the device shows it in the person's own order. */
export function DateInput({ className, ...rest }: ComponentProps<'input'>) {
  const props = useFieldProps(rest);
  return <input type="date" {...props} className={inputClasses(`font-mono ${className ?? ''}`)} />;
}
