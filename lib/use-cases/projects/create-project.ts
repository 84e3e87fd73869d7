import 'server-only';
import {
  insertProject,
  isProjectNameTaken,
  setProjectAnimals,
  setProjectParties,
} from '@/db/queries/projects';
import { findSpecies } from '@/db/queries/species';
import type { ProjectId } from '@/lib/contracts/ids';
import { createProject } from '@/lib/contracts/project';
import { recordAudit } from '../audit';
import { notifyParties } from '../notify';
import { invalid, Refusal } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { checkProjectMembers } from './check-project';

/** A partner starts a joint project with others; each of them is told. */
export const createProjectUseCase = workspaceUseCase(createProject, async (given, { body }) => {
  const { tx, workspace, actor, today } = given;
  // Anybody who may start a project at all may; what goes into it is narrowed to what a partner sees.
  const world: WorkspaceWorld =
    actor.role === 'partner'
      ? { ...given, sees: { everything: false, partyId: actor.partyId, projectIds: actor.projectIds } }
      : given;
  const species = await findSpecies(tx, body.speciesId);
  if (!species) throw invalid('speciesId', 'There is no such species here.');
  const errors = await checkProjectMembers(world, body, new Set());
  if (await isProjectNameTaken(tx, body.name))
    errors.push({ field: 'name', message: 'A project of this name is already there.' });
  if (errors.length)
    throw new Refusal('invalid', errors[0]?.message ?? 'Something is not right.', { errors });

  const id = crypto.randomUUID() as ProjectId;
  const startedOn = body.startedOn ?? today;
  await insertProject(tx, {
    workspaceId: workspace.id,
    id,
    name: body.name,
    purpose: body.purpose,
    speciesId: species.id,
    startedOn,
  });
  await setProjectParties(tx, workspace, id, body.parties, startedOn);
  await setProjectAnimals(tx, workspace, id, body.animals, today);
  await notifyParties(
    world,
    body.parties,
    {
      kind: 'project-started',
      title: `${actor.name} started ${body.name} with you`,
      body: body.purpose,
      href: `projects/${id}`,
    },
    actor.memberId,
  );
  await recordAudit(world, {
    action: 'project.create',
    subject: { kind: 'project', id },
    detail: { name: body.name, speciesId: species.id, parties: body.parties, animals: body.animals },
  });
  return { id };
});
