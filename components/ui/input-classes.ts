import { classNames } from './class-names';

/** The look that every control with a frame shares. 16 px on touch screens, so that a phone does not zoom in. */
export function inputClasses(className?: string): string {
  return classNames(
    'w-full min-h-10 rounded-lg border border-edge bg-card px-3 py-2 text-base text-ink pointer-coarse:min-h-11 pointer-coarse:text-[1rem]',
    'hover:border-ink-3 focus-visible:outline-2 focus-visible:outline-offset-0 focus-visible:outline-focus',
    'aria-invalid:border-alarm aria-invalid:border-2 disabled:bg-shell disabled:text-ink-3 disabled:cursor-not-allowed [&[readonly]]:bg-shell',
    className,
  );
}
