import 'server-only';
import { findInvoice, listInstalments, listLines, listPayments, listRefunds } from '@/db/queries/invoices';
import { showInvoice } from '@/lib/contracts/invoice';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentInvoiceRow, withOpenAmounts } from './present-invoice';

/** A member opens an invoice. */
export const showInvoiceUseCase = workspaceUseCase(showInvoice, async ({ tx, sees, today }, { params }) => {
  const record = await findInvoice(tx, sees, params.invoice);
  if (!record) throw notFound('invoice');
  const { invoice } = record;
  const lines = await listLines(tx, [invoice.id]);
  const refunds = await listRefunds(tx, invoice.id);
  const standing = refunds.filter((refund) => refund.status !== 'failed');
  const payments = await listPayments(tx, invoice.id);
  return {
    ...presentInvoiceRow(record, lines, today),
    version: invoice.version,
    currency: invoice.currency,
    taxBasisPoints: invoice.taxBasisPoints,
    subtotal: invoice.subtotal,
    discount: invoice.discount,
    shipping: invoice.shipping,
    tax: invoice.tax,
    deliveredOn: invoice.deliveredOn,
    note: invoice.note,
    lines,
    instalments: withOpenAmounts(await listInstalments(tx, invoice.id), invoice.paid - invoice.refunded),
    payments: payments.map((payment) => ({
      ...payment,
      refunded: standing
        .filter((refund) => refund.paymentId === payment.id)
        .reduce((sum, refund) => sum + refund.amount, 0),
    })),
    refunds,
    buyerEmail: record.contactEmail,
  };
});
