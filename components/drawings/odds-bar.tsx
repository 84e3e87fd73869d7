import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

const fills = { slate: 'bg-slate', ember: 'bg-ember', moss: 'bg-moss', straw: 'bg-straw' };

/** "36.7%", "<0.1%", "95.5%", "100%" only when it is certain: odds never round to certainty. */
export function percentText(probability: number): string {
  if (probability <= 0) return '0%';
  if (probability >= 1) return '100%';
  const percent = probability * 100;
  if (percent < 0.1) return '<0.1%';
  if (percent > 99.9) return '>99.9%';
  return `${percent.toFixed(1).replace(/\.0$/, '')}%`;
}

/** One outcome: its name, a bar as long as its odds, the odds as a fraction and a percentage. */
export function OddsBar({
  name,
  probability,
  fraction,
  atLeastOne,
  tone = 'slate',
}: {
  name: ReactNode;
  /** Per egg, 0–1. */
  probability: number;
  /** As exactly known: "5/12". */
  fraction?: string;
  /** Odds of one or more in the clutch, 0–1. */
  atLeastOne?: number;
  tone?: keyof typeof fills;
}) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_auto] items-end gap-x-4">
      <div className="min-w-0">
        <p className="text-base leading-5">{name}</p>
        <div aria-hidden className="mt-1 h-2 overflow-hidden rounded-[2px] bg-track">
          <div
            className={classNames('h-full rounded-[2px]', fills[tone])}
            style={{ width: `${Math.min(1, probability) * 100}%`, minWidth: probability > 0 ? 2 : 0 }}
          />
        </div>
      </div>
      <p className="flex gap-3 text-right font-mono text-base leading-4">
        <span className="min-w-12">{fraction ?? percentText(probability)}</span>
        {fraction ? <span className="min-w-14 text-ink-2">{percentText(probability)}</span> : null}
        {atLeastOne === undefined ? null : (
          <span className="min-w-14">
            <span className="sr-only">at least one in the clutch: </span>
            {percentText(atLeastOne)}
          </span>
        )}
      </p>
    </div>
  );
}
