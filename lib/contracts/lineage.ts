import { z } from 'zod';
import { animalStatus, sex } from './animal';
import { contract, isoDay } from './contract';
import { animalId, locusId, speciesId } from './ids';

/** What a symbol of the graph is filled with at the chosen locus. */
export const lineageFill = z.object({
  /** It looks affected: the whole symbol is filled. */
  shows: z.boolean(),
  /** Probability of at least one copy, 0–1: 1 is drawn as a carrier's dot, less as a part-filled symbol. */
  carries: z.number().min(0).max(1),
  words: z.string(),
});

export const lineageNode = z.object({
  /** An animal's id, or a made-up key for one that is not shown. */
  key: z.string(),
  shown: z.boolean(),
  code: z.string(),
  name: z.string(),
  sex,
  hatchedOn: isoDay.nullable(),
  status: animalStatus.nullable(),
  description: z.string(),
  fill: lineageFill.nullable(),
  sire: z.string().nullable(),
  dam: z.string().nullable(),
  possibleSires: z.array(z.string()),
});
export type LineageNode = z.infer<typeof lineageNode>;

export const showLineage = contract({
  id: 'lineage.show',
  method: 'GET',
  path: '/workspaces/{workspace}/lineage',
  summary:
    'Ancestors and descendants of an animal, or every animal of a species, with the matings of relatives marked',
  access: { scope: 'workspace', action: 'animal.see' },
  query: z
    .object({
      animal: animalId.optional(),
      species: speciesId.optional(),
      up: z.coerce.number().int().min(0).max(30).default(3),
      down: z.coerce.number().int().min(0).max(30).default(2),
      locus: locusId.optional(),
    })
    .refine(({ animal, species }) => Boolean(animal) !== Boolean(species), {
      error: 'Choose an animal or a species.',
      path: ['animal'],
    }),
  response: z.object({
    root: animalId.nullable(),
    speciesId,
    loci: z.array(z.object({ id: locusId, name: z.string() })),
    nodes: z.array(lineageNode),
    /** Matings of animals with a common ancestor, by the keys of both. */
    relatedMates: z.array(z.tuple([z.string(), z.string()])),
  }),
});
export type Lineage = z.infer<typeof showLineage.response>;
