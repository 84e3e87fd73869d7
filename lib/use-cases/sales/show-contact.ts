import 'server-only';
import {
  findContact,
  listAnimalsOfContact,
  listContactEvents,
  listDocumentsOfContact,
  listInvoicesOfContact,
} from '@/db/queries/contacts';
import { showContact } from '@/lib/contracts/contact';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';

/** A member opens a contact with its history. */
export const showContactUseCase = workspaceUseCase(showContact, async ({ tx }, { params }) => {
  const contact = await findContact(tx, params.contact);
  if (!contact) throw notFound('contact');
  const events = await listContactEvents(tx, contact.id);
  return {
    ...contact,
    events: events.map((event) => ({ ...event, happenedAt: event.happenedAt.toISOString() })),
    invoices: await listInvoicesOfContact(tx, contact.id),
    animals: await listAnimalsOfContact(tx, contact.id),
    documents: await listDocumentsOfContact(tx, contact.id),
  };
});
