import 'server-only';
import type { InvoiceRecord, listInstalments, listLines } from '@/db/queries/invoices';
import type { InvoiceRow } from '@/lib/contracts/invoice';

type Line = Awaited<ReturnType<typeof listLines>>[number];
type Instalment = Awaited<ReturnType<typeof listInstalments>>[number];

/** An invoice as a row of the list. */
export function presentInvoiceRow(
  { invoice, contactName, nextDueOn }: InvoiceRecord,
  lines: Line[],
  today: string,
): InvoiceRow {
  const isOpen = invoice.status === 'sent' || invoice.status === 'part_paid';
  return {
    id: invoice.id,
    number: invoice.number,
    status: invoice.status,
    contact: { id: invoice.contactId, name: contactName },
    animals: lines
      .filter((line) => line.invoiceId === invoice.id && line.code)
      .map((line) => line.code ?? ''),
    total: invoice.total,
    paid: invoice.paid,
    refunded: invoice.refunded,
    issuedOn: invoice.issuedOn,
    nextDueOn: isOpen ? nextDueOn : null,
    overdue: isOpen && nextDueOn !== null && nextDueOn < today,
  };
}

/** Instalments with what is still open of each: money that came pays the earliest first. */
export function withOpenAmounts(
  instalments: Instalment[],
  received: number,
): { label: string; dueOn: string; amount: number; open: number }[] {
  let left = received;
  return instalments.map(({ label, dueOn, amount }) => {
    const covered = Math.min(amount, left);
    left -= covered;
    return { label, dueOn, amount, open: amount - covered };
  });
}
