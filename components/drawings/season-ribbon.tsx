'use client';

import { useEffect, useRef, useState, type KeyboardEvent } from 'react';
import { classNames } from '@/components/ui/class-names';
import { dayNumber, monthsBetween, sayDay } from './season-days';
import { SeasonLane } from './season-lane';
import type { RibbonLane } from './season-phases';

export type { RibbonLane, RibbonMoment, RibbonPhase } from './season-phases';

const MIN_MONTH = 54;

/**
 * The season: one lane a pairing across the year. Solid is what has happened, a tinted band what is expected, a dashed
 * outline what is planned. Days are ISO days; `today` comes from outside. On a phone the year scrolls sideways and the
 * heads of the lanes stay.
 */
export function SeasonRibbon({
  from,
  to,
  today,
  lanes,
  label = 'Season',
  activeId,
  onOpen,
}: {
  from: string;
  to: string;
  today: string;
  lanes: readonly RibbonLane[];
  label?: string;
  activeId?: string | null;
  onOpen?: (id: string) => void;
}) {
  const scroller = useRef<HTMLDivElement>(null);
  const axis = useRef<HTMLDivElement>(null);
  const list = useRef<HTMLUListElement>(null);
  const [width, setWidth] = useState(720);
  const start = dayNumber(from);
  const span = Math.max(1, dayNumber(to) - start);
  const at = (day: number) => ((day - start) / span) * 100;
  const months = monthsBetween(from, to);
  const now = at(dayNumber(today));
  const showsToday = now >= 0 && now <= 100;

  useEffect(() => {
    const element = axis.current;
    if (!element) return;
    const observer = new ResizeObserver(() => setWidth(element.clientWidth));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);

  useEffect(() => {
    // Where the year does not fit, open it at today instead of at its start.
    const box = scroller.current;
    const chart = axis.current;
    if (!box || !chart || !showsToday || box.scrollWidth <= box.clientWidth) return;
    box.scrollLeft = chart.offsetLeft + (chart.clientWidth * now) / 100 - box.clientWidth / 2;
  }, [now, showsToday]);

  const onKeyDown = (event: KeyboardEvent<HTMLUListElement>) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    const buttons = [...(list.current?.querySelectorAll<HTMLElement>('[data-lane]') ?? [])];
    const current = buttons.findIndex((button) => button === document.activeElement);
    if (current < 0) return;
    buttons[current + step]?.focus();
    event.preventDefault();
  };

  return (
    <div
      ref={scroller}
      className="relative overflow-x-auto"
      style={{ ['--chart' as string]: `${months.length * MIN_MONTH}px` }}
    >
      <div className="min-w-[max(100%,var(--chart))] sm:min-w-[max(100%,calc(var(--chart)+15rem))]">
        <div className="flex border-b border-rule">
          <div className="w-60 shrink-0 max-sm:hidden" />
          <div ref={axis} className="relative h-10 min-w-(--chart) flex-1">
            {months.map((month, index) => (
              <span
                key={month.day}
                className="absolute bottom-1 pl-1 text-sm leading-4 text-ink-3"
                style={{ left: `${at(month.day)}%` }}
              >
                {index === 0 || month.name === 'Jan' ? (
                  <span className="block text-tick">{month.year}</span>
                ) : null}
                {month.name}
              </span>
            ))}
            {showsToday ? (
              <span
                aria-hidden
                className={classNames(
                  'absolute top-0 z-10 rounded-sm bg-ember px-1 text-tick leading-4 font-semibold whitespace-nowrap text-on-ember',
                  now > 95 ? '-translate-x-full' : now < 5 ? '' : '-translate-x-1/2',
                )}
                style={{ left: `${now}%` }}
              >
                today
              </span>
            ) : null}
          </div>
        </div>
        <div className="relative">
          <div aria-hidden className="pointer-events-none absolute inset-y-0 right-0 left-0 sm:left-60">
            {months.map((month) => (
              <span
                key={month.day}
                className="absolute inset-y-0 w-px bg-rule-2"
                style={{ left: `${at(month.day)}%` }}
              />
            ))}
          </div>
          <ul ref={list} aria-label={label} onKeyDown={onKeyDown}>
            {lanes.map((lane) => (
              <SeasonLane
                key={lane.id}
                lane={lane}
                at={at}
                width={width}
                now={showsToday ? now : null}
                active={lane.id === activeId}
                onOpen={onOpen ? () => onOpen(lane.id) : undefined}
              />
            ))}
          </ul>
        </div>
      </div>
      <p className="sr-only">
        From {sayDay(from)} to {sayDay(to)}; today is {sayDay(today)}.
      </p>
    </div>
  );
}

/** The key to the ribbon: what solid, tinted and dashed mean. */
export function SeasonKey() {
  const items = [
    { look: 'bg-slate border-slate', text: 'happened' },
    { look: 'bg-straw-tint border-straw', text: 'expected' },
    { look: 'border-edge border-dashed', text: 'planned' },
  ];
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-sm text-ink-2">
      {items.map((item) => (
        <li key={item.text} className="flex items-center gap-1.5">
          <span aria-hidden className={classNames('h-3 w-6 rounded-[2px] border', item.look)} />
          {item.text}
        </li>
      ))}
    </ul>
  );
}
