import { z } from 'zod';
import { contract, inWorkspace } from './contract';
import { combinationId, speciesId } from './ids';
import { locusEntry } from './locus';
import { speciesProfile } from './species';

export const sexSystem = z.enum(['XY', 'ZW', 'TSD', 'unknown']);

const speciesFields = {
  name: z.string().trim().min(1, 'Name the species.').max(80),
  scientificName: z.string().trim().max(120),
  sexSystem,
  codePrefix: z
    .string()
    .trim()
    .regex(/^[A-Z]{1,6}$/, 'One to six capital letters, such as BP.'),
  profile: speciesProfile,
};
const inSpecies = inWorkspace.extend({ species: speciesId });
const speciesEntry = z.object({ id: speciesId, ...speciesFields, version: z.int() });

export const listSpecies = contract({
  id: 'species.list',
  method: 'GET',
  path: '/workspaces/{workspace}/species',
  summary: 'The species of the workspace',
  access: { scope: 'workspace', action: 'genetics.see' },
  response: z.object({ species: z.array(speciesEntry.extend({ lociCount: z.int() })) }),
});

export const showSpecies = contract({
  id: 'species.show',
  method: 'GET',
  path: '/workspaces/{workspace}/species/{species}',
  summary: 'A species with its loci, what each genotype is called and looks like, and its named combinations',
  access: { scope: 'workspace', action: 'genetics.see' },
  params: inSpecies,
  response: speciesEntry.extend({
    loci: z.array(locusEntry),
    combinations: z.array(
      z.object({ id: combinationId, name: z.string(), phenotypes: z.record(z.string(), z.string()) }),
    ),
  }),
});
export type SpeciesDetail = z.infer<typeof showSpecies.response>;

export const createSpecies = contract({
  id: 'species.create',
  method: 'POST',
  path: '/workspaces/{workspace}/species',
  summary: 'Add a species',
  access: { scope: 'workspace', action: 'genetics.edit' },
  body: z.object(speciesFields),
  response: z.object({ id: speciesId }),
});

export const editSpecies = contract({
  id: 'species.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/species/{species}',
  summary: 'Change a species; what is left out stays as it is',
  access: { scope: 'workspace', action: 'genetics.edit' },
  params: inSpecies,
  body: z.object(speciesFields).partial().extend({ version: z.int() }),
  response: z.object({ version: z.int() }),
});
