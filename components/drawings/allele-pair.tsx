import { useId } from 'react';
import { classNames } from '@/components/ui/class-names';

/** One parental copy of a locus. `probability` (0–1) is that the copy is the mutant one; 1 is certain, 0 is wild type. */
export type AlleleCopy = { letter: string; probability: number };

const sizes = { sm: 'h-6 w-12 text-tick', md: 'h-7 w-14 text-sm', lg: 'h-9 w-20 text-base' };

function words(copy: AlleleCopy): string {
  if (copy.probability >= 1) return `${copy.letter}, certain`;
  if (copy.probability <= 0) return 'wild type';
  return `${copy.letter} at ${Math.round(copy.probability * 100)}%`;
}

function Half({ copy, left, hatchId }: { copy: AlleleCopy; left: boolean; hatchId: string }) {
  const certain = copy.probability >= 1;
  const possible = copy.probability > 0 && copy.probability < 1;
  return (
    <span
      className={classNames(
        'relative grid flex-1 place-items-center overflow-hidden border-[1.5px] border-ink font-mono leading-none font-semibold',
        left ? 'rounded-l-full' : 'rounded-r-full',
        certain ? 'bg-ink text-paper' : 'bg-card text-ink',
      )}
    >
      {possible ? (
        <svg aria-hidden className="absolute inset-0 h-full w-full">
          <defs>
            <pattern id={hatchId} width="4" height="4" patternUnits="userSpaceOnUse">
              <path d="M-1 1 1 -1 M0 4 4 0 M3 5 5 3" stroke="var(--ink-3)" strokeWidth="1.2" />
            </pattern>
          </defs>
          <rect width={`${copy.probability * 100}%`} height="100%" fill="var(--track)" />
          <rect width={`${copy.probability * 100}%`} height="100%" fill={`url(#${hatchId})`} />
          <line
            x1={`${copy.probability * 100}%`}
            x2={`${copy.probability * 100}%`}
            y2="100%"
            stroke="var(--ink)"
          />
        </svg>
      ) : null}
      <span
        className="relative"
        // A halo keeps the letter apart from the hatching behind it.
        style={possible ? { WebkitTextStroke: '4px var(--card)', paintOrder: 'stroke fill' } : undefined}
      >
        {copy.letter}
      </span>
    </span>
  );
}

/**
 * A locus as a capsule of two halves, one per parental copy. Filled: the copy is there. Part-filled to the probability:
 * it may be there. Empty: wild type.
 */
export function AllelePair({
  locus,
  copies,
  size = 'md',
  note,
  className,
}: {
  /** Name of the locus, spoken: "Clown". */
  locus: string;
  copies: readonly [AlleleCopy, AlleleCopy];
  size?: keyof typeof sizes;
  /** In place of the words made from the copies, e.g. "66% carrier". */
  note?: string;
  className?: string;
}) {
  const id = useId();
  const said = `${locus}: ${note ?? `${words(copies[0])}; ${words(copies[1])}`}`;
  return (
    <span
      role="img"
      aria-label={said}
      title={said}
      className={classNames('inline-flex gap-[3px] align-middle', sizes[size], className)}
    >
      <Half copy={copies[0]} left hatchId={`${id}a`} />
      <Half copy={copies[1]} left={false} hatchId={`${id}b`} />
    </span>
  );
}
