import type { ReactNode } from 'react';

/** Text for those who listen instead of look. */
export function VisuallyHidden({ children }: { children: ReactNode }) {
  return <span className="sr-only">{children}</span>;
}
