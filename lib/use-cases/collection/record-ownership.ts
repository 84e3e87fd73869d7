import 'server-only';
import { findAnimal } from '@/db/queries/animals';
import { endOwnership, insertOwnership, lockOwnershipInForce } from '@/db/queries/ownership';
import { recordOwnership } from '@/lib/contracts/animal-ownership';
import type { PartyId } from '@/lib/contracts/ids';
import { recordAudit } from '../audit';
import { notifyParties } from '../notify';
import { notFound, Refusal, type FieldError } from '../refusal';
import { workspaceUseCase } from '../world';
import { checkParts } from './create-animal';

type Parts = readonly { partyId: PartyId; parts: number }[];

/** Whether a party's fraction of the whole is smaller in `after` than in `before`; compared by cross products, exact. */
function loses(party: PartyId, before: Parts, after: Parts): boolean {
  const held = (parts: Parts) => parts.find(({ partyId }) => partyId === party)?.parts ?? 0;
  const whole = (parts: Parts) => parts.reduce((sum, { parts: one }) => sum + one, 0);
  return BigInt(held(after)) * BigInt(whole(before)) < BigInt(held(before)) * BigInt(whole(after));
}

/**
 * Parts of an animal change hands on a day. The set that was in force ends there, and both stay in the history. Of two
 * members who do this at once, the second is told that the parts have changed.
 */
export const recordOwnershipUseCase = workspaceUseCase(recordOwnership, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, today } = world;
  const animal = await findAnimal(tx, sees, params.animal);
  if (!animal) throw notFound('animal');
  const inForce = await lockOwnershipInForce(tx, animal.id);
  if ((inForce?.id ?? null) !== body.seen) {
    throw new Refusal(
      'stale',
      `Somebody recorded other owners of ${animal.code} in the meantime. Nothing of yours was saved; look at the parts as they are now and try again.`,
    );
  }

  const errors: FieldError[] = await checkParts(world, 'parts', body.parts);
  if (body.fromDay > today) errors.push({ field: 'fromDay', message: 'This day has not come yet.' });
  if (animal.hatchedOn && animal.hatchedPrecision === 'day' && body.fromDay < animal.hatchedOn) {
    errors.push({ field: 'fromDay', message: `${animal.code} hatched on ${animal.hatchedOn}.` });
  }
  if (inForce && body.fromDay < inForce.fromDay) {
    errors.push({
      field: 'fromDay',
      message: `The present parts hold since ${inForce.fromDay}; a change comes after them.`,
    });
  }
  if (inForce && body.fromDay === inForce.fromDay && body.reason !== 'correction') {
    errors.push({
      field: 'fromDay',
      message: `The present parts were recorded for the same day. Choose "correction" to replace them.`,
    });
  }
  if (body.reason === 'gift' && body.price) errors.push({ field: 'price', message: 'A gift has no price.' });
  if (
    !sees.everything &&
    inForce?.parts.some(
      ({ partyId }) => partyId !== actor.partyId && loses(partyId, inForce.parts, body.parts),
    )
  ) {
    errors.push({
      field: 'parts',
      message: 'You can give away only parts of your own; this would take some from another partner.',
    });
  }
  if (errors.length)
    throw new Refusal('invalid', errors[0]?.message ?? 'Something is not right.', { errors });

  if (inForce) await endOwnership(tx, inForce.id, body.fromDay);
  const { parts, fromDay, reason, price, note } = body;
  const id = await insertOwnership(
    tx,
    workspace,
    { animalId: animal.id, fromDay, reason, price, note, recordedBy: actor.memberId },
    parts,
  );
  await recordAudit(world, {
    action: 'ownership.record',
    subject: { kind: 'animal', id: animal.id },
    detail: { code: animal.code, fromDay, reason, price, before: inForce?.parts ?? [], after: parts },
    reason: note,
  });
  const concerned = [...new Set([...parts, ...(inForce?.parts ?? [])].map(({ partyId }) => partyId))];
  await notifyParties(
    world,
    concerned,
    { kind: 'ownership', title: `The owners of ${animal.code} changed`, href: `collection/${animal.id}` },
    actor.memberId,
  );
  return { id };
});
