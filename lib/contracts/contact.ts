import { z } from 'zod';
import { contract, inWorkspace, instant, isoDay, minorUnits, pageOf, pageQuery } from './contract';
import { animalId, contactId, documentId, invoiceId } from './ids';
import { contactAddress, contactEventKind, invoiceStatus } from './sale-states';

const inContact = inWorkspace.extend({ contact: contactId });
export const contactKind = z.enum(['buyer', 'breeder', 'veterinarian', 'supplier', 'carrier', 'other']);

export const contactRow = z.object({
  id: contactId,
  name: z.string(),
  email: z.string().nullable(),
  phone: z.string(),
  kind: contactKind,
  tags: z.array(z.string()),
  followUpOn: isoDay.nullable(),
  followUpNote: z.string(),
  invoices: z.int(),
  lastEventAt: instant.nullable(),
});
export type ContactRow = z.infer<typeof contactRow>;

export const listContacts = contract({
  id: 'contacts.list',
  method: 'GET',
  path: '/workspaces/{workspace}/contacts',
  summary: 'Buyers and other contacts',
  access: { scope: 'workspace', action: 'contact.see' },
  query: z.object({
    ...pageQuery,
    search: z.string().trim().max(80).optional(),
    kind: contactKind.optional(),
    tag: z.string().max(40).optional(),
    due: z.enum(['yes']).optional(),
  }),
  response: pageOf(contactRow),
});

const fields = {
  name: z.string().trim().min(1, 'Give a name.').max(120),
  email: z.email('This is not a mail address.').max(200).nullable().default(null),
  phone: z.string().trim().max(40).default(''),
  kind: contactKind.default('buyer'),
  address: contactAddress.default({ street: '', postcode: '', town: '', region: '', country: '' }),
  tags: z.array(z.string().trim().min(1).max(40)).max(20).default([]),
  note: z.string().trim().max(4000).default(''),
  followUpOn: isoDay.nullable().default(null),
  followUpNote: z.string().trim().max(300).default(''),
};

export const contactEvent = z.object({
  id: z.uuid(),
  kind: contactEventKind,
  body: z.string(),
  happenedAt: instant,
  by: z.string().nullable(),
});

export const contactDetail = z.object({
  ...fields,
  id: contactId,
  version: z.int(),
  events: z.array(contactEvent),
  invoices: z.array(
    z.object({
      id: invoiceId,
      number: z.string().nullable(),
      status: invoiceStatus,
      total: minorUnits,
      paid: minorUnits,
      issuedOn: isoDay.nullable(),
    }),
  ),
  animals: z.array(
    z.object({
      id: animalId,
      code: z.string(),
      description: z.string(),
      price: minorUnits,
      deliveredOn: isoDay.nullable(),
    }),
  ),
  documents: z.array(z.object({ id: documentId, name: z.string(), contentType: z.string(), bytes: z.int() })),
});
export type ContactDetail = z.infer<typeof contactDetail>;

export const showContact = contract({
  id: 'contacts.show',
  method: 'GET',
  path: '/workspaces/{workspace}/contacts/{contact}',
  summary: 'A contact with its history: inquiries, mails, invoices, animals bought, documents',
  access: { scope: 'workspace', action: 'contact.see' },
  params: inContact,
  response: contactDetail,
});

export const createContact = contract({
  id: 'contacts.create',
  method: 'POST',
  path: '/workspaces/{workspace}/contacts',
  summary: 'Add a contact',
  access: { scope: 'workspace', action: 'contact.edit' },
  body: z.object(fields),
  response: z.object({ id: contactId }),
});

export const editContact = contract({
  id: 'contacts.edit',
  method: 'PATCH',
  path: '/workspaces/{workspace}/contacts/{contact}',
  summary: 'Change a contact',
  access: { scope: 'workspace', action: 'contact.edit' },
  params: inContact,
  body: z.object({ ...fields, version: z.int() }),
  response: z.object({ version: z.int() }),
});

export const noteOnContact = contract({
  id: 'contacts.events.add',
  method: 'POST',
  path: '/workspaces/{workspace}/contacts/{contact}/events',
  summary: 'Note an inquiry, a call, a meeting or anything else in the history of a contact',
  access: { scope: 'workspace', action: 'contact.edit' },
  params: inContact,
  body: z.object({
    kind: contactEventKind.exclude(['invoice', 'payment', 'delivery']),
    body: z.string().trim().min(1, 'Write what happened.').max(4000),
  }),
  response: contactEvent,
});

export const mailContact = contract({
  id: 'contacts.mail',
  method: 'POST',
  path: '/workspaces/{workspace}/contacts/{contact}/mails',
  summary: 'Write a mail to a contact; it is noted in the history',
  access: { scope: 'workspace', action: 'contact.edit' },
  params: inContact,
  body: z.object({
    subject: z.string().trim().min(1, 'Give a subject.').max(150),
    text: z.string().trim().min(1, 'Write the mail.').max(10_000),
  }),
  response: contactEvent,
  idempotent: true,
});
