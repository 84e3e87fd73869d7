import 'server-only';
import { findSpecies } from '@/db/queries/species';
import { proposeCode } from '@/lib/contracts/animal-record';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { nextCodeOf } from './next-code-of';

/** A form asks which code an animal of this species would get. */
export const proposeCodeUseCase = workspaceUseCase(proposeCode, async ({ tx }, { query }) => {
  const species = await findSpecies(tx, query.species);
  if (!species) throw notFound('species');
  return { code: await nextCodeOf(tx, species.codePrefix) };
});
