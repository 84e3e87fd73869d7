import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

/** The space under the header, with the page's margins. */
export function PageBody({ className, children }: { className?: string; children: ReactNode }) {
  return (
    <div className={classNames('flex min-w-0 flex-col gap-5 px-4 py-5 sm:px-6', className)}>{children}</div>
  );
}
