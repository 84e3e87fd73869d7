'use client';

import { useRef, useState, type KeyboardEvent } from 'react';
import { classNames } from '@/components/ui/class-names';
import { tubLook, TubMark, tubStateNames, type TubState } from './tub-state';

export type { TubState } from './tub-state';

/** A tub in its place. The label is the whole name ("B4"); `title` says more: "BP-102, due today". */
export type WallTub = { id: string; label: string; state: TubState; title?: string };

/** A rack seen from the front. Tubs come row by row from the top left; a missing place is null. */
export type WallRack = {
  id: string;
  name: string;
  note?: string;
  rows: number;
  columns: number;
  tubs: readonly (WallTub | null)[];
};

function tubSize(rack: WallRack): { width: number; height: number; showsLabel: boolean } {
  const width =
    rack.columns <= 1 ? 92 : rack.columns === 2 ? 62 : rack.columns <= 4 ? 46 : rack.columns <= 6 ? 34 : 28;
  const height = rack.rows <= 4 ? 72 : rack.rows <= 8 ? 52 : rack.rows <= 10 ? 40 : 30;
  return { width, height, showsLabel: width >= 44 };
}

/** A wall of a room seen from the front: its racks side by side on the floor, each tub in its place. */
export function RackWall({
  racks,
  label = 'Wall',
  selectedId,
  onOpen,
}: {
  racks: readonly WallRack[];
  label?: string;
  selectedId?: string | null;
  onOpen?: (tubId: string) => void;
}) {
  return (
    <div role="group" aria-label={label} className="overflow-x-auto pb-1">
      <div className="w-fit min-w-full">
        <div className="flex items-end gap-4 px-1.5 pt-1">
          {racks.map((rack) => (
            <Rack key={rack.id} rack={rack} selectedId={selectedId} onOpen={onOpen} />
          ))}
        </div>
        <div aria-hidden className="h-1.5 bg-edge" />
      </div>
    </div>
  );
}

function Rack({
  rack,
  selectedId,
  onOpen,
}: {
  rack: WallRack;
  selectedId?: string | null;
  onOpen?: (tubId: string) => void;
}) {
  const grid = useRef<HTMLDivElement>(null);
  const firstTub = rack.tubs.findIndex((tub) => tub !== null);
  const [focused, setFocused] = useState(firstTub);
  const { width, height, showsLabel } = tubSize(rack);

  const onKeyDown = (event: KeyboardEvent, index: number) => {
    const step = { ArrowRight: 1, ArrowLeft: -1, ArrowDown: rack.columns, ArrowUp: -rack.columns }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    // Steps over places without a tub.
    let next = index + step;
    while (next >= 0 && next < rack.tubs.length && !rack.tubs[next]) next += step;
    if (!rack.tubs[next]) return;
    setFocused(next);
    grid.current?.querySelector<HTMLElement>(`[data-place="${next}"]`)?.focus();
  };

  return (
    <section
      aria-label={`Rack ${rack.name}${rack.note ? `, ${rack.note}` : ''}`}
      className="shrink-0 rounded-t-lg border border-b-0 border-rack bg-rack p-1.5 dark:border-rule pb-2"
    >
      <h3 className="max-w-min min-w-full px-1 pt-0.5 pb-1.5 font-sans text-sm font-normal text-rail-ink-2 [font-stretch:100%]">
        <span className="font-bold text-rail-ink">{rack.name}</span> {rack.note}
      </h3>
      <div
        ref={grid}
        className="grid gap-[3px] [--tub-least:0px] pointer-coarse:[--tub-least:44px]"
        style={{
          gridTemplateColumns: `repeat(${rack.columns}, minmax(max(${width}px, var(--tub-least)), 1fr))`,
          gridAutoRows: `max(${height}px, var(--tub-least))`,
        }}
      >
        {rack.tubs.slice(0, rack.rows * rack.columns).map((tub, index) => {
          if (!tub) return <span key={`gap-${index}`} />;
          const said = `${tub.label}: ${tub.title ?? tubStateNames[tub.state]}`;
          const classes = classNames(
            'relative overflow-hidden rounded-[3px] font-mono text-sm font-semibold focus-visible:z-10 focus-visible:outline-rail-ink',
            tubLook[tub.state],
            selectedId === tub.id && 'z-10 outline-2 outline-offset-1 outline-rail-ember',
          );
          const inside = (
            <>
              <TubMark state={tub.state} />
              {showsLabel ? (
                <span className="absolute inset-x-0 bottom-1 text-center leading-none">{tub.label}</span>
              ) : null}
            </>
          );
          return onOpen ? (
            <button
              key={tub.id}
              type="button"
              data-place={index}
              tabIndex={index === focused ? 0 : -1}
              title={said}
              aria-label={said}
              aria-pressed={selectedId === tub.id}
              onFocus={() => setFocused(index)}
              onKeyDown={(event) => onKeyDown(event, index)}
              onClick={() => onOpen(tub.id)}
              className={classes}
            >
              {inside}
            </button>
          ) : (
            <span key={tub.id} role="img" aria-label={said} title={said} className={classes}>
              {inside}
            </span>
          );
        })}
      </div>
    </section>
  );
}

/** The key to the wall, with how many tubs are in each state. */
export function RackWallKey({ counts }: { counts: Partial<Record<TubState, number>> }) {
  const states = (Object.keys(tubStateNames) as TubState[]).filter((state) => counts[state] !== undefined);
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1.5 text-base">
      {states.map((state) => (
        <li key={state} className="flex items-center gap-2">
          <span
            aria-hidden
            className={classNames('relative h-4 w-6 overflow-hidden rounded-[2px]', tubLook[state])}
          >
            <TubMark state={state} />
          </span>
          {tubStateNames[state]} <span className="font-mono">{counts[state]}</span>
        </li>
      ))}
    </ul>
  );
}
