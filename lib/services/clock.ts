import 'server-only';

const kept = globalThis as { moietyClock?: () => Date };

/** The time of this process. Use cases get it handed in; only jobs and the door read it. */
export function readClock(): Date {
  return kept.moietyClock?.() ?? new Date();
}

/** Lets a script (the demo scenario, a test of a deadline) live at another time; null sets it right again. */
export function setClock(clock: (() => Date) | null): void {
  kept.moietyClock = clock ?? undefined;
}

/** The calendar day of an instant in a time zone, as ISO 8601 text. */
export function dayIn(timeZone: string, at: Date): string {
  return new Intl.DateTimeFormat('en-CA', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).format(at);
}
