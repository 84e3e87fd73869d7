import { describe, expect, it } from 'vitest';
import { dayNumber, monthsBetween, sayDay, trackSpans } from '@/components/drawings/season-days';

describe('days of the ribbon', () => {
  it('counts days over a leap day', () => {
    expect(dayNumber('2028-03-01') - dayNumber('2028-02-28')).toBe(2);
    expect(dayNumber('2027-03-01') - dayNumber('2027-02-28')).toBe(1);
    expect(sayDay('2027-08-12')).toBe('12 Aug 2027');
  });

  it('names every month of a season once, a cut first month from where it begins', () => {
    const months = monthsBetween('2026-11-15', '2027-11-01');
    expect(months.map((month) => month.name).join(' ')).toBe(
      'Nov Dec Jan Feb Mar Apr May Jun Jul Aug Sep Oct',
    );
    expect(months[0]?.day).toBe(dayNumber('2026-11-15'));
    expect(months[2]).toEqual({ day: dayNumber('2027-01-01'), name: 'Jan', year: 2027 });
  });

  it('puts only what overlaps in time into another track', () => {
    expect(
      trackSpans([
        { start: 0, end: 10 },
        { start: 10, end: 20 },
      ]),
    ).toEqual([0, 0]);
    expect(
      trackSpans([
        { start: 5, end: 12 },
        { start: 0, end: 6 },
        { start: 6, end: 9 },
      ]),
    ).toEqual([1, 0, 0]);
  });
});
