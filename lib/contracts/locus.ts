import { z } from 'zod';
import type { LocusDefinition } from '@/lib/genetics/locus';
import { contract, done, inWorkspace } from './contract';
import { combinationId, locusId, speciesId } from './ids';

const genotype = z.string().min(1).max(40);
/** Looks stand in lists and files, between commas and bars. */
const look = z
  .string()
  .trim()
  .max(60)
  .regex(/^[^,|:;]*$/, 'Without commas, colons, semicolons or bars.');
const odds = z.string().regex(/^\d+(\.\d+)?(\/[1-9]\d*)?$/, 'A fraction such as 9/10.');

/** Everything of a locus but its id and name, which the row holds. */
export const locusDefinition = z.object({
  symbol: z.string().trim().min(1, 'A short sign, such as alb.').max(8),
  chromosome: z.enum(['autosomal', 'X', 'Z']),
  linkage: z
    .object({ group: z.string().trim().min(1).max(20), position: z.number().min(0).max(1000) })
    .nullable(),
  alleles: z
    .array(
      z.object({
        symbol: z.string().trim().min(1, 'A sign, such as +.').max(8),
        name: z.string().trim().min(1, 'A name.').max(60),
      }),
    )
    .min(2, 'The wild type and at least one other allele.')
    .max(12),
  phenotypes: z.record(genotype, look),
  penetrance: z.record(genotype, z.record(look, odds)),
  lethal: z.array(genotype),
  dominance: z.enum(['recessive', 'dominant', 'incomplete dominant', 'codominant']),
  welfare: z.array(
    z.object({
      text: z.string().trim().min(1, 'Say what the harm is.').max(500),
      source: z.string().trim().min(1, 'Say where it is from.').max(300),
      genotypes: z.array(genotype),
    }),
  ),
  source: z.object({
    citation: z.string().trim().min(1, 'Say where it is from, or "own observation".').max(300),
    certainty: z.enum(['read', 'memory', 'common practice']),
  }),
}) satisfies z.ZodType<Omit<LocusDefinition, 'id' | 'name'>>;

const locusName = z
  .string()
  .trim()
  .min(1, 'Name the locus.')
  .max(60)
  .regex(/^[^,|:;]*$/, 'Without commas, colons, semicolons or bars.');

const genotypeEntry = z.object({
  genotype: z.string(),
  /** The look that it usually has; '' is normal. */
  phenotype: z.string(),
  /** Copies of alleles other than the wild type. */
  copies: z.int(),
  /** "het", "two copies of Clown", "no copy". */
  words: z.string(),
});

export const locusEntry = z.object({
  id: locusId,
  name: z.string(),
  version: z.int(),
  definition: locusDefinition,
  /** How many animals something is recorded of here. */
  recorded: z.int(),
  /** What an animal of each sex may be, wild type first. */
  genotypes: z.object({
    male: z.array(genotypeEntry),
    female: z.array(genotypeEntry),
    unknown: z.array(genotypeEntry),
  }),
});
export type LocusEntry = z.infer<typeof locusEntry>;

const inSpecies = inWorkspace.extend({ species: speciesId });
const inLocus = inWorkspace.extend({ locus: locusId });

export const createLocus = contract({
  id: 'loci.create',
  method: 'POST',
  path: '/workspaces/{workspace}/species/{species}/loci',
  summary: 'Add a locus to a species: its alleles, what each genotype shows, where it lies, what harms',
  access: { scope: 'workspace', action: 'genetics.edit' },
  params: inSpecies,
  body: z.object({ name: locusName, definition: locusDefinition }),
  response: z.object({ id: locusId }),
});

export const editLocus = contract({
  id: 'loci.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/loci/{locus}',
  summary: 'Change a locus; what is recorded of animals has to fit it still',
  access: { scope: 'workspace', action: 'genetics.edit' },
  params: inLocus,
  body: z.object({ name: locusName, definition: locusDefinition, version: z.int() }),
  response: z.object({ version: z.int() }),
});

export const removeLocus = contract({
  id: 'loci.remove',
  method: 'DELETE',
  path: '/workspaces/{workspace}/loci/{locus}',
  summary: 'Remove a locus that nothing is recorded at',
  access: { scope: 'workspace', action: 'genetics.edit' },
  params: inLocus,
  response: done,
});

export const createCombination = contract({
  id: 'combinations.create',
  method: 'POST',
  path: '/workspaces/{workspace}/species/{species}/combinations',
  summary: 'Name a set of looks over several loci',
  access: { scope: 'workspace', action: 'genetics.edit' },
  params: inSpecies,
  body: z.object({
    name: z.string().trim().min(1, 'Name the combination.').max(60),
    phenotypes: z
      .record(z.string(), z.string().min(1))
      .refine((looks) => Object.keys(looks).length >= 2, 'Choose looks at two loci or more.'),
  }),
  response: z.object({ id: combinationId }),
});

export const removeCombination = contract({
  id: 'combinations.remove',
  method: 'DELETE',
  path: '/workspaces/{workspace}/combinations/{combination}',
  summary: 'Remove the name of a combination',
  access: { scope: 'workspace', action: 'genetics.edit' },
  params: inWorkspace.extend({ combination: combinationId }),
  response: done,
});
