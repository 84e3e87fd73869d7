import 'server-only';
import { randomBytes } from 'node:crypto';
import { insertContactEvent } from '@/db/queries/contacts';
import { findInvoice, listInstalments, listLines, updateInvoice } from '@/db/queries/invoices';
import { takeInvoiceNumber } from '@/db/queries/numbers';
import { sendInvoice } from '@/lib/contracts/invoice';
import { formatMoney } from '@/lib/money/minor-units';
import { configuration } from '@/lib/services/configuration';
import { recordAudit } from '../audit';
import { hashSecret } from '../hash';
import { queueMail } from '../queue-mail';
import { notFound, Refusal, stale } from '../refusal';
import { workspaceUseCase } from '../world';
import { withOpenAmounts } from './present-invoice';

/**
 * An invoice gets its number and goes to the buyer as a mail with a link. Sending again keeps the number and makes a
 * new link; the old one stops working.
 */
export const sendInvoiceUseCase = workspaceUseCase(sendInvoice, async (world, { params, body }) => {
  const { tx, sees, workspace, actor, today, now } = world;
  const record = await findInvoice(tx, sees, params.invoice);
  if (!record) throw notFound('invoice');
  const { invoice, contactName, contactEmail } = record;
  if (invoice.status === 'void' || invoice.status === 'refunded') throw new Refusal('wrong_state', 'This invoice is closed.');
  if (!contactEmail) throw new Refusal('wrong_state', `${contactName} has no mail address. Add one to the contact first.`);

  const number = invoice.number ?? `${workspace.invoicePrefix}${today.slice(0, 4)}-${String(await takeInvoiceNumber(tx, workspace.id)).padStart(4, '0')}`;
  const secret = randomBytes(32).toString('base64url');
  const saved = await updateInvoice(tx, invoice.id, body.version, {
    number,
    status: invoice.status === 'draft' ? 'sent' : invoice.status,
    issuedOn: invoice.issuedOn ?? today,
    sentAt: now,
    linkHash: hashSecret(secret),
  });
  if (!saved) throw stale('invoice', invoice.version);

  const money = (amount: number) => formatMoney(amount, invoice.currency);
  const next = withOpenAmounts(await listInstalments(tx, invoice.id), invoice.paid - invoice.refunded).find(({ open }) => open > 0);
  await queueMail(world, {
    workspaceId: workspace.id,
    contactId: invoice.contactId,
    template: 'invoice',
    to: contactEmail,
    data: {
      name: contactName,
      seller: workspace.name,
      number,
      total: money(invoice.total),
      due: next ? `${next.label}: ${money(next.open)}, due ${next.dueOn}` : 'Nothing is due.',
      lines: (await listLines(tx, [invoice.id])).map((line) => ({ text: line.description, amount: money(line.amount) })),
      link: `${configuration().appUrl}/i/${secret}`,
    },
  });
  await insertContactEvent(tx, {
    workspaceId: workspace.id,
    contactId: invoice.contactId,
    kind: 'invoice',
    body: `Invoice ${number} over ${money(invoice.total)} sent to ${contactEmail}`,
    happenedAt: now,
    recordedBy: actor.memberId,
  });
  await recordAudit(world, { action: 'invoice.send', subject: { kind: 'invoice', id: invoice.id }, detail: { number, to: contactEmail } });
  return { number, version: body.version + 1 };
});
