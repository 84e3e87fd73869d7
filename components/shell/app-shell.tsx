import type { ReactNode } from 'react';
import { PhoneBar } from './phone-bar';
import { Rail } from './rail';
import type { ShellProps } from './shell-types';

export type { ShellProps } from './shell-types';

/**
 * The frame of every page of a workspace: a dark rail at the left, or a bar at the foot of a phone. Takes plain props;
 * who sees which place is decided by the one who gives them. Use it from a client component, for `onSignOut`.
 */
export function AppShell({ children, ...shell }: ShellProps & { children: ReactNode }) {
  return (
    <div className="min-h-dvh md:grid md:grid-cols-[13rem_minmax(0,1fr)]">
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-50 focus:rounded-lg focus:bg-card focus:px-4 focus:py-2 focus:font-semibold"
      >
        Skip to the content
      </a>
      <Rail {...shell} />
      <main
        id="main"
        tabIndex={-1}
        className="min-w-0 pb-[calc(4rem+env(safe-area-inset-bottom))] focus:outline-none md:pb-0"
      >
        {children}
      </main>
      <PhoneBar {...shell} />
    </div>
  );
}
