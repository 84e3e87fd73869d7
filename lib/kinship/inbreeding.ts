import type { OrderedPedigree } from './pedigree-order';

/**
 * Inbreeding coefficient F (0 to 1) of every animal: the chance that its two alleles at an autosomal locus are copies
 * of one ancestral allele (S. Wright, American Naturalist 56, 1922). Founders are taken as unrelated and not inbred.
 *
 * T. H. E. Meuwissen and Z. Luo, Genetics Selection Evolution 24:305–313, 1992: F of an animal is the sum over its
 * ancestors of the squared coefficient of the Cholesky factor times the within-family variance, less one. Full sibs
 * share the value. Doubles are exact here as long as denominators stay below 2^53.
 * @returns F by place in the pedigree
 */
export function inbreedingCoefficients(pedigree: OrderedPedigree): Float64Array {
  const { sire, dam, ids } = pedigree;
  const n = ids.length;
  const F = new Float64Array(n);
  const variance = new Float64Array(n);
  const L = new Float64Array(n);
  const queued = new Uint8Array(n);
  const byParents = new Map<number, number>();
  const heap: number[] = [];
  const inbreedingOf = (place: number) => (place < 0 ? -1 : (F[place] ?? 0));
  for (let i = 0; i < n; i += 1) {
    const s = sire[i] ?? -1;
    const d = dam[i] ?? -1;
    // An unknown parent is counted as F = −1, which gives 1 for founders and 3/4 − F/4 for one known parent.
    variance[i] = 0.5 - 0.25 * (inbreedingOf(s) + inbreedingOf(d));
    if (s < 0 || d < 0) continue;
    const family = s * n + d;
    const known = byParents.get(family);
    if (known !== undefined) {
      F[i] = F[known] ?? 0;
      continue;
    }
    byParents.set(family, i);
    L[i] = 1;
    push(heap, i);
    let diagonal = 0;
    for (let j = pop(heap); j >= 0; j = pop(heap)) {
      const coefficient = L[j] ?? 0;
      L[j] = 0;
      queued[j] = 0;
      diagonal += coefficient * coefficient * (variance[j] ?? 0);
      for (const parent of [sire[j] ?? -1, dam[j] ?? -1]) {
        if (parent < 0) continue;
        L[parent] = (L[parent] ?? 0) + 0.5 * coefficient;
        if (queued[parent]) continue;
        queued[parent] = 1;
        push(heap, parent);
      }
    }
    F[i] = diagonal - 1;
  }
  return F;
}

/** Adds a place to a heap that gives the youngest (largest) first. */
function push(heap: number[], value: number): void {
  let i = heap.length;
  heap.push(value);
  while (i > 0) {
    const up = (i - 1) >> 1;
    const above = heap[up] ?? 0;
    if (above >= value) break;
    heap[i] = above;
    i = up;
  }
  heap[i] = value;
}

/** Takes the largest place, −1 when there is none. */
function pop(heap: number[]): number {
  const top = heap[0];
  const last = heap.pop();
  if (top === undefined || last === undefined) return -1;
  if (heap.length === 0) return top;
  let i = 0;
  for (;;) {
    let down = 2 * i + 1;
    if (down >= heap.length) break;
    if (down + 1 < heap.length && (heap[down + 1] ?? 0) > (heap[down] ?? 0)) down += 1;
    const below = heap[down] ?? 0;
    if (below <= last) break;
    heap[i] = below;
    i = down;
  }
  heap[i] = last;
  return top;
}
