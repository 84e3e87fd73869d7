'use client';

import { Toaster as Sonner } from 'sonner';

/** Where short messages appear; raise one by `toast.success('Saved')` of sonner. Stands once, in the layout. */
export function Toaster() {
  return (
    <Sonner
      position="bottom-center"
      mobileOffset={{ bottom: 76 }}
      style={{ fontFamily: 'inherit' }}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast:
            'flex w-full items-center gap-3 rounded-lg border border-rail-2 bg-rail px-4 py-3 text-base text-rail-ink [&_svg]:size-5',
          title: 'font-semibold',
          description: 'text-sm text-rail-ink-2',
          actionButton: 'ml-auto rounded-md px-2 py-1 font-semibold text-rail-ember hover:bg-rail-2',
          cancelButton: 'rounded-md px-2 py-1 text-rail-ink-2 hover:bg-rail-2',
          error: 'border-alarm',
        },
      }}
    />
  );
}
