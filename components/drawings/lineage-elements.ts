/** An animal of the graph. Parents are keys of other animals of the graph. */
export interface LineageAnimal {
  key: string;
  /** False for one that the viewer may not see: it is drawn without code, fill or parents. */
  shown: boolean;
  code: string;
  sex: 'male' | 'female' | 'unknown';
  dead: boolean;
  fill: { shows: boolean; carries: number } | null;
  sire: string | null;
  dam: string | null;
  possibleSires: readonly string[];
}

/** Parents that have young together, in the order in which they were met. */
export interface Mating {
  id: string;
  /** A known sire, or several possible ones, or none. */
  sires: readonly string[];
  dam: string | null;
  young: readonly string[];
  related: boolean;
}

/** The matings of a set of animals: one for each pair (or lone parent) with young in the set. */
export function matingsOf(
  animals: readonly LineageAnimal[],
  relatedMates: readonly (readonly [string, string])[],
): Mating[] {
  const related = new Set(relatedMates.map(([sire, dam]) => `${sire} ${dam}`));
  const found = new Map<
    string,
    { id: string; sires: readonly string[]; dam: string | null; young: string[]; related: boolean }
  >();
  for (const animal of animals) {
    const sires = animal.sire ? [animal.sire] : animal.possibleSires;
    if (sires.length === 0 && !animal.dam) continue;
    const id = `mating ${sires.join('+')} ${animal.dam ?? ''}`;
    const mating = found.get(id) ?? {
      id,
      sires,
      dam: animal.dam,
      young: [],
      related: sires.some((sire) => related.has(`${sire} ${animal.dam}`)),
    };
    mating.young.push(animal.key);
    found.set(id, mating);
  }
  return [...found.values()];
}

export interface Point {
  x: number;
  y: number;
}

/**
 * Puts the point of a mating on the line between its parents where they stand side by side in one row with nobody
 * between them, as pedigrees are drawn. Where they do not, it stays below the lower parent and the lines go around.
 * @param animals places of the animals
 * @returns places of matings that move
 */
export function placeMatings(
  matings: readonly Mating[],
  animals: ReadonlyMap<string, Point>,
): Map<string, Point> {
  const rows = new Map<number, number[]>();
  for (const { x, y } of animals.values()) rows.set(Math.round(y), [...(rows.get(Math.round(y)) ?? []), x]);
  const moved = new Map<string, Point>();
  for (const { id, sires, dam } of matings) {
    const a = sires.length === 1 ? animals.get(sires[0] ?? '') : undefined;
    const b = dam ? animals.get(dam) : undefined;
    if (!a || !b || Math.round(a.y) !== Math.round(b.y)) continue;
    const [left, right] = [Math.min(a.x, b.x), Math.max(a.x, b.x)];
    const isFree = !(rows.get(Math.round(a.y)) ?? []).some((x) => x > left + 1 && x < right - 1);
    if (isFree) moved.set(id, { x: (left + right) / 2, y: a.y });
  }
  return moved;
}

/** Where the arrow keys lead from an animal: up to a parent, down to young, sideways along the row, mates before others. */
export function neighbourOf(
  key: string,
  direction: 'up' | 'down' | 'left' | 'right',
  animals: ReadonlyMap<string, LineageAnimal>,
  matings: readonly Mating[],
  places: ReadonlyMap<string, Point>,
): string | null {
  const animal = animals.get(key);
  const here = places.get(key);
  if (!animal || !here) return null;
  if (direction === 'up')
    return (
      [animal.sire, animal.dam, ...animal.possibleSires].find((parent) => parent && animals.has(parent)) ??
      null
    );
  if (direction === 'down')
    return matings.find(({ sires, dam }) => sires.includes(key) || dam === key)?.young[0] ?? null;
  const isAhead = (x: number) => (direction === 'left' ? x < here.x - 1 : x > here.x + 1);
  const mates = new Set(
    matings.flatMap(({ sires, dam }) => (dam === key ? [...sires] : sires.includes(key) && dam ? [dam] : [])),
  );
  const ahead = [...places].filter(
    ([other, { x, y }]) => animals.has(other) && isAhead(x) && (mates.has(other) || Math.abs(y - here.y) < 1),
  );
  const distance = ([, { x, y }]: [string, Point]) => Math.abs(x - here.x) + Math.abs(y - here.y);
  return ahead.sort((a, b) => distance(a) - distance(b))[0]?.[0] ?? null;
}
