import type { ReactNode } from 'react';
import { classNames } from './class-names';

export type KeyValue = {
  key: string;
  label?: ReactNode;
  value: ReactNode;
  mono?: boolean;
  tone?: 'moss' | 'straw' | 'alarm' | 'ember';
};

const tones = { moss: 'text-moss', straw: 'text-straw', alarm: 'text-alarm', ember: 'text-ember' };

/** Names and values in lines: `key` is the name unless a `label` is given. */
export function KeyValueList({
  items,
  ruled = false,
  className,
}: {
  items: readonly KeyValue[];
  ruled?: boolean;
  className?: string;
}) {
  return (
    <dl className={classNames('text-base', ruled && 'divide-y divide-rule-2', className)}>
      {items.map((item) => (
        <div
          key={item.key}
          className={classNames('flex items-baseline justify-between gap-4', ruled ? 'py-2' : 'py-0.5')}
        >
          <dt className="text-ink-2">{item.label ?? item.key}</dt>
          <dd
            className={classNames(
              'min-w-0 text-right break-words',
              item.mono && 'font-mono',
              item.tone && `font-semibold ${tones[item.tone]}`,
            )}
          >
            {item.value}
          </dd>
        </div>
      ))}
    </dl>
  );
}
