import { z } from 'zod';
import { ownedParts } from './animal-list';
import { inAnimal } from './animal-record';
import { contract, isoDay, minorUnits } from './contract';

/** Why parts change hands, as a person chooses it. Hatching and sale are recorded by the clutch and the invoice. */
export const chosenReason = z.enum(['buy_in', 'transfer', 'gift', 'buy_out', 'inheritance', 'correction']);

export const recordOwnership = contract({
  id: 'animals.ownership.record',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/{animal}/ownership',
  summary: 'Record who holds which parts of an animal from a day on',
  access: { scope: 'workspace', action: 'ownership.transfer' },
  params: inAnimal,
  body: z.object({
    fromDay: isoDay,
    reason: chosenReason,
    parts: ownedParts.min(1, 'Somebody has to own it.').max(16),
    price: minorUnits.min(0, 'A price is not negative.').nullable().default(null),
    note: z.string().trim().max(500).default(''),
    /** The set of parts that the person saw as in force; null when there was none. */
    seen: z.uuid().nullable(),
  }),
  response: z.object({ id: z.uuid() }),
  idempotent: true,
});
