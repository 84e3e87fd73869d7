import 'server-only';
import { animalsOnOpenInvoices, insertInvoice } from '@/db/queries/invoices';
import { findContact } from '@/db/queries/contacts';
import { findListings, setListingStates, type ListingRecord } from '@/db/queries/listings';
import type { AnimalId } from '@/lib/contracts/ids';
import { createInvoice, type InvoiceDraft } from '@/lib/contracts/invoice';
import { shareOfBasisPoints } from '@/lib/money/minor-units';
import { recordAudit } from '../audit';
import { describeAnimals } from '../genetics/describe-animals';
import { invalid, notFound, Refusal } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';

/** A draft of an invoice is made; its animals are reserved by it. Nothing is owed until it is sent. */
export const createInvoiceUseCase = workspaceUseCase(createInvoice, async (world, { body }) => {
  const { tx, workspace, actor, today, now } = world;
  const contact = await findContact(tx, body.contactId);
  if (!contact) throw invalid('contactId', 'There is no such contact.');
  if (body.balanceDueOn < today) throw invalid('balanceDueOn', 'This day is over.');
  const records = await findSellable(world, body);
  const describe = await describeAnimals(
    tx,
    records.map(({ animalId, speciesId }) => ({ id: animalId, speciesId })),
  );

  const subtotal = body.animals.reduce((sum, { price }) => sum + price, 0);
  if (body.discount > subtotal)
    throw invalid('discount', 'The discount is larger than the price of the animals.');
  const tax = shareOfBasisPoints(subtotal - body.discount, body.taxBasisPoints);
  const total = subtotal - body.discount + body.shipping + tax;
  if (body.deposit >= total)
    throw invalid('deposit', 'A deposit is less than the whole. Leave it out if all is due at once.');

  const animalLines = body.animals.map(({ animalId, price }) => {
    const record = records.find((candidate) => candidate.animalId === animalId);
    return {
      kind: 'animal' as const,
      animalId,
      projectId: record?.projectId ?? null,
      description: `${record?.code} · ${describe(animalId)}`,
      amount: price,
    };
  });
  const id = await insertInvoice(
    tx,
    {
      workspaceId: workspace.id,
      contactId: contact.id,
      currency: workspace.currency,
      taxBasisPoints: body.taxBasisPoints,
      subtotal,
      discount: body.discount,
      shipping: body.shipping,
      tax,
      total,
      note: body.note,
      createdBy: actor.memberId,
    },
    [
      ...animalLines,
      ...(body.discount > 0
        ? [{ kind: 'discount' as const, description: 'Discount', amount: -body.discount }]
        : []),
      ...(body.shipping > 0
        ? [{ kind: 'shipping' as const, description: 'Shipping', amount: body.shipping, taxed: 0 }]
        : []),
    ],
    planDues(body, total),
  );
  await setListingStates(
    tx,
    workspace.id,
    body.animals.map(({ animalId }) => animalId),
    'invoiced',
    now,
  );
  await recordAudit(world, {
    action: 'invoice.create',
    subject: { kind: 'invoice', id },
    detail: { contactId: contact.id, total },
  });
  return { id };
});

/** The animals of a draft, each seen, here, and on no other open invoice. */
async function findSellable({ tx, sees }: WorkspaceWorld, draft: InvoiceDraft): Promise<ListingRecord[]> {
  const ids = draft.animals.map(({ animalId }) => animalId);
  const twice = ids.findIndex((id, index) => ids.indexOf(id) !== index);
  if (twice >= 0) throw invalid(`animals.${twice}.animalId`, 'This animal stands on the invoice twice.');
  const records = await findListings(tx, sees, ids);
  const taken: AnimalId[] = await animalsOnOpenInvoices(tx, ids);
  draft.animals.forEach(({ animalId }, index) => {
    const record = records.find((candidate) => candidate.animalId === animalId);
    if (!record) throw notFound('animal');
    if (!['here', 'on_loan', 'quarantine'].includes(record.status))
      throw invalid(`animals.${index}.animalId`, `${record.code} is not here any more.`);
    if (taken.includes(animalId))
      throw invalid(`animals.${index}.animalId`, `${record.code} already stands on an invoice.`);
    if (record.state === 'held' && record.heldForId && record.heldForId !== draft.contactId) {
      throw new Refusal('wrong_state', `${record.code} is held for ${record.heldForName}.`, {
        errors: [{ field: `animals.${index}.animalId`, message: `Held for ${record.heldForName}.` }],
      });
    }
  });
  return records;
}

function planDues({ deposit, depositDueOn, balanceDueOn }: InvoiceDraft, total: number) {
  const balance = {
    label: deposit > 0 ? 'Balance' : 'Whole amount',
    dueOn: balanceDueOn,
    amount: total - deposit,
  };
  return deposit > 0 && depositDueOn
    ? [{ label: 'Deposit', dueOn: depositDueOn, amount: deposit }, balance]
    : [balance];
}
