import 'server-only';
import {
  addToProject,
  findVisibleProject,
  insertAnimal,
  isCodeTaken,
  replaceClaims,
  replacePossibleSires,
} from '@/db/queries/animals';
import { insertOwnership, listPartyMarks } from '@/db/queries/ownership';
import { findSpecies } from '@/db/queries/species';
import { createAnimal } from '@/lib/contracts/animal-record';
import type { AnimalId, PartyId, SpeciesId } from '@/lib/contracts/ids';
import { recordAudit } from '../audit';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { reachOf } from '../permissions';
import { invalid, Refusal, type FieldError } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { checkDraft } from './draft-animal';
import { nextCodeOf } from './next-code-of';

/** Checks that parts go to parties of the workspace, each once. */
export async function checkParts(
  { tx }: Pick<WorkspaceWorld, 'tx'>,
  field: string,
  parts: readonly { partyId: PartyId; parts: number }[],
): Promise<FieldError[]> {
  const known = new Set((await listPartyMarks(tx)).map(({ id }) => id));
  const errors: FieldError[] = [];
  parts.forEach(({ partyId }, index) => {
    if (!known.has(partyId))
      errors.push({ field: `${field}.${index}.partyId`, message: 'There is no such party here.' });
    if (parts.findIndex((other) => other.partyId === partyId) < index) {
      errors.push({
        field: `${field}.${index}.partyId`,
        message: 'This party is named twice; give it all its parts in one line.',
      });
    }
  });
  return errors;
}

/** A member adds an animal with its owners. */
export const createAnimalUseCase = workspaceUseCase(createAnimal, async (world, { body }) => {
  const { tx, sees, workspace, actor, today } = world;
  const species = await findSpecies(tx, body.speciesId);
  if (!species) throw invalid('speciesId', 'There is no such species here.');
  const id = crypto.randomUUID() as AnimalId;
  const code = body.code ?? (await nextCodeOf(tx, species.codePrefix));
  const { loci, possibleSires, owners, ownedFrom, projectId, ...fields } = body;
  const draft = { ...fields, id, code, loci, possibleSires };

  const errors = await checkDraft(world, draft, await loadBeliefs(tx, species.id), new Set());
  if (body.code && (await isCodeTaken(tx, body.code)))
    errors.push({ field: 'code', message: `Another animal already has the code ${body.code}.` });
  errors.push(...(await checkParts(world, 'owners', owners)));
  const since = ownedFrom ?? (body.hatchedPrecision === 'day' ? body.hatchedOn : null) ?? today;
  if (since > today) errors.push({ field: 'ownedFrom', message: 'This day has not come yet.' });
  if (body.hatchedOn && since < body.hatchedOn && body.hatchedPrecision === 'day') {
    errors.push({ field: 'ownedFrom', message: `Nobody owned it before it hatched on ${body.hatchedOn}.` });
  }
  errors.push(...(await checkProject(world, projectId, species.id)));
  if (!sees.everything && !owners.some(({ partyId }) => partyId === actor.partyId) && !projectId) {
    errors.push({
      field: 'owners',
      message:
        'Give yourself a part, or put it into a project that you are in; you could not see it otherwise.',
    });
  }
  if (errors.length)
    throw new Refusal('invalid', errors[0]?.message ?? 'Something is not right.', { errors });

  await insertAnimal(tx, { ...fields, workspaceId: workspace.id, id, code });
  await replacePossibleSires(tx, { workspaceId: workspace.id, id }, possibleSires);
  await replaceClaims(
    tx,
    { workspaceId: workspace.id, id },
    loci.map(({ locusId, ...claim }) => ({ locusId, claim })),
    today,
  );
  await insertOwnership(
    tx,
    workspace,
    { animalId: id, fromDay: since, reason: 'founding', recordedBy: actor.memberId },
    owners,
  );
  if (projectId)
    await addToProject(tx, [{ workspaceId: workspace.id, projectId, animalId: id, addedOn: today }]);
  await recordAudit(world, {
    action: 'animal.create',
    subject: { kind: 'animal', id },
    detail: { code, speciesId: species.id, sex: body.sex, owners },
  });
  return { id, code };
});

async function checkProject(
  { tx, sees, actor }: WorkspaceWorld,
  projectId: Parameters<typeof findVisibleProject>[2] | null,
  speciesId: SpeciesId,
): Promise<FieldError[]> {
  if (!projectId) return [];
  if (reachOf(actor.role, 'project.edit') === 'no')
    return [{ field: 'projectId', message: 'Your role does not include changing projects.' }];
  const project = await findVisibleProject(tx, sees, projectId);
  if (!project)
    return [{ field: 'projectId', message: 'There is no such project here, or you may not see it.' }];
  return project.speciesId === speciesId
    ? []
    : [{ field: 'projectId', message: `${project.name} is a project of another species.` }];
}
