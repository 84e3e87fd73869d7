import { classNames } from './class-names';

/** The place of something that is still on its way; give it the size of what will stand there. */
export function Skeleton({ className }: { className?: string }) {
  return <div aria-hidden className={classNames('animate-pulse rounded-sm bg-rule-2', className)} />;
}

/** Lines of text on their way. */
export function SkeletonText({ lines = 3 }: { lines?: number }) {
  return (
    <div role="status" aria-label="Loading" className="space-y-2">
      {Array.from({ length: lines }, (_, line) => (
        <Skeleton key={line} className={classNames('h-4', line === lines - 1 ? 'w-2/3' : 'w-full')} />
      ))}
    </div>
  );
}
