'use client';

import { Tooltip as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

/** A short name or explanation on hover and focus. Nothing that a person must know to go on: phones have no hover. */
export function Tooltip({
  text,
  side = 'top',
  children,
}: {
  text: ReactNode;
  side?: 'top' | 'right' | 'bottom' | 'left';
  children: ReactNode;
}) {
  return (
    <Radix.Provider delayDuration={300}>
      <Radix.Root>
        <Radix.Trigger asChild>{children}</Radix.Trigger>
        <Radix.Portal>
          <Radix.Content
            side={side}
            sideOffset={5}
            collisionPadding={8}
            className="z-50 max-w-64 rounded-md bg-ink px-2.5 py-1.5 text-sm text-paper"
          >
            {text}
          </Radix.Content>
        </Radix.Portal>
      </Radix.Root>
    </Radix.Provider>
  );
}
