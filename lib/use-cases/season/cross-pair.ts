import type Fraction from 'fraction.js';
import type { AnimalId } from '@/lib/contracts/ids';
import type { PairingFigures } from '@/lib/contracts/pairing-figures';
import type { Belief } from '@/lib/genetics/belief';
import { crossParents, type Cross } from '@/lib/genetics/cross';
import { isMutant } from '@/lib/genetics/genotype';
import type { CombinationName } from '@/lib/genetics/locus';
import { outcomeTable, type OutcomeTable } from '@/lib/genetics/outcome-table';
import { phenotypesOfYoung } from '@/lib/genetics/offspring';
import type { BeliefLocus, SpeciesBeliefs } from '../genetics/species-beliefs';
import { exactBelief } from './exact-belief';

/** A pairing with what is thought of both parents, at the loci where either may carry something. */
export interface CrossedPair {
  sireId: AnimalId;
  damId: AnimalId;
  loci: readonly BeliefLocus[];
  beliefs: Record<'sire' | 'dam', ReadonlyMap<string, Belief>>;
  cross: Cross;
  table: OutcomeTable;
}

/** Looks beyond this many are summed up: a table that nobody can read helps nobody. */
const MOST_ROWS = 60;

/** Crosses two animals as far as their pedigree tells what they carry. */
export function crossPair(
  species: SpeciesBeliefs,
  pair: { sireId: AnimalId; damId: AnimalId },
  eggs: number,
  combinations: readonly CombinationName[],
): CrossedPair {
  const beliefOf = (animalId: AnimalId, locus: BeliefLocus) =>
    exactBelief(species.belief(animalId, locus.id).genotypes);
  const loci = species.loci.filter((locus) =>
    [pair.sireId, pair.damId].some((id) =>
      [...beliefOf(id, locus).keys()].some((genotype) => isMutant(locus.definition, genotype)),
    ),
  );
  // Core loci are named by the id in their definition; the workspace's own id is what everything else uses.
  const definitions = loci.map(({ id, definition }) => ({ ...definition, id: id as string }));
  const beliefs = (animalId: AnimalId) =>
    new Map(loci.map((locus) => [locus.id as string, beliefOf(animalId, locus)]));
  const [sire, dam] = [beliefs(pair.sireId), beliefs(pair.damId)];
  const cross = crossParents({
    sexSystem: species.sexSystem,
    loci: definitions,
    sire: { beliefs: sire },
    dam: { beliefs: dam },
  });
  const named = combinations.filter(({ phenotypes }) =>
    Object.keys(phenotypes).every((id) => definitions.some((locus) => locus.id === id)),
  );
  return {
    ...pair,
    loci,
    beliefs: { sire, dam },
    cross,
    table: outcomeTable(cross, { clutch: eggs, combinations: named, limit: MOST_ROWS }),
  };
}

/** Published harm that young of this pairing may suffer, each once. */
export function cautionsOf({ table }: CrossedPair): PairingFigures['cautions'] {
  const found = new Map(
    table.rows.flatMap(({ welfare }) => welfare.map(({ text, source }) => [text, { text, source }] as const)),
  );
  return [...found.values()];
}

/**
 * Why the odds of a clutch are no simple power, and what the clutch would tell of a parent who is not certain: null when
 * both are known. The odds of what a clutch without a visual leaves are Bayes' rule over (1 − q)ⁿ.
 */
export function explainUncertainty(
  pair: CrossedPair,
  names: Record<'sire' | 'dam', string>,
  eggs: number,
  sexSystem: SpeciesBeliefs['sexSystem'],
): string | null {
  const uncertain = (['sire', 'dam'] as const).flatMap((side) =>
    pair.loci
      .filter(({ id }) => (pair.beliefs[side].get(id)?.size ?? 0) > 1)
      .map((locus) => ({ side, locus })),
  );
  const [first] = uncertain;
  if (!first) return null;
  const who = [...new Set(uncertain.map(({ side }) => names[side]))].join(' and ');
  const what = [...new Set(uncertain.map(({ locus }) => locus.name))].join(', ');
  const verb = who.includes(' and ') ? 'carry' : 'carries';
  const shared = `It is not certain what ${who} ${verb} at ${what}. All ${eggs} eggs have the same parents, so the odds of at least one are averaged over what these may be: they are not 1 − (1 − odds) to the power of ${eggs}.`;
  const proofs = uncertain.flatMap(
    ({ side, locus }) => proofOf(pair, side, locus, names[side], eggs, sexSystem) ?? [],
  );
  // The parent who is least certain has most to learn from the clutch.
  const [best] = proofs.sort((a, b) => Math.abs(a.chance - 0.5) - Math.abs(b.chance - 0.5));
  return best ? `${shared} ${best.text}` : shared;
}

function proofOf(
  pair: CrossedPair,
  side: 'sire' | 'dam',
  locus: BeliefLocus,
  name: string,
  eggs: number,
  sexSystem: SpeciesBeliefs['sexSystem'],
): { chance: number; text: string } | null {
  const own = pair.beliefs[side].get(locus.id);
  const other = pair.beliefs[side === 'sire' ? 'dam' : 'sire'].get(locus.id);
  if (!own || own.size !== 2 || other?.size !== 1) return null;
  const definition = { ...locus.definition, id: locus.id as string };
  const showing = (genotype: string): Fraction => {
    const known = { beliefs: new Map([[definition.id, new Map([[genotype, certain]])]]) };
    const mate = { beliefs: new Map([[definition.id, other]]) };
    const cross = crossParents({
      sexSystem,
      loci: [definition],
      sire: side === 'sire' ? known : mate,
      dam: side === 'dam' ? known : mate,
    });
    return phenotypesOfYoung(cross)
      .filter(({ values }) => values[definition.id] !== '')
      .reduce((sum, { chance }) => sum.add(chance), certain.sub(1));
  };
  const certain = [...own.values()].reduce((sum, chance) => sum.add(chance));
  const carrier = [...own].find(([genotype]) => isMutant(definition, genotype) && showing(genotype).gt(0));
  const free = [...own].find(([genotype]) => genotype !== carrier?.[0]);
  if (!carrier || !free || showing(free[0]).gt(0)) return null;
  const left = carrier[1].mul(certain.sub(showing(carrier[0])).pow(eggs) ?? 0);
  const after = left.div(left.add(free[1])).valueOf();
  const percent = (value: number) => (value < 0.01 ? 'under 1%' : `${Math.floor(value * 100 + 1e-9)}%`);
  const chance = carrier[1].valueOf();
  return {
    chance,
    text: `One ${locus.name} in this clutch proves ${name}; ${eggs} young without lower ${name} from ${percent(chance)} to ${percent(after)}.`,
  };
}
