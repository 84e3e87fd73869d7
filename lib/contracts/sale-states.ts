import { z } from 'zod';

export const listingState = z.enum(['not_listed', 'listed', 'held', 'invoiced', 'sold', 'kept']);
export type ListingState = z.infer<typeof listingState>;

export const invoiceStatus = z.enum(['draft', 'sent', 'part_paid', 'paid', 'refunded', 'void']);
export type InvoiceStatus = z.infer<typeof invoiceStatus>;

export const paymentMethod = z.enum(['card', 'bank_transfer', 'cash']);
export type PaymentMethod = z.infer<typeof paymentMethod>;

export const contactEventKind = z.enum([
  'inquiry',
  'mail',
  'call',
  'meeting',
  'note',
  'invoice',
  'payment',
  'delivery',
]);
export type ContactEventKind = z.infer<typeof contactEventKind>;

export const contactAddress = z.object({
  street: z.string().max(200),
  postcode: z.string().max(20),
  town: z.string().max(120),
  region: z.string().max(120),
  country: z.string().max(80),
});
export type ContactAddress = z.infer<typeof contactAddress>;
