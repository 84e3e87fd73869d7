'use client';

import { Tabs as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

export type Tab = { value: string; label: ReactNode; count?: number; content: ReactNode };

/** Views of one thing, side by side. Controlled, so that the address can hold the choice; the row scrolls on a phone. */
export function Tabs({
  tabs,
  value,
  onValueChange,
  label,
  defaultValue,
}: {
  tabs: readonly Tab[];
  value?: string;
  defaultValue?: string;
  onValueChange?: (value: string) => void;
  label: string;
}) {
  return (
    <Radix.Root value={value} defaultValue={defaultValue ?? tabs[0]?.value} onValueChange={onValueChange}>
      <Radix.List
        aria-label={label}
        className="flex gap-1 overflow-x-auto border-b border-rule [scrollbar-width:none]"
      >
        {tabs.map((tab) => (
          <Radix.Trigger
            key={tab.value}
            value={tab.value}
            className="-mb-px min-h-10 shrink-0 border-b-2 border-transparent px-3 text-base font-medium whitespace-nowrap text-ink-2 hover:text-ink focus-visible:outline-offset-[-2px] data-[state=active]:border-ember data-[state=active]:font-semibold data-[state=active]:text-ink pointer-coarse:min-h-11"
          >
            {tab.label}
            {tab.count === undefined ? null : (
              <span className="ml-1.5 font-mono text-sm text-ink-3">{tab.count}</span>
            )}
          </Radix.Trigger>
        ))}
      </Radix.List>
      {tabs.map((tab) => (
        <Radix.Content key={tab.value} value={tab.value} className="pt-4">
          {tab.content}
        </Radix.Content>
      ))}
    </Radix.Root>
  );
}
