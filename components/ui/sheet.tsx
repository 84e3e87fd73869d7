'use client';

import { X } from 'lucide-react';
import { Dialog } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names';
import { IconButton } from './icon-button';

export type SheetProps = {
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  trigger?: ReactNode;
  title: ReactNode;
  description?: ReactNode;
  footer?: ReactNode;
  /** On a wide screen: `md` 28 rem, `lg` 40 rem. A phone always gets a sheet from below. */
  size?: 'md' | 'lg';
  hideTitle?: boolean;
  children: ReactNode;
};

const widths = { md: 'sm:w-[28rem]', lg: 'sm:w-[40rem]' };

/** A panel over the page: from the right on a desktop, from below on a phone. For forms and details that take room. */
export function Sheet({
  open,
  onOpenChange,
  trigger,
  title,
  description,
  footer,
  size = 'md',
  hideTitle,
  children,
}: SheetProps) {
  return (
    <Dialog.Root open={open} onOpenChange={onOpenChange}>
      {trigger ? <Dialog.Trigger asChild>{trigger}</Dialog.Trigger> : null}
      <Dialog.Portal>
        <Dialog.Overlay className="fixed inset-0 z-40 animate-[fade_140ms_ease-out] bg-veil" />
        <Dialog.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          // The panel itself takes the focus, not its closing button: a person reads first.
          onOpenAutoFocus={(event) => {
            event.preventDefault();
            if (event.currentTarget instanceof HTMLElement) event.currentTarget.focus();
          }}
          className={classNames(
            'fixed z-50 flex flex-col border-rule bg-paper focus:outline-none',
            'inset-x-0 bottom-0 max-h-[92dvh] animate-[slide-in-bottom_180ms_ease-out] rounded-t-xl border-t',
            'sm:inset-y-0 sm:right-0 sm:left-auto sm:max-h-none sm:max-w-[92vw] sm:animate-[slide-in-right_180ms_ease-out] sm:rounded-none sm:border-t-0 sm:border-l',
            widths[size],
          )}
        >
          <div aria-hidden className="mx-auto mt-2 h-1 w-10 shrink-0 rounded-full bg-edge sm:hidden" />
          <header className="flex shrink-0 items-start gap-3 px-5 pt-3 pb-3 sm:pt-5">
            <div className={classNames('min-w-0 flex-1', hideTitle && 'sr-only')}>
              <Dialog.Title className="text-xl">{title}</Dialog.Title>
              {description ? (
                <Dialog.Description className="mt-1 text-sm text-ink-2">{description}</Dialog.Description>
              ) : null}
            </div>
            <Dialog.Close asChild>
              <IconButton label="Close" className="-mt-1 -mr-2 ml-auto">
                <X aria-hidden />
              </IconButton>
            </Dialog.Close>
          </header>
          <div className="min-h-0 flex-1 overflow-y-auto overscroll-contain px-5 pt-1 pb-6">{children}</div>
          {footer ? (
            <footer className="flex shrink-0 flex-wrap gap-2 border-t border-rule px-5 pt-3 pb-[max(0.75rem,env(safe-area-inset-bottom))] *:flex-1">
              {footer}
            </footer>
          ) : null}
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}

export const SheetClose = Dialog.Close;
