'use client';

import { Fragment } from 'react';
import { classNames } from '@/components/ui/class-names';
import { dayNumber, sayDay, trackSpans } from './season-days';
import {
  momentLook,
  moments as momentKinds,
  phaseLook,
  phaseNames,
  type RibbonLane,
  type RibbonMoment,
} from './season-phases';

const TRACK = 24;
const DOT = 24;

function describeLane(lane: RibbonLane): string {
  const phases = lane.phases.map(
    (phase) =>
      `${phase.label ?? phaseNames[phase.kind]} ${phase.certainty}, ${sayDay(phase.from)} to ${sayDay(phase.to)}`,
  );
  const happened = (lane.moments ?? []).map((moment) => describeMoment(moment));
  return [lane.name, ...happened, ...phases].join('; ');
}

function describeMoment(moment: RibbonMoment): string {
  const said = moment.label ?? momentKinds[moment.kind].name;
  return `${said}${moment.certainty === 'observed' ? '' : `, ${moment.certainty}`}, ${sayDay(moment.day)}`;
}

/** Moments that would cover one another stand as one sign that counts them. */
function groupMoments(moments: readonly RibbonMoment[], x: (day: string) => number): RibbonMoment[][] {
  const groups: RibbonMoment[][] = [];
  for (const moment of [...moments].sort((a, b) => dayNumber(a.day) - dayNumber(b.day))) {
    const last = groups.at(-1);
    const lead = last?.[0];
    const room = last && last.length > 1 ? DOT * 1.7 : DOT;
    if (last && lead && x(moment.day) - x(lead.day) < room) last.push(moment);
    else groups.push([moment]);
  }
  return groups;
}

/** Free px to the right of a span in its own track. */
function roomAfter(
  spans: readonly { start: number; end: number }[],
  tracks: readonly number[],
  index: number,
  at: (day: number) => number,
  width: number,
): number {
  const end = spans[index]?.end ?? 0;
  const next = spans.filter(
    (span, other) => tracks[other] === tracks[index] && span.start >= end && other !== index,
  );
  const limit = Math.min(100, ...next.map((span) => at(span.start)));
  return ((limit - at(end)) / 100) * width;
}

/** One lane: the head at the left, moments above, phases below, in tracks where they overlap in time. */
export function SeasonLane({
  lane,
  at,
  width,
  now,
  active,
  onOpen,
}: {
  lane: RibbonLane;
  /** Place of a day on the axis, in %. */
  at: (day: number) => number;
  /** Width of the axis in px, to know which names fit into their bars. */
  width: number;
  /** Place of today on the axis, in %. */
  now: number | null;
  active: boolean;
  onOpen?: () => void;
}) {
  const spans = lane.phases.map((phase) => ({ start: dayNumber(phase.from), end: dayNumber(phase.to) + 1 }));
  const tracks = trackSpans(spans);
  const trackCount = Math.max(1, ...tracks.map((track) => track + 1));
  const dots = groupMoments(lane.moments ?? [], (day) => (at(dayNumber(day)) / 100) * width);
  const top = dots.length > 0 ? DOT + 4 : 0;

  return (
    <li
      className={classNames(
        'relative border-b border-rule-2 sm:flex',
        active && 'bg-chosen shadow-[inset_3px_0_0_var(--ember)]',
        onOpen && 'hover:bg-hover',
      )}
    >
      {onOpen ? (
        <button
          type="button"
          data-lane=""
          aria-current={active || undefined}
          aria-label={`Open ${describeLane(lane)}`}
          onClick={onOpen}
          className="absolute inset-0 z-[6] focus-visible:-outline-offset-2"
        />
      ) : (
        <span className="sr-only">{describeLane(lane)}</span>
      )}
      <div
        className={classNames(
          'sticky left-0 z-[7] shrink-0 px-3 pt-2.5 max-sm:w-fit max-sm:max-w-[calc(100vw-2rem)] sm:w-60 sm:py-2.5',
          'pointer-events-none [&_a]:pointer-events-auto [&_button]:pointer-events-auto',
        )}
      >
        {lane.heading}
      </div>
      <div
        aria-hidden
        className="relative min-w-(--chart) flex-1 overflow-hidden"
        style={{ minHeight: top + trackCount * TRACK + 20 }}
      >
        {/* Behind the bars, which are opaque, so that their names stay readable. */}
        {now === null ? null : (
          <span className="absolute inset-y-0 w-0.5 -translate-x-1/2 bg-ember" style={{ left: `${now}%` }} />
        )}
        <div
          className="absolute inset-x-0"
          style={{ top: `calc(50% - ${(top + trackCount * TRACK) / 2}px)` }}
        >
          {lane.phases.map((phase, index) => {
            const span = spans[index];
            if (!span) return null;
            const left = Math.max(0, at(span.start));
            const right = Math.min(100, at(span.end));
            if (right <= 0 || left >= 100) return null;
            const name = phase.label ?? phaseNames[phase.kind];
            const needed = name.length * 7.2 + 12;
            const fits = ((right - left) / 100) * width > needed;
            const room = roomAfter(spans, tracks, index, at, width);
            return (
              <Fragment key={index}>
                <span
                  title={`${name} ${phase.certainty}, ${sayDay(phase.from)} – ${sayDay(phase.to)}`}
                  className={classNames(
                    'absolute flex items-center overflow-hidden rounded-[3px] border px-1.5 text-sm leading-4 font-medium whitespace-nowrap',
                    phaseLook(phase.kind, phase.certainty, lane.muted),
                  )}
                  style={{
                    left: `${left}%`,
                    width: `max(4px, ${right - left}%)`,
                    top: top + (tracks[index] ?? 0) * TRACK + 2,
                    height: TRACK - 4,
                  }}
                >
                  {fits ? name : null}
                </span>
                {!fits && room > needed ? (
                  <span
                    className="absolute pl-1 text-sm whitespace-nowrap text-ink-2"
                    style={{
                      left: `${right}%`,
                      top: top + (tracks[index] ?? 0) * TRACK + 3,
                      lineHeight: `${TRACK - 6}px`,
                    }}
                  >
                    {name}
                  </span>
                ) : null}
              </Fragment>
            );
          })}
          {dots.map((group) => {
            const lead = group[0];
            if (!lead) return null;
            const kind = momentKinds[lead.kind];
            const same = group.every((moment) => moment.kind === lead.kind);
            const place = at(dayNumber(lead.day));
            if (place < 0 || place > 100) return null;
            return (
              <span
                key={`${lead.kind}${lead.day}`}
                title={group.map(describeMoment).join('; ')}
                className={classNames(
                  'absolute top-0 grid -translate-x-1/2 place-items-center rounded-full border px-1 text-tick leading-none font-semibold whitespace-nowrap',
                  momentLook(lead.kind, lead.certainty, lane.muted),
                )}
                style={{
                  left: `clamp(${DOT / 2}px, ${place}%, calc(100% - ${DOT / 2}px))`,
                  height: DOT,
                  minWidth: DOT,
                }}
              >
                {group.length === 1
                  ? kind.letters
                  : same
                    ? `${kind.letters}×${group.length}`
                    : `${kind.letters}+${group.length - 1}`}
              </span>
            );
          })}
        </div>
      </div>
    </li>
  );
}
