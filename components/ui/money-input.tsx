'use client';

import { useState, type ComponentProps } from 'react';
import { minorUnitsOf, textOfMinorUnits } from './number-text';
import { TextInput } from './text-input';

export type MoneyInputProps = Omit<ComponentProps<'input'>, 'value' | 'onChange' | 'type' | 'prefix'> & {
  /** Integer minor units (cents), or null when empty. */
  value: number | null;
  /** Null when empty; `NaN` when what stands there is no amount of this currency. */
  onChange: (minorUnits: number | null) => void;
  /** ISO 4217 code, shown in the frame. */
  currency: string;
  /** Decimals of the currency: 2 for USD, 0 for JPY. */
  exponent?: number;
};

/** An amount of money: typed as people write it, kept as integer minor units, never as a float. */
export function MoneyInput({ value, onChange, currency, exponent = 2, onBlur, ...rest }: MoneyInputProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const read = (text: string) => (text.trim() === '' ? null : (minorUnitsOf(text, exponent) ?? Number.NaN));
  return (
    <TextInput
      {...rest}
      mono
      inputMode="decimal"
      autoComplete="off"
      suffix={currency}
      value={draft ?? (value === null || Number.isNaN(value) ? '' : textOfMinorUnits(value, exponent))}
      onChange={(event) => {
        setDraft(event.target.value);
        onChange(read(event.target.value));
      }}
      onBlur={(event) => {
        if (!Number.isNaN(read(event.target.value) ?? 0)) setDraft(null);
        onBlur?.(event);
      }}
    />
  );
}
