const DAY_MS = 86_400_000;
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** Number of an ISO day (`2027-08-12`) in days since 1970; `NaN` for what is no day. */
export function dayNumber(isoDay: string): number {
  return Date.parse(`${isoDay.slice(0, 10)}T00:00:00Z`) / DAY_MS;
}

/** "12 Aug 2027". */
export function sayDay(isoDay: string): string {
  const date = new Date(dayNumber(isoDay) * DAY_MS);
  return `${date.getUTCDate()} ${MONTHS[date.getUTCMonth()] ?? ''} ${date.getUTCFullYear()}`;
}

/** The months that begin within a span of days, with the day each begins. A first month that is cut counts from `from`. */
export function monthsBetween(from: string, to: string): { day: number; name: string; year: number }[] {
  const start = new Date(dayNumber(from) * DAY_MS);
  const end = dayNumber(to);
  const months: { day: number; name: string; year: number }[] = [];
  for (let step = 0; step < 240; step += 1) {
    const first = new Date(Date.UTC(start.getUTCFullYear(), start.getUTCMonth() + step, 1));
    const day = first.getTime() / DAY_MS;
    if (day >= end) break;
    months.push({
      day: Math.max(day, dayNumber(from)),
      name: MONTHS[first.getUTCMonth()] ?? '',
      year: first.getUTCFullYear(),
    });
  }
  return months;
}

/** Puts spans that overlap in time into as few tracks as possible, in order of their start. Returns the track of each. */
export function trackSpans(spans: readonly { start: number; end: number }[]): number[] {
  const ends: number[] = [];
  const tracks = spans.map(() => 0);
  const order = spans
    .map((span, index) => ({ ...span, index }))
    .sort((a, b) => a.start - b.start || a.end - b.end);
  for (const span of order) {
    let track = ends.findIndex((end) => end <= span.start);
    if (track < 0) track = ends.length;
    ends[track] = span.end;
    tracks[span.index] = track;
  }
  return tracks;
}
