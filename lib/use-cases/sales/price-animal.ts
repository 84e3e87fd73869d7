import 'server-only';
import { findContact } from '@/db/queries/contacts';
import { findListings, saveListing } from '@/db/queries/listings';
import { priceAnimal } from '@/lib/contracts/invoice';
import { recordAudit } from '../audit';
import { invalid, notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentListings } from './present-listing';

/** An animal gets a price and a listing state, or is held for somebody. */
export const priceAnimalUseCase = workspaceUseCase(priceAnimal, async (world, { params, body }) => {
  const { tx, sees, workspace, now, today } = world;
  const [listing] = await findListings(tx, sees, [params.animal]);
  if (!listing) throw notFound('animal');
  if (listing.state === 'invoiced' || listing.state === 'sold') {
    throw new Refusal('wrong_state', 'This animal stands on an invoice. Void the invoice first.');
  }
  if (body.heldFor && !(await findContact(tx, body.heldFor)))
    throw invalid('heldFor', 'There is no such contact.');
  if (body.heldUntil && body.heldUntil < today) throw invalid('heldUntil', 'This day is over.');
  const { version, heldUntil, ...change } = body;
  const saved = await saveListing(
    tx,
    { workspaceId: workspace.id, animalId: params.animal, seen: version },
    {
      ...change,
      heldFor: body.state === 'held' ? body.heldFor : null,
      heldUntil: body.state === 'held' && heldUntil ? new Date(`${heldUntil}T23:59:59Z`) : null,
    },
    now,
  );
  if (!saved) throw stale('listing', listing.version);
  await recordAudit(world, {
    action: 'listing.set',
    subject: { kind: 'animal', id: params.animal },
    detail: { state: body.state, price: body.price },
  });
  const [row] = await presentListings(world, await findListings(tx, sees, [params.animal]));
  if (!row) throw notFound('animal');
  return row;
});
