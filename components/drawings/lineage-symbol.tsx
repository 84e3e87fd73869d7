import { useId } from 'react';

/** One pedigree symbol by itself, for the legend and the table. */
export function LineageSymbol({
  sex,
  shows = false,
  carries = 0,
  dead = false,
  hidden = false,
}: {
  sex: 'male' | 'female' | 'unknown';
  shows?: boolean;
  /** Probability of a copy, 0–1. */
  carries?: number;
  dead?: boolean;
  hidden?: boolean;
}) {
  const id = useId();
  const outline =
    sex === 'male' ? (
      <rect x="3" y="3" width="14" height="14" />
    ) : sex === 'female' ? (
      <circle cx="10" cy="10" r="7.5" />
    ) : (
      <path d="M10 1.5 18.5 10 10 18.5 1.5 10Z" />
    );
  const isPart = !shows && carries > 0 && carries < 1;
  return (
    <svg aria-hidden viewBox="0 0 20 20" className="inline-block size-5 shrink-0 align-text-bottom">
      {isPart ? (
        <>
          <clipPath id={id}>{outline}</clipPath>
          <rect
            clipPath={`url(#${id})`}
            x="0"
            width="20"
            y={20 - 20 * carries}
            height={20 * carries}
            fill="var(--ink-3)"
          />
        </>
      ) : null}
      <g
        fill={shows ? 'var(--ink)' : isPart ? 'none' : 'var(--card)'}
        stroke={hidden ? 'var(--ink-3)' : 'var(--ink)'}
        strokeWidth="1.5"
        strokeDasharray={hidden ? '2.5 2' : undefined}
      >
        {outline}
      </g>
      {!shows && carries === 1 ? <circle cx="10" cy="10" r="2.6" fill="var(--ink)" /> : null}
      {dead ? <path d="M1 19 19 1" stroke={shows ? 'var(--ink-3)' : 'var(--ink)'} strokeWidth="1.3" /> : null}
    </svg>
  );
}
