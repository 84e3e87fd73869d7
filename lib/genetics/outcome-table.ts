import type Fraction from 'fraction.js';
import { chanceOfAny } from './clutch-odds';
import { livingSexes, type Cross, type CrossBlock, type KnownSex } from './cross';
import { carriedAlleles, carriedWords, looksWords, type Carried } from './describe';
import { fractionText, ONE, ZERO } from './fractions';
import { NORMAL, type CombinationName, type Genotype, type Phenotype, type WelfareNote } from './locus';
import { phenotypeClasses } from './offspring';

/** Young that look alike. */
export interface OutcomeRow {
  /** Stays the same while the loci and phenotypes do: "sex locus=phenotype …"; "normal" for none. */
  key: string;
  /** Told only where a locus is sex-linked. */
  sex: KnownSex | null;
  /** Phenotype by locus id ('' is normal). */
  phenotypes: Readonly<Record<string, Phenotype>>;
  looksLike: string;
  /** "het Piebald, 66% het Clown"; empty when there is nothing to say. */
  carries: string;
  carried: readonly Carried[];
  /** Exact chance among the young that live, as text such as "5/12". */
  odds: string;
  /** The same as a number, 0 to 1. */
  probability: number;
  /** Chance of at least one in the clutch, 0 to 1: a mixture over the parents' genotypes. */
  atLeastOne: number;
  /** Published harm that young of this row may suffer. */
  welfare: readonly WelfareNote[];
}

export interface OutcomeOptions {
  /** Eggs in the clutch, or chance per number of eggs. */
  clutch: number | ReadonlyMap<number, number>;
  /** Chance that an egg that does not die of its genotype hatches, 0 to 1; 1 if left out. */
  hatchRate?: number;
  combinations?: readonly CombinationName[];
  /** The likeliest rows of each sex are shown, at most so many; 200 if left out. */
  limit?: number;
}

export interface OutcomeTable {
  /** Likeliest first. */
  rows: readonly OutcomeRow[];
  /** Share of fertile eggs that die of their genotype, as a fraction in text. */
  lethal: string;
  /** Chance of the rows that the limit left out. */
  notShown: number;
}

interface BlockClass {
  values: Record<string, Phenotype>;
  chance: Fraction;
  /** Chance per genotype at each locus given this class. */
  genotypes: Map<string, Map<Genotype, number>>;
  /** Per state of the parents, chance of a living egg of this class among eggs of the sex. */
  perState: number[];
}

/**
 * The outcome of a pairing, grouped by what the young look like. Blocks are folded in one by one and only the likeliest
 * rows are kept, which is exact for those rows: factors of independent blocks keep their order.
 */
export function outcomeTable(cross: Cross, options: OutcomeOptions): OutcomeTable {
  const { limit = 200, hatchRate = 1, combinations = [] } = options;
  const clutch = typeof options.clutch === 'number' ? new Map([[options.clutch, 1]]) : options.clutch;
  const sexes = livingSexes(cross);
  const first = sexes[0];
  // Turns chances among eggs of a sex into chances among all eggs.
  const share = cross.sexLinked ? 0.5 : 1;
  const rows = sexes.flatMap(({ sex, computeAs, factor }) => {
    let partial: { chance: Fraction; size: number; classes: BlockClass[] }[] = [
      { chance: factor, size: factor.valueOf(), classes: [] },
    ];
    for (const block of cross.blocks) {
      const classes = blockClasses(block, computeAs);
      // Doubles are enough to rank; only what is kept is multiplied exactly.
      partial = partial
        .flatMap((row) => classes.map((entry) => ({ row, entry, size: row.size * entry.chance.valueOf() })))
        .toSorted((a, b) => b.size - a.size)
        .slice(0, limit)
        .map(({ row, entry, size }) => ({
          chance: row.chance.mul(entry.chance),
          size,
          classes: [...row.classes, entry],
        }));
    }
    return partial.map(({ chance, classes }): OutcomeRow => {
      const phenotypes = Object.assign({}, ...classes.map(({ values }) => values)) as Record<
        string,
        Phenotype
      >;
      const genotypes = new Map(classes.flatMap((entry) => [...entry.genotypes]));
      const carried = cross.loci.flatMap((locus) =>
        carriedAlleles(locus, phenotypes[locus.id] ?? NORMAL, genotypes.get(locus.id) ?? new Map()),
      );
      const shown = Object.entries(phenotypes).filter(([, phenotype]) => phenotype !== NORMAL);
      return {
        key:
          [sex, ...shown.map(([id, phenotype]) => `${id}=${phenotype}`).toSorted()]
            .filter(Boolean)
            .join(' ') || 'normal',
        sex,
        phenotypes,
        looksLike: looksWords(cross.loci, phenotypes, combinations),
        carries: carried.map(carriedWords).join(', '),
        carried,
        odds: fractionText(chance),
        probability: chance.valueOf(),
        atLeastOne: chanceOfAny(eggMixture(cross, classes, share), clutch, hatchRate),
        welfare: cross.loci.flatMap(({ id, welfare }) =>
          welfare.filter((note) =>
            note.genotypes.some((genotype) => (genotypes.get(id)?.get(genotype) ?? 0) > 0),
          ),
        ),
      };
    });
  });
  rows.sort((a, b) => b.probability - a.probability || (a.key < b.key ? -1 : 1));
  const shown = rows.reduce((total, { probability }) => total + probability, 0);
  const living = first ? (cross.sexLinked ? ONE.div(first.factor.mul(2)) : ONE.div(first.factor)) : ZERO;
  return { rows, lethal: fractionText(ONE.sub(living)), notShown: first ? Math.max(0, 1 - shown) : 0 };
}

function blockClasses(block: CrossBlock, sex: KnownSex): BlockClass[] {
  const classes = new Map<string, BlockClass & { weights: Map<string, Map<Genotype, Fraction>> }>();
  for (const egg of block.eggs[sex]) {
    if (egg.lethal) continue;
    for (const { values, chance } of phenotypeClasses(block.loci, egg.genotypes)) {
      const key = JSON.stringify(values);
      const entry = classes.get(key) ?? {
        values,
        chance: ZERO,
        genotypes: new Map(),
        weights: new Map(),
        perState: [],
      };
      const weight = chance.mul(egg.chance);
      entry.chance = entry.chance.add(weight);
      block.loci.forEach(({ id }, i) => {
        const known = entry.weights.get(id) ?? new Map<Genotype, Fraction>();
        const genotype = egg.genotypes[i] ?? '';
        known.set(genotype, (known.get(genotype) ?? ZERO).add(weight));
        entry.weights.set(id, known);
      });
      classes.set(key, entry);
    }
  }
  for (const entry of classes.values()) {
    for (const [id, weights] of entry.weights) {
      // Divided while exact, so that certainty is exactly 1.
      entry.genotypes.set(
        id,
        new Map([...weights].map(([g, weight]) => [g, weight.div(entry.chance).valueOf()])),
      );
    }
    const wanted = JSON.stringify(entry.values);
    entry.perState = block.parentStates.map(({ eggs }) => {
      let chance = 0;
      for (const egg of eggs[sex]) {
        if (egg.lethal) continue;
        for (const shown of phenotypeClasses(block.loci, egg.genotypes)) {
          if (JSON.stringify(shown.values) === wanted) chance += egg.chance.mul(shown.chance).valueOf();
        }
      }
      return chance;
    });
  }
  return [...classes.values()];
}

/** Chances per egg of a row, merged where they are equal, with the weights of the parents' states. */
function eggMixture(
  cross: Cross,
  classes: readonly BlockClass[],
  share: number,
): { chance: number; weight: number }[] {
  let mixture = new Map<number, number>([[share, 1]]);
  cross.blocks.forEach((block, index) => {
    const next = new Map<number, number>();
    block.parentStates.forEach(({ weight }, state) => {
      const factor = classes[index]?.perState[state] ?? 0;
      for (const [chance, before] of mixture) {
        // Rounding joins products that differ only in the order of their factors.
        const product = Number((chance * factor).toPrecision(12));
        next.set(product, (next.get(product) ?? 0) + before * weight.valueOf());
      }
    });
    mixture = next;
  });
  return [...mixture].map(([chance, weight]) => ({ chance, weight }));
}
