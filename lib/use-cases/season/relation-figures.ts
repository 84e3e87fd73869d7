import type { AnimalId } from '@/lib/contracts/ids';
import { ancestryPaths } from '@/lib/kinship/ancestry';
import { inbreedingOfClutch } from '@/lib/kinship/kinship';
import { orderPedigree } from '@/lib/kinship/pedigree-order';
import { relationshipOf } from '@/lib/kinship/relationship';

export interface RelationFigures {
  /** Inbreeding coefficient of the young, 0–1. */
  inbreeding: number;
  /** How the two are related, in words; "unrelated" when nothing is recorded. */
  words: string;
  /** Each common ancestor with its generations on either side, the one that adds most first. */
  commonAncestors: string[];
}

type Row = { id: AnimalId; code: string; sireId: AnimalId | null; damId: AnimalId | null };
const MOST_NAMED = 6;

const times = (generations: number) =>
  [
    'the animal itself',
    'one generation',
    'two generations',
    'three generations',
    'four generations',
    'five generations',
  ][generations] ?? `${generations} generations`;

/**
 * Kinship of two animals over the whole pedigree. An ancestor that stands outside what the parties of the project see is
 * counted, but not named.
 */
export function relationFigures(
  rows: readonly Row[],
  pair: { sireId: AnimalId; damId: AnimalId },
  isNamed: (id: string) => boolean,
): RelationFigures {
  const pedigree = orderPedigree(rows.map(({ id, sireId, damId }) => ({ id, sire: sireId, dam: damId })));
  const codes = new Map<string, string>(rows.map(({ id, code }) => [id, code]));
  const { paths } = ancestryPaths(pedigree, pair.sireId, pair.damId);
  const seen = new Map<string, string>();
  for (const { ancestor, animals } of paths) {
    if (seen.has(ancestor)) continue;
    const up = animals.indexOf(ancestor);
    const down = animals.length - 1 - up;
    const name = isNamed(ancestor) ? (codes.get(ancestor) ?? 'an animal') : 'an animal outside this project';
    seen.set(ancestor, `${name}, ${times(up)} back on his side, ${times(down)} on hers`);
  }
  return {
    inbreeding: inbreedingOfClutch(pedigree, pair.sireId, pair.damId),
    words: relationshipOf(pedigree, pair.sireId, pair.damId).words,
    commonAncestors: [...new Set(seen.values())].slice(0, MOST_NAMED),
  };
}
