import type { ReactNode } from 'react';

/** A list with nothing in it: says what will stand here and what to do first. */
export function EmptyState({
  title,
  action,
  drawing,
  children,
}: {
  title: ReactNode;
  action?: ReactNode;
  drawing?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <div className="flex flex-col items-start gap-3 rounded-xl border border-dashed border-edge px-6 py-8 sm:px-10 sm:py-12">
      {drawing}
      <h2 className="text-xl">{title}</h2>
      {children ? <div className="max-w-prose text-base text-ink-2">{children}</div> : null}
      {action ? <div className="mt-1 flex flex-wrap gap-2">{action}</div> : null}
    </div>
  );
}
