import Link from 'next/link';
import type { ReactNode } from 'react';
import { Mark } from '@/components/drawings/mark';

export default function SiteLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col bg-shell">
      <header className="px-4 py-5 sm:px-8">
        <Link href="/" className="inline-flex items-center gap-2 font-heading text-xl font-semibold text-ink">
          <Mark className="size-6" />
          Moiety
        </Link>
      </header>
      <main id="main" className="flex flex-1 flex-col px-4 pb-16 sm:px-8">
        {children}
      </main>
    </div>
  );
}
