import { z } from 'zod';
import { animalId, partyId, termsId } from './ids';

export const pairingEventKind = z.enum(['introduction', 'separation', 'lock', 'refusal', 'follicles', 'ovulation', 'pre_lay_shed']);
export type PairingEventKind = z.infer<typeof pairingEventKind>;

/** What is proposed of a pairing beside its two animals. */
export const pairingPlan = z.object({
  startsOn: z.iso.date(),
  endsOn: z.iso.date(),
  eggsExpected: z.int().min(1).max(120),
  note: z.string().max(2000),
  /** Minor units expected per phenotype row of the outcome table, by the row's key. */
  prices: z.record(z.string(), z.int().min(0)),
  /** Welfare cautions that the proposer has acknowledged, by their text. */
  acknowledgedCautions: z.array(z.string()),
});
export type PairingPlan = z.infer<typeof pairingPlan>;

export const outcomeRow = z.object({
  key: z.string(),
  looksLike: z.string(),
  carries: z.string(),
  /** Exact odds per egg as a fraction such as "5/12", and the same as a number for drawing. */
  odds: z.string(),
  probability: z.number().min(0).max(1),
  /** Chance of at least one in the expected clutch, given that all eggs share their parents. */
  atLeastOne: z.number().min(0).max(1),
  sex: z.enum(['male', 'female']).nullable(),
  price: z.int().min(0).nullable(),
});

/** The figures that the parties saw and agreed to; kept with the version, never recomputed. */
export const pairingFigures = z.object({
  title: z.string(),
  sire: z.object({ id: animalId, code: z.string(), description: z.string() }),
  dam: z.object({ id: animalId, code: z.string(), description: z.string() }),
  outcomes: z.array(outcomeRow),
  /** Share of the eggs lost to lethal genotypes, as a fraction. */
  lethal: z.string(),
  inbreeding: z.number().min(0).max(1),
  commonAncestors: z.array(z.string()),
  eggsExpected: z.int(),
  hatchlingsExpected: z.number(),
  warnings: z.array(z.object({ about: z.string(), text: z.string() })),
  cautions: z.array(z.object({ text: z.string(), source: z.string() })),
  termsId,
  termsNumber: z.int(),
  proceeds: z.object({
    expected: z.int(),
    currency: z.string(),
    steps: z.array(z.object({ label: z.string(), amount: z.int() })),
    shares: z.array(z.object({ partyId, name: z.string(), amount: z.int(), parts: z.int(), of: z.int(), why: z.string() })),
  }),
});
export type PairingFigures = z.infer<typeof pairingFigures>;
