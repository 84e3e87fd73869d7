import {
  animalOrigin,
  animalStatus,
  type AnimalOrigin,
  type AnimalStatus,
  type Sex,
} from '@/lib/contracts/animal';
import type { HatchedPrecision } from '@/lib/contracts/animal-list';

/** What can't be read is said with the words for it. */
export class UnreadableCell extends Error {
  override name = 'UnreadableCell';
}

const sexes: Record<string, Sex> = {
  male: 'male',
  m: 'male',
  '1.0': 'male',
  '♂': 'male',
  female: 'female',
  f: 'female',
  '0.1': 'female',
  '♀': 'female',
  unknown: 'unknown',
  u: 'unknown',
  '?': 'unknown',
  '0.0.1': 'unknown',
  '': 'unknown',
};

export function readSex(cell: string): Sex {
  const sex = sexes[cell.toLowerCase()];
  if (!sex) throw new UnreadableCell(`"${cell}" is no sex; write male, female or unknown.`);
  return sex;
}

const sexings = ['probed', 'popped', 'visible', 'stated', 'proven'] as const;
export function readSexedBy(cell: string): (typeof sexings)[number] | null {
  if (!cell) return null;
  const found = sexings.find((name) => name === cell.toLowerCase());
  if (!found) throw new UnreadableCell(`"${cell}" is no way of sexing; write ${sexings.join(', ')}.`);
  return found;
}

const origins: Record<string, AnimalOrigin> = {
  cb: 'captive_bred',
  cbb: 'captive_bred',
  'captive bred': 'captive_bred',
  wc: 'wild_caught',
  'wild caught': 'wild_caught',
  '': 'unknown',
};
export function readOrigin(cell: string): AnimalOrigin {
  const plain = cell.toLowerCase().replace(/[_-]/g, ' ');
  const found = origins[plain] ?? animalOrigin.options.find((name) => name.replace('_', ' ') === plain);
  if (!found) throw new UnreadableCell(`"${cell}" is no origin; write captive-bred, wild-caught or unknown.`);
  return found;
}

export function readStatus(cell: string): AnimalStatus {
  const plain = cell.toLowerCase().replace(/[\s-]/g, '_');
  if (!plain) return 'here';
  const found = animalStatus.options.find((name) => name === plain);
  if (!found)
    throw new UnreadableCell(
      `"${cell}" is no status; write one of ${animalStatus.options.map((name) => name.replaceAll('_', ' ')).join(', ')}.`,
    );
  return found;
}

/** An ISO day that exists in the calendar. */
export function readDay(cell: string): string | null {
  if (!cell) return null;
  if (
    !/^\d{4}-\d{2}-\d{2}$/.test(cell) ||
    new Date(`${cell}T00:00:00Z`).toISOString().slice(0, 10) !== cell
  ) {
    throw new UnreadableCell(`"${cell}" is no day; write it as 2024-07-31.`);
  }
  return cell;
}

/** "2022-07-03", "2022-07" or "2022". */
export function readHatched(cell: string): { hatchedOn: string | null; hatchedPrecision: HatchedPrecision } {
  if (/^\d{4}$/.test(cell)) return { hatchedOn: `${cell}-01-01`, hatchedPrecision: 'year' };
  if (/^\d{4}-(0[1-9]|1[0-2])$/.test(cell)) return { hatchedOn: `${cell}-01`, hatchedPrecision: 'month' };
  try {
    return { hatchedOn: readDay(cell), hatchedPrecision: 'day' };
  } catch {
    throw new UnreadableCell(`"${cell}" is no date; write 2022-07-03, 2022-07 or 2022.`);
  }
}

export function readYes(cell: string): boolean {
  if (['', 'no', 'n', 'false', '0'].includes(cell.toLowerCase())) return false;
  if (['yes', 'y', 'true', '1', 'x'].includes(cell.toLowerCase())) return true;
  throw new UnreadableCell(`"${cell}" is neither yes nor no.`);
}

/** "Odile 2; Bram 1": names with positive whole numbers; a lone name gets 1. */
export function readCounted(cell: string): { name: string; count: number }[] {
  return cell
    .split(';')
    .map((piece) => piece.trim())
    .filter(Boolean)
    .map((piece) => {
      const found = /^(.*\S)\s+(\d{1,6})$/.exec(piece);
      if (!found) return { name: piece, count: 1 };
      const count = Number(found[2]);
      if (count < 1) throw new UnreadableCell(`"${piece}": parts are whole numbers from 1.`);
      return { name: found[1] ?? piece, count };
    });
}

/** "2024-05-01 1200; 2024-06-01 1250", or one mass in grams, taken as of today. */
export function readWeights(cell: string, today: string): { weighedOn: string; grams: number }[] {
  return cell
    .split(';')
    .map((piece) => piece.trim())
    .filter(Boolean)
    .map((piece) => {
      const found = /^(?:(\d{4}-\d{2}-\d{2})\s+)?(\d{1,6})(?:\s*g)?$/.exec(piece);
      const grams = Number(found?.[2]);
      if (!found || grams < 1)
        throw new UnreadableCell(`"${piece}" is no weight; write 1200, or 2024-05-01 1200.`);
      const weighedOn = readDay(found[1] ?? '') ?? today;
      if (weighedOn > today) throw new UnreadableCell(`"${piece}": this day has not come yet.`);
      return { weighedOn, grams };
    });
}
