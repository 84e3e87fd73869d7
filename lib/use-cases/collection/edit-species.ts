import 'server-only';
import { listLoci } from '@/db/queries/loci';
import { findSpecies, hasAnimals, updateSpecies } from '@/db/queries/species';
import { editSpecies } from '@/lib/contracts/species-catalogue';
import { recordAudit } from '../audit';
import { invalid, notFound, stale } from '../refusal';
import { workspaceUseCase } from '../world';

/** The owner changes a species. How its sex is decided is fixed once animals or sex-linked loci depend on it. */
export const editSpeciesUseCase = workspaceUseCase(editSpecies, async (world, { params, body }) => {
  const { tx } = world;
  const species = await findSpecies(tx, params.species);
  if (!species) throw notFound('species');
  const { version, ...change } = body;
  if (version !== species.version) throw stale('species', species.version);
  if (change.sexSystem && change.sexSystem !== species.sexSystem) {
    const linked = (await listLoci(tx, species.id)).find(
      ({ definition }) => definition.chromosome !== 'autosomal',
    );
    if (linked)
      throw invalid(
        'sexSystem',
        `${linked.name} lies on the ${linked.definition.chromosome} chromosome; remove it first.`,
      );
    if (await hasAnimals(tx, species.id))
      throw invalid('sexSystem', 'Animals of this species are recorded; how their sex is decided stays.');
  }
  if (!(await updateSpecies(tx, species.id, version, change))) throw stale('species', version + 1);
  await recordAudit(world, {
    action: 'species.edit',
    subject: { kind: 'species', id: species.id },
    detail: { name: species.name, change },
  });
  return { version: version + 1 };
});
