import 'server-only';
import { listLoci } from '@/db/queries/loci';
import { findSpecies, listCombinations } from '@/db/queries/species';
import { showSpecies } from '@/lib/contracts/species-catalogue';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentLocus } from './present-locus';

/** A member looks at a species and its loci. */
export const showSpeciesUseCase = workspaceUseCase(showSpecies, async ({ tx }, { params }) => {
  const species = await findSpecies(tx, params.species);
  if (!species) throw notFound('species');
  const { id, name, scientificName, sexSystem, codePrefix, profile, version } = species;
  return {
    id,
    name,
    scientificName,
    sexSystem,
    codePrefix,
    profile,
    version,
    loci: (await listLoci(tx, id)).map((row) => presentLocus(row, sexSystem)),
    combinations: await listCombinations(tx, id),
  };
});
