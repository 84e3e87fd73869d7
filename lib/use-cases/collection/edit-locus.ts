import 'server-only';
import { findAnimals } from '@/db/queries/animals';
import { findLocus, listClaimsAt, updateLocus } from '@/db/queries/loci';
import { findSpecies } from '@/db/queries/species';
import { editLocus } from '@/lib/contracts/locus';
import { recordAudit } from '../audit';
import { invalid, notFound, stale } from '../refusal';
import { workspaceUseCase } from '../world';
import { refuseUnsoundLocus } from './check-definition';
import { checkClaims } from './claim-rules';

/** The owner changes a locus. What is recorded of animals there has to fit it still. */
export const editLocusUseCase = workspaceUseCase(editLocus, async (world, { params, body }) => {
  const { tx, sees } = world;
  const locus = await findLocus(tx, params.locus);
  const species = locus ? await findSpecies(tx, locus.speciesId) : null;
  if (!locus || !species) throw notFound('locus');
  if (body.version !== locus.version) throw stale('locus', locus.version);
  const definition = { ...body.definition, id: locus.id, name: body.name };
  refuseUnsoundLocus(definition, species.sexSystem);
  const claims = new Map((await listClaimsAt(tx, locus.id)).map(({ animalId, claim }) => [animalId, claim]));
  for (const animal of await findAnimals(tx, sees, [...claims.keys()])) {
    const claim = claims.get(animal.id);
    const changed = { sexSystem: species.sexSystem, loci: [{ id: locus.id, name: body.name, definition }] };
    const [misfit] = claim ? checkClaims(changed, animal, [{ locusId: locus.id, ...claim }]) : [];
    if (misfit)
      throw invalid('definition', `What is recorded of an animal would no longer fit. ${misfit.message}`);
  }
  if (!(await updateLocus(tx, locus.id, body.version, { name: body.name, definition })))
    throw stale('locus', body.version + 1);
  await recordAudit(world, {
    action: 'locus.edit',
    subject: { kind: 'locus', id: locus.id },
    detail: { name: body.name, before: locus.definition, after: definition },
  });
  return { version: body.version + 1 };
});
