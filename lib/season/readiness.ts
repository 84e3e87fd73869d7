import { daysBetween, wholeMonths } from './days';

/** What a pairing should know of one of its animals. */
export interface Breeder {
  code: string;
  sex: 'male' | 'female';
  hatchedOn: string | null;
  /** The last weight, grams, and the day of it. */
  grams: number | null;
  weighedOn: string | null;
}

/** The least weight (grams) and age (months), from one authority such as "the workspace" or "the species". */
export interface BreedingLimit {
  grams: number;
  months: number;
  from: string;
}

export interface ReadinessWarning {
  about: 'age' | 'weight';
  text: string;
}

/** A weight older than this says little about an animal today (common practice, no source). */
const OLD_WEIGHT_DAYS = 60;

const strictest = (limits: readonly BreedingLimit[], of: 'grams' | 'months') =>
  limits.reduce<BreedingLimit | null>(
    (most, limit) => (most === null || limit[of] > most[of] ? limit : most),
    null,
  );

/**
 * What stands against pairing an animal on a day: its age and its last weight under the strictest limit given, or that
 * one of them is not known. Warnings inform; they don't forbid.
 */
export function checkReadiness(
  animal: Breeder,
  limits: readonly BreedingLimit[],
  onDay: string,
): ReadinessWarning[] {
  const warnings: ReadinessWarning[] = [];
  const age = strictest(limits, 'months');
  const weight = strictest(limits, 'grams');
  if (age && age.months > 0) {
    if (!animal.hatchedOn) {
      warnings.push({
        about: 'age',
        text: `The age of ${animal.code} is not known; ${age.from} asks for ${age.months} months.`,
      });
    } else {
      const months = wholeMonths(animal.hatchedOn, onDay);
      if (months < age.months) {
        warnings.push({
          about: 'age',
          text: `${animal.code} will be ${months} months old; ${age.from} asks for ${age.months}.`,
        });
      }
    }
  }
  if (weight && weight.grams > 0) {
    if (animal.grams === null || !animal.weighedOn) {
      warnings.push({
        about: 'weight',
        text: `${animal.code} has no weight on record; ${weight.from} asks for ${weight.grams} g.`,
      });
    } else {
      if (animal.grams < weight.grams) {
        warnings.push({
          about: 'weight',
          text: `${animal.code} weighs ${animal.grams} g; ${weight.from} asks for ${weight.grams} g.`,
        });
      }
      const old = daysBetween(animal.weighedOn, onDay);
      if (old > OLD_WEIGHT_DAYS) {
        warnings.push({
          about: 'weight',
          text: `The last weight of ${animal.code} will be ${old} days old: weigh before pairing.`,
        });
      }
    }
  }
  return warnings;
}
