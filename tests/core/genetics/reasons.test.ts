import { describe, expect, it } from 'vitest';
import { defineRecessive } from '@/lib/genetics/define-locus';
import { explainContradiction } from '@/lib/genetics/pedigree/contradiction';
import { explainBelief } from '@/lib/genetics/pedigree/explain-belief';
import type { Evidence, PedigreeInput } from '@/lib/genetics/pedigree/pedigree-input';

const locus = defineRecessive({
  id: 'r',
  name: 'Pale',
  allele: 'p',
  source: { citation: 'made up for the test', certainty: 'memory' },
});
const looks = (animal: string, phenotype: string): Evidence => ({
  animal,
  locus: 'r',
  kind: 'phenotype',
  phenotype,
});
const family: PedigreeInput = {
  sexSystem: 'XY',
  loci: [locus],
  animals: [
    { id: 's', sex: 'male' },
    { id: 'd', sex: 'female' },
    { id: 'y', sex: 'female', sire: 's', dam: 'd' },
    { id: 'm', sex: 'male' },
    { id: 'k', sex: 'unknown', sire: 'm', dam: 'y' },
    { id: 'other', sex: 'unknown', sire: 'm', dam: 'd' },
  ],
  evidence: [],
};

describe('contradictions', () => {
  it('names the smallest set behind a normal young of two visuals', () => {
    const input = {
      ...family,
      evidence: [looks('s', 'Pale'), looks('d', 'Pale'), looks('y', ''), looks('m', ''), looks('other', '')],
    };
    const found = explainContradiction(input);
    const names = found?.records.map((record) => `${record.kind} ${record.animal}`).toSorted();
    expect(names).toEqual(['dam y', 'evidence d', 'evidence s', 'evidence y', 'sire y']);
    expect(found?.suspicions.reduce((total, { probability }) => total + probability, 0)).toBeCloseTo(1, 12);
    const ranked = found?.suspicions.map(({ probability }) => probability) ?? [];
    expect(ranked).toEqual(ranked.toSorted((a, b) => b - a));
    expect(found?.suspicions[0]?.probability).toBeGreaterThan(1 / 5);
  });

  it('finds none where there is none', () => {
    expect(explainContradiction({ ...family, evidence: [looks('s', 'Pale'), looks('y', '')] })).toBeNull();
  });
});

describe('reasons', () => {
  it('leads from the parents over the look to the young', () => {
    const het = (animal: string): Evidence => ({
      animal,
      locus: 'r',
      kind: 'prior',
      genotypes: { '+/p': 1 },
    });
    const pale: Evidence = { animal: 'm', locus: 'r', kind: 'prior', genotypes: { 'p/p': 1 } };
    const input = { ...family, evidence: [het('s'), het('d'), looks('y', ''), pale, looks('k', '')] };
    const steps = explainBelief(input, 'y', locus);
    expect(steps.map(({ about }) => about)).toEqual(['ancestors', 'own', 'descendants']);
    // Mendel: 3/4 carry something; of the three ways left when she shows nothing two carry; one normal young halves them.
    [3 / 4, 2 / 3, 1 / 2].forEach((chance, i) => expect(steps[i]?.chanceOfCarrying).toBeCloseTo(chance, 12));
    expect(steps[1]?.text).toBe('It looks normal, which rules out p/p: +/p 66.7 %, +/+ 33.3 %.');
  });
});
