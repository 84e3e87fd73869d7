'use client';

import { useState, type ComponentProps, type ReactNode } from 'react';
import { plainDecimal } from './number-text';
import { TextInput } from './text-input';

export type NumberInputProps = Omit<ComponentProps<'input'>, 'value' | 'onChange' | 'type' | 'prefix'> & {
  value: number | null;
  /** Null when the box is empty; `NaN` when what stands there is no number, so that the form can say so. */
  onChange: (value: number | null) => void;
  /** Stands in the frame: g, °C, %. */
  unit?: ReactNode;
  /** Only whole numbers: asks a phone for the keypad without a decimal sign. */
  whole?: boolean;
};

function read(text: string, whole: boolean): number | null {
  if (text.trim() === '') return null;
  const plain = plainDecimal(text);
  const value = plain === null ? Number.NaN : Number(plain);
  return whole && !Number.isInteger(value) ? Number.NaN : value;
}

/** A number as typed, in the face of figures. No arrows: they change values by accident under a scrolling thumb. */
export function NumberInput({ value, onChange, unit, whole = false, onBlur, ...rest }: NumberInputProps) {
  const [draft, setDraft] = useState<string | null>(null);
  return (
    <TextInput
      {...rest}
      mono
      inputMode={whole ? 'numeric' : 'decimal'}
      autoComplete="off"
      suffix={unit}
      value={draft ?? (value === null || Number.isNaN(value) ? '' : String(value))}
      onChange={(event) => {
        setDraft(event.target.value);
        onChange(read(event.target.value, whole));
      }}
      onBlur={(event) => {
        // What is no number stays as it was typed, beside its error.
        if (!Number.isNaN(read(event.target.value, whole) ?? 0)) setDraft(null);
        onBlur?.(event);
      }}
    />
  );
}
