import type { ReactNode } from 'react';
import { Button } from './button';

/** Something could not be shown: what happened, what is safe, and a way to try again. */
export function ErrorState({
  title = 'This could not be loaded',
  onRetry,
  retrying = false,
  action,
  children,
}: {
  title?: ReactNode;
  onRetry?: () => void;
  retrying?: boolean;
  action?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <div
      role="alert"
      className="flex flex-col items-start gap-3 rounded-xl border border-alarm bg-paper px-6 py-6"
    >
      <h2 className="text-xl">{title}</h2>
      <div className="max-w-prose text-base text-ink-2">
        {children ?? 'The server did not answer as it should. Nothing that you saved before is lost.'}
      </div>
      {onRetry || action ? (
        <div className="flex flex-wrap gap-2">
          {onRetry ? (
            <Button busy={retrying} onClick={onRetry}>
              Try again
            </Button>
          ) : null}
          {action}
        </div>
      ) : null}
    </div>
  );
}
