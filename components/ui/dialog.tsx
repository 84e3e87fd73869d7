'use client';

import { X } from 'lucide-react';
import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names';
import { IconButton } from './icon-button';

export type DialogProps = {
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  /** The element that opens it, when it is not opened from outside. */
  trigger?: ReactNode;
  title: ReactNode;
  description?: ReactNode;
  /** Buttons at the foot; they stay in sight while the body scrolls. */
  footer?: ReactNode;
  size?: 'sm' | 'md' | 'lg';
  children?: ReactNode;
};

const widths = { sm: 'sm:max-w-md', md: 'sm:max-w-xl', lg: 'sm:max-w-3xl' };

/** A question or a short form over the page. Esc and the veil close it; focus stays inside and returns after. */
export function Dialog({
  open,
  onOpenChange,
  trigger,
  title,
  description,
  footer,
  size = 'md',
  children,
}: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {trigger ? <Radix.Trigger asChild>{trigger}</Radix.Trigger> : null}
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 animate-[fade_120ms_ease-out] bg-veil" />
        <Radix.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={classNames(
            'fixed inset-x-3 top-1/2 z-50 mx-auto flex max-h-[88dvh] -translate-y-1/2 flex-col rounded-xl border border-rule bg-paper',
            'animate-[fade_140ms_ease-out] focus:outline-none',
            widths[size],
          )}
        >
          <header className="flex items-start gap-3 px-5 pt-4 pb-3">
            <div className="min-w-0 flex-1">
              <Radix.Title className="text-xl">{title}</Radix.Title>
              {description ? (
                <Radix.Description className="mt-1 text-base text-ink-2">{description}</Radix.Description>
              ) : null}
            </div>
            <Radix.Close asChild>
              <IconButton label="Close" className="-mt-1 -mr-2">
                <X aria-hidden />
              </IconButton>
            </Radix.Close>
          </header>
          {children ? <div className="min-h-0 flex-1 overflow-y-auto px-5 pt-1 pb-5">{children}</div> : null}
          {footer ? (
            <footer className="flex flex-wrap justify-end gap-2 border-t border-rule px-5 py-3">
              {footer}
            </footer>
          ) : null}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** Closes the dialog around it: `<DialogClose asChild><Button>Cancel</Button></DialogClose>`. */
export const DialogClose = Radix.Close;
