import 'server-only';
import {
  addToProject,
  insertAnimal,
  insertWeights,
  replaceClaims,
  replacePossibleSires,
} from '@/db/queries/animals';
import { insertOwnership } from '@/db/queries/ownership';
import { importAnimals } from '@/lib/contracts/animal-import';
import type { AnimalId } from '@/lib/contracts/ids';
import { recordAudit } from '../audit';
import { Refusal } from '../refusal';
import { workspaceUseCase } from '../world';
import { parentsIn, planImport, type PlannedRow } from './plan-import';

/** The owner imports a file of animals. One wrong row, and nothing is saved. */
export const importAnimalsUseCase = workspaceUseCase(importAnimals, async (world, { body }) => {
  const { tx, workspace, actor, today } = world;
  const { rows } = await planImport(world, body);
  const wrong = rows.flatMap(({ line, errors }) =>
    errors.map(({ field, message }) => ({ field: `rows.${line}.${field}`, message })),
  );
  if (wrong.length) {
    throw new Refusal(
      'invalid',
      `Nothing was imported: ${wrong.length} ${wrong.length === 1 ? 'thing is' : 'things are'} not right in the file.`,
      { errors: wrong.slice(0, 500) },
    );
  }
  for (const { animal } of parentsFirst(rows)) {
    const { possibleSires, loci, owners, ownedFrom, weights, projectIds, ...fields } = animal;
    const key = { workspaceId: workspace.id, id: animal.id };
    await insertAnimal(tx, { ...fields, workspaceId: workspace.id });
    await replacePossibleSires(tx, key, possibleSires);
    await replaceClaims(
      tx,
      key,
      loci.map(({ locusId, ...claim }) => ({ locusId, claim })),
      today,
    );
    const since = ownedFrom ?? (animal.hatchedPrecision === 'day' ? animal.hatchedOn : null) ?? today;
    await insertOwnership(
      tx,
      workspace,
      { animalId: animal.id, fromDay: since, reason: 'founding', recordedBy: actor.memberId },
      owners,
    );
    await insertWeights(
      tx,
      weights.map((weight) => ({
        workspaceId: workspace.id,
        animalId: animal.id,
        ...weight,
        recordedBy: actor.memberId,
      })),
    );
    await addToProject(
      tx,
      projectIds.map((projectId) => ({
        workspaceId: workspace.id,
        projectId,
        animalId: animal.id,
        addedOn: today,
      })),
    );
  }
  await recordAudit(world, {
    action: 'animal.import',
    subject: { kind: 'workspace', id: workspace.id },
    detail: { animals: rows.length, codes: rows.map(({ animal }) => animal.code) },
  });
  return { imported: rows.length };
});

function parentsFirst(rows: readonly PlannedRow[]): PlannedRow[] {
  const byId = new Map(rows.map((row) => [row.animal.id, row]));
  const ordered = new Set<PlannedRow>();
  const add = (row: PlannedRow): void => {
    if (ordered.has(row)) return;
    for (const parent of parentsIn(row).map((id: AnimalId) => byId.get(id))) if (parent) add(parent);
    ordered.add(row);
  };
  for (const row of rows) add(row);
  return [...ordered];
}
