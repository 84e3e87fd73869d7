import { addDays, daysBetween } from './days';

/** Days between two phases: the least, the usual and the most. */
export interface DayRange {
  from: number;
  usual: number;
  to: number;
}

/** What is usual for a species, from its profile. */
export interface SeasonIntervals {
  pairingToOvulation: DayRange;
  ovulationToPreLayShed: DayRange;
  preLayShedToLaying: DayRange;
  incubation: DayRange;
}

export type SeasonEventKind =
  'introduction' | 'separation' | 'lock' | 'refusal' | 'follicles' | 'ovulation' | 'pre_lay_shed';

/** What is planned and what was seen of one pairing; days are ISO days. */
export interface SeasonFacts {
  plan: { startsOn: string; endsOn: string };
  events: readonly { kind: SeasonEventKind; seenOn: string }[];
  clutch: { laidOn: string; hatchedOn: string | null } | null;
  bearing: 'eggs' | 'live';
}

export type PhaseCertainty = 'planned' | 'expected' | 'observed';
export interface SeasonPhase {
  kind: 'pairing' | 'lay' | 'incubation' | 'hatch';
  from: string;
  to: string;
  certainty: PhaseCertainty;
}
export interface SeasonMoment {
  kind: 'lock' | 'follicles' | 'ovulation' | 'shed' | 'lay' | 'hatch' | 'other';
  day: string;
  label: string;
}

/** A span of days in which something is expected. */
export interface DayWindow {
  from: string;
  usual: string;
  to: string;
}

export interface SeasonForecast {
  phases: SeasonPhase[];
  moments: SeasonMoment[];
  /** Null once it has happened. For live-bearing species laying is birth, and hatching the same day. */
  laying: DayWindow | null;
  hatching: DayWindow | null;
  /** What the forecast of laying starts from, in words. */
  basis: string;
}

/**
 * Sums intervals that follow one another. Usual lengths add up; their deviations are taken as independent, so the
 * distances to the earliest and the latest day add up in quadrature rather than all falling on the same side.
 */
export function sumOfIntervals(intervals: readonly DayRange[]): DayRange {
  const usual = intervals.reduce((sum, interval) => sum + interval.usual, 0);
  const early = Math.sqrt(intervals.reduce((sum, { from, usual: mid }) => sum + (mid - from) ** 2, 0));
  const late = Math.sqrt(intervals.reduce((sum, { to, usual: mid }) => sum + (to - mid) ** 2, 0));
  return { from: Math.round(usual - early), usual, to: Math.round(usual + late) };
}

const windowFrom = (day: string, range: DayRange): DayWindow => ({
  from: addDays(day, range.from),
  usual: addDays(day, range.usual),
  to: addDays(day, range.to),
});

/** The day on which something was first or last seen. */
function seen(facts: SeasonFacts, kinds: readonly SeasonEventKind[], which: 'first' | 'last'): string | null {
  const days = facts.events
    .filter(({ kind }) => kinds.includes(kind))
    .map(({ seenOn }) => seenOn)
    .sort();
  return days[which === 'first' ? 0 : days.length - 1] ?? null;
}

/** The last thing that tells when she will lay, and what is still to come after it. */
function findAnchor(
  facts: SeasonFacts,
  intervals: SeasonIntervals,
): { day: string; ahead: DayRange[]; basis: string } {
  const { pairingToOvulation, ovulationToPreLayShed, preLayShedToLaying } = intervals;
  const shed = seen(facts, ['pre_lay_shed'], 'last');
  if (shed) return { day: shed, ahead: [preLayShedToLaying], basis: 'pre-lay shed seen' };
  const ovulation = seen(facts, ['ovulation'], 'last');
  if (ovulation)
    return { day: ovulation, ahead: [ovulationToPreLayShed, preLayShedToLaying], basis: 'ovulation seen' };
  const ahead = [pairingToOvulation, ovulationToPreLayShed, preLayShedToLaying];
  const paired = seen(facts, ['lock'], 'first') ?? seen(facts, ['introduction'], 'first');
  if (paired)
    return {
      day: paired,
      ahead,
      basis: seen(facts, ['lock'], 'first') ? 'first lock' : 'first introduction',
    };
  return { day: facts.plan.startsOn, ahead, basis: 'planned start' };
}

/** What has not happened yet can't be expected before today, unless it is overdue altogether. */
function notBefore(window: DayWindow, today: string): DayWindow {
  if (window.to < today) return window;
  return {
    ...window,
    from: window.from < today ? today : window.from,
    usual: window.usual < today ? today : window.usual,
  };
}

function pairingPhases({ plan, events }: SeasonFacts, isOver: boolean, today: string): SeasonPhase[] {
  const together = events
    .filter(({ kind }) => ['introduction', 'lock', 'separation'].includes(kind))
    .map(({ seenOn }) => seenOn)
    .sort();
  const first = together[0];
  if (!first)
    return isOver ? [] : [{ kind: 'pairing', from: plan.startsOn, to: plan.endsOn, certainty: 'planned' }];
  const last = together[together.length - 1] ?? first;
  const phases: SeasonPhase[] = [{ kind: 'pairing', from: first, to: last, certainty: 'observed' }];
  const restFrom = last < today ? today : addDays(last, 1);
  if (!isOver && restFrom <= plan.endsOn)
    phases.push({ kind: 'pairing', from: addDays(last, 1), to: plan.endsOn, certainty: 'planned' });
  return phases;
}

const momentOf: Partial<Record<SeasonEventKind, { kind: SeasonMoment['kind']; label: string }>> = {
  lock: { kind: 'lock', label: 'lock' },
  follicles: { kind: 'follicles', label: 'follicle check' },
  ovulation: { kind: 'ovulation', label: 'ovulation' },
  pre_lay_shed: { kind: 'shed', label: 'pre-lay shed' },
  refusal: { kind: 'other', label: 'refused to pair' },
};

/**
 * Phases of a pairing's season: observed where something was seen, expected from the last thing seen, planned before
 * anything was. Forecasts use the species' usual intervals; see `sumOfIntervals` for how their spread adds up.
 * @param today ISO day; nothing that has not happened is expected earlier
 */
export function forecastSeason(
  facts: SeasonFacts,
  intervals: SeasonIntervals,
  today: string,
): SeasonForecast {
  const { clutch, events, bearing } = facts;
  const anchor = findAnchor(facts, intervals);
  const started = anchor.basis !== 'planned start';
  const isOver =
    clutch !== null || events.some(({ kind }) => kind === 'ovulation' || kind === 'pre_lay_shed');
  const certainty: PhaseCertainty = started ? 'expected' : 'planned';
  const phases = pairingPhases(facts, isOver, today);
  const moments: SeasonMoment[] = events.flatMap(({ kind, seenOn }) => {
    const moment = momentOf[kind];
    return moment ? [{ ...moment, day: seenOn }] : [];
  });

  const laying = clutch ? null : notBefore(windowFrom(anchor.day, sumOfIntervals(anchor.ahead)), today);
  if (laying)
    phases.push({ kind: bearing === 'live' ? 'hatch' : 'lay', from: laying.from, to: laying.to, certainty });
  if (clutch)
    moments.push({ kind: 'lay', day: clutch.laidOn, label: bearing === 'live' ? 'gave birth' : 'laid' });
  if (bearing === 'live') return { phases, moments, laying, hatching: laying, basis: anchor.basis };

  const hatching = expectHatch(facts, anchor, intervals, today);
  if (clutch) {
    phases.push({
      kind: 'incubation',
      from: clutch.laidOn,
      to: clutch.hatchedOn ?? (today > clutch.laidOn ? today : clutch.laidOn),
      certainty: 'observed',
    });
    if (clutch.hatchedOn) moments.push({ kind: 'hatch', day: clutch.hatchedOn, label: 'hatched' });
  }
  if (hatching) {
    const from = clutch
      ? today > clutch.laidOn
        ? addDays(today, 1)
        : addDays(clutch.laidOn, 1)
      : addDays(laying?.to ?? hatching.from, 1);
    if (daysBetween(from, hatching.from) > 0)
      phases.push({
        kind: 'incubation',
        from,
        to: addDays(hatching.from, -1),
        certainty: clutch ? 'expected' : certainty,
      });
    phases.push({
      kind: 'hatch',
      from: hatching.from,
      to: hatching.to,
      certainty: clutch ? 'expected' : certainty,
    });
  }
  return { phases, moments, laying, hatching, basis: clutch ? 'laid' : anchor.basis };
}

function expectHatch(
  facts: SeasonFacts,
  anchor: ReturnType<typeof findAnchor>,
  intervals: SeasonIntervals,
  today: string,
): DayWindow | null {
  if (facts.clutch?.hatchedOn) return null;
  if (facts.clutch) return notBefore(windowFrom(facts.clutch.laidOn, intervals.incubation), today);
  return notBefore(windowFrom(anchor.day, sumOfIntervals([...anchor.ahead, intervals.incubation])), today);
}
