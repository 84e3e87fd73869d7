import { Slot } from 'radix-ui';
import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names';
import { Spinner } from './spinner';

export type ButtonTone = 'primary' | 'quiet' | 'plain' | 'moss' | 'danger' | 'link';
export type ButtonSize = 'sm' | 'md' | 'lg';

const tones: Record<ButtonTone, string> = {
  primary: 'bg-ember text-on-ember hover:bg-ember-hover',
  quiet: 'border border-rule bg-card text-ink hover:bg-hover hover:border-edge',
  plain: 'text-ink hover:bg-hover',
  moss: 'bg-moss text-on-moss hover:brightness-95',
  danger: 'bg-alarm text-on-alarm hover:bg-alarm-hover',
  link: 'text-slate underline underline-offset-3 decoration-1 hover:text-ink hover:decoration-2',
};

const sizes: Record<ButtonSize, string> = {
  sm: 'min-h-8 px-3 text-sm gap-1.5',
  md: 'min-h-10 px-4 text-base gap-2',
  lg: 'min-h-12 px-5 text-lg gap-2',
};

/** Class names of a button, for a link that looks like one: `<Link className={buttonClasses({ tone: 'quiet' })}>`. */
export function buttonClasses({
  tone = 'quiet',
  size = 'md',
  wide = false,
  className,
}: { tone?: ButtonTone; size?: ButtonSize; wide?: boolean; className?: string } = {}): string {
  return classNames(
    'relative inline-flex items-center justify-center rounded-lg text-center font-semibold',
    'select-none transition-colors disabled:cursor-not-allowed disabled:opacity-55 aria-disabled:cursor-not-allowed aria-disabled:opacity-55',
    '[&_svg]:size-4 [&_svg]:shrink-0',
    tone === 'link' ? 'font-medium' : classNames(sizes[size], 'py-1 leading-tight pointer-coarse:min-h-11'),
    tones[tone],
    wide && 'w-full',
    className,
  );
}

export type ButtonProps = ComponentProps<'button'> & {
  tone?: ButtonTone;
  size?: ButtonSize;
  wide?: boolean;
  /** Work is under way: the button keeps its width, shows a spinner and takes no second press. */
  busy?: boolean;
  /** Gives the look to the only child, e.g. a link. */
  asChild?: boolean;
  icon?: ReactNode;
};

/** A button. `primary` (ember) is for the one next action of a screen; everything else is `quiet` or less. */
export function Button({
  tone,
  size,
  wide,
  busy = false,
  asChild = false,
  icon,
  className,
  children,
  disabled,
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  const classes = buttonClasses({ tone, size, wide, className });
  if (asChild) {
    return (
      <Slot.Root className={classes} onClick={onClick} {...rest}>
        {children}
      </Slot.Root>
    );
  }
  return (
    <button
      type={type}
      className={classes}
      disabled={disabled}
      // A busy button stays focusable, so that a screen reader does not lose its place.
      aria-disabled={busy || undefined}
      aria-busy={busy || undefined}
      onClick={busy ? (event) => event.preventDefault() : onClick}
      {...rest}
    >
      {busy ? (
        <span className="absolute inset-0 grid place-items-center">
          <Spinner />
        </span>
      ) : null}
      <span className={classNames('contents', busy && '[&>*]:opacity-0')}>
        {icon}
        <span className={busy ? 'opacity-0' : 'contents'}>{children}</span>
      </span>
    </button>
  );
}
