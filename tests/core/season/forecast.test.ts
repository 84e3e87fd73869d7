import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addDays, daysBetween, wholeMonths } from '@/lib/season/days';
import {
  forecastSeason,
  sumOfIntervals,
  type SeasonFacts,
  type SeasonIntervals,
} from '@/lib/season/forecast';

// Made-up intervals; the checks are of the arithmetic, not of a species.
const intervals: SeasonIntervals = {
  pairingToOvulation: { from: 30, usual: 60, to: 120 },
  ovulationToPreLayShed: { from: 14, usual: 20, to: 28 },
  preLayShedToLaying: { from: 25, usual: 30, to: 50 },
  incubation: { from: 53, usual: 58, to: 65 },
};
const planned: SeasonFacts = {
  plan: { startsOn: '2026-11-24', endsOn: '2027-02-10' },
  events: [],
  clutch: null,
  bearing: 'eggs',
};
const seen = (...events: SeasonFacts['events']): SeasonFacts => ({ ...planned, events });

describe('days', () => {
  it('counts over a leap day', () => {
    expect(addDays('2028-02-28', 2)).toBe('2028-03-01');
    expect(daysBetween('2028-02-28', '2028-03-01')).toBe(2);
  });
  it('counts an age in full months', () => {
    expect(wholeMonths('2024-07-15', '2026-07-14')).toBe(23);
    expect(wholeMonths('2024-07-15', '2026-07-15')).toBe(24);
    expect(wholeMonths('2026-07-15', '2024-07-15')).toBe(0);
  });
});

describe('sum of intervals', () => {
  it('adds usual lengths and takes deviations in quadrature (3-4-5 triangle)', () => {
    expect(
      sumOfIntervals([
        { from: 7, usual: 10, to: 16 },
        { from: 16, usual: 20, to: 28 },
      ]),
    ).toEqual({ from: 25, usual: 30, to: 40 });
  });
  it('is never wider than adding all extremes, and keeps one interval as it is', () => {
    const interval = fc
      .tuple(fc.nat(60), fc.nat(60), fc.nat(60))
      .map(([a, b, c]) => ({ from: a, usual: a + b, to: a + b + c }));
    fc.assert(
      fc.property(fc.array(interval, { minLength: 1, maxLength: 5 }), (many) => {
        const sum = sumOfIntervals(many);
        expect(sum.from).toBeGreaterThanOrEqual(many.reduce((total, { from }) => total + from, 0));
        expect(sum.to).toBeLessThanOrEqual(many.reduce((total, { to }) => total + to, 0));
        expect(sumOfIntervals([many[0]!])).toEqual(many[0]);
      }),
    );
  });
});

describe('forecast of a season', () => {
  it('starts from the planned day while nothing was seen', () => {
    const forecast = forecastSeason(planned, intervals, '2026-11-01');
    expect(forecast.basis).toBe('planned start');
    expect(forecast.laying?.usual).toBe(addDays('2026-11-24', 110));
    expect(forecast.hatching?.usual).toBe(addDays('2026-11-24', 168));
    expect(forecast.phases.every(({ certainty }) => certainty === 'planned')).toBe(true);
  });
  it('narrows with ovulation and again with the pre-lay shed', () => {
    const width = (facts: SeasonFacts) => {
      const { laying } = forecastSeason(facts, intervals, '2026-11-01');
      return daysBetween(laying!.from, laying!.to);
    };
    const ovulated = seen({ kind: 'ovulation', seenOn: '2027-01-20' });
    const shed = seen(
      { kind: 'ovulation', seenOn: '2027-01-20' },
      { kind: 'pre_lay_shed', seenOn: '2027-02-09' },
    );
    expect(width(ovulated)).toBeLessThan(width(planned));
    expect(forecastSeason(shed, intervals, '2027-02-10').laying).toEqual({
      from: '2027-03-06',
      usual: '2027-03-11',
      to: '2027-03-31',
    });
    expect(width(shed)).toBe(25);
  });
  it('counts hatching from the day of laying and stops once hatched', () => {
    const laid: SeasonFacts = { ...planned, clutch: { laidOn: '2027-03-10', hatchedOn: null } };
    const forecast = forecastSeason(laid, intervals, '2027-03-20');
    expect(forecast.laying).toBeNull();
    expect(forecast.hatching).toEqual({ from: '2027-05-02', usual: '2027-05-07', to: '2027-05-14' });
    expect(
      forecast.phases.find(({ kind, certainty }) => kind === 'incubation' && certainty === 'observed'),
    ).toMatchObject({ from: '2027-03-10', to: '2027-03-20' });
    const hatched = forecastSeason(
      { ...laid, clutch: { laidOn: '2027-03-10', hatchedOn: '2027-05-08' } },
      intervals,
      '2027-06-01',
    );
    expect(hatched.hatching).toBeNull();
    expect(hatched.phases.every(({ certainty }) => certainty === 'observed')).toBe(true);
  });
  it('expects nothing that has not happened before today, and leaves what is overdue where it was', () => {
    const inside = forecastSeason(planned, intervals, '2027-03-20');
    expect(inside.laying!.from).toBe('2027-03-20');
    const overdue = forecastSeason(planned, intervals, '2027-12-01');
    expect(overdue.laying!.to < '2027-12-01').toBe(true);
  });
  it('has no incubation for a live-bearing species', () => {
    const forecast = forecastSeason({ ...planned, bearing: 'live' }, intervals, '2026-11-01');
    expect(forecast.phases.map(({ kind }) => kind)).toEqual(['pairing', 'hatch']);
    expect(forecast.hatching).toEqual(forecast.laying);
  });
  it('keeps phases in order of time and each from before to', () => {
    const kinds = ['introduction', 'lock', 'ovulation', 'pre_lay_shed'] as const;
    fc.assert(
      fc.property(
        fc.array(fc.nat(160), { maxLength: 4 }),
        fc.integer({ min: -30, max: 400 }),
        (offsets, todayOffset) => {
          const events = [...offsets]
            .sort((a, b) => a - b)
            .map((offset, index) => ({ kind: kinds[index]!, seenOn: addDays('2026-11-24', offset) }));
          const { phases } = forecastSeason(seen(...events), intervals, addDays('2026-11-24', todayOffset));
          for (const phase of phases) expect(phase.from <= phase.to, JSON.stringify(phase)).toBe(true);
        },
      ),
    );
  });
});
