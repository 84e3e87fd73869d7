const DAY_MS = 86_400_000;

/** Number of an ISO day (`2027-08-12`) in days since 1 January 1970. */
export function dayNumber(isoDay: string): number {
  return Date.parse(`${isoDay}T00:00:00Z`) / DAY_MS;
}

/** The ISO day of a day number. */
export function dayOfNumber(day: number): string {
  return new Date(day * DAY_MS).toISOString().slice(0, 10);
}

/** The ISO day `days` days later (earlier when negative). */
export function addDays(isoDay: string, days: number): string {
  return dayOfNumber(dayNumber(isoDay) + days);
}

/** Days from one ISO day to another. */
export function daysBetween(from: string, to: string): number {
  return dayNumber(to) - dayNumber(from);
}

/** Full months from one ISO day to a later one, as ages are counted; 0 when it is not later. */
export function wholeMonths(from: string, to: string): number {
  const [fromYear = 0, fromMonth = 0, fromDay = 0] = from.split('-').map(Number);
  const [toYear = 0, toMonth = 0, toDay = 0] = to.split('-').map(Number);
  return Math.max(0, (toYear - fromYear) * 12 + toMonth - fromMonth - (toDay < fromDay ? 1 : 0));
}
