'use client';

import { Popover as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** Something small that belongs to the control that opens it: filters, an explanation. */
export function Popover({
  open,
  onOpenChange,
  trigger,
  label,
  align = 'start',
  className,
  children,
}: {
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  trigger: ReactNode;
  label: string;
  align?: 'start' | 'center' | 'end';
  className?: string;
  children: ReactNode;
}) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          aria-label={label}
          align={align}
          sideOffset={6}
          collisionPadding={8}
          className={classNames(
            'z-50 max-h-(--radix-popover-content-available-height) w-80 max-w-[calc(100vw-1rem)] overflow-y-auto rounded-lg border border-edge bg-card p-4 focus:outline-none',
            className,
          )}
        >
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
