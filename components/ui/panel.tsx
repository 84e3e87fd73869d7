import { createElement, type ReactNode } from 'react';
import { classNames } from './class-names';

/** A framed area with a heading. Never inside another one: part areas within by rules. */
export function Panel({
  title,
  aside,
  level = 2,
  footer,
  className,
  children,
}: {
  title?: ReactNode;
  /** To the right of the heading: a short remark or a small button. */
  aside?: ReactNode;
  level?: 2 | 3;
  footer?: ReactNode;
  className?: string;
  children: ReactNode;
}) {
  return (
    <section
      className={classNames('min-w-0 rounded-xl border border-rule bg-paper px-4 py-4 sm:px-5', className)}
    >
      {title || aside ? (
        <header className="mb-3 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
          {title ? createElement(`h${level}`, { className: 'text-xl' }, title) : null}
          {aside ? <div className="text-sm text-ink-3">{aside}</div> : null}
        </header>
      ) : null}
      {children}
      {footer ? (
        <footer className="mt-4 flex flex-wrap gap-2 border-t border-rule-2 pt-3">{footer}</footer>
      ) : null}
    </section>
  );
}
