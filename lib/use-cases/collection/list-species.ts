import 'server-only';
import { listSpecies as querySpecies } from '@/db/queries/species';
import { listSpecies } from '@/lib/contracts/species-catalogue';
import { workspaceUseCase } from '../world';

/** A member looks at the species that are kept here. */
export const listSpeciesUseCase = workspaceUseCase(listSpecies, async ({ tx }) => ({
  species: await querySpecies(tx),
}));
