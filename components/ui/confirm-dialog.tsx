'use client';

import { AlertDialog } from 'radix-ui';
import type { ReactNode } from 'react';
import { Button, type ButtonTone } from './button';

export type ConfirmDialogProps = {
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  trigger?: ReactNode;
  title: ReactNode;
  /** What will happen, and whether it can be taken back. */
  description: ReactNode;
  confirmLabel: string;
  cancelLabel?: string;
  tone?: Extract<ButtonTone, 'primary' | 'danger'>;
  busy?: boolean;
  /** Runs on the press; close by `onOpenChange` when the work has succeeded. */
  onConfirm: () => void;
  children?: ReactNode;
};

/** Asks before something that is hard to take back. Focus starts on the safe answer. */
export function ConfirmDialog({
  open,
  onOpenChange,
  trigger,
  title,
  description,
  confirmLabel,
  cancelLabel = 'Cancel',
  tone = 'danger',
  busy,
  onConfirm,
  children,
}: ConfirmDialogProps) {
  return (
    <AlertDialog.Root open={open} onOpenChange={onOpenChange}>
      {trigger ? <AlertDialog.Trigger asChild>{trigger}</AlertDialog.Trigger> : null}
      <AlertDialog.Portal>
        <AlertDialog.Overlay className="fixed inset-0 z-40 animate-[fade_120ms_ease-out] bg-veil" />
        <AlertDialog.Content className="fixed inset-x-3 top-1/2 z-50 mx-auto max-h-[88dvh] -translate-y-1/2 overflow-y-auto rounded-xl border border-rule bg-paper p-5 focus:outline-none sm:max-w-md">
          <AlertDialog.Title className="text-xl">{title}</AlertDialog.Title>
          <AlertDialog.Description className="mt-2 text-base text-ink-2">
            {description}
          </AlertDialog.Description>
          {children ? <div className="mt-4">{children}</div> : null}
          <div className="mt-5 flex flex-wrap justify-end gap-2">
            <AlertDialog.Cancel asChild>
              <Button>{cancelLabel}</Button>
            </AlertDialog.Cancel>
            <Button tone={tone} busy={busy} onClick={onConfirm}>
              {confirmLabel}
            </Button>
          </div>
        </AlertDialog.Content>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  );
}
