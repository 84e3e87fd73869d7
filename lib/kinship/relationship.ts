import { ancestorsOf } from './ancestry';
import { kinshipTable } from './kinship';
import { placeIn, type OrderedPedigree } from './pedigree-order';

export interface Relationship {
  /** The closest relationship in words, seen from the first animal: "parent", "half sibling", "unrelated". */
  words: string;
  /** Kinship φ, 0 to 1; half of Wright's coefficient of relationship for animals that are not inbred. */
  kinship: number;
}

/**
 * How two animals are related: the nearest line between them, and the kinship that all lines together give.
 * "Parent" says that the first is the second's parent.
 */
export function relationshipOf(pedigree: OrderedPedigree, a: string, b: string): Relationship {
  const [first, second] = [placeIn(pedigree, a), placeIn(pedigree, b)];
  return { words: nameOf(pedigree, a, b), kinship: kinshipTable(pedigree)(first, second) };
}

function nameOf(pedigree: OrderedPedigree, a: string, b: string): string {
  if (a === b) return 'the same animal';
  const above = ancestorsOf(pedigree, a);
  const aboveOther = ancestorsOf(pedigree, b);
  const down = aboveOther.get(a);
  if (down !== undefined) return inLine('parent', down);
  const up = above.get(b);
  if (up !== undefined) return inLine('offspring', up);
  const shared = [...above].flatMap(([id, x]) => {
    const y = aboveOther.get(id);
    return y === undefined ? [] : [{ id, x, y }];
  });
  if (shared.length === 0) return 'unrelated';
  const nearest = Math.min(...shared.map(({ x, y }) => x + y));
  const closest = shared.filter(({ x, y }) => x + y === nearest);
  const [{ x, y } = { x: 0, y: 0 }] = closest;
  const alike = closest.filter((line) => line.x === x && line.y === y);
  const full = areMates(
    pedigree,
    alike.map(({ id }) => id),
  )
    ? ''
    : 'half ';
  const fewer = Math.min(x, y);
  const removed = Math.abs(x - y);
  if (fewer === 1 && removed === 0) return full ? 'half sibling' : 'full sibling';
  if (fewer === 1) {
    const great = 'great-'.repeat(removed - 1);
    return `${full}${great}${x < y ? 'aunt or uncle' : 'niece or nephew'}`;
  }
  const double = full === '' && alike.length >= 4 ? 'double ' : '';
  const times = removed === 0 ? '' : removed === 1 ? ' once removed' : ` ${removed} times removed`;
  return `${double}${full}${ordinal(fewer - 1)} cousin${times}`;
}

/** Whether two of the nearest common ancestors bred together, so that the line is a full one. */
function areMates(pedigree: OrderedPedigree, ids: readonly string[]): boolean {
  const places = new Set(ids.map((id) => placeIn(pedigree, id)));
  return pedigree.ids.some(
    (_, place) => places.has(pedigree.sire[place] ?? -1) && places.has(pedigree.dam[place] ?? -1),
  );
}

function inLine(word: 'parent' | 'offspring', generations: number): string {
  if (generations === 1) return word;
  return `${'great-'.repeat(generations - 2)}grand${word}`;
}

function ordinal(n: number): string {
  return ['', 'first', 'second', 'third'][n] ?? `${n}th`;
}
