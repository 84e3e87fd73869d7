import 'server-only';
import { listInvoiceRecords, listLines } from '@/db/queries/invoices';
import { listInvoices } from '@/lib/contracts/invoice';
import { workspaceUseCase } from '../world';
import { presentInvoiceRow } from './present-invoice';

/** A member looks through the invoices of what they may see. */
export const listInvoicesUseCase = workspaceUseCase(listInvoices, async ({ tx, sees, today }, { query }) => {
  const { overdue, offset, limit, ...filter } = query;
  const { rows, total } = await listInvoiceRecords(
    tx,
    sees,
    { ...filter, overdueOn: overdue ? today : undefined },
    { offset, limit },
  );
  const lines = await listLines(
    tx,
    rows.map(({ invoice }) => invoice.id),
  );
  return { rows: rows.map((row) => presentInvoiceRow(row, lines, today)), total };
});
