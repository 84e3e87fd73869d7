import type { NumericBelief } from '../belief';
import { buildGraph } from './build-graph';
import { calibrateParts } from './calibrate-parts';
import type { PedigreeInput } from './pedigree-input';

export interface PedigreePosterior {
  /** The evidence cannot all be true; `beliefs` and `sires` are then empty. See `explainContradiction`. */
  impossible: boolean;
  /** By locus id, then animal id: chance per genotype, those of chance 0 left out. */
  beliefs: ReadonlyMap<string, ReadonlyMap<string, NumericBelief>>;
  /** By sire group, or "own:" and the animal's id: chance per possible sire. */
  sires: ReadonlyMap<string, ReadonlyMap<string, number>>;
  /** Chance of being male of each animal of unknown sex, where sex-linked loci may tell. */
  chanceOfMale: ReadonlyMap<string, number>;
  /**
   * What was not computed, because an exact answer would pass the bound on memory: these have no belief. Their evidence is
   * not in the likelihood.
   */
  tooEntangled: readonly { locus: string; animal: string }[];
  /** Natural logarithm of the probability of all evidence. */
  logLikelihood: number;
}

/**
 * What each animal probably carries, given all that is known of it and its relatives: the exact posterior over the
 * whole pedigree, loops included. Loci are independent of one another but for possible sires and unknown sexes, which
 * they share.
 * @throws {GeneticsError} for bad input ('parent-sex', 'parent-order', 'genotype', 'probability', …)
 */
export function inferPedigree(input: PedigreeInput): PedigreePosterior {
  const graph = buildGraph(input);
  const { logLikelihood, marginals, tooLarge } = graph.impossible
    ? { logLikelihood: -Infinity, marginals: [], tooLarge: new Set<number>() }
    : calibrateParts(graph.sizes, graph.factors, input.largestTable);
  const impossible = logLikelihood === -Infinity;
  const beliefs = new Map<string, Map<string, NumericBelief>>(input.loci.map(({ id }) => [id, new Map()]));
  const sires = new Map<string, Map<string, number>>();
  const chanceOfMale = new Map<string, number>();
  const tooEntangled: { locus: string; animal: string }[] = [];
  if (!impossible) {
    for (const { locus, animal, variable, states } of graph.genotypes) {
      if (tooLarge.has(variable)) {
        tooEntangled.push({ locus, animal });
        continue;
      }
      const chances = marginals[variable];
      beliefs
        .get(locus)
        ?.set(
          animal,
          new Map(
            states.flatMap((state, i) => ((chances?.[i] ?? 0) > 0 ? [[state, chances?.[i] ?? 0]] : [])),
          ),
        );
    }
    for (const { group, variable, candidates } of graph.sireGroups) {
      if (tooLarge.has(variable)) continue;
      sires.set(group, new Map(candidates.map((id, i) => [id, marginals[variable]?.[i] ?? 0])));
    }
    for (const { animal, variable } of graph.sexes)
      if (!tooLarge.has(variable)) chanceOfMale.set(animal, marginals[variable]?.[0] ?? 0);
  }
  return { impossible, beliefs, sires, chanceOfMale, tooEntangled, logLikelihood };
}
