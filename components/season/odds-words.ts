/** A fraction that a person can read, such as "5/12"; nothing for one with large numbers, where percent say more. */
export const readableOdds = (odds: string): string | undefined => (odds.length <= 7 ? odds : undefined);

/** "41", or "4.9" for few. */
export const sayCount = (count: number) =>
  count >= 10 ? String(Math.round(count)) : count.toFixed(1).replace(/\.0$/, '');

/** "Season 2026–27": the year in which the young are expected and the one before. */
export const saySeason = (season: number) => `Season ${season - 1}–${String(season % 100).padStart(2, '0')}`;

/** "4 y 2 mo", "7 mo". */
export function sayMonths(months: number | null): string {
  if (months === null) return 'not known';
  const years = Math.floor(months / 12);
  const rest = months % 12;
  if (years === 0) return `${months} mo`;
  return rest === 0 ? `${years} y` : `${years} y ${rest} mo`;
}

/** "1 Dec, 21:14" in the workspace's time zone. */
export function sayMoment(instant: string, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    hour: '2-digit',
    minute: '2-digit',
    timeZone,
  }).format(new Date(instant));
}
