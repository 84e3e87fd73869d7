import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ancestryPaths,
  commonAncestors,
  effectiveFounders,
  founderContributions,
} from '@/lib/kinship/ancestry';
import { inbreedingCoefficients } from '@/lib/kinship/inbreeding';
import {
  inbreedingOfClutch,
  kinshipOf,
  kinshipTable,
  meanKinships,
  sexLinkedKinshipTable,
} from '@/lib/kinship/kinship';
import { orderPedigree, PedigreeError, placeIn } from '@/lib/kinship/pedigree-order';
import { relationshipOf } from '@/lib/kinship/relationship';

/** Random pedigrees: even places male, odd female. */
const pedigrees = fc
  .array(fc.tuple(fc.nat(), fc.nat(), fc.integer({ min: 0, max: 3 })), { minLength: 2, maxLength: 14 })
  .map((drafts) =>
    drafts.map(([s, d, known], i) => {
      const sire = known > 0 && i > 1 ? `a${2 * (s % Math.ceil(i / 2))}` : null;
      const dam = known > 1 && i > 1 ? `a${2 * (d % Math.floor(i / 2)) + 1}` : null;
      return { id: `a${i}`, sire, dam };
    }),
  );

const cousins = orderPedigree([
  { id: 'p', sire: 'x', dam: 'c' },
  { id: 'q', sire: 'd', dam: 'y' },
  { id: 'x', sire: 'a', dam: 'b' },
  { id: 'y', sire: 'a', dam: 'b' },
  { id: 'h', sire: 'a', dam: 'e' },
  { id: 'z', sire: 'p', dam: 'q' },
]);

describe('kinship', () => {
  it('has the inbreeding of the efficient method equal to the kinship of the parents, and to Wright’s paths', () => {
    fc.assert(
      fc.property(pedigrees, (animals) => {
        const pedigree = orderPedigree(animals);
        const F = inbreedingCoefficients(pedigree);
        const kinship = kinshipTable(pedigree);
        pedigree.ids.forEach((id, i) => {
          const [s, d] = [pedigree.sire[i] ?? -1, pedigree.dam[i] ?? -1];
          expect(F[i]).toBeCloseTo(s < 0 || d < 0 ? 0 : kinship(s, d), 12);
          expect(kinship(i, i)).toBeCloseTo((1 + (F[i] ?? 0)) / 2, 12);
          const shares = [...founderContributions(pedigree, id).values()];
          expect(shares.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 12);
        });
        const [last, before] = [pedigree.ids.at(-1) ?? '', pedigree.ids.at(-2) ?? ''];
        const { paths, complete } = ancestryPaths(pedigree, last, before, 100_000);
        expect(complete).toBe(true);
        expect(paths.reduce((total, { contribution }) => total + contribution, 0)).toBeCloseTo(
          kinshipOf(pedigree, last, before),
          12,
        );
      }),
      { numRuns: 200 },
    );
  });

  it('agrees with dropping genes down the pedigree', () => {
    // Fixed linear congruential numbers; 40,000 drops leave a standard error below 0.0025.
    let state = 12345;
    const coin = () => {
      state = (state * 48271) % 2147483647;
      return (state >> 8) % 2;
    };
    const drops = 40_000;
    let alike = 0;
    let own = 0;
    for (let drop = 0; drop < drops; drop += 1) {
      const genes: [number, number][] = [];
      cousins.ids.forEach((_, i) => {
        const from = (parent: number, fresh: number) =>
          parent < 0 ? fresh : (genes[parent]?.[coin()] ?? fresh);
        genes.push([from(cousins.sire[i] ?? -1, 2 * i), from(cousins.dam[i] ?? -1, 2 * i + 1)]);
      });
      const gene = (id: string) => genes[placeIn(cousins, id)] ?? [-1, -2];
      if (gene('x')[coin()] === gene('y')[coin()]) alike += 1;
      if (gene('z')[0] === gene('z')[1]) own += 1;
    }
    expect(Math.abs(alike / drops - kinshipOf(cousins, 'x', 'y'))).toBeLessThan(0.01);
    expect(Math.abs(own / drops - inbreedingOfClutch(cousins, 'p', 'q'))).toBeLessThan(0.006);
  });

  it('names relationships', () => {
    const words = (a: string, b: string) => relationshipOf(cousins, a, b).words;
    expect(words('a', 'x')).toBe('parent');
    expect(words('p', 'a')).toBe('grandoffspring');
    expect(words('x', 'y')).toBe('full sibling');
    expect(words('x', 'h')).toBe('half sibling');
    expect(words('x', 'q')).toBe('aunt or uncle');
    expect(words('q', 'x')).toBe('niece or nephew');
    expect(words('p', 'q')).toBe('first cousin');
    expect(words('c', 'd')).toBe('unrelated');
    expect(
      commonAncestors(cousins, 'p', 'q')
        .map(({ id }) => id)
        .toSorted(),
    ).toEqual(['a', 'b']);
  });

  it('ranks by mean kinship and counts founders', () => {
    const ranked = meanKinships(cousins, ['x', 'y', 'c']);
    expect(ranked[0]).toEqual({ id: 'c', meanKinship: 1 / 6 });
    // Four equal founders of a grandchild count as four.
    const pedigree = orderPedigree([
      { id: 's', sire: 'a', dam: 'b' },
      { id: 'd', sire: 'c', dam: 'e' },
      { id: 'x', sire: 's', dam: 'd' },
    ]);
    expect(effectiveFounders(pedigree, ['x'])).toBeCloseTo(4, 12);
  });

  it('follows the X', () => {
    // A son has his dam's X: with her 1/2, with his sire 0; two brothers share one of her two X with 1/2.
    const family = orderPedigree([
      { id: 's1', sire: 's', dam: 'd' },
      { id: 's2', sire: 's', dam: 'd' },
      { id: 'f', sire: 's', dam: 'd' },
    ]);
    const male = new Set(['s', 's1', 's2']);
    const kinship = sexLinkedKinshipTable(
      family,
      (i) => (male.has(family.ids[i] ?? '') ? 'male' : 'female'),
      'male',
    );
    const of = (a: string, b: string) => kinship(placeIn(family, a), placeIn(family, b));
    expect([of('s1', 'd'), of('s1', 's'), of('s1', 's2'), of('f', 's'), of('f', 's1')]).toEqual([
      0.5, 0, 0.5, 0.5, 0.25,
    ]);
  });

  it('refuses an animal among its own ancestors', () => {
    const circle = () =>
      orderPedigree([
        { id: 'a', sire: 'b' },
        { id: 'b', dam: 'c' },
        { id: 'c', sire: 'a' },
      ]);
    expect(circle).toThrow(PedigreeError);
    expect(circle).toThrow(/a ← b ← c ← a/);
    expect(() => orderPedigree([{ id: 'a' }, { id: 'a' }])).toThrow(/listed twice/);
  });
});
