import { inbreedingCoefficients } from './inbreeding';
import { placeIn, type OrderedPedigree } from './pedigree-order';

/** A line of descent from a common ancestor to two animals. */
export interface AncestryPath {
  ancestor: string;
  /** From the first animal up to the ancestor and down to the second; no animal twice. */
  animals: readonly string[];
  /** (1/2)^n·(1 + F of the ancestor) with n animals on the path: what the path adds to the kinship. */
  contribution: number;
}

/** Every animal above one, itself included, with the fewest generations to it. */
export function ancestorsOf(pedigree: OrderedPedigree, id: string): Map<string, number> {
  const found = new Map<number, number>([[placeIn(pedigree, id), 0]]);
  let generation = [placeIn(pedigree, id)];
  for (let depth = 1; generation.length > 0; depth += 1) {
    const above: number[] = [];
    for (const place of generation) {
      for (const parent of [pedigree.sire[place] ?? -1, pedigree.dam[place] ?? -1]) {
        if (parent < 0 || found.has(parent)) continue;
        found.set(parent, depth);
        above.push(parent);
      }
    }
    generation = above;
  }
  return new Map([...found].map(([place, depth]) => [pedigree.ids[place] ?? '', depth]));
}

/** Animals that two have above them both (one may be the other), the nearest first by generations to either. */
export function commonAncestors(
  pedigree: OrderedPedigree,
  a: string,
  b: string,
): { id: string; generations: [number, number] }[] {
  const second = ancestorsOf(pedigree, b);
  return [...ancestorsOf(pedigree, a)]
    .flatMap(([id, depth]) => {
      const other = second.get(id);
      return other === undefined ? [] : [{ id, generations: [depth, other] as [number, number] }];
    })
    .toSorted((x, y) => x.generations[0] + x.generations[1] - y.generations[0] - y.generations[1]);
}

/**
 * The paths of Wright's formula: their contributions add up to the kinship of the two (S. Wright 1922).
 * @param most paths that are listed; when there are more, `complete` is false and the rest is left out
 */
export function ancestryPaths(
  pedigree: OrderedPedigree,
  a: string,
  b: string,
  most = 500,
): { paths: AncestryPath[]; complete: boolean } {
  const F = inbreedingCoefficients(pedigree);
  const shared = commonAncestors(pedigree, a, b);
  const paths: AncestryPath[] = [];
  let complete = true;
  for (const { id } of shared) {
    const ancestor = placeIn(pedigree, id);
    const left = linesTo(pedigree, placeIn(pedigree, a), ancestor, most);
    const right = linesTo(pedigree, placeIn(pedigree, b), ancestor, most);
    complete &&= left.length < most && right.length < most;
    for (const up of left) {
      const onLeft = new Set(up);
      for (const down of right) {
        if (down.some((place) => place !== ancestor && onLeft.has(place))) continue;
        if (paths.length >= most) return { paths, complete: false };
        const places = [...up, ...down.slice(0, -1).toReversed()];
        paths.push({
          ancestor: id,
          animals: places.map((place) => pedigree.ids[place] ?? ''),
          contribution: 0.5 ** places.length * (1 + (F[ancestor] ?? 0)),
        });
      }
    }
  }
  return { paths: paths.toSorted((x, y) => y.contribution - x.contribution), complete };
}

/** Lines from an animal up to an ancestor, both ends included. */
function linesTo(pedigree: OrderedPedigree, from: number, ancestor: number, most: number): number[][] {
  const lines: number[][] = [];
  const walk = (place: number, line: number[]): void => {
    if (lines.length >= most) return;
    if (place === ancestor) {
      lines.push(line);
      return;
    }
    for (const parent of [pedigree.sire[place] ?? -1, pedigree.dam[place] ?? -1]) {
      // Parents stand before their young, so nothing before the ancestor can lead to it.
      if (parent >= ancestor) walk(parent, [...line, parent]);
    }
  };
  walk(from, [from]);
  return lines;
}

/**
 * Share of each founder in an animal's genes, adding up to 1. A founder is an animal without known parents; an unknown
 * parent beside a known one counts under the empty id.
 */
export function founderContributions(pedigree: OrderedPedigree, id: string): Map<string, number> {
  const share = new Float64Array(pedigree.ids.length);
  const founders = new Map<string, number>();
  share[placeIn(pedigree, id)] = 1;
  for (let place = placeIn(pedigree, id); place >= 0; place -= 1) {
    const part = share[place] ?? 0;
    if (part === 0) continue;
    const parents = [pedigree.sire[place] ?? -1, pedigree.dam[place] ?? -1];
    if (parents.every((parent) => parent < 0)) {
      founders.set(pedigree.ids[place] ?? '', part);
      continue;
    }
    for (const parent of parents) {
      if (parent < 0) founders.set('', (founders.get('') ?? 0) + part / 2);
      else share[parent] = (share[parent] ?? 0) + part / 2;
    }
  }
  return new Map([...founders].toSorted((x, y) => y[1] - x[1]));
}

/**
 * Effective number of founders of a set of animals: 1 / Σp², p the mean contribution of each founder (R. C. Lacy, Zoo
 * Biology 8:111–123, 1989). Unknown parents count as one founder each time they are met.
 */
export function effectiveFounders(pedigree: OrderedPedigree, living: readonly string[]): number {
  const mean = new Map<string, number>();
  living.forEach((id) => {
    for (const [founder, part] of founderContributions(pedigree, id)) {
      const key = founder || `unknown parent of ${id}`;
      mean.set(key, (mean.get(key) ?? 0) + part / living.length);
    }
  });
  return 1 / [...mean.values()].reduce((total, part) => total + part * part, 0);
}
