'use client';

import { Search } from 'lucide-react';
import type { ComponentProps } from 'react';
import { classNames } from './class-names';
import { TextInput } from './text-input';

/** The search box above a list. `label` is spoken and is the placeholder too. */
export function SearchInput({
  label,
  className,
  ...rest
}: Omit<ComponentProps<'input'>, 'prefix'> & { label: string }) {
  return (
    <div role="search" className={classNames('min-w-0', className)}>
      <TextInput
        type="search"
        aria-label={label}
        placeholder={label}
        lead={<Search />}
        enterKeyHint="search"
        {...rest}
      />
    </div>
  );
}
