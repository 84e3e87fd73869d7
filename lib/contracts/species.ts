import { z } from 'zod';

const days = z.object({
  from: z.int().min(0),
  usual: z.int().min(0),
  to: z.int().min(0),
  source: z.string(),
});

/** What is usual for a species. Each value says where it comes from, or "common practice". */
export const speciesProfile = z.object({
  bearing: z.enum(['eggs', 'live']),
  clutchSize: z.object({
    from: z.int().min(0),
    usual: z.number().min(0),
    to: z.int().min(1),
    source: z.string(),
  }),
  /** Share of the eggs laid that hatch, as a fraction in text such as "81/100". */
  hatchRate: z.object({ fraction: z.string().regex(/^\d+\/\d+$/), source: z.string() }),
  /** Days from one phase of a season to the next. */
  intervals: z.object({
    pairingToOvulation: days,
    ovulationToPreLayShed: days,
    preLayShedToLaying: days,
    incubation: days,
    hatchToFirstShed: days,
  }),
  incubationCelsius: z.object({ from: z.number(), to: z.number(), source: z.string() }),
  breeding: z.object({
    femaleGrams: z.int().min(0),
    maleGrams: z.int().min(0),
    femaleMonths: z.int().min(0),
    maleMonths: z.int().min(0),
    source: z.string(),
  }),
});
export type SpeciesProfile = z.infer<typeof speciesProfile>;
