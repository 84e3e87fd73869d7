import 'server-only';
import { findInvoice, listLines, updateInvoice } from '@/db/queries/invoices';
import { setListingStates } from '@/db/queries/listings';
import { voidInvoice } from '@/lib/contracts/invoice';
import { recordAudit } from '../audit';
import { notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';

/** An invoice on which nothing was paid is voided; its animals are free again, its number stays taken. */
export const voidInvoiceUseCase = workspaceUseCase(voidInvoice, async (world, { params, body }) => {
  const { tx, sees, workspace, now } = world;
  const record = await findInvoice(tx, sees, params.invoice);
  if (!record) throw notFound('invoice');
  const { invoice } = record;
  if (invoice.status !== 'draft' && invoice.status !== 'sent') {
    throw new Refusal('wrong_state', 'Money came in on this invoice. Refund it instead.');
  }
  if (!(await updateInvoice(tx, invoice.id, body.version, { status: 'void', voidedAt: now, linkHash: null })))
    throw stale('invoice', invoice.version);
  const animalIds = (await listLines(tx, [invoice.id])).flatMap(({ animalId }) =>
    animalId ? [animalId] : [],
  );
  await setListingStates(tx, workspace.id, animalIds, 'listed', now);
  await recordAudit(world, {
    action: 'invoice.void',
    subject: { kind: 'invoice', id: invoice.id },
    reason: body.reason,
  });
  return { version: body.version + 1 };
});
