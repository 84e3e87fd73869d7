import { z } from 'zod';
import { animalOrigin, animalStatus, sex } from './animal';
import { contract, fileAnswer, isoDay, pageQuery } from './contract';
import { animalId, locusId, partyId, photoId, projectId, speciesId, tubId } from './ids';

export const hatchedPrecision = z.enum(['day', 'month', 'year']);
export type HatchedPrecision = z.infer<typeof hatchedPrecision>;

export const ownedParts = z.array(z.object({ partyId, parts: z.int().min(1) }));

export const animalRow = z.object({
  id: animalId,
  code: z.string(),
  name: z.string(),
  species: z.object({ id: speciesId, name: z.string() }),
  sex,
  hatchedOn: isoDay.nullable(),
  hatchedPrecision,
  origin: animalOrigin,
  status: animalStatus,
  /** What it looks like and carries, in the trade's words. */
  description: z.string(),
  tub: z.object({ id: tubId, label: z.string() }).nullable(),
  /** Newest weight. */
  grams: z.int().nullable(),
  owners: ownedParts,
  projects: z.array(z.object({ id: projectId, name: z.string() })),
  photoId: photoId.nullable(),
});
export type AnimalRow = z.infer<typeof animalRow>;

/** Columns that the list sorts by; a minus in front turns the order round. */
export const animalSort = z.enum([
  'code',
  '-code',
  'name',
  '-name',
  'species',
  '-species',
  'sex',
  '-sex',
  'hatched',
  '-hatched',
  'status',
  '-status',
  'looks',
  '-looks',
  'place',
  '-place',
  'weight',
  '-weight',
]);
export type AnimalSort = z.infer<typeof animalSort>;

export const animalFilter = z.object({
  search: z.string().trim().max(80).optional(),
  species: speciesId.optional(),
  sex: sex.optional(),
  /** `present`: here, on loan or in quarantine. */
  status: z.enum(['present', ...animalStatus.options]).optional(),
  project: projectId.optional(),
  holder: partyId.optional(),
  locus: locusId.optional(),
  /** With a locus: shows it, carries it for certain, may carry it, or has no copy. */
  at: z.enum(['shows', 'carries', 'possible', 'free']).optional(),
  sort: animalSort.default('code'),
});

export const listAnimals = contract({
  id: 'animals.list',
  method: 'GET',
  path: '/workspaces/{workspace}/animals',
  summary: 'Animals that the caller may see, with search, filters and sorting',
  access: { scope: 'workspace', action: 'animal.see' },
  query: animalFilter.extend({ ...pageQuery, limit: z.coerce.number().int().min(1).max(2000).default(200) }),
  response: z.object({
    rows: z.array(animalRow),
    total: z.int().min(0),
    /** Males, females and unknown among all that match, as they are counted in the trade: 1.2.3. */
    sexes: z.object({ male: z.int(), female: z.int(), unknown: z.int() }),
    /** How many the caller may see without any filter. */
    ofAll: z.int(),
  }),
});

export const exportAnimals = contract({
  id: 'animals.export',
  method: 'GET',
  path: '/workspaces/{workspace}/animals/export',
  summary: 'Animals as a CSV file that can be imported again; chosen ones, or those that match the filters',
  access: { scope: 'workspace', action: 'animal.see' },
  query: animalFilter.extend({
    /** Ids joined by commas. */
    ids: z.string().max(100_000).optional(),
  }),
  response: fileAnswer,
  produces: 'text/csv',
});

export const changeAnimals = contract({
  id: 'animals.change-many',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/changes',
  summary: 'Set place or status of many animals, or add them to a project: all of them or none',
  access: { scope: 'workspace', action: 'animal.edit' },
  body: z.object({
    ids: z.array(animalId).min(1, 'Choose at least one animal.').max(2000),
    change: z.discriminatedUnion('kind', [
      z.object({ kind: z.literal('status'), status: animalStatus, since: isoDay.optional() }),
      z.object({ kind: z.literal('tub'), tubId: tubId.nullable() }),
      z.object({ kind: z.literal('project'), projectId }),
    ]),
  }),
  response: z.object({ changed: z.int() }),
});
