import { z } from 'zod';
import { sex } from './animal';
import { contract, inWorkspace, isoDay, pageOf, pageQuery } from './contract';
import { animalId, clutchId, locusId, pairingId, partyId, projectId, termsId } from './ids';
import { pairingEventKind } from './pairing-figures';

const note = z.string().trim().max(2000);
const inPairing = inWorkspace.extend({ pairing: pairingId });
const inClutch = inWorkspace.extend({ clutch: clutchId });
const parent = z.object({ id: animalId, code: z.string(), description: z.string() });
const parts = z.array(z.object({ partyId, parts: z.int().min(1) }));

export const pairingEvent = z.object({
  id: z.uuid(),
  kind: pairingEventKind,
  seenOn: isoDay,
  minutes: z.int().nullable(),
  note: z.string(),
  by: z.string(),
  retracted: z.boolean(),
});
export type PairingEvent = z.infer<typeof pairingEvent>;

export const listPairingEvents = contract({
  id: 'pairings.events.list',
  method: 'GET',
  path: '/workspaces/{workspace}/pairings/{pairing}/events',
  summary: 'What was seen of a pairing, oldest first',
  access: { scope: 'workspace', action: 'pairing.see' },
  params: inPairing,
  response: z.object({ events: z.array(pairingEvent) }),
});

export const logPairingEvent = contract({
  id: 'pairings.events.log',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings/{pairing}/events',
  summary: 'Log an introduction, separation, lock, refusal, follicles, ovulation or pre-lay shed',
  access: { scope: 'workspace', action: 'season.log' },
  params: inPairing,
  body: z.object({
    kind: pairingEventKind,
    seenOn: isoDay,
    /** How long a lock lasted. */
    minutes: z.int().min(1).max(10_080).nullable().default(null),
    note: note.default(''),
  }),
  response: pairingEvent,
});

export const retractPairingEvent = contract({
  id: 'pairings.events.retract',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings/{pairing}/events/{event}/retraction',
  summary: 'Mark something that was logged of a pairing as not having happened',
  access: { scope: 'workspace', action: 'season.log' },
  params: inPairing.extend({ event: z.uuid() }),
  response: pairingEvent,
});

export const clutchState = z.enum(['incubating', 'hatching', 'hatched', 'lost']);

export const clutchRow = z.object({
  id: clutchId,
  code: z.string(),
  pairingId,
  project: z.object({ id: projectId, name: z.string() }),
  sire: parent,
  dam: parent,
  laidOn: isoDay,
  eggs: z.int(),
  slugs: z.int(),
  incubatorLabel: z.string(),
  incubationDecicelsius: z.int().nullable(),
  /** Forecast from the day of laying and the species' incubation; null once hatched. */
  pipExpected: z.object({ from: isoDay, usual: isoDay, to: isoDay }).nullable(),
  hatchedOn: isoDay.nullable(),
  hatchlings: z.int(),
  state: clutchState,
});
export type ClutchRow = z.infer<typeof clutchRow>;

export const listClutches = contract({
  id: 'clutches.list',
  method: 'GET',
  path: '/workspaces/{workspace}/clutches',
  summary: 'Clutches, newest first',
  access: { scope: 'workspace', action: 'clutch.see' },
  query: z.object({
    ...pageQuery,
    search: z.string().trim().max(80).optional(),
    state: clutchState.optional(),
    project: projectId.optional(),
    season: z.coerce.number().int().min(1990).max(2200).optional(),
  }),
  response: pageOf(clutchRow),
});

export const hatchlingRow = z.object({
  id: animalId,
  code: z.string(),
  hatchNumber: z.int().nullable(),
  sex,
  looksLike: z.string(),
  grams: z.int().nullable(),
  alive: z.boolean(),
  note: z.string(),
  parts,
});

/** A look that may hatch, with the phenotype per locus that it stands for, likeliest first. */
export const possibleLook = z.object({
  key: z.string(),
  label: z.string(),
  probability: z.number().min(0).max(1),
  odds: z.string(),
  shows: z.record(z.string(), z.string()),
});

export const clutchDetail = clutchRow.extend({
  version: z.int(),
  clutchGrams: z.int().nullable(),
  note: z.string(),
  terms: z.object({ id: termsId, number: z.int(), inForceFrom: isoDay }),
  possibleLooks: z.array(possibleLook),
  /** What the young's parts will be, or are, and the steps that led there. */
  derivation: z.object({ parts, steps: z.array(z.string()) }),
  hatchlings: z.int(),
  young: z.array(hatchlingRow),
  /** Codes proposed for the next young, in order. */
  proposedCodes: z.array(z.string()),
});
export type ClutchDetail = z.infer<typeof clutchDetail>;

export const showClutch = contract({
  id: 'clutches.show',
  method: 'GET',
  path: '/workspaces/{workspace}/clutches/{clutch}',
  summary: 'A clutch with its young, what may hatch and whose the young are',
  access: { scope: 'workspace', action: 'clutch.see' },
  params: inClutch,
  response: clutchDetail,
});

const clutchFields = {
  laidOn: isoDay,
  eggs: z.int().min(0).max(200),
  slugs: z.int().min(0).max(200).default(0),
  clutchGrams: z.int().min(1).max(50_000).nullable().default(null),
  incubatorLabel: z.string().trim().max(40).default(''),
  incubationDecicelsius: z.int().min(150).max(400).nullable().default(null),
  note: note.default(''),
};
const eggsOrSlugs = { error: 'A clutch has at least one egg or slug.', path: ['eggs'] };

export const layClutch = contract({
  id: 'clutches.lay',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings/{pairing}/clutches',
  summary: 'Log the laying of a clutch with its eggs and slugs',
  access: { scope: 'workspace', action: 'clutch.log' },
  params: inPairing,
  body: z.object(clutchFields).refine(({ eggs, slugs }) => eggs + slugs > 0, eggsOrSlugs),
  response: z.object({ id: clutchId, code: z.string() }),
  idempotent: true,
});

export const editClutch = contract({
  id: 'clutches.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/clutches/{clutch}',
  summary: 'Correct or add to what is recorded of a clutch',
  access: { scope: 'workspace', action: 'clutch.log' },
  params: inClutch,
  body: z
    .object({ ...clutchFields, version: z.int() })
    .refine(({ eggs, slugs }) => eggs + slugs > 0, eggsOrSlugs),
  response: z.object({ version: z.int() }),
});

export const newHatchling = z.object({
  code: z.string().trim().min(1, 'Give it a code.').max(40),
  sex,
  grams: z.int('Whole grams.').min(1, 'At least 1 g.').max(5000).nullable().default(null),
  /** Phenotype per locus; '' = looks normal there. A locus that is left out was not judged. */
  shows: z.partialRecord(locusId, z.string().max(80)),
  alive: z.boolean().default(true),
  note: note.default(''),
});

export const logHatchlings = contract({
  id: 'clutches.hatchlings.log',
  method: 'POST',
  path: '/workspaces/{workspace}/clutches/{clutch}/hatchlings',
  summary: 'Log the young of a clutch in one go; their parts follow from their parents and the terms',
  access: { scope: 'workspace', action: 'clutch.log' },
  params: inClutch,
  body: z.object({
    hatchedOn: isoDay,
    hatchlings: z.array(newHatchling).min(1, 'Log at least one hatchling.').max(120),
  }),
  response: z.object({ ids: z.array(animalId) }),
  idempotent: true,
});
