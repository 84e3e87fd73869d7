import { describe, expect, it } from 'vitest';
import { checkReadiness, type Breeder } from '@/lib/season/readiness';

// Limits are set by each workspace; these are made up.
const limits = [
  { grams: 1500, months: 30, from: 'the species' },
  { grams: 1200, months: 36, from: 'the workspace' },
];
const dam: Breeder = {
  code: 'TP-002',
  sex: 'female',
  hatchedOn: '2022-07-01',
  grams: 1840,
  weighedOn: '2026-11-20',
};

describe('readiness of an animal to be paired', () => {
  it('says nothing when age and weight are enough', () => {
    expect(checkReadiness(dam, limits, '2026-12-01')).toEqual([]);
  });
  it('takes the strictest limit and names who set it', () => {
    const young = checkReadiness({ ...dam, hatchedOn: '2024-01-01' }, limits, '2026-12-01');
    expect(young).toEqual([
      { about: 'age', text: 'TP-002 will be 35 months old; the workspace asks for 36.' },
    ]);
    const light = checkReadiness({ ...dam, grams: 1499 }, limits, '2026-12-01');
    expect(light).toEqual([{ about: 'weight', text: 'TP-002 weighs 1499 g; the species asks for 1500 g.' }]);
  });
  it('is exact at the limit', () => {
    expect(checkReadiness({ ...dam, grams: 1500, hatchedOn: '2023-12-01' }, limits, '2026-12-01')).toEqual(
      [],
    );
  });
  it('warns of what is not known and of an old weight', () => {
    const unknown = checkReadiness(
      { ...dam, hatchedOn: null, grams: null, weighedOn: null },
      limits,
      '2026-12-01',
    );
    expect(unknown.map(({ about }) => about)).toEqual(['age', 'weight']);
    expect(checkReadiness({ ...dam, weighedOn: '2026-09-01' }, limits, '2026-12-01')[0]?.text).toContain(
      '91 days',
    );
  });
});
