import 'server-only';
import { and, asc, count, desc, eq, ilike, isNotNull, lte, or, sql } from 'drizzle-orm';
import type { ContactId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { users } from '../schema/auth';
import { animals, documents } from '../schema/collection';
import { contactEvents, contacts, invoiceLines, invoices } from '../schema/sales';
import { members } from '../schema/workspace';

export interface ContactFilter {
  search?: string;
  kind?: (typeof contacts.$inferSelect)['kind'];
  tag?: string;
  /** Only contacts whose follow-up is due on or before this day. */
  dueBy?: string;
}

/** Contacts that match, those with the soonest follow-up first, then by name. */
export async function listContactRows(
  tx: Transaction,
  filter: ContactFilter,
  page: { offset: number; limit: number },
) {
  const text = filter.search ? `%${filter.search.replace(/[%_\\]/g, '\\$&')}%` : null;
  const where = and(
    text
      ? or(ilike(contacts.name, text), ilike(contacts.email, text), ilike(contacts.note, text))
      : undefined,
    filter.kind ? eq(contacts.kind, filter.kind) : undefined,
    filter.tag ? sql`${filter.tag} = any(${contacts.tags})` : undefined,
    filter.dueBy ? and(isNotNull(contacts.followUpOn), lte(contacts.followUpOn, filter.dueBy)) : undefined,
  );
  const rows = await tx
    .select({
      id: contacts.id,
      name: contacts.name,
      email: contacts.email,
      phone: contacts.phone,
      kind: contacts.kind,
      tags: contacts.tags,
      followUpOn: contacts.followUpOn,
      followUpNote: contacts.followUpNote,
      invoices: sql<number>`(select count(*)::int from invoices i where i.workspace_id = ${contacts.workspaceId} and i.contact_id = ${contacts.id})`,
      lastEventAt: sql<
        string | null
      >`(select max(e.happened_at) from contact_events e where e.workspace_id = ${contacts.workspaceId} and e.contact_id = ${contacts.id})`,
    })
    .from(contacts)
    .where(where)
    .orderBy(sql`${contacts.followUpOn} asc nulls last`, asc(contacts.name))
    .limit(page.limit)
    .offset(page.offset);
  const [total] = await tx.select({ total: count() }).from(contacts).where(where);
  return { rows, total: total?.total ?? 0 };
}

export async function findContact(tx: Transaction, id: ContactId) {
  const [row] = await tx.select().from(contacts).where(eq(contacts.id, id));
  return row ?? null;
}

export async function insertContact(tx: Transaction, row: typeof contacts.$inferInsert): Promise<ContactId> {
  const id = crypto.randomUUID() as ContactId;
  await tx.insert(contacts).values({ ...row, id });
  return id;
}

/** @returns whether the row still had the version that was seen */
export async function updateContact(
  tx: Transaction,
  id: ContactId,
  seen: number,
  change: Partial<typeof contacts.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(contacts)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(contacts.id, id), eq(contacts.version, seen)))
    .returning({ id: contacts.id });
  return rows.length === 1;
}

export async function insertContactEvent(
  tx: Transaction,
  row: typeof contactEvents.$inferInsert,
): Promise<string> {
  const id = crypto.randomUUID();
  await tx.insert(contactEvents).values({ ...row, id });
  return id;
}

/** The history of a contact, newest first. */
export async function listContactEvents(tx: Transaction, contactId: ContactId) {
  return tx
    .select({
      id: contactEvents.id,
      kind: contactEvents.kind,
      body: contactEvents.body,
      happenedAt: contactEvents.happenedAt,
      by: users.name,
    })
    .from(contactEvents)
    .leftJoin(
      members,
      and(eq(members.workspaceId, contactEvents.workspaceId), eq(members.id, contactEvents.recordedBy)),
    )
    .leftJoin(users, eq(users.id, members.userId))
    .where(eq(contactEvents.contactId, contactId))
    .orderBy(desc(contactEvents.happenedAt));
}

export async function listInvoicesOfContact(tx: Transaction, contactId: ContactId) {
  return tx
    .select({
      id: invoices.id,
      number: invoices.number,
      status: invoices.status,
      total: invoices.total,
      paid: invoices.paid,
      issuedOn: invoices.issuedOn,
    })
    .from(invoices)
    .where(eq(invoices.contactId, contactId))
    .orderBy(desc(invoices.createdAt));
}

export async function listAnimalsOfContact(tx: Transaction, contactId: ContactId) {
  return tx
    .select({
      id: animals.id,
      code: animals.code,
      speciesId: animals.speciesId,
      price: invoiceLines.amount,
      deliveredOn: invoices.deliveredOn,
      description: invoiceLines.description,
    })
    .from(invoiceLines)
    .innerJoin(
      invoices,
      and(eq(invoices.workspaceId, invoiceLines.workspaceId), eq(invoices.id, invoiceLines.invoiceId)),
    )
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, invoiceLines.workspaceId), eq(animals.id, invoiceLines.animalId)),
    )
    .where(and(eq(invoices.contactId, contactId), sql`${invoices.status} not in ('draft', 'void')`))
    .orderBy(desc(invoices.createdAt), asc(invoiceLines.position));
}

export async function listDocumentsOfContact(tx: Transaction, contactId: ContactId) {
  return tx
    .select({
      id: documents.id,
      name: documents.name,
      contentType: documents.contentType,
      bytes: documents.bytes,
    })
    .from(documents)
    .where(and(eq(documents.subjectKind, 'contact'), eq(documents.subjectId, contactId)))
    .orderBy(desc(documents.createdAt));
}
