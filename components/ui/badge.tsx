import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** Moss: done, agreed. Straw: waiting, expected. Slate: information. Alarm: wrong, over a limit. Ember: today, heat. */
export type Tone = 'neutral' | 'moss' | 'straw' | 'slate' | 'alarm' | 'ember';

const tones: Record<Tone, string> = {
  neutral: 'bg-rule-2 text-ink-2',
  moss: 'bg-moss-tint text-moss-deep',
  straw: 'bg-straw-tint text-straw-deep',
  slate: 'bg-slate-tint text-slate-deep',
  alarm: 'bg-alarm-tint text-alarm-deep',
  ember: 'bg-ember-tint text-ember-deep',
};

/** A state in the words of a person: "2 of 3 agreed". The words carry the meaning, the colour only helps. */
export function Badge({
  tone = 'neutral',
  icon,
  className,
  children,
}: {
  tone?: Tone;
  icon?: ReactNode;
  className?: string;
  children: ReactNode;
}) {
  return (
    <span
      className={classNames(
        'inline-flex max-w-full items-center gap-1 rounded-full px-2.5 py-0.5 text-sm font-semibold whitespace-nowrap [&_svg]:size-3.5',
        tones[tone],
        className,
      )}
    >
      {icon}
      {children}
    </span>
  );
}
