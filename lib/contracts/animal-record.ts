import { z } from 'zod';
import { animalOrigin, animalStatus, locusClaim, ownershipReason, sex } from './animal';
import { hatchedPrecision, ownedParts } from './animal-list';
import { contract, inWorkspace, instant, isoDay, minorUnits } from './contract';
import {
  animalId,
  clutchId,
  documentId,
  locusId,
  pairingId,
  photoId,
  projectId,
  speciesId,
  tubId,
} from './ids';
import { partyMark } from './session';

export const inAnimal = inWorkspace.extend({ animal: animalId });

/** A relative: with its code if the caller may see it, otherwise only that there is one. */
export const relative = z.discriminatedUnion('shown', [
  z.object({
    shown: z.literal(true),
    id: animalId,
    code: z.string(),
    name: z.string(),
    sex,
    description: z.string(),
  }),
  z.object({ shown: z.literal(false) }),
]);
export type Relative = z.infer<typeof relative>;

/** One parental copy of a locus as it is drawn. */
const alleleCopy = z.object({ letter: z.string(), probability: z.number().min(0).max(1) });

export const locusOfAnimal = z.object({
  locusId,
  name: z.string(),
  /** The claim as recorded; null when nothing is. */
  claim: locusClaim.nullable(),
  copies: z.tuple([alleleCopy, alleleCopy]),
  /** The second copy does not exist: sex-linked in the sex with two different sex chromosomes. */
  single: z.boolean(),
  /** "66% het", "visual", "no copy". */
  words: z.string(),
  source: z.enum(['recorded', 'relatives', 'nothing']),
  genotypes: z.array(z.object({ genotype: z.string(), probability: z.number() })),
});
export type LocusOfAnimal = z.infer<typeof locusOfAnimal>;

export const ownershipSet = z.object({
  id: z.uuid(),
  fromDay: isoDay,
  untilDay: isoDay.nullable(),
  reason: ownershipReason,
  parts: ownedParts,
  /** Null when none was paid, or when it is not for the caller to see. */
  price: minorUnits.nullable(),
  note: z.string(),
  /** How the parts followed from the parents' and the terms. */
  derivation: z.array(z.string()).nullable(),
  recordedBy: z.string().nullable(),
});
export type OwnershipSet = z.infer<typeof ownershipSet>;

export const animalRecord = z.object({
  id: animalId,
  code: z.string(),
  name: z.string(),
  species: z.object({ id: speciesId, name: z.string(), scientificName: z.string(), sexSystem: z.string() }),
  sex,
  sexedBy: z.enum(['probed', 'popped', 'visible', 'stated', 'proven']).nullable(),
  hatchedOn: isoDay.nullable(),
  hatchedPrecision,
  origin: animalOrigin,
  status: animalStatus,
  statusSince: isoDay.nullable(),
  heldBack: z.boolean(),
  notes: z.string(),
  version: z.int(),
  description: z.string(),
  tub: z.object({ id: tubId, label: z.string(), room: z.string(), rack: z.string() }).nullable(),
  sire: relative.nullable(),
  dam: relative.nullable(),
  possibleSires: z.array(z.object({ sire: relative, weight: z.int() })),
  young: z.array(relative),
  loci: z.array(locusOfAnimal),
  /** Marks of everyone who is named in the ownership below. */
  parties: z.array(partyMark),
  ownership: z.array(ownershipSet),
  weights: z.array(z.object({ id: z.uuid(), weighedOn: isoDay, grams: z.int() })),
  photos: z.array(
    z.object({
      id: photoId,
      width: z.int(),
      height: z.int(),
      caption: z.string(),
      takenOn: isoDay.nullable(),
    }),
  ),
  documents: z.array(
    z.object({
      id: documentId,
      name: z.string(),
      contentType: z.string(),
      bytes: z.int(),
      createdAt: instant,
    }),
  ),
  projects: z.array(z.object({ id: projectId, name: z.string() })),
  pairings: z.array(
    z.object({
      id: pairingId,
      season: z.int(),
      status: z.string(),
      as: z.enum(['sire', 'dam']),
      mate: relative,
    }),
  ),
  clutches: z.array(
    z.object({ id: clutchId, code: z.string(), laidOn: isoDay, as: z.enum(['sire', 'dam']) }),
  ),
  hatchedFrom: z.object({ id: clutchId, code: z.string() }).nullable(),
});
export type AnimalRecord = z.infer<typeof animalRecord>;

export const showAnimal = contract({
  id: 'animals.show',
  method: 'GET',
  path: '/workspaces/{workspace}/animals/{animal}',
  summary:
    'The record of an animal: what it is and carries, its relatives, owners, weights, photos and papers',
  access: { scope: 'workspace', action: 'animal.see' },
  params: inAnimal,
  response: animalRecord,
});

const possibleSire = z.object({
  animalId,
  weight: z.int('Whole numbers.').min(1, 'At least 1.').max(1000).default(1),
});
const claimAtLocus = z.object({ locusId, ...locusClaim.shape });

const animalFields = {
  code: z.string().trim().min(1, 'Give it a code.').max(40),
  name: z.string().trim().max(80),
  speciesId,
  sex,
  sexedBy: z.enum(['probed', 'popped', 'visible', 'stated', 'proven']).nullable(),
  hatchedOn: isoDay.nullable(),
  hatchedPrecision,
  origin: animalOrigin,
  status: animalStatus,
  statusSince: isoDay.nullable(),
  heldBack: z.boolean(),
  notes: z.string().trim().max(4000),
  sireId: animalId.nullable(),
  damId: animalId.nullable(),
  /** Two or more, instead of a known sire. */
  possibleSires: z.array(possibleSire).max(8),
  tubId: tubId.nullable(),
  /** Claims per locus; they replace all that are there. */
  loci: z.array(claimAtLocus).max(200),
};

export const createAnimal = contract({
  id: 'animals.create',
  method: 'POST',
  path: '/workspaces/{workspace}/animals',
  summary: 'Add an animal with its owners; without a code the next free one of the species is taken',
  access: { scope: 'workspace', action: 'animal.edit' },
  body: z.object({
    ...animalFields,
    code: animalFields.code.optional(),
    name: animalFields.name.default(''),
    sexedBy: animalFields.sexedBy.default(null),
    hatchedOn: animalFields.hatchedOn.default(null),
    hatchedPrecision: hatchedPrecision.default('day'),
    origin: animalOrigin.default('unknown'),
    status: animalStatus.default('here'),
    statusSince: animalFields.statusSince.default(null),
    heldBack: z.boolean().default(false),
    notes: animalFields.notes.default(''),
    sireId: animalFields.sireId.default(null),
    damId: animalFields.damId.default(null),
    possibleSires: animalFields.possibleSires.default([]),
    tubId: animalFields.tubId.default(null),
    loci: animalFields.loci.default([]),
    owners: ownedParts.min(1, 'Somebody owns it: give at least one part.'),
    /** The day from which these owners hold it; its hatch date or today when left out. */
    ownedFrom: isoDay.optional(),
    projectId: projectId.nullable().default(null),
  }),
  response: z.object({ id: animalId, code: z.string() }),
  idempotent: true,
});

export const editAnimal = contract({
  id: 'animals.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/animals/{animal}',
  summary: 'Change what is recorded of an animal; what is left out stays as it is',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inAnimal,
  body: z.object(animalFields).partial().extend({ version: z.int() }),
  response: z.object({ version: z.int() }),
});

export const proposeCode = contract({
  id: 'animals.propose-code',
  method: 'GET',
  path: '/workspaces/{workspace}/animals/next-code',
  summary: 'The next free code of a species',
  access: { scope: 'workspace', action: 'animal.edit' },
  query: z.object({ species: speciesId }),
  response: z.object({ code: z.string() }),
});

export const addWeight = contract({
  id: 'animals.weights.add',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/{animal}/weights',
  summary: 'Record a weight',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inAnimal,
  body: z.object({
    weighedOn: isoDay,
    grams: z.int('Whole grams.').min(1, 'At least 1 g.').max(300_000, 'That is more than 300 kg.'),
  }),
  response: z.object({ id: z.uuid() }),
});

export const removeWeight = contract({
  id: 'animals.weights.remove',
  method: 'DELETE',
  path: '/workspaces/{workspace}/animals/{animal}/weights/{weight}',
  summary: 'Take back a weight that was recorded by mistake',
  access: { scope: 'workspace', action: 'animal.edit' },
  params: inAnimal.extend({ weight: z.uuid() }),
  response: z.object({ done: z.literal(true) }),
});
