import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defineIncompleteDominant, defineRecessive } from '@/lib/genetics/define-locus';
import { genotypesOf, phenotypesOf } from '@/lib/genetics/genotype';
import type { LocusDefinition, SexSystem } from '@/lib/genetics/locus';
import { inferPedigree } from '@/lib/genetics/pedigree/infer';
import type { Evidence, PedigreeMember } from '@/lib/genetics/pedigree/pedigree-input';
import { listAllAssignments, type PlainAnimal } from './brute-force';

const source = { citation: 'made up for the test', certainty: 'memory' } as const;
const recessive = defineRecessive({ id: 'r', name: 'Pale', allele: 'p', source });
const partial = defineIncompleteDominant({ id: 'i', name: 'Bright', allele: 'B', penetrance: '4/5', source });
const lethal = defineIncompleteDominant({ id: 'l', name: 'Grey', allele: 'G', lethalDouble: true, source });
const onX = defineRecessive({ id: 'x', name: 'Ash', allele: 'a', chromosome: 'X', source });
const onZ = defineRecessive({ id: 'z', name: 'Ash', allele: 'a', chromosome: 'Z', source });
const kinds: { locus: LocusDefinition; system: SexSystem }[] = [
  { locus: recessive, system: 'XY' },
  { locus: partial, system: 'ZW' },
  { locus: lethal, system: 'TSD' },
  { locus: onX, system: 'XY' },
  { locus: onZ, system: 'ZW' },
];

/** Small random pedigrees with loops, several sires and young without a sire. */
const pedigrees = fc
  .tuple(
    fc.constantFrom(...kinds),
    fc.array(
      fc.record({
        male: fc.boolean(),
        parents: fc.constantFrom('none', 'both', 'both', 'sires', 'group', 'dam', 'alone'),
        sire: fc.nat(),
        other: fc.nat(),
        dam: fc.nat(),
        share: fc.integer({ min: 1, max: 9 }),
        look: fc.option(fc.nat(), { nil: null }),
        test: fc.option(fc.tuple(fc.nat(), fc.integer({ min: 1, max: 4 })), { nil: null, freq: 3 }),
        retention: fc.integer({ min: 0, max: 4 }),
      }),
      { minLength: 2, maxLength: 6 },
    ),
    fc.integer({ min: 1, max: 9 }),
  )
  .map(([{ locus, system }, drafts, mutant]) => {
    const animals: PlainAnimal[] = [];
    const groups = new Map<string, Record<string, number>>();
    drafts.forEach((draft, index) => {
      const sex = draft.male ? ('male' as const) : ('female' as const);
      const males = animals.filter((animal) => animal.sex === 'male').map(({ id }) => id);
      const females = animals.filter((animal) => animal.sex === 'female').map(({ id }) => id);
      const animal: PlainAnimal = { id: `a${index}`, sex, sire: null, dam: null };
      const sire = males[draft.sire % Math.max(1, males.length)] ?? null;
      const other = males[draft.other % Math.max(1, males.length)] ?? null;
      const dam = females[draft.dam % Math.max(1, females.length)] ?? null;
      if (draft.parents === 'both' && sire && dam) Object.assign(animal, { sire, dam });
      if (draft.parents === 'dam') animal.dam = dam;
      if (
        (draft.parents === 'sires' || draft.parents === 'group') &&
        sire &&
        other &&
        sire !== other &&
        dam
      ) {
        const sires = { [sire]: draft.share / 10, [other]: 1 - draft.share / 10 };
        animal.dam = dam;
        animal.sires = draft.parents === 'group' ? (groups.get('g') ?? sires) : sires;
        if (draft.parents === 'group') {
          groups.set('g', animal.sires);
          animal.sireGroup = 'g';
        }
      }
      const hemizygous = locus.chromosome !== 'autosomal';
      if (draft.parents === 'alone' && dam && !hemizygous) {
        Object.assign(animal, { dam, parthenogenetic: true, retention: draft.retention / 4 });
      }
      const phenotypes = phenotypesOf(locus);
      if (draft.look !== null) animal.phenotype = phenotypes[draft.look % phenotypes.length] ?? '';
      const genotypes = genotypesOf(locus, sex, system);
      if (draft.test)
        animal.test = {
          genotype: genotypes[draft.test[0] % genotypes.length] ?? '',
          error: draft.test[1] / 10,
        };
      animals.push(animal);
    });
    return { locus, system, animals, frequencies: { '+': 1 - mutant / 10, [locus.symbol]: mutant / 10 } };
  });

function members(animals: readonly PlainAnimal[]): PedigreeMember[] {
  return animals.map(({ phenotype: _phenotype, test: _test, ...member }) => member);
}

function evidenceOf(animals: readonly PlainAnimal[], locus: string): Evidence[] {
  return animals.flatMap(({ id, phenotype, test }): Evidence[] => [
    ...(phenotype === undefined ? [] : [{ animal: id, locus, kind: 'phenotype', phenotype } as const]),
    ...(test ? [{ animal: id, locus, kind: 'test', ...test } as const] : []),
  ]);
}

describe('inference over a pedigree', () => {
  it('agrees with listing every joint assignment', () => {
    fc.assert(
      fc.property(pedigrees, ({ locus, system, animals, frequencies }) => {
        const plain = listAllAssignments(animals, locus, system, frequencies);
        const result = inferPedigree({
          sexSystem: system,
          loci: [locus],
          animals: members(animals),
          evidence: evidenceOf(animals, locus.id),
          frequencies: { [locus.id]: frequencies },
        });
        expect(result.impossible).toBe(plain.total === 0);
        if (result.impossible) return;
        // Both are the probability of the same evidence.
        expect(Math.exp(result.logLikelihood)).toBeCloseTo(plain.total, 12);
        for (const [id, chances] of plain.genotypes) {
          const found = result.beliefs.get(locus.id)?.get(id);
          for (const key of new Set([...chances.keys(), ...(found?.keys() ?? [])])) {
            expect(found?.get(key) ?? 0).toBeCloseTo(chances.get(key) ?? 0, 10);
          }
        }
        for (const [group, chances] of plain.sires) {
          for (const [sire, p] of chances) expect(result.sires.get(group)?.get(sire) ?? 0).toBeCloseTo(p, 10);
        }
      }),
      { numRuns: 300 },
    );
  });

  it('tells an unknown sex and a possible sire from what other loci show', () => {
    // An ash mother's ash-showing X sons and normal daughters of a normal father: the look tells the sex.
    const result = inferPedigree({
      sexSystem: 'XY',
      loci: [onX, recessive],
      animals: [
        { id: 'd', sex: 'female' },
        { id: 's', sex: 'male' },
        { id: 't', sex: 'male' },
        { id: 'y', sex: 'unknown', dam: 'd', sires: { s: 0.5, t: 0.5 } },
      ],
      evidence: [
        { animal: 'd', locus: 'x', kind: 'prior', genotypes: { 'a/a': 1 } },
        { animal: 's', locus: 'x', kind: 'prior', genotypes: { '+': 1 } },
        { animal: 't', locus: 'x', kind: 'prior', genotypes: { '+': 1 } },
        { animal: 'y', locus: 'x', kind: 'phenotype', phenotype: 'Ash' },
        { animal: 'd', locus: 'r', kind: 'prior', genotypes: { 'p/p': 1 } },
        { animal: 's', locus: 'r', kind: 'prior', genotypes: { '+/+': 1 } },
        { animal: 't', locus: 'r', kind: 'prior', genotypes: { '+/p': 1 } },
        { animal: 'y', locus: 'r', kind: 'phenotype', phenotype: '' },
      ],
    });
    expect(result.chanceOfMale.get('y')).toBe(1);
    // Normal from a pale dam: certain with s, one in two with t, so 2 to 1 for s.
    expect(result.sires.get('own:y')?.get('s')).toBeCloseTo(2 / 3, 12);
    expect(result.beliefs.get('r')?.get('y')?.get('+/p')).toBeCloseTo(1, 12);
  });

  it('keeps a father-daughter loop exact', () => {
    // s is het; dam is wild; their daughter is het with 1/2; young of father and daughter: P(p/p) = 1/2 · 1/4.
    const result = inferPedigree({
      sexSystem: 'XY',
      loci: [recessive],
      animals: [
        { id: 's', sex: 'male' },
        { id: 'd', sex: 'female' },
        { id: 'x', sex: 'female', sire: 's', dam: 'd' },
        { id: 'y', sex: 'unknown', sire: 's', dam: 'x' },
      ],
      evidence: [
        { animal: 's', locus: 'r', kind: 'prior', genotypes: { '+/p': 1 } },
        { animal: 'd', locus: 'r', kind: 'prior', genotypes: { '+/+': 1 } },
      ],
    });
    expect(result.beliefs.get('r')?.get('y')?.get('p/p')).toBeCloseTo(1 / 8, 12);
  });

  it('refuses a female sire, a circle of descent and a pair of alleles where one fits', () => {
    const infer = (animals: PedigreeMember[], evidence: Evidence[] = []) =>
      inferPedigree({ sexSystem: 'ZW', loci: [onZ], animals, evidence });
    expect(() =>
      infer([
        { id: 's', sex: 'female' },
        { id: 'y', sex: 'male', sire: 's' },
      ]),
    ).toThrow(/sire of y, is female/);
    expect(() =>
      infer([
        { id: 'a', sex: 'male', sire: 'b' },
        { id: 'b', sex: 'male', sire: 'a' },
      ]),
    ).toThrow(/own ancestor/);
    expect(() =>
      infer(
        [{ id: 'f', sex: 'female' }],
        [{ animal: 'f', locus: 'z', kind: 'prior', genotypes: { '+/a': 1 } }],
      ),
    ).toThrow(/female cannot be/);
  });

  it('says what it could not compute, and computes the rest', () => {
    const animals: PedigreeMember[] = [
      { id: 's', sex: 'male' },
      { id: 'd', sex: 'female' },
      { id: 'y', sex: 'female', sire: 's', dam: 'd' },
      { id: 'alone', sex: 'female' },
    ];
    const evidence: Evidence[] = [{ animal: 'alone', locus: 'r', kind: 'phenotype', phenotype: 'Pale' }];
    const result = inferPedigree({ sexSystem: 'XY', loci: [recessive], animals, evidence, largestTable: 10 });
    expect(result.tooEntangled.map(({ animal }) => animal).toSorted()).toEqual(['d', 's', 'y']);
    expect(result.beliefs.get('r')?.get('alone')?.get('p/p')).toBe(1);
    expect(result.beliefs.get('r')?.has('y')).toBe(false);
  });

  it('answers ten loci over 393 related animals without delay', () => {
    const animals: PedigreeMember[] = [];
    const evidence: Evidence[] = [];
    const loci = Array.from({ length: 10 }, (_, i) => ({ ...recessive, id: `r${i}` }));
    let state = 7;
    const draw = (below: number) => {
      state = (state * 48271) % 2147483647;
      return state % below;
    };
    // Six clutches of eight in each generation, after three males and six females kept of the one before.
    let kept = Array.from({ length: 9 }, (_, i) => ({
      id: `f${i}`,
      sex: i < 3 ? ('male' as const) : ('female' as const),
    }));
    for (const founder of kept) animals.push(founder);
    for (let generation = 0; generation < 8; generation += 1) {
      const males = kept.filter(({ sex }) => sex === 'male');
      const females = kept.filter(({ sex }) => sex === 'female');
      const young: typeof kept = [];
      females.forEach((dam, clutch) => {
        const sire = males[draw(males.length)];
        for (let egg = 0; egg < 8; egg += 1) {
          const hatchling = {
            id: `g${generation}c${clutch}e${egg}`,
            sex: egg % 2 ? ('male' as const) : ('female' as const),
          };
          animals.push({ ...hatchling, sire: sire?.id ?? null, dam: dam.id });
          young.push(hatchling);
          for (const { id } of loci)
            evidence.push({ animal: hatchling.id, locus: id, kind: 'phenotype', phenotype: '' });
        }
      });
      const shuffled = young.toSorted(() => draw(3) - 1);
      kept = [
        ...shuffled.filter(({ sex }) => sex === 'male').slice(0, 3),
        ...shuffled.filter(({ sex }) => sex === 'female').slice(0, 6),
      ];
    }
    const start = performance.now();
    const result = inferPedigree({ sexSystem: 'XY', loci, animals, evidence });
    const spent = performance.now() - start;
    expect(result.impossible).toBe(false);
    expect(result.beliefs.get('r0')?.size).toBe(393);
    expect(spent).toBeLessThan(5000);
  });
});
