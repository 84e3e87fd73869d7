import { useId } from 'react';

export type TubState = 'settled' | 'due' | 'shed' | 'quarantine' | 'alarm' | 'empty';

export const tubStateNames: Record<TubState, string> = {
  settled: 'settled',
  due: 'due today',
  shed: 'in shed',
  quarantine: 'quarantine',
  alarm: 'needs a look',
  empty: 'empty',
};

export const tubLook: Record<TubState, string> = {
  settled: 'bg-tub-settled text-tub-ink',
  due: 'bg-tub-due text-tub-ink',
  shed: 'bg-tub-shed text-tub-ink',
  quarantine: 'bg-tub-quarantine text-tub-ink',
  alarm: 'bg-tub-alarm text-tub-ink',
  empty: 'bg-tub-empty text-tub-empty-ink',
};

/** What tells a state without colour: a bar for due, stripes for quarantine, a slanted corner for shed, a sign for alarm. */
export function TubMark({ state }: { state: TubState }) {
  const id = useId();
  switch (state) {
    case 'due':
      return <span className="absolute inset-x-0 bottom-0 h-[3px] bg-ember" />;
    case 'shed':
      return (
        <svg viewBox="0 0 10 10" className="absolute top-0 left-0 size-2.5">
          <path d="M0 0H10L0 10Z" fill="var(--slate)" />
        </svg>
      );
    case 'alarm':
      return (
        <span className="absolute top-0.5 right-1 text-base leading-none font-bold text-tub-ink">!</span>
      );
    case 'quarantine':
      return (
        <svg className="absolute inset-0 h-full w-full opacity-60">
          <defs>
            <pattern id={id} width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
              <rect width="4" height="9" fill="var(--tub-quarantine-2)" />
            </pattern>
          </defs>
          <rect width="100%" height="100%" fill={`url(#${id})`} />
        </svg>
      );
    case 'settled':
    case 'empty':
      return null;
  }
}
