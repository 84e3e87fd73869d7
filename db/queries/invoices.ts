import 'server-only';
import { and, asc, count, desc, eq, ilike, inArray, or, sql, type SQL } from 'drizzle-orm';
import type { AnimalId, InvoiceId } from '@/lib/contracts/ids';
import type { InvoiceStatus } from '@/lib/contracts/sale-states';
import type { Transaction } from '../scope';
import { animals } from '../schema/collection';
import { contacts, instalments, invoiceLines, invoices, payments, refunds } from '../schema/sales';
import { visibleAnimal, type Visibility } from './visibility';

/** Invoices on which an animal stands that is seen. */
function visibleInvoice(tx: Transaction, sees: Visibility): SQL | undefined {
  if (sees.everything) return undefined;
  const lines = tx
    .select({ id: invoiceLines.invoiceId })
    .from(invoiceLines)
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, invoiceLines.workspaceId), eq(animals.id, invoiceLines.animalId)),
    )
    .where(visibleAnimal(tx, sees));
  return inArray(invoices.id, lines);
}

const nextDueOn = sql<string | null>`(
  select i.due_on::text from (
    select due_on, sum(amount) over (order by position) as due_so_far from instalments s
    where s.workspace_id = ${invoices.workspaceId} and s.invoice_id = ${invoices.id}) i
  where i.due_so_far > ${invoices.paid} - ${invoices.refunded} order by i.due_on limit 1)`;

function selectInvoices(tx: Transaction) {
  return tx
    .select({ invoice: invoices, contactName: contacts.name, contactEmail: contacts.email, nextDueOn })
    .from(invoices)
    .innerJoin(
      contacts,
      and(eq(contacts.workspaceId, invoices.workspaceId), eq(contacts.id, invoices.contactId)),
    );
}
export type InvoiceRecord = NonNullable<Awaited<ReturnType<typeof findInvoice>>>;

export interface InvoiceFilter {
  search?: string;
  status?: InvoiceStatus;
  /** Only invoices with something due before this day. */
  overdueOn?: string;
}

/** Invoices that are seen and match, newest first. */
export async function listInvoiceRecords(
  tx: Transaction,
  sees: Visibility,
  filter: InvoiceFilter,
  page: { offset: number; limit: number },
) {
  const text = filter.search ? `%${filter.search.replace(/[%_\\]/g, '\\$&')}%` : null;
  const where = and(
    visibleInvoice(tx, sees),
    text
      ? or(
          ilike(invoices.number, text),
          ilike(contacts.name, text),
          sql`exists (select 1 from invoice_lines l where l.workspace_id = ${invoices.workspaceId} and l.invoice_id = ${invoices.id} and l.description ilike ${text})`,
        )
      : undefined,
    filter.status ? eq(invoices.status, filter.status) : undefined,
    filter.overdueOn
      ? and(inArray(invoices.status, ['sent', 'part_paid']), sql`${nextDueOn} < ${filter.overdueOn}`)
      : undefined,
  );
  const rows = await selectInvoices(tx)
    .where(where)
    .orderBy(desc(invoices.createdAt), desc(invoices.number))
    .limit(page.limit)
    .offset(page.offset);
  const [total] = await tx
    .select({ total: count() })
    .from(invoices)
    .innerJoin(
      contacts,
      and(eq(contacts.workspaceId, invoices.workspaceId), eq(contacts.id, invoices.contactId)),
    )
    .where(where);
  return { rows, total: total?.total ?? 0 };
}

export async function findInvoice(tx: Transaction, sees: Visibility, id: InvoiceId) {
  const [row] = await selectInvoices(tx).where(and(eq(invoices.id, id), visibleInvoice(tx, sees)));
  return row ?? null;
}

export async function listLines(tx: Transaction, invoiceIds: InvoiceId[]) {
  if (invoiceIds.length === 0) return [];
  return tx
    .select({
      invoiceId: invoiceLines.invoiceId,
      kind: invoiceLines.kind,
      animalId: invoiceLines.animalId,
      code: animals.code,
      projectId: invoiceLines.projectId,
      description: invoiceLines.description,
      amount: invoiceLines.amount,
      position: invoiceLines.position,
    })
    .from(invoiceLines)
    .leftJoin(
      animals,
      and(eq(animals.workspaceId, invoiceLines.workspaceId), eq(animals.id, invoiceLines.animalId)),
    )
    .where(inArray(invoiceLines.invoiceId, invoiceIds))
    .orderBy(asc(invoiceLines.position));
}

export async function listInstalments(tx: Transaction, invoiceId: InvoiceId) {
  return tx
    .select()
    .from(instalments)
    .where(eq(instalments.invoiceId, invoiceId))
    .orderBy(asc(instalments.position));
}

export async function listPayments(tx: Transaction, invoiceId: InvoiceId) {
  return tx
    .select()
    .from(payments)
    .where(eq(payments.invoiceId, invoiceId))
    .orderBy(asc(payments.recordedAt), asc(payments.id));
}

export async function listRefunds(tx: Transaction, invoiceId: InvoiceId) {
  return tx
    .select()
    .from(refunds)
    .where(eq(refunds.invoiceId, invoiceId))
    .orderBy(asc(refunds.recordedAt), asc(refunds.id));
}

export async function insertInvoice(
  tx: Transaction,
  invoice: typeof invoices.$inferInsert,
  lines: Omit<typeof invoiceLines.$inferInsert, 'invoiceId' | 'workspaceId' | 'position'>[],
  dues: Omit<typeof instalments.$inferInsert, 'invoiceId' | 'workspaceId' | 'position'>[],
): Promise<InvoiceId> {
  const id = crypto.randomUUID() as InvoiceId;
  const of = (position: number) => ({ workspaceId: invoice.workspaceId, invoiceId: id, position });
  await tx.insert(invoices).values({ ...invoice, id });
  await tx.insert(invoiceLines).values(lines.map((line, index) => ({ ...line, ...of(index + 1) })));
  await tx.insert(instalments).values(dues.map((due, index) => ({ ...due, ...of(index + 1) })));
  return id;
}

/** @returns whether the row still had the version that was seen */
export async function updateInvoice(
  tx: Transaction,
  id: InvoiceId,
  seen: number,
  change: Partial<typeof invoices.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(invoices)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(invoices.id, id), eq(invoices.version, seen)))
    .returning({ id: invoices.id });
  return rows.length === 1;
}

/** Whether an animal already stands on an invoice that is neither void nor refunded. */
export async function animalsOnOpenInvoices(tx: Transaction, animalIds: AnimalId[]): Promise<AnimalId[]> {
  const rows = await tx
    .select({ animalId: invoiceLines.animalId })
    .from(invoiceLines)
    .innerJoin(
      invoices,
      and(eq(invoices.workspaceId, invoiceLines.workspaceId), eq(invoices.id, invoiceLines.invoiceId)),
    )
    .where(
      and(inArray(invoiceLines.animalId, animalIds), sql`${invoices.status} not in ('void', 'refunded')`),
    );
  return rows.flatMap(({ animalId }) => (animalId ? [animalId] : []));
}
