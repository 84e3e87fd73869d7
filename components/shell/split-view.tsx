'use client';

import { X } from 'lucide-react';
import type { ReactNode } from 'react';
import { IconButton } from '@/components/ui/icon-button';
import { Sheet } from '@/components/ui/sheet';
import { useMediaQuery } from './use-media-query';

export type SplitViewProps = {
  /** The list or drawing, with the page's margins of its own. */
  children: ReactNode;
  /** Details of the chosen row; null when none is chosen. */
  panel: ReactNode | null;
  panelTitle: ReactNode;
  onClose: () => void;
  /** Actions at the foot of the panel; they stay in sight. */
  footer?: ReactNode;
};

/** List and details side by side, so that nobody loses the list. Under 1024 px the details are a sheet from below. */
export function SplitView({ children, panel, panelTitle, onClose, footer }: SplitViewProps) {
  const wide = useMediaQuery('(min-width: 1024px)', true);
  const open = panel !== null && panel !== undefined;
  return (
    <div className={open && wide ? 'lg:grid lg:grid-cols-[minmax(0,1fr)_25rem]' : undefined}>
      <div className="min-w-0">{children}</div>
      {open && wide ? (
        <aside
          aria-label="Details"
          className="sticky top-16 flex h-[calc(100dvh-4rem)] min-w-0 flex-col border-l border-rule bg-paper max-lg:hidden"
        >
          <div className="flex items-start gap-3 px-5 pt-6 pb-2">
            <h2 className="min-w-0 flex-1 text-xl">{panelTitle}</h2>
            <IconButton label="Close details" onClick={onClose} className="-mt-1.5 -mr-2">
              <X aria-hidden />
            </IconButton>
          </div>
          <div className="min-h-0 flex-1 overflow-y-auto px-5 pb-6">{panel}</div>
          {footer ? (
            <footer className="flex gap-2 border-t border-rule px-5 py-3 *:flex-1">{footer}</footer>
          ) : null}
        </aside>
      ) : null}
      {!wide ? (
        <Sheet
          open={open}
          onOpenChange={(next) => (next ? undefined : onClose())}
          title={panelTitle}
          footer={footer}
        >
          {panel}
        </Sheet>
      ) : null}
    </div>
  );
}
