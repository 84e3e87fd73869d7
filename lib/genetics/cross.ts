import type Fraction from 'fraction.js';
import { certainly, wildGenotype, type Belief } from './belief';
import { HALF, ONE, sum, ZERO } from './fractions';
import { GeneticsError } from './genetics-error';
import { allelesOf, copiesOf, isLethal, isSexLinked, joinAlleles, normaliseGenotype } from './genotype';
import {
  gametesOfHaplotypes,
  linkageBlocks,
  type Haplotype,
  type LinkageBlock,
  type LinkedLoci,
} from './linkage';
import type { Genotype, LocusDefinition, SexSystem } from './locus';

export type KnownSex = 'male' | 'female';

/** What is known of a parent. */
export interface ParentGenetics {
  /** Belief by locus id; a locus that is left out is wild type. Beliefs at different loci are taken as independent. */
  beliefs: ReadonlyMap<string, Belief>;
  /** Chromosomes known in phase: alleles in the order of `loci`, one list per chromosome copy. */
  phases?: readonly { loci: readonly string[]; haplotypes: readonly Haplotype[] }[];
}

export interface CrossInput {
  sexSystem: SexSystem;
  loci: readonly LocusDefinition[];
  sire: ParentGenetics;
  dam: ParentGenetics;
  /** Measured recombination; other linkage is taken from the loci's positions. */
  linked?: readonly LinkedLoci[];
}

/** Genotypes at the loci of one block (in the block's order) of an egg of a given sex. */
export interface EggClass {
  genotypes: readonly Genotype[];
  chance: Fraction;
  /** Dies in the egg. */
  lethal: boolean;
}

export type EggsBySex = Readonly<Record<KnownSex, readonly EggClass[]>>;

/** A block of a cross: independent of the other blocks given the egg's sex. */
export interface CrossBlock {
  loci: readonly LocusDefinition[];
  /** One entry per possible pair of the parents' genotypes; the weights add up to 1. */
  parentStates: readonly { weight: Fraction; eggs: EggsBySex }[];
  /** Averaged over the parents' states: a single egg taken at random. */
  eggs: EggsBySex;
}

/** The exact outcome of a cross, kept factorised: nothing is multiplied out before it is shown. */
export interface Cross {
  sexSystem: SexSystem;
  loci: readonly LocusDefinition[];
  /** Whether the outcome depends on the egg's sex. */
  sexLinked: boolean;
  blocks: readonly CrossBlock[];
}

export const SEXES: readonly KnownSex[] = ['male', 'female'];

interface ParentState {
  haplotypes: readonly Haplotype[];
  weight: Fraction;
}

/**
 * Computes what a pairing can give. Parents of uncertain phase are in either phase with equal chance (linkage
 * equilibrium). Males and females are equally frequent among eggs.
 * @throws {GeneticsError} 'unknown-allele', 'genotype', 'chromosome' or 'linkage'
 */
export function crossParents(input: CrossInput): Cross {
  const { sexSystem, loci } = input;
  const blocks = linkageBlocks(loci, input.linked).map((block) => crossBlock(block, input));
  return { sexSystem, loci, sexLinked: loci.some(isSexLinked), blocks };
}

function crossBlock(block: LinkageBlock, { sexSystem, sire, dam }: CrossInput): CrossBlock {
  const sireStates = parentStates(block, sire, 'male', sexSystem);
  const damStates = parentStates(block, dam, 'female', sexSystem);
  const states = sireStates.flatMap((fromSire) =>
    damStates.map((fromDam) => ({
      weight: fromSire.weight.mul(fromDam.weight),
      eggs: {
        male: eggsOf(block, fromSire.haplotypes, fromDam.haplotypes, 'male', sexSystem),
        female: eggsOf(block, fromSire.haplotypes, fromDam.haplotypes, 'female', sexSystem),
      },
    })),
  );
  const average = (sex: KnownSex) =>
    mergeEggs(
      states.flatMap(({ weight, eggs }) =>
        eggs[sex].map((egg) => ({ ...egg, chance: egg.chance.mul(weight) })),
      ),
    );
  return {
    loci: block.loci,
    parentStates: states,
    eggs: { male: average('male'), female: average('female') },
  };
}

function parentStates(
  block: LinkageBlock,
  parent: ParentGenetics,
  sex: KnownSex,
  system: SexSystem,
): ParentState[] {
  const ids = block.loci.map(({ id }) => id);
  const phase = parent.phases?.find(({ loci }) => ids.some((id) => loci.includes(id)));
  if (phase) {
    const haplotypes = phase.haplotypes.map((haplotype) =>
      ids.map((id) => haplotype[phase.loci.indexOf(id)] ?? ''),
    );
    block.loci.forEach((locus, i) => {
      normaliseGenotype(locus, haplotypes.map((haplotype) => haplotype[i] ?? '').join('/'), sex, system);
    });
    return [{ haplotypes, weight: ONE }];
  }
  let states: ParentState[] = [{ haplotypes: [], weight: ONE }];
  for (const [index, locus] of block.loci.entries()) {
    const belief = parent.beliefs.get(locus.id) ?? certainly(wildGenotype(locus, sex, system));
    const total = sum(belief.values());
    if (!total.equals(ONE)) {
      throw new GeneticsError(
        'probability',
        locus.id,
        `The chances at ${locus.name} add up to ${total.toFraction()}, not 1.`,
      );
    }
    states = states.flatMap((state) =>
      [...belief].flatMap(([written, chance]) => {
        const alleles = allelesOf(normaliseGenotype(locus, written, sex, system));
        const weight = state.weight.mul(chance);
        if (index === 0) return [{ haplotypes: alleles.map((symbol) => [symbol]), weight }];
        return phasesOf(state, alleles, weight);
      }),
    );
  }
  return states;
}

/** A heterozygous locus may lie either way round on chromosomes that differ already. */
function phasesOf(state: ParentState, alleles: readonly string[], weight: Fraction): ParentState[] {
  const append = (order: readonly string[], share: Fraction): ParentState => ({
    haplotypes: state.haplotypes.map((haplotype, i) => [...haplotype, order[i] ?? '']),
    weight: weight.mul(share),
  });
  const [first, second] = alleles;
  const [left, right] = state.haplotypes;
  const either = alleles.length === 2 && first !== second && left?.join(' ') !== right?.join(' ');
  return either ? [append(alleles, HALF), append(alleles.toReversed(), HALF)] : [append(alleles, ONE)];
}

/** Eggs of one sex from parents of known chromosomes; their chances add up to 1. */
function eggsOf(
  block: LinkageBlock,
  sire: readonly Haplotype[],
  dam: readonly Haplotype[],
  sex: KnownSex,
  system: SexSystem,
): EggClass[] {
  const nothing = [{ haplotype: null, chance: ONE }];
  const [first] = block.loci;
  // Sons of XY get no X of their sire, daughters of ZW no Z of their dam.
  const fromOneParent = first !== undefined && copiesOf(first, sex, system) === 1;
  const fromSire =
    fromOneParent && system === 'XY' ? nothing : gametesOfHaplotypes(sire, block.recombination);
  const fromDam = fromOneParent && system === 'ZW' ? nothing : gametesOfHaplotypes(dam, block.recombination);
  const eggs = fromSire.flatMap((paternal) =>
    fromDam.map((maternal): EggClass => {
      const genotypes = block.loci.map((locus, i) =>
        joinAlleles(
          locus,
          [paternal.haplotype?.[i], maternal.haplotype?.[i]].filter((symbol) => symbol !== undefined),
        ),
      );
      const lethal = block.loci.some((locus, i) => isLethal(locus, genotypes[i] ?? ''));
      return { genotypes, lethal, chance: paternal.chance.mul(maternal.chance) };
    }),
  );
  return mergeEggs(eggs);
}

function mergeEggs(eggs: readonly EggClass[]): EggClass[] {
  const merged = new Map<string, EggClass>();
  for (const egg of eggs) {
    const key = egg.genotypes.join(' ');
    merged.set(key, { ...egg, chance: egg.chance.add(merged.get(key)?.chance ?? ZERO) });
  }
  return [...merged.values()].filter(({ chance }) => chance.gt(0));
}

/** Share of eggs of one sex that live. */
function livingShare(cross: Cross, sex: KnownSex): Fraction {
  return cross.blocks.reduce(
    (product, { eggs }) =>
      product.mul(sum(eggs[sex].filter(({ lethal }) => !lethal).map(({ chance }) => chance))),
    ONE,
  );
}

/** Share of fertile eggs that die of their genotype, 0 to 1. */
export function lethalShare(cross: Cross): Fraction {
  return ONE.sub(livingShare(cross, 'male').add(livingShare(cross, 'female')).mul(HALF));
}

/** The sexes to tell apart, with each sex's factor that turns a block product into a chance among the living. */
export function livingSexes(cross: Cross): { sex: KnownSex | null; computeAs: KnownSex; factor: Fraction }[] {
  const living = ONE.sub(lethalShare(cross));
  if (living.equals(ZERO)) return [];
  if (!cross.sexLinked) return [{ sex: null, computeAs: 'female', factor: ONE.div(living) }];
  return SEXES.map((sex) => ({ sex, computeAs: sex, factor: HALF.div(living) }));
}
