import 'server-only';
import { findAnimals } from '@/db/queries/animals';
import { findParties } from '@/db/queries/projects';
import type { AnimalId, PartyId, SpeciesId } from '@/lib/contracts/ids';
import type { FieldError } from '../refusal';
import type { WorkspaceWorld } from '../world';

/** What is wrong with the parties and animals named for a project; `keeps` are animals that stand in it already. */
export async function checkProjectMembers(
  { tx, sees, actor }: WorkspaceWorld,
  project: { speciesId: SpeciesId; parties?: readonly PartyId[]; animals?: readonly AnimalId[] },
  keeps: ReadonlySet<AnimalId>,
): Promise<FieldError[]> {
  const errors: FieldError[] = [];
  const { parties = [], animals = [] } = project;
  const known = new Set((await findParties(tx, parties)).map(({ id }) => id));
  parties.forEach((id, index) => {
    if (!known.has(id)) errors.push({ field: `parties.${index}`, message: 'There is no such party here.' });
  });
  if (project.parties && !sees.everything && (!actor.partyId || !parties.includes(actor.partyId))) {
    errors.push({ field: 'parties', message: 'You are a party of your own projects: keep yourself in it.' });
  }
  const visible = new Map((await findAnimals(tx, sees, animals)).map((animal) => [animal.id, animal]));
  animals.forEach((id, index) => {
    if (keeps.has(id)) return;
    const animal = visible.get(id);
    if (!animal)
      errors.push({
        field: `animals.${index}`,
        message: 'There is no such animal here, or you may not see it.',
      });
    else if (animal.speciesId !== project.speciesId)
      errors.push({ field: `animals.${index}`, message: `${animal.code} is of another species.` });
  });
  return errors;
}
