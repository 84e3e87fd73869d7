import { sayDay } from '@/components/drawings/season-days';
import type { Tone } from '@/components/ui/badge';
import type { AnimalOrigin, AnimalStatus, OwnershipReason, Sex } from '@/lib/contracts/animal';
import type { HatchedPrecision } from '@/lib/contracts/animal-list';

export const sexWords: Record<Sex, string> = { male: 'Male', female: 'Female', unknown: 'Sex unknown' };
export const sexSigns: Record<Sex, string> = { male: '♂', female: '♀', unknown: '?' };

export const statusWords: Record<AnimalStatus, string> = {
  here: 'Here',
  on_loan: 'On loan',
  quarantine: 'In quarantine',
  sold: 'Sold',
  given_away: 'Given away',
  died: 'Died',
  missing: 'Missing',
};
export const statusTones: Record<AnimalStatus, Tone> = {
  here: 'moss',
  on_loan: 'slate',
  quarantine: 'straw',
  sold: 'neutral',
  given_away: 'neutral',
  died: 'neutral',
  missing: 'alarm',
};

export const originWords: Record<AnimalOrigin, string> = {
  captive_bred: 'Captive-bred',
  wild_caught: 'Wild-caught',
  unknown: 'Origin unknown',
};

export const sexedByWords = {
  probed: 'probed',
  popped: 'popped',
  visible: 'visible',
  stated: 'stated',
  proven: 'proven',
} as const;

export const reasonWords: Record<OwnershipReason, string> = {
  founding: 'First owners',
  buy_in: 'Buy-in',
  transfer: 'Transfer',
  gift: 'Gift',
  buy_out: 'Buy-out',
  inheritance: 'Inheritance',
  hatched: 'Hatched',
  sale: 'Sold',
  correction: 'Correction',
};

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** "3 Jul 2022", "Jul 2022" or "2022", as exactly as it is known. */
export function sayHatched(day: string | null, precision: HatchedPrecision): string {
  if (!day) return 'not known';
  if (precision === 'year') return day.slice(0, 4);
  if (precision === 'month') return `${MONTHS[Number(day.slice(5, 7)) - 1] ?? ''} ${day.slice(0, 4)}`;
  return sayDay(day);
}

/** "4 y", "7 mo" or "12 d" from one day to another. */
export function sayAge(from: string | null, today: string): string {
  if (!from) return '';
  const days = Math.floor((Date.parse(`${today}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);
  if (days < 0) return '';
  if (days < 60) return `${days} d`;
  const months = Math.floor(days / 30.4375);
  return months < 24 ? `${months} mo` : `${Math.floor(months / 12)} y`;
}

/** "1,840 g". */
export const sayGrams = (grams: number) => `${grams.toLocaleString('en-US')} g`;

/** "34 kB". */
export function sayBytes(bytes: number): string {
  return bytes < 1_000_000
    ? `${Math.max(1, Math.round(bytes / 1000))} kB`
    : `${(bytes / 1_000_000).toFixed(1)} MB`;
}

/** Males.females.unknown, as animals are counted in the trade. */
export const saySexes = ({ male, female, unknown }: Record<Sex, number>) => `${male}.${female}.${unknown}`;
