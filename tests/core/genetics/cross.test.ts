import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { beliefFromStatements, certainly, readBelief } from '@/lib/genetics/belief';
import { checkLocus } from '@/lib/genetics/check-locus';
import { chanceInClutch } from '@/lib/genetics/clutch-odds';
import { crossParents, lethalShare } from '@/lib/genetics/cross';
import { defineDominant, defineIncompleteDominant, defineRecessive } from '@/lib/genetics/define-locus';
import { describeAnimal } from '@/lib/genetics/describe';
import { GeneticsError } from '@/lib/genetics/genetics-error';
import { chiSquaredTail, testFit } from '@/lib/genetics/goodness-of-fit';
import { recombinationFromDistance } from '@/lib/genetics/linkage';
import { genotypesOfYoung, phenotypesOfYoung } from '@/lib/genetics/offspring';
import { outcomeTable } from '@/lib/genetics/outcome-table';
import { punnettSquare } from '@/lib/genetics/punnett';

const source = { citation: 'made up for the test', certainty: 'memory' } as const;
const clown = defineRecessive({ id: 'clown', name: 'Clown', allele: 'c', source });
const pied = defineRecessive({ id: 'pied', name: 'Piebald', allele: 'p', source });
const pastel = defineIncompleteDominant({ id: 'pastel', name: 'Pastel', allele: 'Pa', source });
const spider = defineDominant({ id: 'spider', name: 'Spider', allele: 'S', lethalDouble: true, source });
const beliefs = (entries: Record<string, string>) =>
  new Map(Object.entries(entries).map(([id, genotype]) => [id, certainly(genotype)]));
const twoThirds = readBelief(clown, 'female', 'XY', { '+/+': '1/3', '+/c': '2/3' });

describe('odds of a clutch', () => {
  const cross = crossParents({
    sexSystem: 'XY',
    loci: [clown],
    sire: { beliefs: beliefs({ clown: '+/c' }) },
    dam: { beliefs: new Map([['clown', twoThirds]]) },
  });

  it('is a mixture over the parents, not a binomial on the average', () => {
    // Law of total probability; 54.8 % against 66.5 % for the average.
    const p = chanceInClutch(cross, { phenotype: { clown: 'Clown' } }, 6);
    expect(p.toFraction()).toBe(
      new Fraction(2, 3).mul(new Fraction(1).sub(new Fraction(3, 4).pow(6))).toFraction(),
    );
    expect(p.valueOf()).toBeCloseTo(0.548, 3);
    const row = outcomeTable(cross, { clutch: 6 }).rows.find(({ looksLike }) => looksLike === 'Clown');
    expect(row?.odds).toBe('1/6');
    expect(row?.atLeastOne).toBeCloseTo(p.valueOf(), 12);
  });

  it('averages over clutch sizes and counts eggs that do not hatch', () => {
    const sizes = new Map([
      [4, new Fraction(1, 2)],
      [8, new Fraction(1, 2)],
    ]);
    const wanted = { phenotype: { clown: 'Clown' } };
    const p = chanceInClutch(cross, wanted, sizes, 1, new Fraction(4, 5));
    const none = (n: number) => new Fraction(2, 3).mul(new Fraction(4, 5).pow(n)).add(new Fraction(1, 3));
    expect(p.equals(new Fraction(1).sub(none(4).add(none(8)).div(2)))).toBe(true);
  });

  it('asks for a sex only where chromosomes decide it', () => {
    const half = chanceInClutch(cross, { phenotype: { clown: 'Clown' }, sex: 'male' }, 1);
    expect(half.toFraction()).toBe('1/12');
    const gecko = crossParents({
      sexSystem: 'TSD',
      loci: [clown],
      sire: { beliefs: new Map() },
      dam: { beliefs: new Map() },
    });
    expect(() => chanceInClutch(gecko, { phenotype: {}, sex: 'male' }, 1)).toThrow(GeneticsError);
  });
});

describe('the table of outcomes', () => {
  it('says what each row may carry', () => {
    const { rows, lethal } = outcomeTable(
      crossParents({
        sexSystem: 'XY',
        loci: [pastel, clown, pied],
        sire: { beliefs: beliefs({ pastel: '+/Pa', clown: '+/c', pied: 'p/p' }) },
        dam: { beliefs: beliefs({ clown: '+/c' }) },
      }),
      {
        clutch: 6,
        combinations: [{ name: 'Pastel Clown', phenotypes: { pastel: 'Pastel', clown: 'Clown' } }],
      },
    );
    expect(lethal).toBe('0');
    expect(rows.map(({ looksLike, carries, odds }) => [looksLike, carries, odds])).toEqual([
      ['Normal', '66% het Clown, het Piebald', '3/8'],
      ['Pastel', '66% het Clown, het Piebald', '3/8'],
      ['Clown', 'het Piebald', '1/8'],
      ['Pastel Clown', 'het Piebald', '1/8'],
    ]);
  });

  it('counts lethal eggs apart', () => {
    const parent = { beliefs: beliefs({ spider: '+/S' }) };
    const cross = crossParents({ sexSystem: 'XY', loci: [spider], sire: parent, dam: parent });
    expect(lethalShare(cross).toFraction()).toBe('1/4');
    const table = outcomeTable(cross, { clutch: 1 });
    expect(table.lethal).toBe('1/4');
    const row = table.rows[0];
    expect([row?.looksLike, row?.odds, row?.carries]).toEqual(['Spider', '2/3', '']);
    expect(row?.atLeastOne).toBeCloseTo(1 / 2, 12);
  });

  it('keeps the likeliest rows and says what it left out', () => {
    const loci = Array.from({ length: 10 }, (_, i) => ({ ...clown, id: `c${i}` }));
    const parent = { beliefs: new Map(loci.map(({ id }) => [id, certainly('+/c')])) };
    const { rows, notShown } = outcomeTable(
      crossParents({ sexSystem: 'XY', loci, sire: parent, dam: parent }),
      { clutch: 6, limit: 50 },
    );
    expect(rows).toHaveLength(50);
    expect(rows[0]?.odds).toBe(new Fraction(3, 4).pow(10).toFraction());
    expect(rows.reduce((total, row) => total + row.probability, notShown)).toBeCloseTo(1, 12);
  });
});

describe('any cross', () => {
  const belief = fc.constantFrom('+/+', '+/c', 'c/c').map(certainly);
  it('gives chances that add up to exactly 1', () => {
    fc.assert(
      fc.property(belief, belief, belief, belief, fc.integer({ min: 0, max: 50 }), (a, b, c, d, r) => {
        const loci = [clown, { ...clown, id: 'second' }];
        const cross = crossParents({
          sexSystem: 'XY',
          loci,
          linked: [{ loci: ['clown', 'second'], recombination: [new Fraction(r, 100)] }],
          sire: {
            beliefs: new Map([
              ['clown', a],
              ['second', b],
            ]),
          },
          dam: {
            beliefs: new Map([
              ['clown', c],
              ['second', d],
            ]),
          },
        });
        for (const rows of [genotypesOfYoung(cross), phenotypesOfYoung(cross)]) {
          expect(rows.reduce((total, { chance }) => total.add(chance), new Fraction(0)).equals(1)).toBe(true);
        }
      }),
    );
  });

  it('draws the nine-three-three-one square of Mendel', () => {
    const both = { clown: '+/c', pied: '+/p' };
    const square = punnettSquare('XY', [clown, pied], both, both);
    expect([square.sire.length, square.dam.length]).toEqual([4, 4]);
    const normal = square.cells
      .flat()
      .filter(({ phenotypes }) => Object.values(phenotypes[0]?.phenotypes ?? {}).every((p) => p === ''));
    expect(normal).toHaveLength(9);
    expect(normal.reduce((total, { chance }) => total.add(chance), new Fraction(0)).toFraction()).toBe(
      '9/16',
    );
  });
});

describe('statements and descriptions', () => {
  it('reads the trade', () => {
    const say = (...statements: Parameters<typeof beliefFromStatements>[3]) =>
      beliefFromStatements(clown, 'male', 'XY', statements);
    expect(say({ kind: 'shows', phenotype: '' }).get('+/+')?.toFraction()).toBe('1');
    expect(say({ kind: 'shows', phenotype: 'Clown' }).get('c/c')?.toFraction()).toBe('1');
    expect(say({ kind: 'het', allele: 'c', probability: '2/3' }).get('+/c')?.toFraction()).toBe('2/3');
    expect(() =>
      say({ kind: 'het', allele: 'c', probability: '1' }, { kind: 'shows', phenotype: 'Clown' }),
    ).toThrow(/contradicts/);
  });

  it('speaks the trade', () => {
    const certain = (genotype: string) => new Map([[genotype, 1]]);
    expect(
      describeAnimal([
        { locus: pastel, shown: 'Pastel', belief: certain('+/Pa') },
        { locus: clown, shown: '', belief: certain('+/c') },
      ]),
    ).toBe('Pastel het Clown');
    expect(
      describeAnimal([
        {
          locus: clown,
          shown: null,
          belief: new Map([
            ['+/+', 1 / 3],
            ['+/c', 2 / 3],
          ]),
        },
        { locus: pied, shown: null, belief: certain('p/p') },
      ]),
    ).toBe('Piebald, 66% het Clown');
  });
});

describe('goodness of fit', () => {
  it('sums all outcomes no likelier than the observed', () => {
    // One in six where 1/2 is expected: 2·(1 + 6)/64, the two-sided exact binomial test of any statistics text.
    const half = new Fraction(1, 2);
    expect(testFit({ a: 1, b: 5 }, { a: half, b: half }).exactPValue?.toFraction()).toBe('7/32');
    expect(
      testFit({ a: 1, b: 5 }, { a: new Fraction(0), b: new Fraction(1) }).exactPValue?.toFraction(),
    ).toBe('0');
  });

  it('has the tail of χ²', () => {
    // Critical values of printed tables (from memory): 3.841 with 1, 7.815 with 3, 18.307 with 10 degrees of freedom.
    expect(chiSquaredTail(3.841, 1)).toBeCloseTo(0.05, 4);
    expect(chiSquaredTail(7.815, 3)).toBeCloseTo(0.05, 4);
    expect(chiSquaredTail(18.307, 10)).toBeCloseTo(0.05, 4);
    // With 2 degrees of freedom it is e^(−x/2) exactly.
    expect(chiSquaredTail(5, 2)).toBeCloseTo(Math.exp(-2.5), 14);
    expect(chiSquaredTail(0.3, 2)).toBeCloseTo(Math.exp(-0.15), 14);
  });
});

describe('bad definitions', () => {
  it('names the rule', () => {
    const rule = (locus: Parameters<typeof checkLocus>[0], system?: Parameters<typeof checkLocus>[1]) => {
      try {
        checkLocus(locus, system);
      } catch (error) {
        return error instanceof GeneticsError ? error.rule : error;
      }
      return 'none';
    };
    expect(rule(clown)).toBe('none');
    expect(rule({ ...clown, alleles: [{ symbol: '+', name: 'wild type' }] })).toBe('alleles');
    expect(rule({ ...clown, phenotypes: { 'c/+': 'Clown' } })).toBe('genotype');
    expect(rule({ ...clown, phenotypes: { 'x/x': 'Clown' } })).toBe('unknown-allele');
    expect(rule({ ...clown, penetrance: { 'c/c': { Clown: '1/2' } } })).toBe('penetrance');
    expect(rule({ ...clown, lethal: ['+/+', '+/c', 'c/c'] })).toBe('lethal');
    expect(rule({ ...clown, chromosome: 'X' }, 'ZW')).toBe('chromosome');
    expect(() => readBelief(clown, 'male', 'XY', { '+/+': '1/2' })).toThrow(/add up to 1\/2/);
  });

  it('turns map distance into recombination by Haldane', () => {
    // 50 cM: (1 − 1/e)/2.
    expect(recombinationFromDistance(50).valueOf()).toBeCloseTo((1 - Math.exp(-1)) / 2, 6);
    expect(recombinationFromDistance(0).toFraction()).toBe('0');
  });
});
