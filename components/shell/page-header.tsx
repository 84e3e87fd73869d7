import { ArrowLeft } from 'lucide-react';
import Link from 'next/link';
import type { ReactNode } from 'react';

/** The head of a page: names the thing and holds its actions. Stays in sight on a wide screen. */
export function PageHeader({
  title,
  lead,
  meta,
  actions,
  back,
  children,
}: {
  title: ReactNode;
  /** Before the title: codes, a sign. */
  lead?: ReactNode;
  /** After the title, small: "3 partners · 9 pairings". */
  meta?: ReactNode;
  actions?: ReactNode;
  back?: { href: string; label: string };
  /** A second line: tabs or filters. */
  children?: ReactNode;
}) {
  return (
    <header className="border-b border-rule bg-paper md:sticky md:top-0 md:z-20">
      <div className="flex min-h-16 flex-wrap items-center gap-x-4 gap-y-2 px-4 py-3 sm:px-6 md:py-2">
        <div className="min-w-0 flex-1 basis-64">
          {back ? (
            <Link
              href={back.href}
              className="-ml-0.5 inline-flex items-center gap-1 text-sm text-ink-3 hover:text-ink pointer-coarse:min-h-8"
            >
              <ArrowLeft aria-hidden className="size-3.5" />
              {back.label}
            </Link>
          ) : null}
          <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
            {lead}
            <h1 className="min-w-0 text-xl md:text-2xl md:leading-7">{title}</h1>
            {meta ? <div className="text-sm text-ink-3">{meta}</div> : null}
          </div>
        </div>
        {actions ? <div className="flex flex-wrap items-center gap-2">{actions}</div> : null}
      </div>
      {children ? <div className="px-4 pb-3 sm:px-6">{children}</div> : null}
    </header>
  );
}
