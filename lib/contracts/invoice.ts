import { z } from 'zod';
import { contract, inWorkspace, instant, isoDay, minorUnits, pageOf, pageQuery } from './contract';
import { animalId, contactId, invoiceId, paymentId, projectId, refundId } from './ids';
import { invoiceStatus, listingState, paymentMethod } from './sale-states';

const inInvoice = inWorkspace.extend({ invoice: invoiceId });

export const listingRow = z.object({
  animalId,
  code: z.string(),
  description: z.string(),
  sex: z.enum(['male', 'female', 'unknown']),
  hatchedOn: isoDay.nullable(),
  project: z.object({ id: projectId, name: z.string() }).nullable(),
  state: listingState,
  price: minorUnits.nullable(),
  headline: z.string(),
  heldFor: z.object({ id: contactId, name: z.string() }).nullable(),
  heldUntil: instant.nullable(),
  photoId: z.uuid().nullable(),
  version: z.int(),
});
export type ListingRow = z.infer<typeof listingRow>;

export const listListings = contract({
  id: 'listings.list',
  method: 'GET',
  path: '/workspaces/{workspace}/listings',
  summary: 'Animals that are or could be for sale: hatchlings, and what was ever priced',
  access: { scope: 'workspace', action: 'listing.see' },
  query: z.object({
    ...pageQuery,
    search: z.string().trim().max(80).optional(),
    state: listingState.optional(),
    project: projectId.optional(),
  }),
  response: pageOf(listingRow),
});

export const priceAnimal = contract({
  id: 'listings.set',
  method: 'PUT',
  path: '/workspaces/{workspace}/listings/{animal}',
  summary: 'Give an animal a price and a listing state, or hold it for somebody',
  access: { scope: 'workspace', action: 'listing.edit' },
  params: inWorkspace.extend({ animal: animalId }),
  body: z
    .object({
      state: listingState.exclude(['invoiced', 'sold']),
      price: minorUnits.min(0, 'A price is not negative.').nullable(),
      headline: z.string().trim().max(200).default(''),
      heldFor: contactId.nullable().default(null),
      heldUntil: isoDay.nullable().default(null),
      /** 0 when the animal was never priced. */
      version: z.int().min(0),
    })
    .refine(({ state, price }) => state !== 'listed' || price !== null, {
      error: 'Give the price it is offered at.',
      path: ['price'],
    })
    .refine(({ state, heldFor }) => state !== 'held' || heldFor !== null, {
      error: 'Say whom it is held for.',
      path: ['heldFor'],
    }),
  response: listingRow,
});

const invoiceLine = z.object({
  kind: z.enum(['animal', 'shipping', 'discount']),
  animalId: animalId.nullable(),
  description: z.string(),
  amount: minorUnits,
});
const instalment = z.object({ label: z.string(), dueOn: isoDay, amount: minorUnits, open: minorUnits });

export const invoiceRow = z.object({
  id: invoiceId,
  number: z.string().nullable(),
  status: invoiceStatus,
  contact: z.object({ id: contactId, name: z.string() }),
  animals: z.array(z.string()),
  total: minorUnits,
  paid: minorUnits,
  refunded: minorUnits,
  issuedOn: isoDay.nullable(),
  nextDueOn: isoDay.nullable(),
  overdue: z.boolean(),
});
export type InvoiceRow = z.infer<typeof invoiceRow>;

export const listInvoices = contract({
  id: 'invoices.list',
  method: 'GET',
  path: '/workspaces/{workspace}/invoices',
  summary: 'Invoices, newest first',
  access: { scope: 'workspace', action: 'invoice.see' },
  query: z.object({
    ...pageQuery,
    search: z.string().trim().max(80).optional(),
    status: invoiceStatus.optional(),
    overdue: z.enum(['yes']).optional(),
  }),
  response: pageOf(invoiceRow),
});

const paymentRow = z.object({
  id: paymentId,
  method: paymentMethod,
  amount: minorUnits,
  fee: minorUnits,
  receivedOn: isoDay,
  reference: z.string(),
  refunded: minorUnits,
});

export const invoiceDetail = invoiceRow.extend({
  version: z.int(),
  currency: z.string(),
  taxBasisPoints: z.int(),
  subtotal: minorUnits,
  discount: minorUnits,
  shipping: minorUnits,
  tax: minorUnits,
  deliveredOn: isoDay.nullable(),
  note: z.string(),
  lines: z.array(invoiceLine),
  instalments: z.array(instalment),
  payments: z.array(paymentRow),
  refunds: z.array(
    z.object({
      id: refundId,
      paymentId,
      amount: minorUnits,
      reason: z.string(),
      status: z.enum(['pending', 'succeeded', 'failed']),
      refundedOn: isoDay,
    }),
  ),
  buyerEmail: z.string().nullable(),
});
export type InvoiceDetail = z.infer<typeof invoiceDetail>;

export const showInvoice = contract({
  id: 'invoices.show',
  method: 'GET',
  path: '/workspaces/{workspace}/invoices/{invoice}',
  summary: 'An invoice with its lines, due dates, payments and refunds',
  access: { scope: 'workspace', action: 'invoice.see' },
  params: inInvoice,
  response: invoiceDetail,
});

export const invoiceDraft = z
  .object({
    contactId,
    animals: z
      .array(z.object({ animalId, price: minorUnits.min(1, 'A price above zero.') }))
      .min(1, 'Choose at least one animal.')
      .max(40),
    shipping: minorUnits.min(0).default(0),
    discount: minorUnits.min(0).default(0),
    taxBasisPoints: z.int().min(0).max(5000),
    /** Due first; 0 = no deposit. */
    deposit: minorUnits.min(0).default(0),
    depositDueOn: isoDay.nullable().default(null),
    balanceDueOn: isoDay,
    note: z.string().trim().max(2000).default(''),
  })
  .refine(({ deposit, depositDueOn }) => deposit === 0 || depositDueOn !== null, {
    error: 'Say when the deposit is due.',
    path: ['depositDueOn'],
  })
  .refine(({ depositDueOn, balanceDueOn }) => depositDueOn === null || depositDueOn <= balanceDueOn, {
    error: 'The balance is due on or after the day of the deposit.',
    path: ['balanceDueOn'],
  });
export type InvoiceDraft = z.infer<typeof invoiceDraft>;

export const createInvoice = contract({
  id: 'invoices.create',
  method: 'POST',
  path: '/workspaces/{workspace}/invoices',
  summary: 'Draft an invoice to a buyer',
  access: { scope: 'workspace', action: 'invoice.edit' },
  body: invoiceDraft,
  response: z.object({ id: invoiceId }),
  idempotent: true,
});

export const voidInvoice = contract({
  id: 'invoices.void',
  method: 'POST',
  path: '/workspaces/{workspace}/invoices/{invoice}/voiding',
  summary: 'Void an invoice on which nothing was paid; its number stays taken',
  access: { scope: 'workspace', action: 'invoice.edit' },
  params: inInvoice,
  body: z.object({ version: z.int(), reason: z.string().trim().min(1, 'Give the reason.').max(500) }),
  response: z.object({ version: z.int() }),
});
