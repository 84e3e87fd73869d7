import { describe, expect, it } from 'vitest';
import type { ReferenceCase } from '@/scripts/reference/case-kind';
import { loadCaseKinds, runCase } from '@/scripts/reference/run-cases';
import published from './published-cases.json';

// Each case names its source and how certain it is.
const cases = published.cases as unknown as ReferenceCase[];
const kinds = await loadCaseKinds();

describe('published worked examples', () => {
  it.each(cases.map((given) => [given.id, given] as const))('%s', (_id, given) => {
    const outcome = runCase(kinds, given);
    expect(outcome.message).toBeNull();
    expect(outcome.findings.filter(({ ok }) => !ok)).toEqual([]);
    expect(outcome.findings.length).toBeGreaterThan(0);
  });

  it('fails on a wrong value, an unknown kind and a missing answer', () => {
    const [first] = cases;
    if (!first) throw new Error('no cases');
    expect(runCase(kinds, { ...first, expected: { lethal: '1/4' } }).ok).toBe(false);
    expect(runCase(kinds, { ...first, kind: 'guess' }).ok).toBe(false);
    expect(runCase(kinds, { ...first, expected: {} }).ok).toBe(false);
    expect(runCase(kinds, { ...first, error: true }).ok).toBe(false);
  });
});
