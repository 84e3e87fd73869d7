import type { ReactNode } from 'react';
import type { Tone } from './badge';
import { classNames } from './class-names';

const tones: Record<Tone, string> = {
  neutral: 'border-rule bg-rule-2 text-ink',
  slate: 'border-transparent bg-slate-tint text-slate-deep',
  straw: 'border-transparent bg-straw-tint text-straw-deep',
  alarm: 'border-alarm bg-alarm-tint text-alarm-deep',
  moss: 'border-transparent bg-moss-tint text-moss-deep',
  ember: 'border-transparent bg-ember-tint text-ember-deep',
};

/** A box beside the thing it speaks of. Slate explains, straw cautions or waits, alarm says that something is wrong. */
export function Notice({
  tone = 'slate',
  title,
  action,
  className,
  children,
}: {
  tone?: Tone;
  title?: ReactNode;
  action?: ReactNode;
  className?: string;
  children?: ReactNode;
}) {
  return (
    <div
      role="note"
      className={classNames('rounded-lg border px-3.5 py-2.5 text-base', tones[tone], className)}
    >
      {title ? <p className="font-display text-lg font-bold text-ink">{title}</p> : null}
      {children ? <div className={classNames(title ? 'mt-0.5' : null)}>{children}</div> : null}
      {action ? <div className="mt-2.5">{action}</div> : null}
    </div>
  );
}
