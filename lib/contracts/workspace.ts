import { z } from 'zod';

/** Limits a workspace sets for itself; crossing one warns, it does not forbid. */
export const workspaceLimits = z.object({
  /** Per sex: the least weight (grams) and age (months) at which an animal is paired. Species may set their own. */
  minimumBreedingGrams: z.object({ male: z.int().min(0), female: z.int().min(0) }),
  minimumBreedingMonths: z.object({ male: z.int().min(0), female: z.int().min(0) }),
  /** Inbreeding coefficient of the young (per mille) above which a pairing warns. */
  inbreedingPerMille: z.int().min(0).max(1000),
});
export type WorkspaceLimits = z.infer<typeof workspaceLimits>;
