'use client';

import { Command } from 'cmdk';
import { Check, ChevronsUpDown, X } from 'lucide-react';
import { Popover } from 'radix-ui';
import { useId, useState, type ReactNode } from 'react';
import { classNames } from './class-names';
import { useFieldProps } from './field-context';
import { inputClasses } from './input-classes';
import { Spinner } from './spinner';

export type ComboboxOption = {
  value: string;
  label: string;
  /** Drawn in the list instead of the plain label. */
  body?: ReactNode;
  hint?: ReactNode;
  /** Other words by which it is found. */
  keywords?: string[];
  disabled?: boolean;
};

export type ComboboxProps = {
  value: string | null;
  onChange: (value: string | null) => void;
  options: readonly ComboboxOption[];
  /** The text of the chosen one when it is not among the options at hand. */
  selectedLabel?: string;
  placeholder?: string;
  /** Given: the server searches, and `options` are its answers. Not given: the options are searched here. */
  onSearchChange?: (text: string) => void;
  loading?: boolean;
  emptyText?: ReactNode;
  clearable?: boolean;
  disabled?: boolean;
  id?: string;
  'aria-label'?: string;
};

/** One of many, found by typing: an animal, a contact, an account. */
export function Combobox({
  value,
  onChange,
  options,
  selectedLabel,
  placeholder = 'Choose …',
  onSearchChange,
  loading = false,
  emptyText = 'Nothing found',
  clearable = false,
  disabled,
  ...rest
}: ComboboxProps) {
  const [open, setOpen] = useState(false);
  const listId = useId();
  const {
    'aria-describedby': describedBy,
    'aria-invalid': invalid,
    id,
  } = useFieldProps<{
    id?: string;
    'aria-describedby'?: string;
    'aria-invalid'?: boolean;
  }>({ id: rest.id });
  const chosen = options.find((option) => option.value === value);
  const text = chosen?.label ?? selectedLabel ?? null;
  const named = rest['aria-label'];

  return (
    <Popover.Root open={open} onOpenChange={setOpen}>
      <div className="relative">
        <Popover.Trigger asChild>
          <button
            type="button"
            id={id}
            role="combobox"
            aria-expanded={open}
            aria-haspopup="listbox"
            aria-controls={listId}
            aria-label={named ? `${named}${text ? `: ${text}` : ''}` : undefined}
            aria-describedby={describedBy}
            aria-invalid={invalid}
            disabled={disabled}
            className={inputClasses(
              classNames('flex items-center text-left', clearable && value ? 'pr-16' : 'pr-9'),
            )}
          >
            <span className={classNames('truncate', !text && 'text-ink-3')}>{text ?? placeholder}</span>
            <ChevronsUpDown aria-hidden className="absolute right-3 size-4 text-ink-3" />
          </button>
        </Popover.Trigger>
        {clearable && value && !disabled ? (
          <button
            type="button"
            aria-label="Clear"
            onClick={() => onChange(null)}
            className="absolute inset-y-0 right-8 my-auto grid size-7 place-items-center rounded-md text-ink-3 hover:text-ink"
          >
            <X aria-hidden className="size-4" />
          </button>
        ) : null}
      </div>
      <Popover.Portal>
        <Popover.Content
          align="start"
          sideOffset={4}
          collisionPadding={8}
          aria-label={named ?? placeholder}
          className="z-50 w-(--radix-popover-trigger-width) min-w-64 overflow-hidden rounded-lg border border-edge bg-card focus:outline-none"
        >
          <Command shouldFilter={!onSearchChange} label={named ?? placeholder}>
            <div className="flex items-center border-b border-rule">
              <Command.Input
                autoFocus
                onValueChange={onSearchChange}
                placeholder="Type to search"
                className="min-h-11 w-full bg-transparent px-3 text-base outline-none pointer-coarse:text-[1rem]"
              />
              {loading ? <Spinner className="mr-3 size-4 text-ink-3" /> : null}
            </div>
            <Command.List id={listId} className="max-h-72 overflow-y-auto overscroll-contain p-1">
              {loading ? null : (
                <Command.Empty className="px-2.5 py-3 text-base text-ink-3">{emptyText}</Command.Empty>
              )}
              {options.map((option) => (
                <Command.Item
                  key={option.value}
                  value={option.value}
                  keywords={[option.label, ...(option.keywords ?? [])]}
                  disabled={option.disabled}
                  onSelect={() => {
                    onChange(option.value);
                    setOpen(false);
                  }}
                  className="flex min-h-9 items-center gap-2 rounded-md px-2.5 py-1.5 text-base pointer-coarse:min-h-11 data-[disabled=true]:opacity-50 data-[selected=true]:bg-hover"
                >
                  <Check
                    aria-hidden
                    className={classNames('size-4 shrink-0', option.value !== value && 'invisible')}
                  />
                  <span className="min-w-0 flex-1">{option.body ?? option.label}</span>
                  {option.hint ? <span className="shrink-0 text-sm text-ink-3">{option.hint}</span> : null}
                </Command.Item>
              ))}
            </Command.List>
          </Command>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
