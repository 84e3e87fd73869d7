import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgPolicy,
  pgTable,
  primaryKey,
  smallint,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import type { InvitationId, MemberId, PartyId, ProjectId, UserId, WorkspaceId } from '@/lib/contracts/ids';
import type { Role } from '@/lib/contracts/roles';
import type { WorkspaceLimits } from '@/lib/contracts/workspace';
import { users } from './auth';
import {
  announcedLink,
  announcedPerson,
  createdAt,
  day,
  moment,
  tenantPolicy,
  versionColumn,
  workspaceColumn,
} from './columns';

export const workspaces = pgTable(
  'workspaces',
  {
    id: uuid('id').$type<WorkspaceId>().primaryKey().defaultRandom(),
    slug: text('slug').notNull().unique(),
    name: text('name').notNull(),
    facilityName: text('facility_name').notNull().default(''),
    /** ISO 4217; fixed when the first entry is posted. */
    currency: text('currency').notNull().default('USD'),
    timeZone: text('time_zone').notNull().default('UTC'),
    temperatureUnit: text('temperature_unit').$type<'C' | 'F'>().notNull().default('C'),
    /** Sales tax in basis points that new invoices start with; 0 = not registered. */
    salesTaxBasisPoints: integer('sales_tax_basis_points').notNull().default(0),
    /** When a sale is split: as each payment arrives (cash method) or once the animal is delivered. */
    recognition: text('recognition').$type<'on_receipt' | 'on_delivery'>().notNull().default('on_receipt'),
    invoicePrefix: text('invoice_prefix').notNull().default(''),
    nextInvoiceNumber: integer('next_invoice_number').notNull().default(1),
    nextEntryNumber: integer('next_entry_number').notNull().default(1),
    limits: jsonb('limits').$type<WorkspaceLimits>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  () => [
    pgPolicy('workspaces_tenant', {
      as: 'permissive',
      for: 'all',
      to: 'public',
      using: sql`id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or exists (select 1 from members m where m.workspace_id = workspaces.id and m.user_id = ${announcedPerson} and m.ended_at is null) or current_setting('moiety.system', true) = 'on'`,
      withCheck: sql`id = nullif(current_setting('moiety.workspace_id', true), '')::uuid`,
    }),
  ],
);

/** Whoever can hold parts and be owed money: a partner, or the house itself. May or may not sign in. */
export const parties = pgTable(
  'parties',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<PartyId>().notNull().defaultRandom(),
    name: text('name').notNull(),
    kind: text('kind').$type<'partner' | 'house'>().notNull().default('partner'),
    /** Which of the eight partner marks (colour and pattern) draws this party, 0–7. */
    mark: smallint('mark').notNull(),
    email: text('email'),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('parties_name').on(t.workspaceId, t.name),
    check('parties_mark', sql`${t.mark} between 0 and 7`),
    tenantPolicy('parties'),
  ],
);

export const members = pgTable(
  'members',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<MemberId>().notNull().defaultRandom(),
    userId: text('user_id')
      .$type<UserId>()
      .notNull()
      .references(() => users.id),
    role: text('role').$type<Role>().notNull(),
    /** The party this person acts for; owners and partners have one. */
    partyId: uuid('party_id').$type<PartyId>(),
    joinedAt: moment('joined_at').notNull().defaultNow(),
    endedAt: moment('ended_at'),
    version: versionColumn(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    uniqueIndex('members_one_per_person')
      .on(t.workspaceId, t.userId)
      .where(sql`ended_at is null`),
    index('members_user').on(t.userId),
    foreignKey({
      name: 'members_party',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    check('members_role', sql`${t.role} in ('owner', 'partner', 'keeper', 'accountant')`),
    tenantPolicy('members', sql`user_id = ${announcedPerson}`),
  ],
);

export const invitations = pgTable(
  'invitations',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<InvitationId>().notNull().defaultRandom(),
    email: text('email').notNull(),
    role: text('role').$type<Role>().notNull(),
    partyId: uuid('party_id').$type<PartyId>(),
    projectIds: jsonb('project_ids').$type<ProjectId[]>().notNull().default([]),
    tokenHash: text('token_hash').notNull().unique(),
    invitedBy: uuid('invited_by').$type<MemberId>().notNull(),
    expiresAt: moment('expires_at').notNull(),
    acceptedAt: moment('accepted_at'),
    revokedAt: moment('revoked_at'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    foreignKey({
      name: 'invitations_party',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'invitations_invited_by',
      columns: [t.workspaceId, t.invitedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('invitations', sql`token_hash = ${announcedLink}`),
  ],
);

/** Days on which the ledger is closed, from the first day to `through`. */
export const closedPeriods = pgTable(
  'closed_periods',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    fromDay: day('from_day').notNull(),
    throughDay: day('through_day').notNull(),
    closedBy: uuid('closed_by').$type<MemberId>().notNull(),
    closedAt: moment('closed_at').notNull().defaultNow(),
    reopenedAt: moment('reopened_at'),
    reopenReason: text('reopen_reason'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    foreignKey({
      name: 'closed_periods_by',
      columns: [t.workspaceId, t.closedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('closed_periods_order', sql`${t.fromDay} <= ${t.throughDay}`),
    tenantPolicy('closed_periods'),
  ],
);
