import type { ComponentProps } from 'react';
import { classNames } from './class-names';

/** A square button with only an icon; `label` names it for everyone who does not see the icon. */
export function IconButton({
  label,
  className,
  framed = false,
  type = 'button',
  children,
  ...rest
}: Omit<ComponentProps<'button'>, 'aria-label'> & { label: string; framed?: boolean }) {
  return (
    <button
      type={type}
      aria-label={label}
      title={label}
      className={classNames(
        'inline-grid size-9 shrink-0 place-items-center rounded-lg text-ink-2 transition-colors hover:bg-hover hover:text-ink',
        'disabled:cursor-not-allowed disabled:opacity-55 pointer-coarse:size-11 [&_svg]:size-5',
        framed && 'border border-edge bg-card',
        className,
      )}
      {...rest}
    >
      {children}
    </button>
  );
}
