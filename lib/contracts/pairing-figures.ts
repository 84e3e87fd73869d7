import { z } from 'zod';
import { animalId, locusId, partyId, termsId } from './ids';

export const pairingEventKind = z.enum([
  'introduction',
  'separation',
  'lock',
  'refusal',
  'follicles',
  'ovulation',
  'pre_lay_shed',
]);
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

const alleleCopy = z.object({ letter: z.string(), probability: z.number().min(0).max(1) });
const partsOf = z.array(z.object({ partyId, parts: z.int().min(0) }));

/** A parent as it stood when the figures were made. */
export const parentFigures = z.object({
  id: animalId,
  code: z.string(),
  name: z.string(),
  description: z.string(),
  hatchedOn: z.iso.date().nullable(),
  /** In full months on the first day of the pairing. */
  ageMonths: z.int().nullable(),
  grams: z.int().nullable(),
  weighedOn: z.iso.date().nullable(),
  parts: partsOf,
  /** The loci at which either parent may carry something. */
  loci: z.array(
    z.object({
      locusId,
      name: z.string(),
      copies: z.tuple([alleleCopy, alleleCopy]),
      /** The second copy does not exist: sex-linked in the sex with two different sex chromosomes. */
      single: z.boolean(),
      words: z.string(),
    }),
  ),
});
export type ParentFigures = z.infer<typeof parentFigures>;

/** A Punnett square over one or two loci: the sire's gametes in columns, the dam's in rows. */
export const punnettSquare = z.object({
  title: z.string(),
  columns: z.array(z.string()),
  rows: z.array(z.string()),
  /** Per row and column: the genotype, what it looks like ('' = normal), and the odds of the cell as a fraction. */
  cells: z.array(z.array(z.object({ genotype: z.string(), looksLike: z.string(), odds: z.string() }))),
  note: z.string(),
});
export type PunnettSquare = z.infer<typeof punnettSquare>;

/** The figures that the parties saw and agreed to; kept with the version, never recomputed. */
export const pairingFigures = z.object({
  title: z.string(),
  sire: z.object({ id: animalId, code: z.string(), description: z.string() }),
  dam: z.object({ id: animalId, code: z.string(), description: z.string() }),
  parents: z.object({ sire: parentFigures, dam: parentFigures }),
  outcomes: z.array(outcomeRow),
  /** Looks that are too unlikely for the table, together; 0 when the table has all. */
  leftOut: z.number().min(0).max(1),
  squares: z.array(punnettSquare),
  /** Why the odds per clutch are not a simple power; null when both parents are known for certain. */
  uncertain: z.string().nullable(),
  /** Whose the young would be by the parents' parts and the terms, and the steps that lead there. */
  youngParts: z.object({ parts: partsOf, steps: z.array(z.string()) }),
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
    /** Taken off before the shares, such as the house share. Steps and shares add up to what is expected. */
    steps: z.array(z.object({ label: z.string(), amount: z.int(), partyId: partyId.nullable() })),
    shares: z.array(
      z.object({ partyId, name: z.string(), amount: z.int(), parts: z.int(), of: z.int(), why: z.string() }),
    ),
  }),
});
export type PairingFigures = z.infer<typeof pairingFigures>;
