import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** A figure at the head of a screen: what it is, the number, and a range or unit beside it. */
export function Figure({
  label,
  value,
  aside,
  tone,
  size = 'md',
}: {
  label: ReactNode;
  value: ReactNode;
  aside?: ReactNode;
  tone?: 'moss' | 'straw' | 'alarm' | 'ember';
  size?: 'md' | 'lg';
}) {
  const tones = { moss: 'text-moss', straw: 'text-straw', alarm: 'text-alarm', ember: 'text-ember' };
  return (
    <div className="min-w-0">
      <p className="text-sm text-ink-3">{label}</p>
      <p
        className={classNames(
          'font-display font-bold tracking-tight whitespace-nowrap',
          size === 'lg' ? 'text-3xl' : 'text-2xl leading-7',
          tone && tones[tone],
        )}
      >
        {value}
        {aside ? (
          <span className="ml-1.5 font-sans text-base font-normal tracking-normal text-ink-3">{aside}</span>
        ) : null}
      </p>
    </div>
  );
}
