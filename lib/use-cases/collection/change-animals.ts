import 'server-only';
import { addToProject, findAnimals, findVisibleProject, updateManyAnimals } from '@/db/queries/animals';
import { findTub } from '@/db/queries/tubs';
import { changeAnimals } from '@/lib/contracts/animal-list';
import { recordAudit } from '../audit';
import { reachOf } from '../permissions';
import { invalid, notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';

/** Many animals get a place, a status or a project at once: all of them or none. */
export const changeAnimalsUseCase = workspaceUseCase(changeAnimals, async (world, { body }) => {
  const { tx, sees, workspace, today, actor } = world;
  const ids = [...new Set(body.ids)];
  const found = await findAnimals(tx, sees, ids);
  if (found.length < ids.length) throw notFound('animal');
  const { change } = body;
  if (change.kind === 'tub') {
    const tub = change.tubId ? await findTub(tx, change.tubId) : null;
    if (change.tubId && !tub) throw notFound('tub');
    await updateManyAnimals(tx, ids, { tubId: change.tubId });
  } else if (change.kind === 'status') {
    const since = change.since ?? today;
    if (since > today) throw invalid('change.since', 'This day has not come yet.');
    await updateManyAnimals(tx, ids, { status: change.status, statusSince: since });
  } else {
    if (reachOf(actor.role, 'project.edit') === 'no') {
      throw new Refusal('not_allowed', 'Your role in this workspace does not include changing projects.');
    }
    const project = await findVisibleProject(tx, sees, change.projectId);
    if (!project) throw notFound('project');
    const other = found.find((animal) => animal.speciesId !== project.speciesId);
    if (other) throw invalid('change.projectId', `${other.code} is of another species than ${project.name}.`);
    await addToProject(
      tx,
      ids.map((animalId) => ({ workspaceId: workspace.id, projectId: project.id, animalId, addedOn: today })),
    );
  }
  for (const animal of found) {
    await recordAudit(world, {
      action: 'animal.change',
      subject: { kind: 'animal', id: animal.id },
      detail: { code: animal.code, ...change },
    });
  }
  return { changed: found.length };
});
