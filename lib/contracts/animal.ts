import { z } from 'zod';

export const sex = z.enum(['male', 'female', 'unknown']);
export type Sex = z.infer<typeof sex>;

export const animalOrigin = z.enum(['captive_bred', 'wild_caught', 'unknown']);
export type AnimalOrigin = z.infer<typeof animalOrigin>;

export const animalStatus = z.enum([
  'here',
  'on_loan',
  'quarantine',
  'sold',
  'given_away',
  'died',
  'missing',
]);
export type AnimalStatus = z.infer<typeof animalStatus>;

export const ownershipReason = z.enum([
  'founding',
  'buy_in',
  'transfer',
  'gift',
  'buy_out',
  'inheritance',
  'hatched',
  'sale',
  'correction',
]);
export type OwnershipReason = z.infer<typeof ownershipReason>;

/**
 * What is recorded of one animal at one locus.
 * `shows`: the phenotype that is seen ('' = looks normal at this locus; null = not judged).
 * `carries`: what it is known or said to carry, with how sure the recorder is; genotypes are alleles joined by '/'.
 */
export const locusClaim = z.object({
  shows: z.string().nullable(),
  carries: z
    .object({
      /** Probability per genotype, fractions in text such as "2/3"; they add up to 1. */
      genotypes: z.record(z.string(), z.string().regex(/^\d+(\/[1-9]\d*)?$/)),
      basis: z.enum(['stated', 'tested', 'proven']),
    })
    .nullable(),
});
export type LocusClaim = z.infer<typeof locusClaim>;
