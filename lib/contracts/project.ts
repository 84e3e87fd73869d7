import { z } from 'zod';
import { sex } from './animal';
import { contract, inWorkspace, isoDay, pageOf } from './contract';
import { animalId, pairingId, partyId, projectId, speciesId, termsId } from './ids';
import { partyMark } from './session';

export const inProject = inWorkspace.extend({ project: projectId });

/** What a proposal is at: agreed only once every party has agreed. */
export const termsStatus = z.enum(['draft', 'proposed', 'agreed', 'withdrawn']);
export type TermsStatus = z.infer<typeof termsStatus>;
export const pairingStatus = z.enum(['draft', 'proposed', 'agreed', 'withdrawn', 'ended']);
export type PairingStatus = z.infer<typeof pairingStatus>;

/** A party of a project in rank order, with its mark and how much of the project's animals it holds. */
export const projectParty = partyMark.extend({ rank: z.int(), joinedOn: isoDay, leftOn: isoDay.nullable() });

export const projectRow = z.object({
  id: projectId,
  name: z.string(),
  purpose: z.string(),
  species: z.object({ id: speciesId, name: z.string() }),
  startedOn: isoDay,
  endedOn: isoDay.nullable(),
  parties: z.array(projectParty),
  animals: z.int(),
  pairings: z.int(),
  /** Number of the terms in force today; null before any were agreed. Absent for who may not see terms. */
  termsInForce: z.int().nullable().optional(),
  /** Proposals of the project that wait for the caller's party. */
  waitingForMe: z.int(),
});
export type ProjectRow = z.infer<typeof projectRow>;

export const listProjects = contract({
  id: 'projects.list',
  method: 'GET',
  path: '/workspaces/{workspace}/projects',
  summary: 'The joint projects that the caller sees',
  access: { scope: 'workspace', action: 'project.see' },
  query: z.object({ search: z.string().trim().max(80).optional(), ended: z.enum(['yes', 'no']).optional() }),
  response: pageOf(projectRow),
});

export const projectAnimal = z.object({
  id: animalId,
  code: z.string(),
  name: z.string(),
  sex,
  status: z.string(),
  description: z.string(),
  hatchedOn: isoDay.nullable(),
  grams: z.int().nullable(),
  parts: z.array(z.object({ partyId, parts: z.int().min(1) })),
});
export type ProjectAnimal = z.infer<typeof projectAnimal>;

export const projectDetail = projectRow.extend({
  version: z.int(),
  animals: z.int(),
  /** Parts held in the project's animals, each animal counted as one whole, as exact integer parts of `of`. */
  holdings: z.object({ of: z.int(), parts: z.array(z.object({ partyId, parts: z.int() })) }),
  animalRows: z.array(projectAnimal),
  terms: z
    .array(
      z.object({
        id: termsId,
        number: z.int(),
        status: termsStatus,
        inForceFrom: isoDay,
        inForce: z.boolean(),
        agreed: z.int(),
        of: z.int(),
      }),
    )
    .optional(),
  pairingRows: z.array(
    z.object({
      id: pairingId,
      season: z.int(),
      title: z.string(),
      status: pairingStatus,
      sireCode: z.string(),
      damCode: z.string(),
      agreed: z.int(),
      of: z.int(),
    }),
  ),
});
export type ProjectDetail = z.infer<typeof projectDetail>;

export const showProject = contract({
  id: 'projects.show',
  method: 'GET',
  path: '/workspaces/{workspace}/projects/{project}',
  summary: 'A joint project with its parties, animals, versions of terms and pairings',
  access: { scope: 'workspace', action: 'project.see' },
  params: inProject,
  response: projectDetail,
});

const projectFields = {
  name: z.string().trim().min(1, 'Give the project a name.').max(80),
  purpose: z.string().trim().max(2000),
};
const rankedParties = z
  .array(partyId)
  .min(2, 'A joint project has at least two parties.')
  .max(12)
  .refine((ids) => new Set(ids).size === ids.length, 'Each party stands once.');

export const createProject = contract({
  id: 'projects.create',
  method: 'POST',
  path: '/workspaces/{workspace}/projects',
  summary: 'Start a joint project with its parties in rank order and its first animals',
  access: { scope: 'workspace', action: 'project.create' },
  body: z.object({
    name: projectFields.name,
    purpose: projectFields.purpose.default(''),
    speciesId,
    startedOn: isoDay.optional(),
    /** In rank order: the order in which they are drawn, and who takes an odd cent first. */
    parties: rankedParties,
    animals: z.array(animalId).max(500).default([]),
  }),
  response: z.object({ id: projectId }),
  idempotent: true,
});

export const editProject = contract({
  id: 'projects.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/projects/{project}',
  summary: 'Change a project: its name, purpose, parties, animals or end; what is left out stays as it is',
  access: { scope: 'workspace', action: 'project.edit' },
  params: inProject,
  body: z.object({
    version: z.int(),
    name: projectFields.name.optional(),
    purpose: projectFields.purpose.optional(),
    endedOn: isoDay.nullable().optional(),
    parties: rankedParties.optional(),
    animals: z.array(animalId).max(500).optional(),
  }),
  response: z.object({ version: z.int() }),
});
