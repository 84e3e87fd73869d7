import 'server-only';
import {
  findAnimal,
  isCodeTaken,
  listClaims,
  listPossibleSires,
  listYoungOf,
  replaceClaims,
  replacePossibleSires,
  updateAnimal,
} from '@/db/queries/animals';
import { findSpecies } from '@/db/queries/species';
import { editAnimal } from '@/lib/contracts/animal-record';
import type { AnimalId } from '@/lib/contracts/ids';
import { recordAudit } from '../audit';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { invalid, notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';
import { checkAsParent } from './animal-rules';
import { checkDraft } from './draft-animal';

/** A member changes what is recorded of an animal. What is not sent stays as it is. */
export const editAnimalUseCase = workspaceUseCase(editAnimal, async (world, { params, body }) => {
  const { tx, sees, workspace, today } = world;
  const animal = await findAnimal(tx, sees, params.animal);
  if (!animal) throw notFound('animal');
  const { version, loci, possibleSires, ...fields } = body;
  if (version !== animal.version) throw stale('animal', animal.version);
  const species = await findSpecies(tx, fields.speciesId ?? animal.speciesId);
  if (!species) throw invalid('speciesId', 'There is no such species here.');

  const sires = (await listPossibleSires(tx, animal.id)).map(({ sireId, weight }) => ({
    animalId: sireId,
    weight,
  }));
  const claims = (await listClaims(tx, animal.id)).map(({ locusId, claim }) => ({ locusId, ...claim }));
  const draft = { ...animal, ...fields, possibleSires: possibleSires ?? sires, loci: loci ?? claims };
  const kept = new Set<AnimalId>(
    [animal.sireId, animal.damId, ...sires.map(({ animalId }) => animalId)].filter((id) => id !== null),
  );
  const errors = await checkDraft(world, draft, await loadBeliefs(tx, species.id), kept);
  if (fields.code && (await isCodeTaken(tx, fields.code, animal.id))) {
    errors.push({ field: 'code', message: `Another animal already has the code ${fields.code}.` });
  }
  // The young are asked whoever may see them: what is impossible stays impossible.
  const young = await listYoungOf(tx, { everything: true }, animal.id);
  errors.push(
    ...checkAsParent(
      draft,
      young.map((child) => ({ child, as: child.damId === animal.id ? ('dam' as const) : ('sire' as const) })),
    ),
  );
  if (errors.length)
    throw new Refusal('invalid', errors[0]?.message ?? 'Something is not right.', { errors });

  const since =
    fields.status && fields.status !== animal.status && fields.statusSince === undefined
      ? { statusSince: today }
      : {};
  if (!(await updateAnimal(tx, animal.id, version, { ...fields, ...since })))
    throw stale('animal', version + 1);
  if (possibleSires)
    await replacePossibleSires(tx, { workspaceId: workspace.id, id: animal.id }, possibleSires);
  if (loci)
    await replaceClaims(
      tx,
      { workspaceId: workspace.id, id: animal.id },
      loci.map(({ locusId, ...claim }) => ({ locusId, claim })),
      today,
    );
  await recordAudit(world, {
    action: 'animal.edit',
    subject: { kind: 'animal', id: animal.id },
    detail: { code: draft.code, changed: { ...fields, loci, possibleSires } },
  });
  return { version: version + 1 };
});
