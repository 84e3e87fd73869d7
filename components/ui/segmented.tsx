'use client';

import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** A few views or filters side by side, one of them on: "Wall | Plan", "All | Mine". */
export function Segmented<V extends string>({
  label,
  options,
  value,
  onChange,
  className,
}: {
  label: string;
  options: readonly { value: V; label: ReactNode }[];
  value: V;
  onChange: (value: V) => void;
  className?: string;
}) {
  return (
    <div
      role="group"
      aria-label={label}
      className={classNames('inline-flex rounded-lg border border-edge bg-card p-0.5', className)}
    >
      {options.map((option) => (
        <button
          key={option.value}
          type="button"
          aria-pressed={option.value === value}
          onClick={() => onChange(option.value)}
          className="min-h-8 flex-1 rounded-md px-3 text-sm font-medium whitespace-nowrap text-ink-2 hover:text-ink aria-pressed:bg-ink aria-pressed:text-paper pointer-coarse:min-h-10"
        >
          {option.label}
        </button>
      ))}
    </div>
  );
}
