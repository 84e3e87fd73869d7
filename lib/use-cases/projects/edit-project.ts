import 'server-only';
import {
  findProject,
  isProjectNameTaken,
  listAnimalsOfProject,
  listPartiesOfProjects,
  setProjectAnimals,
  setProjectParties,
  updateProject,
} from '@/db/queries/projects';
import { listTermsOf } from '@/db/queries/terms';
import { editProject } from '@/lib/contracts/project';
import type { PartyId, ProjectId } from '@/lib/contracts/ids';
import { recordAudit } from '../audit';
import { notFound, Refusal, stale, type FieldError } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { checkProjectMembers } from './check-project';
import { presentParties } from './present-projects';

/** A partner changes what is recorded of a project. What is not sent stays as it is. */
export const editProjectUseCase = workspaceUseCase(editProject, async (world, { params, body }) => {
  const { tx, sees, workspace, today } = world;
  const project = await findProject(tx, sees, params.project);
  if (!project) throw notFound('project');
  const { version, parties, animals, ...fields } = body;
  if (version !== project.version) throw stale('project', project.version);

  const kept = new Set((await listAnimalsOfProject(tx, project.id)).map(({ id }) => id));
  const errors = await checkProjectMembers(world, { speciesId: project.speciesId, parties, animals }, kept);
  if (fields.name && (await isProjectNameTaken(tx, fields.name, project.id)))
    errors.push({ field: 'name', message: 'A project of this name is already there.' });
  if (fields.endedOn && fields.endedOn < project.startedOn)
    errors.push({ field: 'endedOn', message: `The project started on ${project.startedOn}.` });
  if (parties) errors.push(...(await checkPartiesMayChange(world, project.id, parties)));
  if (errors.length)
    throw new Refusal('invalid', errors[0]?.message ?? 'Something is not right.', { errors });

  if (!(await updateProject(tx, project.id, version, fields))) throw stale('project', version + 1);
  if (parties) await setProjectParties(tx, workspace, project.id, parties, today);
  if (animals) await setProjectAnimals(tx, workspace, project.id, animals, today);
  await recordAudit(world, {
    action: 'project.edit',
    subject: { kind: 'project', id: project.id },
    detail: { changed: { ...fields, parties, animals } },
  });
  return { version: version + 1 };
});

/** Once terms are agreed or being agreed on, the parties follow from them: a new version of terms changes who is in. */
async function checkPartiesMayChange(
  { tx }: WorkspaceWorld,
  projectId: ProjectId,
  parties: readonly PartyId[],
): Promise<FieldError[]> {
  const now = presentParties(await listPartiesOfProjects(tx, [projectId])).map(({ id }) => id);
  const sameMembers = now.length === parties.length && now.every((id) => parties.includes(id));
  if (sameMembers) return [];
  const bound = (await listTermsOf(tx, [projectId])).some(
    ({ status }) => status === 'agreed' || status === 'proposed',
  );
  const removed = now.filter((id) => !parties.includes(id));
  if (!bound || removed.length === 0) return [];
  return [
    {
      field: 'parties',
      message:
        'A party that is bound by terms leaves by its exit clause: agree on that in a new version of the terms first.',
    },
  ];
}
