import {
  bigserial,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import { sql } from 'drizzle-orm';
import type { ContactId, MailId, MemberId, NotificationId, WorkspaceId } from '@/lib/contracts/ids';
import { createdAt, moment, tenantPolicy, workspaceColumn } from './columns';
import { members, workspaces } from './workspace';

/** Who did what when and why; rows are only added, and each carries the hash of the one before it. */
export const auditLog = pgTable(
  'audit_log',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    sequence: bigserial('sequence', { mode: 'number' }).notNull(),
    at: timestamp('at', { withTimezone: true, mode: 'string', precision: 3 }).notNull(),
    /** Null when the product itself acted (a payment arrived, a job ran). */
    memberId: uuid('member_id').$type<MemberId>(),
    actor: text('actor').notNull(),
    action: text('action').notNull(),
    subjectKind: text('subject_kind').notNull(),
    subjectId: text('subject_id').notNull(),
    detail: jsonb('detail').$type<Record<string, unknown>>().notNull(),
    reason: text('reason').notNull().default(''),
    previousHash: text('previous_hash').notNull(),
    hash: text('hash').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.sequence] }),
    index('audit_log_subject').on(t.workspaceId, t.subjectKind, t.subjectId),
    foreignKey({
      name: 'audit_log_member',
      columns: [t.workspaceId, t.memberId],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('audit_log'),
  ],
);

/** What members say to each other about a thing. */
export const comments = pgTable(
  'comments',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    subjectKind: text('subject_kind').$type<'pairing' | 'terms' | 'settlement'>().notNull(),
    subjectId: uuid('subject_id').notNull(),
    memberId: uuid('member_id').$type<MemberId>().notNull(),
    body: text('body').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('comments_subject').on(t.workspaceId, t.subjectKind, t.subjectId, t.createdAt),
    foreignKey({
      name: 'comments_member',
      columns: [t.workspaceId, t.memberId],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('comments'),
  ],
);

/** What a member is told in the product. */
export const notifications = pgTable(
  'notifications',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<NotificationId>().notNull().defaultRandom(),
    memberId: uuid('member_id').$type<MemberId>().notNull(),
    kind: text('kind').notNull(),
    title: text('title').notNull(),
    body: text('body').notNull().default(''),
    /** Path inside the workspace, such as "season/…". */
    href: text('href').notNull(),
    createdAt: createdAt(),
    readAt: moment('read_at'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('notifications_member').on(t.workspaceId, t.memberId, t.createdAt),
    foreignKey({
      name: 'notifications_member_fk',
      columns: [t.workspaceId, t.memberId],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('notifications'),
  ],
);

/** Every mail, from the moment it is asked for; a job sends it. Workspace null: mail of the sign-in. */
export const mails = pgTable(
  'mails',
  {
    id: uuid('id').$type<MailId>().primaryKey().defaultRandom(),
    workspaceId: uuid('workspace_id').$type<WorkspaceId>(),
    contactId: uuid('contact_id').$type<ContactId>(),
    template: text('template').notNull(),
    recipient: text('recipient').notNull(),
    subject: text('subject').notNull(),
    data: jsonb('data').$type<Record<string, unknown>>().notNull(),
    status: text('status').$type<'queued' | 'sent' | 'failed'>().notNull().default('queued'),
    attempts: integer('attempts').notNull().default(0),
    lastError: text('last_error'),
    messageId: text('message_id'),
    createdAt: createdAt(),
    sentAt: moment('sent_at'),
  },
  (t) => [
    index('mails_workspace').on(t.workspaceId, t.createdAt),
    index('mails_contact').on(t.workspaceId, t.contactId),
    tenantPolicy('mails', sql`workspace_id is null`, sql`workspace_id is null`),
  ],
);

/** The answer to a write that may be sent twice, kept under the key that the client made. */
export const idempotencyKeys = pgTable(
  'idempotency_keys',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    key: text('key').notNull(),
    useCase: text('use_case').notNull(),
    inputHash: text('input_hash').notNull(),
    response: jsonb('response'),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.workspaceId, t.key] }), tenantPolicy('idempotency_keys')],
);
