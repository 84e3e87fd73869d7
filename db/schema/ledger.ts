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
  type AnyPgColumn,
} from 'drizzle-orm/pg-core';
import type {
  AccountId,
  AnimalId,
  ClutchId,
  EntryId,
  ExpenseId,
  InvoiceId,
  MemberId,
  PartyId,
  PaymentId,
  ProjectId,
  RefundId,
  SettlementId,
  TermsId,
} from '@/lib/contracts/ids';
import type { AccountPurpose, AccountType, EntryCauseKind } from '@/lib/contracts/ledger-kinds';
import { createdAt, day, minorUnits, moment, tenantPolicy, versionColumn, workspaceColumn } from './columns';
import { projects, termsVersions } from './projects';
import { invoices, payments, refunds } from './sales';
import { members, parties, workspaces } from './workspace';

export const accounts = pgTable(
  'accounts',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<AccountId>().notNull().defaultRandom(),
    /** Set by the accountant. */
    code: text('code').notNull(),
    name: text('name').notNull(),
    type: text('type').$type<AccountType>().notNull(),
    /** What the product uses the account for; with a party for what is due to or from it. */
    purpose: text('purpose').$type<AccountPurpose>().notNull(),
    partyId: uuid('party_id').$type<PartyId>(),
    version: versionColumn(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('accounts_code').on(t.workspaceId, t.code),
    unique('accounts_purpose').on(t.workspaceId, t.purpose, t.partyId).nullsNotDistinct(),
    foreignKey({
      name: 'accounts_party',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    check('accounts_type', sql`${t.type} in ('asset', 'liability', 'equity', 'revenue', 'expense')`),
    tenantPolicy('accounts'),
  ],
);

/** A journal entry. Only ever added: a correction is a reversal and a new entry. */
export const entries = pgTable(
  'entries',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<EntryId>().notNull().defaultRandom(),
    number: integer('number').notNull(),
    /** The day of the event itself, and the day under which it stands in the books. */
    eventOn: day('event_on').notNull(),
    postedOn: day('posted_on').notNull(),
    recordedAt: moment('recorded_at').notNull().defaultNow(),
    causeKind: text('cause_kind').$type<EntryCauseKind>().notNull(),
    causeId: uuid('cause_id').notNull(),
    memo: text('memo').notNull(),
    reversesId: uuid('reverses_id').$type<EntryId>(),
    recordedBy: uuid('recorded_by').$type<MemberId>(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('entries_number').on(t.workspaceId, t.number),
    unique('entries_reversed_once').on(t.workspaceId, t.reversesId),
    index('entries_posted').on(t.workspaceId, t.postedOn),
    index('entries_cause').on(t.workspaceId, t.causeKind, t.causeId),
    foreignKey({
      name: 'entries_reverses',
      columns: [t.workspaceId, t.reversesId],
      foreignColumns: [t.workspaceId, t.id] as [AnyPgColumn, AnyPgColumn],
    }),
    foreignKey({
      name: 'entries_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('entries'),
  ],
);

export const postings = pgTable(
  'postings',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    entryId: uuid('entry_id').$type<EntryId>().notNull(),
    line: smallint('line').notNull(),
    accountId: uuid('account_id').$type<AccountId>().notNull(),
    side: text('side').$type<'debit' | 'credit'>().notNull(),
    amount: minorUnits('amount').notNull(),
    currency: text('currency').notNull(),
    partyId: uuid('party_id').$type<PartyId>(),
    projectId: uuid('project_id').$type<ProjectId>(),
    animalId: uuid('animal_id').$type<AnimalId>(),
    /** Why this amount: the step of the split, weights, quota and the rounding unit, in words. */
    why: text('why').notNull().default(''),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.entryId, t.line] }),
    index('postings_account').on(t.workspaceId, t.accountId),
    index('postings_party').on(t.workspaceId, t.partyId),
    foreignKey({
      name: 'postings_entry',
      columns: [t.workspaceId, t.entryId],
      foreignColumns: [entries.workspaceId, entries.id],
    }),
    foreignKey({
      name: 'postings_account_fk',
      columns: [t.workspaceId, t.accountId],
      foreignColumns: [accounts.workspaceId, accounts.id],
    }),
    foreignKey({
      name: 'postings_party_fk',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'postings_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    check('postings_amount', sql`${t.amount} between 1 and 9007199254740991`),
    check('postings_side', sql`${t.side} in ('debit', 'credit')`),
    tenantPolicy('postings'),
  ],
);

/** How a payment (or the undoing of one) for one animal was split, step by step, as it was posted. */
export const saleSplits = pgTable(
  'sale_splits',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    invoiceId: uuid('invoice_id').$type<InvoiceId>().notNull(),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    paymentId: uuid('payment_id').$type<PaymentId>(),
    refundId: uuid('refund_id').$type<RefundId>(),
    termsId: uuid('terms_id').$type<TermsId>(),
    entryId: uuid('entry_id').$type<EntryId>().notNull(),
    split: jsonb('split').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('sale_splits_invoice').on(t.workspaceId, t.invoiceId),
    foreignKey({
      name: 'sale_splits_invoice_fk',
      columns: [t.workspaceId, t.invoiceId],
      foreignColumns: [invoices.workspaceId, invoices.id],
    }),
    foreignKey({
      name: 'sale_splits_payment',
      columns: [t.workspaceId, t.paymentId],
      foreignColumns: [payments.workspaceId, payments.id],
    }),
    foreignKey({
      name: 'sale_splits_refund',
      columns: [t.workspaceId, t.refundId],
      foreignColumns: [refunds.workspaceId, refunds.id],
    }),
    foreignKey({
      name: 'sale_splits_terms',
      columns: [t.workspaceId, t.termsId],
      foreignColumns: [termsVersions.workspaceId, termsVersions.id],
    }),
    foreignKey({
      name: 'sale_splits_entry',
      columns: [t.workspaceId, t.entryId],
      foreignColumns: [entries.workspaceId, entries.id],
    }),
    tenantPolicy('sale_splits'),
  ],
);

export const expenses = pgTable(
  'expenses',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<ExpenseId>().notNull().defaultRandom(),
    spentOn: day('spent_on').notNull(),
    description: text('description').notNull(),
    category: text('category')
      .$type<'feed' | 'veterinary' | 'equipment' | 'power' | 'shipping' | 'other'>()
      .notNull(),
    amount: minorUnits('amount').notNull(),
    /** Who paid; the house when null. */
    paidBy: uuid('paid_by').$type<PartyId>(),
    inKind: integer('in_kind').notNull().default(0),
    projectId: uuid('project_id').$type<ProjectId>(),
    animalId: uuid('animal_id').$type<AnimalId>(),
    clutchId: uuid('clutch_id').$type<ClutchId>(),
    /** What sales have paid back of it so far, for costs that the terms recover first. */
    recovered: minorUnits('recovered').notNull().default(0),
    recordedBy: uuid('recorded_by').$type<MemberId>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('expenses_project').on(t.workspaceId, t.projectId),
    foreignKey({
      name: 'expenses_paid_by',
      columns: [t.workspaceId, t.paidBy],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'expenses_project_fk',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'expenses_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('expenses_amounts', sql`${t.amount} > 0 and ${t.recovered} between 0 and ${t.amount}`),
    tenantPolicy('expenses'),
  ],
);

export const settlements = pgTable(
  'settlements',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<SettlementId>().notNull().defaultRandom(),
    number: integer('number').notNull(),
    fromDay: day('from_day').notNull(),
    throughDay: day('through_day').notNull(),
    projectId: uuid('project_id').$type<ProjectId>(),
    status: text('status')
      .$type<'proposed' | 'agreed' | 'paid' | 'withdrawn'>()
      .notNull()
      .default('proposed'),
    /** Statements and transfers as they were computed; `hash` is the SHA-256 of its canonical JSON. */
    snapshot: jsonb('snapshot').notNull(),
    hash: text('hash').notNull(),
    createdBy: uuid('created_by').$type<MemberId>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('settlements_number').on(t.workspaceId, t.number),
    foreignKey({
      name: 'settlements_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'settlements_by',
      columns: [t.workspaceId, t.createdBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('settlements'),
  ],
);

export const settlementDecisions = pgTable(
  'settlement_decisions',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    settlementId: uuid('settlement_id').$type<SettlementId>().notNull(),
    partyId: uuid('party_id').$type<PartyId>().notNull(),
    decision: text('decision').$type<'agreed' | 'change_asked'>().notNull(),
    comment: text('comment').notNull().default(''),
    decidedBy: uuid('decided_by').$type<MemberId>().notNull(),
    decidedAt: moment('decided_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.settlementId, t.partyId] }),
    foreignKey({
      name: 'settlement_decisions_settlement',
      columns: [t.workspaceId, t.settlementId],
      foreignColumns: [settlements.workspaceId, settlements.id],
    }),
    foreignKey({
      name: 'settlement_decisions_party',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'settlement_decisions_by',
      columns: [t.workspaceId, t.decidedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('settlement_decisions'),
  ],
);

/** Who pays whom in a settlement; from or to the house's bank when the party is null. */
export const settlementTransfers = pgTable(
  'settlement_transfers',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    settlementId: uuid('settlement_id').$type<SettlementId>().notNull(),
    fromParty: uuid('from_party').$type<PartyId>(),
    toParty: uuid('to_party').$type<PartyId>(),
    amount: minorUnits('amount').notNull(),
    paidOn: day('paid_on'),
    reference: text('reference').notNull().default(''),
    entryId: uuid('entry_id').$type<EntryId>(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    foreignKey({
      name: 'settlement_transfers_settlement',
      columns: [t.workspaceId, t.settlementId],
      foreignColumns: [settlements.workspaceId, settlements.id],
    }),
    foreignKey({
      name: 'settlement_transfers_from',
      columns: [t.workspaceId, t.fromParty],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'settlement_transfers_to',
      columns: [t.workspaceId, t.toParty],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'settlement_transfers_entry',
      columns: [t.workspaceId, t.entryId],
      foreignColumns: [entries.workspaceId, entries.id],
    }),
    check('settlement_transfers_positive', sql`${t.amount} > 0`),
    tenantPolicy('settlement_transfers'),
  ],
);
