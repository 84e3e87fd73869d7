import { z } from 'zod';
import { contract, fileAnswer, isoDay, minorUnits } from './contract';
import { animalId, invoiceId, photoId } from './ids';
import { invoiceStatus } from './sale-states';

/** The secret of the link that was mailed, or, for a signed-in buyer, the invoice's id. */
export const invoiceKey = z.union([z.string().regex(/^[A-Za-z0-9_-]{43}$/), invoiceId]);
const withKey = z.object({ invoice: invoiceKey });

/** What a buyer sees of an invoice: never who owns the animals. */
export const buyerInvoice = z.object({
  number: z.string(),
  seller: z.string(),
  buyer: z.string(),
  status: invoiceStatus,
  currency: z.string(),
  issuedOn: isoDay,
  animals: z.array(
    z.object({
      id: animalId,
      code: z.string(),
      description: z.string(),
      species: z.string(),
      sex: z.enum(['male', 'female', 'unknown']),
      hatchedOn: isoDay.nullable(),
      photoId: photoId.nullable(),
      amount: minorUnits,
    }),
  ),
  subtotal: minorUnits,
  discount: minorUnits,
  shipping: minorUnits,
  tax: minorUnits,
  total: minorUnits,
  paid: minorUnits,
  refunded: minorUnits,
  /** What is due next, and what it would be to pay all of the rest. */
  due: z.object({ label: z.string(), amount: minorUnits, on: isoDay }).nullable(),
  open: minorUnits,
  instalments: z.array(z.object({ label: z.string(), dueOn: isoDay, amount: minorUnits, open: minorUnits })),
  payments: z.array(z.object({ receivedOn: isoDay, amount: minorUnits, method: z.string() })),
  deliveredOn: isoDay.nullable(),
  note: z.string(),
});
export type BuyerInvoice = z.infer<typeof buyerInvoice>;

export const showBuyerInvoice = contract({
  id: 'buyer.invoices.show',
  method: 'GET',
  path: '/buyer/invoices/{invoice}',
  summary: 'An invoice as its buyer sees it, by the mailed link or signed in',
  access: { scope: 'public' },
  params: withKey,
  response: buyerInvoice,
});

export const payBuyerInvoice = contract({
  id: 'buyer.invoices.pay',
  method: 'POST',
  path: '/buyer/invoices/{invoice}/checkouts',
  summary: 'Start a card payment of what is due next or of all that is open; answers where to pay',
  access: { scope: 'public' },
  params: withKey,
  body: z.object({ what: z.enum(['due', 'all']) }),
  response: z.object({ url: z.url() }),
});

export const buyerInvoicePdf = contract({
  id: 'buyer.invoices.pdf',
  method: 'GET',
  path: '/buyer/invoices/{invoice}/pdf',
  summary: 'The invoice as PDF, for its buyer',
  access: { scope: 'public' },
  params: withKey,
  response: fileAnswer,
  produces: 'application/pdf',
});

export const buyerPhoto = contract({
  id: 'buyer.photos.show',
  method: 'GET',
  path: '/buyer/invoices/{invoice}/photos/{photo}',
  summary: 'A photo of an animal on the invoice',
  access: { scope: 'public' },
  params: withKey.extend({ photo: photoId }),
  response: fileAnswer,
  produces: 'image/webp',
});

export const animalPapers = contract({
  id: 'buyer.papers.show',
  method: 'GET',
  path: '/buyer/invoices/{invoice}/animals/{animal}/papers',
  summary: 'The papers of an animal on the invoice: identity, lineage, what it carries and how that is known, weights',
  access: { scope: 'public' },
  params: withKey.extend({ animal: animalId }),
  response: fileAnswer,
  produces: 'application/pdf',
});

export const listMyInvoices = contract({
  id: 'buyer.invoices.list',
  method: 'GET',
  path: '/buyer/invoices',
  summary: 'The invoices that were sent to the signed-in person\'s address',
  access: { scope: 'person' },
  response: z.object({
    invoices: z.array(
      z.object({ id: invoiceId, number: z.string(), seller: z.string(), status: invoiceStatus, currency: z.string(), total: minorUnits, paid: minorUnits, refunded: minorUnits, issuedOn: isoDay }),
    ),
  }),
});
