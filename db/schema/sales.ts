import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  smallint,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import type {
  AnimalId,
  ContactId,
  InvoiceId,
  ListingId,
  MemberId,
  PaymentId,
  ProjectId,
  RefundId,
} from '@/lib/contracts/ids';
import type {
  ContactAddress,
  ContactEventKind,
  InvoiceStatus,
  ListingState,
  PaymentMethod,
} from '@/lib/contracts/sale-states';
import { animals } from './collection';
import {
  announcedEmail,
  announcedLink,
  createdAt,
  day,
  minorUnits,
  moment,
  tenantPolicy,
  versionColumn,
  workspaceColumn,
} from './columns';
import { projects } from './projects';
import { members, workspaces } from './workspace';

export const contacts = pgTable(
  'contacts',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<ContactId>().notNull().defaultRandom(),
    name: text('name').notNull(),
    email: text('email'),
    phone: text('phone').notNull().default(''),
    address: jsonb('address').$type<ContactAddress>().notNull(),
    kind: text('kind')
      .$type<'buyer' | 'breeder' | 'veterinarian' | 'supplier' | 'carrier' | 'other'>()
      .notNull()
      .default('buyer'),
    tags: text('tags')
      .array()
      .notNull()
      .default(sql`'{}'::text[]`),
    note: text('note').notNull().default(''),
    followUpOn: day('follow_up_on'),
    followUpNote: text('follow_up_note').notNull().default(''),
    followUpReminderSentOn: day('follow_up_reminder_sent_on'),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('contacts_email').on(sql`lower(${t.email})`),
    index('contacts_follow_up').on(t.workspaceId, t.followUpOn),
    tenantPolicy('contacts', sql`lower(email) = ${announcedEmail}`),
  ],
);

export const contactEvents = pgTable(
  'contact_events',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    contactId: uuid('contact_id').$type<ContactId>().notNull(),
    kind: text('kind').$type<ContactEventKind>().notNull(),
    body: text('body').notNull(),
    happenedAt: moment('happened_at').notNull().defaultNow(),
    recordedBy: uuid('recorded_by').$type<MemberId>(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('contact_events_contact').on(t.workspaceId, t.contactId, t.happenedAt),
    foreignKey({
      name: 'contact_events_contact_fk',
      columns: [t.workspaceId, t.contactId],
      foreignColumns: [contacts.workspaceId, contacts.id],
    }),
    foreignKey({
      name: 'contact_events_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('contact_events'),
  ],
);

/** An animal's standing on the market: one row per animal that was ever priced. */
export const listings = pgTable(
  'listings',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<ListingId>().notNull().defaultRandom(),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    state: text('state').$type<ListingState>().notNull().default('not_listed'),
    price: minorUnits('price'),
    headline: text('headline').notNull().default(''),
    heldFor: uuid('held_for').$type<ContactId>(),
    heldUntil: moment('held_until'),
    version: versionColumn(),
    updatedAt: moment('updated_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('listings_animal').on(t.workspaceId, t.animalId),
    foreignKey({
      name: 'listings_animal_fk',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'listings_held_for',
      columns: [t.workspaceId, t.heldFor],
      foreignColumns: [contacts.workspaceId, contacts.id],
    }),
    check('listings_price', sql`${t.price} is null or ${t.price} between 0 and 9007199254740991`),
    tenantPolicy('listings'),
  ],
);

export const invoices = pgTable(
  'invoices',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<InvoiceId>().notNull().defaultRandom(),
    /** Given when it is sent; gapless per workspace. */
    number: text('number'),
    contactId: uuid('contact_id').$type<ContactId>().notNull(),
    status: text('status').$type<InvoiceStatus>().notNull().default('draft'),
    currency: text('currency').notNull(),
    taxBasisPoints: integer('tax_basis_points').notNull().default(0),
    subtotal: minorUnits('subtotal').notNull(),
    shipping: minorUnits('shipping').notNull().default(0),
    discount: minorUnits('discount').notNull().default(0),
    tax: minorUnits('tax').notNull(),
    total: minorUnits('total').notNull(),
    paid: minorUnits('paid').notNull().default(0),
    refunded: minorUnits('refunded').notNull().default(0),
    issuedOn: day('issued_on'),
    sentAt: moment('sent_at'),
    deliveredOn: day('delivered_on'),
    voidedAt: moment('voided_at'),
    note: text('note').notNull().default(''),
    /** SHA-256 of the secret in the buyer's link. */
    linkHash: text('link_hash').unique(),
    createdBy: uuid('created_by').$type<MemberId>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('invoices_number').on(t.workspaceId, t.number),
    index('invoices_contact').on(t.workspaceId, t.contactId),
    foreignKey({
      name: 'invoices_contact_fk',
      columns: [t.workspaceId, t.contactId],
      foreignColumns: [contacts.workspaceId, contacts.id],
    }),
    foreignKey({
      name: 'invoices_created_by',
      columns: [t.workspaceId, t.createdBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check(
      'invoices_adds_up',
      sql`${t.subtotal} - ${t.discount} + ${t.shipping} + ${t.tax} = ${t.total} and ${t.total} between 0 and 9007199254740991`,
    ),
    check('invoices_paid', sql`${t.paid} >= 0 and ${t.refunded} between 0 and ${t.paid}`),
    tenantPolicy('invoices', sql`link_hash = ${announcedLink}`),
  ],
);

export const invoiceLines = pgTable(
  'invoice_lines',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    invoiceId: uuid('invoice_id').$type<InvoiceId>().notNull(),
    position: smallint('position').notNull(),
    kind: text('kind').$type<'animal' | 'shipping' | 'discount'>().notNull(),
    animalId: uuid('animal_id').$type<AnimalId>(),
    projectId: uuid('project_id').$type<ProjectId>(),
    description: text('description').notNull(),
    amount: minorUnits('amount').notNull(),
    taxed: integer('taxed').notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('invoice_lines_position').on(t.workspaceId, t.invoiceId, t.position),
    index('invoice_lines_animal').on(t.workspaceId, t.animalId),
    foreignKey({
      name: 'invoice_lines_invoice',
      columns: [t.workspaceId, t.invoiceId],
      foreignColumns: [invoices.workspaceId, invoices.id],
    }),
    foreignKey({
      name: 'invoice_lines_animal_fk',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'invoice_lines_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    check('invoice_lines_animal_named', sql`(${t.kind} = 'animal') = (${t.animalId} is not null)`),
    tenantPolicy('invoice_lines'),
  ],
);

/** What of an invoice is due when: a deposit and the balance, or instalments. */
export const instalments = pgTable(
  'instalments',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    invoiceId: uuid('invoice_id').$type<InvoiceId>().notNull(),
    position: smallint('position').notNull(),
    label: text('label').notNull(),
    dueOn: day('due_on').notNull(),
    amount: minorUnits('amount').notNull(),
    reminderSentOn: day('reminder_sent_on'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('instalments_position').on(t.workspaceId, t.invoiceId, t.position),
    foreignKey({
      name: 'instalments_invoice',
      columns: [t.workspaceId, t.invoiceId],
      foreignColumns: [invoices.workspaceId, invoices.id],
    }),
    check('instalments_positive', sql`${t.amount} > 0`),
    tenantPolicy('instalments'),
  ],
);

/** An attempt to pay by card at the payment service; money counts only once a payment row exists. */
export const checkouts = pgTable(
  'checkouts',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    invoiceId: uuid('invoice_id').$type<InvoiceId>().notNull(),
    attempt: integer('attempt').notNull(),
    amount: minorUnits('amount').notNull(),
    sessionId: text('session_id').unique(),
    url: text('url'),
    status: text('status').$type<'open' | 'complete' | 'expired'>().notNull().default('open'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('checkouts_attempt').on(t.workspaceId, t.invoiceId, t.attempt),
    foreignKey({
      name: 'checkouts_invoice',
      columns: [t.workspaceId, t.invoiceId],
      foreignColumns: [invoices.workspaceId, invoices.id],
    }),
    tenantPolicy('checkouts'),
  ],
);

export const payments = pgTable(
  'payments',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<PaymentId>().notNull().defaultRandom(),
    invoiceId: uuid('invoice_id').$type<InvoiceId>().notNull(),
    method: text('method').$type<PaymentMethod>().notNull(),
    amount: minorUnits('amount').notNull(),
    fee: minorUnits('fee').notNull().default(0),
    receivedOn: day('received_on').notNull(),
    recordedAt: moment('recorded_at').notNull().defaultNow(),
    /** Identifiers at the payment service; one business fact, one row. */
    intentId: text('intent_id').unique(),
    chargeId: text('charge_id').unique(),
    balanceTransactionId: text('balance_transaction_id').unique(),
    reference: text('reference').notNull().default(''),
    recordedBy: uuid('recorded_by').$type<MemberId>(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('payments_invoice').on(t.workspaceId, t.invoiceId),
    foreignKey({
      name: 'payments_invoice_fk',
      columns: [t.workspaceId, t.invoiceId],
      foreignColumns: [invoices.workspaceId, invoices.id],
    }),
    foreignKey({
      name: 'payments_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('payments_positive', sql`${t.amount} > 0 and ${t.fee} >= 0`),
    tenantPolicy('payments'),
  ],
);

export const refunds = pgTable(
  'refunds',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<RefundId>().notNull().defaultRandom(),
    paymentId: uuid('payment_id').$type<PaymentId>().notNull(),
    invoiceId: uuid('invoice_id').$type<InvoiceId>().notNull(),
    amount: minorUnits('amount').notNull(),
    reason: text('reason').notNull(),
    status: text('status').$type<'pending' | 'succeeded' | 'failed'>().notNull(),
    serviceRefundId: text('service_refund_id').unique(),
    refundedOn: day('refunded_on').notNull(),
    recordedBy: uuid('recorded_by').$type<MemberId>(),
    recordedAt: moment('recorded_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    foreignKey({
      name: 'refunds_payment',
      columns: [t.workspaceId, t.paymentId],
      foreignColumns: [payments.workspaceId, payments.id],
    }),
    foreignKey({
      name: 'refunds_invoice',
      columns: [t.workspaceId, t.invoiceId],
      foreignColumns: [invoices.workspaceId, invoices.id],
    }),
    foreignKey({
      name: 'refunds_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('refunds_positive', sql`${t.amount} > 0`),
    tenantPolicy('refunds'),
  ],
);

/** Every event that the payment service sent, once each, whatever it was about. */
export const paymentServiceEvents = pgTable(
  'payment_service_events',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    eventId: text('event_id').notNull(),
    type: text('type').notNull(),
    objectId: text('object_id').notNull(),
    receivedAt: moment('received_at').notNull().defaultNow(),
    outcome: text('outcome').notNull(),
  },
  (t) => [primaryKey({ columns: [t.workspaceId, t.eventId] }), tenantPolicy('payment_service_events')],
);
