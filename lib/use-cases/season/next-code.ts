/**
 * The next free codes of the form `start` + number, after the highest that is taken.
 * @param taken codes that start with `start`
 * @param digits least number of digits, filled with zeros
 */
export function nextCodes(
  start: string,
  taken: readonly string[],
  howMany: number,
  digits: number,
): string[] {
  const numbers = taken
    .map((code) => code.slice(start.length))
    .filter((rest) => /^\d+$/.test(rest))
    .map(Number);
  const highest = numbers.reduce((most, number) => Math.max(most, number), 0);
  return Array.from(
    { length: howMany },
    (_, index) => start + String(highest + 1 + index).padStart(digits, '0'),
  );
}
