import type { Factor } from './factor';

export interface ReducedGraph {
  /** States of each variable that are possible, by their former number; an empty list when nothing is possible. */
  kept: readonly (readonly number[])[];
  sizes: readonly number[];
  factors: readonly Factor[];
  /** Logarithm of what the factors without a variable left multiply to. */
  logConstant: number;
}

/**
 * Drops states that no combination of their neighbours allows, until none is left to drop, and takes variables with a
 * single state out of the tables. It changes no posterior, and it cuts a pedigree apart at every animal whose genotype
 * is certain, such as a visual or a proven carrier: after it, elimination meets far smaller tables.
 */
export function reduceStates(sizes: readonly number[], factors: readonly Factor[]): ReducedGraph {
  const alive = sizes.map((size) => new Uint8Array(size).fill(1));
  const factorsOf: number[][] = sizes.map(() => []);
  factors.forEach(({ variables }, f) => variables.forEach((variable) => factorsOf[variable]?.push(f)));
  const open = factors.map((_, f) => f);
  const waiting = new Uint8Array(factors.length).fill(1);
  for (let f = open.pop(); f !== undefined; f = open.pop()) {
    waiting[f] = 0;
    const factor = factors[f];
    if (!factor) continue;
    const supported = factor.variables.map((variable) => new Uint8Array(sizes[variable] ?? 0));
    forEachPossible(factor, sizes, alive, (states) =>
      states.forEach((state, i) => supported[i]?.fill(1, state, state + 1)),
    );
    factor.variables.forEach((variable, i) => {
      const states = alive[variable];
      let changed = false;
      states?.forEach((is, state) => {
        if (!is || supported[i]?.[state]) return;
        states[state] = 0;
        changed = true;
      });
      if (!changed) return;
      for (const other of factorsOf[variable] ?? []) {
        if (other === f || waiting[other]) continue;
        waiting[other] = 1;
        open.push(other);
      }
    });
  }
  const kept = alive.map((states) => [...states.keys()].filter((state) => states[state]));
  const place = kept.map((states) => new Map(states.map((state, i) => [state, i])));
  let logConstant = 0;
  const reduced: Factor[] = [];
  for (const factor of factors) {
    const left = factor.variables
      .map((_, i) => i)
      .filter((i) => (kept[factor.variables[i] ?? 0]?.length ?? 0) > 1);
    const variables = left.map((i) => factor.variables[i] ?? 0);
    const table = new Float64Array(
      variables.reduce((product, variable) => product * (kept[variable]?.length ?? 0), 1),
    );
    forEachPossible(factor, sizes, alive, (states, value) => {
      let at = 0;
      for (const i of left) {
        const variable = factor.variables[i] ?? 0;
        at = at * (kept[variable]?.length ?? 0) + (place[variable]?.get(states[i] ?? 0) ?? 0);
      }
      table[at] = value;
    });
    if (variables.length === 0) logConstant += Math.log(table[0] ?? 0);
    else reduced.push({ variables, table });
  }
  return { kept, sizes: kept.map(({ length }) => length), factors: reduced, logConstant };
}

/** Visits the entries above 0 whose states are all alive. */
function forEachPossible(
  { variables, table }: Factor,
  sizes: readonly number[],
  alive: readonly Uint8Array[],
  visit: (states: readonly number[], value: number) => void,
): void {
  const states = variables.map(() => 0);
  for (let at = 0; at < table.length; at += 1) {
    const value = table[at] ?? 0;
    if (value > 0 && variables.every((variable, i) => alive[variable]?.[states[i] ?? 0]))
      visit(states, value);
    for (let i = variables.length - 1; i >= 0; i -= 1) {
      const next = (states[i] ?? 0) + 1;
      states[i] = next < (sizes[variables[i] ?? 0] ?? 1) ? next : 0;
      if (states[i] !== 0) break;
    }
  }
}
