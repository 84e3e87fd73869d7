import { GeneticsError } from '../genetics-error';
import type { Factor } from './factor';

export interface Calibrated {
  /** Natural logarithm of the probability of all evidence; −Infinity when it is impossible. */
  logLikelihood: number;
  /** Posterior of each variable; empty when the evidence is impossible. */
  marginals: readonly Float64Array[];
}

/** Entries of the largest table that is made: 2^22 doubles are 32 MB. */
export const LARGEST_TABLE = 2 ** 22;

interface Clique {
  /** The separator towards the rest, then the eliminated variable. */
  variables: number[];
  table: Float64Array;
  /** Upward message over the separator. */
  message: Float64Array;
  parent: number;
}

/**
 * Exact marginals of all variables: variable elimination arranged as a junction tree, with one pass up and one down
 * (S. L. Lauritzen and D. J. Spiegelhalter, J. Royal Statistical Society B 50, 1988; for pedigrees R. C. Elston and
 * J. Stewart, Human Heredity 21, 1971, and C. Cannings et al. 1978 with loops). Messages are scaled, their logarithms
 * summed, so that nothing underflows.
 * @param sizes number of states per variable
 * @throws {GeneticsError} 'too-large' when a table would pass `largest` entries
 */
export function calibrate(
  sizes: readonly number[],
  factors: readonly Factor[],
  largest = LARGEST_TABLE,
): Calibrated {
  const order = eliminationOrder(sizes, factors);
  const rank = new Int32Array(sizes.length);
  order.forEach(({ variable }, i) => (rank[variable] = i));
  const first = (variables: readonly number[]) =>
    variables.reduce((low, variable) => Math.min(low, rank[variable] ?? 0), Number.MAX_SAFE_INTEGER);
  const assigned: Factor[][] = order.map(() => []);
  let logLikelihood = 0;
  for (const factor of factors) {
    if (factor.variables.length > 0) assigned[first(factor.variables)]?.push(factor);
  }
  const cliques: Clique[] = [];
  for (const [i, { variable, neighbours }] of order.entries()) {
    const variables = [...neighbours, variable];
    const entries = variables.reduce((product, each) => product * (sizes[each] ?? 1), 1);
    if (entries > largest) {
      throw new GeneticsError(
        'too-large',
        'pedigree',
        `The animals are too entangled: a table of ${entries} entries would be needed.`,
      );
    }
    const table = new Float64Array(entries).fill(1);
    for (const factor of assigned[i] ?? []) multiplyInto(table, variables, sizes, factor);
    const states = sizes[variable] ?? 1;
    const message = new Float64Array(entries / states);
    let highest = 0;
    for (let s = 0; s < message.length; s += 1) {
      let total = 0;
      for (let x = 0; x < states; x += 1) total += table[s * states + x] ?? 0;
      message[s] = total;
      if (total > highest) highest = total;
    }
    if (!(highest > 0)) return { logLikelihood: -Infinity, marginals: [] };
    for (let s = 0; s < message.length; s += 1) message[s] = (message[s] ?? 0) / highest;
    logLikelihood += Math.log(highest);
    const parent = neighbours.length > 0 ? first(neighbours) : -1;
    if (parent >= 0) assigned[parent]?.push({ variables: neighbours, table: message });
    cliques.push({ variables, table, message, parent });
  }
  return { logLikelihood, marginals: distribute(sizes, order, cliques) };
}

/** The pass down: every clique's table becomes the joint posterior of its variables. */
function distribute(
  sizes: readonly number[],
  order: readonly Elimination[],
  cliques: readonly Clique[],
): Float64Array[] {
  const marginals: Float64Array[] = sizes.map(() => new Float64Array(0));
  for (let i = cliques.length - 1; i >= 0; i -= 1) {
    const clique = cliques[i];
    const elimination = order[i];
    if (!clique || !elimination) continue;
    const above = cliques[clique.parent];
    if (above) {
      const down = sumOnto(above.table, above.variables, elimination.neighbours, sizes);
      for (let s = 0; s < down.length; s += 1) {
        const up = clique.message[s] ?? 0;
        down[s] = up > 0 ? (down[s] ?? 0) / up : 0;
      }
      multiplyInto(clique.table, clique.variables, sizes, { variables: elimination.neighbours, table: down });
    }
    let total = 0;
    for (const value of clique.table) total += value;
    for (let s = 0; s < clique.table.length; s += 1) clique.table[s] = (clique.table[s] ?? 0) / total;
    marginals[elimination.variable] = sumOnto(clique.table, clique.variables, [elimination.variable], sizes);
  }
  return marginals;
}

/** Multiplies a factor into a table whose variables include the factor's. */
function multiplyInto(
  table: Float64Array,
  variables: readonly number[],
  sizes: readonly number[],
  factor: Factor,
): void {
  walk(variables, factor.variables, sizes, (at, inFactor) => {
    table[at] = (table[at] ?? 0) * (factor.table[inFactor] ?? 0);
  });
}

/** Sums a table over all but the given of its variables. */
function sumOnto(
  table: Float64Array,
  variables: readonly number[],
  kept: readonly number[],
  sizes: readonly number[],
): Float64Array {
  const result = new Float64Array(kept.reduce((product, variable) => product * (sizes[variable] ?? 1), 1));
  walk(variables, kept, sizes, (at, inResult) => {
    result[inResult] = (result[inResult] ?? 0) + (table[at] ?? 0);
  });
  return result;
}

/** Visits every entry of a table, with the place of the same states in a table over some of its variables. */
function walk(
  variables: readonly number[],
  part: readonly number[],
  sizes: readonly number[],
  visit: (at: number, inPart: number) => void,
): void {
  const count = variables.length;
  const strides = new Int32Array(count);
  let stride = 1;
  for (let p = part.length - 1; p >= 0; p -= 1) {
    const variable = part[p] ?? -1;
    strides[variables.indexOf(variable)] = stride;
    stride *= sizes[variable] ?? 1;
  }
  const states = Int32Array.from(variables, (variable) => sizes[variable] ?? 1);
  const state = new Int32Array(count);
  let entries = 1;
  for (const size of states) entries *= size;
  let inPart = 0;
  for (let at = 0; at < entries; at += 1) {
    visit(at, inPart);
    for (let v = count - 1; v >= 0; v -= 1) {
      const next = (state[v] ?? 0) + 1;
      if (next < (states[v] ?? 1)) {
        state[v] = next;
        inPart += strides[v] ?? 0;
        break;
      }
      inPart -= (strides[v] ?? 0) * (state[v] ?? 0);
      state[v] = 0;
    }
  }
}

interface Elimination {
  variable: number;
  neighbours: number[];
}

/** Above so many neighbours the fill is taken to be complete rather than counted. */
const MOST_COUNTED = 48;

/**
 * Greedy order: the variable next whose elimination adds the fewest edges (min-fill), the smaller table first where
 * equal.
 */
function eliminationOrder(sizes: readonly number[], factors: readonly Factor[]): Elimination[] {
  const neighbours = sizes.map(() => new Set<number>());
  for (const { variables } of factors) {
    for (const a of variables) for (const b of variables) if (a !== b) neighbours[a]?.add(b);
  }
  const cost = (variable: number): number => {
    const around = [...(neighbours[variable] ?? [])];
    const logSize = around.reduce((total, each) => total + Math.log2(sizes[each] ?? 1), 0);
    if (around.length > MOST_COUNTED) return around.length * around.length + logSize / 1000;
    let fill = 0;
    for (const [i, a] of around.entries()) {
      for (let j = i + 1; j < around.length; j += 1) if (!neighbours[a]?.has(around[j] ?? -1)) fill += 1;
    }
    return fill + logSize / 1000;
  };
  const current = sizes.map((_, variable) => cost(variable));
  const heap = new CostHeap();
  current.forEach((value, variable) => heap.push(value, variable));
  const done = new Uint8Array(sizes.length);
  const order: Elimination[] = [];
  for (let entry = heap.pop(); entry; entry = heap.pop()) {
    const { variable } = entry;
    if (done[variable] || entry.cost !== current[variable]) continue;
    done[variable] = 1;
    const around = [...(neighbours[variable] ?? [])];
    order.push({ variable, neighbours: around });
    const touched = new Set(around);
    for (const a of around) {
      neighbours[a]?.delete(variable);
      for (const b of around) {
        if (a >= b || neighbours[a]?.has(b)) continue;
        neighbours[a]?.add(b);
        neighbours[b]?.add(a);
        // A new edge also lowers the fill of whoever knows both.
        const [few, many] = (neighbours[a]?.size ?? 0) < (neighbours[b]?.size ?? 0) ? [a, b] : [b, a];
        for (const c of neighbours[few] ?? []) if (neighbours[many]?.has(c)) touched.add(c);
      }
    }
    for (const each of touched) {
      const value = cost(each);
      if (value === current[each]) continue;
      current[each] = value;
      heap.push(value, each);
    }
  }
  return order;
}

/** A heap that gives the lowest cost first; entries that were overtaken are skipped by the caller. */
class CostHeap {
  private readonly entries: { cost: number; variable: number }[] = [];

  push(cost: number, variable: number): void {
    const { entries } = this;
    let i = entries.length;
    const entry = { cost, variable };
    entries.push(entry);
    while (i > 0) {
      const up = (i - 1) >> 1;
      const above = entries[up];
      if (!above || above.cost <= cost) break;
      entries[i] = above;
      i = up;
    }
    entries[i] = entry;
  }

  pop(): { cost: number; variable: number } | undefined {
    const { entries } = this;
    const top = entries[0];
    const last = entries.pop();
    if (!top || !last || entries.length === 0) return top;
    let i = 0;
    for (;;) {
      let down = 2 * i + 1;
      const [left, right] = [entries[down], entries[down + 1]];
      if (!left) break;
      if (right && right.cost < left.cost) down += 1;
      const below = entries[down];
      if (!below || below.cost >= last.cost) break;
      entries[i] = below;
      i = down;
    }
    entries[i] = last;
    return top;
  }
}
