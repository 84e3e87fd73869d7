import type { Tone } from './badge';
import { classNames } from './class-names';

const fills: Record<Tone, string> = {
  neutral: 'bg-ink-2',
  moss: 'bg-moss',
  straw: 'bg-straw',
  slate: 'bg-slate',
  alarm: 'bg-alarm',
  ember: 'bg-ember',
};

/** A measure from 0 to `max`, with an optional line at a limit. The label says it in words. */
export function Progress({
  value,
  max = 1,
  label,
  tone = 'slate',
  limit,
  size = 'md',
  className,
}: {
  value: number;
  max?: number;
  label: string;
  tone?: Tone;
  limit?: number;
  size?: 'sm' | 'md';
  className?: string;
}) {
  const percent = (part: number) => `${Math.max(0, Math.min(100, (part / max) * 100))}%`;
  return (
    <div
      role="meter"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={max}
      aria-valuenow={Math.max(0, Math.min(max, value))}
      className={classNames('relative', className)}
    >
      <div className={classNames('overflow-hidden rounded-sm bg-track', size === 'sm' ? 'h-1.5' : 'h-3')}>
        <div className={classNames('h-full', fills[tone])} style={{ width: percent(value) }} />
      </div>
      {limit === undefined ? null : (
        <span
          aria-hidden
          className="absolute -inset-y-1 w-0.5 -translate-x-1/2 bg-ink"
          style={{ left: percent(limit) }}
        />
      )}
    </div>
  );
}
