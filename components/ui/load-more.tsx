'use client';

import { Button } from './button';

/** The end of a list that is read by cursor: how much is shown, and the next portion. */
export function LoadMore({
  shown,
  hasMore,
  busy,
  onMore,
}: {
  shown: number;
  hasMore: boolean;
  busy: boolean;
  onMore: () => void;
}) {
  return (
    <div className="flex items-center justify-between gap-3">
      <p className="text-sm text-ink-2" aria-live="polite">
        <span className="font-mono">{shown}</span> shown{hasMore ? '' : ', that is all'}
      </p>
      {hasMore ? (
        <Button size="sm" busy={busy} onClick={onMore}>
          Show more
        </Button>
      ) : null}
    </div>
  );
}
