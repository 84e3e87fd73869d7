import 'server-only';
import { insertAnimal, insertWeights, isCodeTaken, replaceClaims } from '@/db/queries/animals';
import { findClutch, listYoung, lockClutch, setHatched, type ClutchRecord } from '@/db/queries/clutches';
import { insertOwnership } from '@/db/queries/ownership';
import { logHatchlings, type newHatchling } from '@/lib/contracts/clutch';
import type { AnimalId, LocusId } from '@/lib/contracts/ids';
import type { z } from 'zod';
import { recordAudit } from '../audit';
import { checkClaims } from '../collection/claim-rules';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { notifyParties } from '../notify';
import { notFound, Refusal, type FieldError } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { deriveParts } from './present-clutch';

type Hatchling = z.output<typeof newHatchling>;

const claimsOf = ({ shows }: Hatchling) =>
  Object.entries(shows).flatMap(([locusId, look]) =>
    look === undefined ? [] : [{ locusId: locusId as LocusId, shows: look, carries: null }],
  );

/** All young of a clutch that hatched on a day are logged in one go, or none; each gets its owners from the terms. */
export const logHatchlingsUseCase = workspaceUseCase(logHatchlings, async (world, { params, body }) => {
  const { tx, sees, workspace, actor } = world;
  if (!(await findClutch(tx, sees, params.clutch))) throw notFound('clutch');
  await lockClutch(tx, params.clutch);
  // Read again: another member may have logged young while this one waited.
  const clutch = await findClutch(tx, sees, params.clutch);
  if (!clutch) throw notFound('clutch');
  const errors = await checkHatchlings(world, clutch, body);
  if (errors.length)
    throw new Refusal('invalid', errors[0]?.message ?? 'Something is not right.', { errors });
  const { parts, steps, partyIds } = await deriveParts(world, clutch);
  if (parts.length === 0) {
    throw new Refusal(
      'wrong_state',
      `No owner of the parents is recorded for ${clutch.laidOn}, the day of laying. Record it first.`,
    );
  }

  const { hatchedOn, hatchlings } = body;
  const last = (await listYoung(tx, clutch.id)).reduce(
    (most, { hatchNumber }) => Math.max(most, hatchNumber ?? 0),
    0,
  );
  const ids: AnimalId[] = [];
  for (const [index, young] of hatchlings.entries()) {
    const id = crypto.randomUUID() as AnimalId;
    ids.push(id);
    await insertAnimal(tx, {
      workspaceId: workspace.id,
      id,
      code: young.code,
      speciesId: clutch.speciesId,
      sex: young.sex,
      hatchedOn,
      origin: 'captive_bred',
      status: young.alive ? 'here' : 'died',
      statusSince: hatchedOn,
      notes: young.note,
      damId: clutch.damId,
      sireId: clutch.sireId,
      clutchId: clutch.id,
      hatchNumber: last + 1 + index,
    });
    const claims = claimsOf(young).map(({ locusId, ...claim }) => ({ locusId, claim }));
    await replaceClaims(tx, { workspaceId: workspace.id, id }, claims, hatchedOn);
    if (young.grams !== null) {
      await insertWeights(tx, [
        {
          workspaceId: workspace.id,
          animalId: id,
          weighedOn: hatchedOn,
          grams: young.grams,
          recordedBy: actor.memberId,
        },
      ]);
    }
    await insertOwnership(
      tx,
      workspace,
      { animalId: id, fromDay: hatchedOn, reason: 'hatched', derivation: steps, recordedBy: actor.memberId },
      parts,
    );
  }
  await setHatched(tx, clutch.id, hatchedOn);
  const codes = hatchlings.map(({ code }) => code);
  await recordAudit(world, {
    action: 'clutch.hatch',
    subject: { kind: 'clutch', id: clutch.id },
    detail: { code: clutch.code, hatchedOn, codes, parts },
  });
  await notifyParties(
    world,
    partyIds,
    {
      kind: 'clutch-hatched',
      title: `${clutch.code} hatched: ${codes.length} young`,
      body: clutch.projectName,
      href: `clutches/${clutch.id}`,
    },
    actor.memberId,
  );
  return { ids };
});

async function checkHatchlings(
  { tx, today }: WorkspaceWorld,
  clutch: ClutchRecord,
  { hatchedOn, hatchlings }: { hatchedOn: string; hatchlings: readonly Hatchling[] },
): Promise<FieldError[]> {
  const errors: FieldError[] = [];
  if (hatchedOn > today) errors.push({ field: 'hatchedOn', message: 'This day has not come yet.' });
  if (hatchedOn < clutch.laidOn)
    errors.push({ field: 'hatchedOn', message: `The clutch was laid on ${clutch.laidOn}.` });
  const left = clutch.eggs - clutch.hatchlings;
  if (hatchlings.length > left) {
    errors.push({
      field: 'hatchlings',
      message: `${clutch.eggs} eggs, ${clutch.hatchlings} young logged: at most ${Math.max(0, left)} more can hatch.`,
    });
  }
  const beliefs = await loadBeliefs(tx, clutch.speciesId);
  for (const [index, young] of hatchlings.entries()) {
    const field = `hatchlings.${index}.code`;
    if (hatchlings.findIndex(({ code }) => code === young.code) < index) {
      errors.push({ field, message: `${young.code} is used twice here.` });
    } else if (await isCodeTaken(tx, young.code)) {
      errors.push({ field, message: `Another animal already has the code ${young.code}.` });
    }
    for (const { message } of checkClaims(beliefs, young, claimsOf(young))) {
      errors.push({ field: `hatchlings.${index}.shows`, message });
    }
  }
  return errors;
}
