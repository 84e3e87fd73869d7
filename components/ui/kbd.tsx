import type { ReactNode } from 'react';

/** A key of the keyboard. */
export function Kbd({ children }: { children: ReactNode }) {
  return (
    <kbd className="rounded-sm border border-edge bg-card px-1.5 font-mono text-sm text-ink-2">
      {children}
    </kbd>
  );
}
