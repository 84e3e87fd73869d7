import { addDays, formatISO } from 'date-fns';

/** Days of the scenario, counted from the day of seeding: -30 is a month ago. ISO 8601 text. */
export function dayFromNow(now: Date, days: number): string {
  return formatISO(addDays(now, days), { representation: 'date' });
}
