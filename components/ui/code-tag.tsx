import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** A framed code, as on an animal's or tub's label. `lead` is a sign before it, e.g. the sign of the sex. */
export function CodeTag({
  lead,
  size = 'md',
  className,
  children,
}: {
  lead?: ReactNode;
  size?: 'sm' | 'md' | 'lg';
  className?: string;
  children: ReactNode;
}) {
  return (
    <span
      className={classNames(
        'inline-flex items-center gap-1.5 rounded-sm border border-rule bg-card font-mono font-semibold whitespace-nowrap text-ink',
        size === 'sm' && 'px-1 text-sm',
        size === 'md' && 'px-1.5 py-0.5 text-sm',
        size === 'lg' && 'px-2 py-0.5 text-lg',
        className,
      )}
    >
      {lead ? <span className="font-sans">{lead}</span> : null}
      {children}
    </span>
  );
}
