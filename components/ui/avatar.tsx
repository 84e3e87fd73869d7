import { classNames } from './class-names';

/** Up to two letters of a name: "Odile Verhoeven" → "OV". */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/).filter(Boolean);
  const first = words[0] ?? '?';
  const last = words.length > 1 ? (words.at(-1) ?? '') : '';
  return ([...first][0] ?? '?').toUpperCase() + ([...last][0] ?? '').toUpperCase();
}

/** A person as a disc with initials. The name stands beside it or is given by `title`. */
export function Avatar({
  name,
  size = 'md',
  className,
  labelled = false,
}: {
  name: string;
  size?: 'sm' | 'md' | 'lg';
  className?: string;
  /** True when the name does not stand beside it. */
  labelled?: boolean;
}) {
  return (
    <span
      {...(labelled ? { role: 'img', 'aria-label': name, title: name } : { 'aria-hidden': true })}
      className={classNames(
        'inline-grid shrink-0 place-items-center rounded-full bg-rule-2 font-semibold text-ink-2',
        size === 'sm' && 'size-6 text-tick',
        size === 'md' && 'size-8 text-sm',
        size === 'lg' && 'size-11 text-base',
        className,
      )}
    >
      {initialsOf(name)}
    </span>
  );
}
