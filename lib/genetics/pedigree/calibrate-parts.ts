import { GeneticsError } from '../genetics-error';
import type { Factor } from './factor';
import { calibrate, LARGEST_TABLE, type Calibrated } from './factor-graph';
import { reduceStates } from './reduce-states';

/**
 * Calibrates each connected part of a graph by itself, so that one that is too entangled for an exact answer leaves the
 * others be.
 * @returns as `calibrate`, with the variables whose part would pass the bound; their marginals are empty
 */
export function calibrateParts(
  sizes: readonly number[],
  factors: readonly Factor[],
  largest = LARGEST_TABLE,
): Calibrated & { tooLarge: ReadonlySet<number> } {
  const tooLarge = new Set<number>();
  const reduced = reduceStates(sizes, factors);
  if (reduced.kept.some(({ length }) => length === 0))
    return { logLikelihood: -Infinity, marginals: [], tooLarge };
  const marginals: Float64Array[] = sizes.map(() => new Float64Array(0));
  let logLikelihood = reduced.logConstant;
  for (const part of connectedParts(reduced.sizes, reduced.factors)) {
    const place = new Map(part.variables.map((variable, i) => [variable, i]));
    let result: Calibrated;
    try {
      result = calibrate(
        part.variables.map((variable) => reduced.sizes[variable] ?? 1),
        part.factors.map(({ variables, table }) => ({
          variables: variables.map((each) => place.get(each) ?? 0),
          table,
        })),
        largest,
      );
    } catch (error) {
      if (!(error instanceof GeneticsError) || error.rule !== 'too-large') throw error;
      for (const variable of part.variables) tooLarge.add(variable);
      continue;
    }
    if (result.logLikelihood === -Infinity) return { logLikelihood: -Infinity, marginals: [], tooLarge };
    logLikelihood += result.logLikelihood;
    part.variables.forEach((variable, i) => {
      const full = new Float64Array(sizes[variable] ?? 0);
      reduced.kept[variable]?.forEach((state, s) => (full[state] = result.marginals[i]?.[s] ?? 0));
      marginals[variable] = full;
    });
  }
  return { logLikelihood, marginals, tooLarge };
}

function connectedParts(
  sizes: readonly number[],
  factors: readonly Factor[],
): { variables: number[]; factors: Factor[] }[] {
  const leader = sizes.map((_, i) => i);
  const find = (variable: number): number => {
    let at = variable;
    while (leader[at] !== at) {
      leader[at] = leader[leader[at] ?? at] ?? at;
      at = leader[at] ?? at;
    }
    return at;
  };
  for (const { variables } of factors)
    for (const each of variables) leader[find(each)] = find(variables[0] ?? each);
  const parts = new Map<number, { variables: number[]; factors: Factor[] }>();
  sizes.forEach((_, variable) => {
    const part = parts.get(find(variable)) ?? { variables: [], factors: [] };
    part.variables.push(variable);
    parts.set(find(variable), part);
  });
  for (const factor of factors) parts.get(find(factor.variables[0] ?? 0))?.factors.push(factor);
  return [...parts.values()];
}
