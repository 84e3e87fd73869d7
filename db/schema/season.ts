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
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import type {
  AnimalId,
  ClutchId,
  MemberId,
  PairingId,
  PairingVersionId,
  PartyId,
  ProjectId,
  TermsId,
} from '@/lib/contracts/ids';
import type { PairingEventKind, PairingFigures, PairingPlan } from '@/lib/contracts/pairing-figures';
import { animals } from './collection';
import { createdAt, day, moment, tenantPolicy, versionColumn, workspaceColumn } from './columns';
import { projects, termsVersions } from './projects';
import { members, parties, workspaces } from './workspace';

export const pairings = pgTable(
  'pairings',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<PairingId>().notNull().defaultRandom(),
    projectId: uuid('project_id').$type<ProjectId>().notNull(),
    /** The year in which the young are expected. */
    season: integer('season').notNull(),
    sireId: uuid('sire_id').$type<AnimalId>().notNull(),
    damId: uuid('dam_id').$type<AnimalId>().notNull(),
    status: text('status')
      .$type<'draft' | 'proposed' | 'agreed' | 'withdrawn' | 'ended'>()
      .notNull()
      .default('draft'),
    createdBy: uuid('created_by').$type<MemberId>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('pairings_season').on(t.workspaceId, t.season),
    uniqueIndex('pairings_once')
      .on(t.workspaceId, t.season, t.sireId, t.damId)
      .where(sql`status <> 'withdrawn'`),
    foreignKey({
      name: 'pairings_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'pairings_sire',
      columns: [t.workspaceId, t.sireId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'pairings_dam',
      columns: [t.workspaceId, t.damId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'pairings_created_by',
      columns: [t.workspaceId, t.createdBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('pairings_two_animals', sql`${t.sireId} <> ${t.damId}`),
    tenantPolicy('pairings'),
  ],
);

/** A proposed version of a pairing with the terms and the figures that the parties saw. Locked once all agreed. */
export const pairingVersions = pgTable(
  'pairing_versions',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<PairingVersionId>().notNull().defaultRandom(),
    pairingId: uuid('pairing_id').$type<PairingId>().notNull(),
    number: integer('number').notNull(),
    termsId: uuid('terms_id').$type<TermsId>().notNull(),
    plan: jsonb('plan').$type<PairingPlan>().notNull(),
    figures: jsonb('figures').$type<PairingFigures>().notNull(),
    proposedBy: uuid('proposed_by').$type<MemberId>().notNull(),
    proposedAt: moment('proposed_at').notNull().defaultNow(),
    answerBy: day('answer_by'),
    lockedAt: moment('locked_at'),
    previousHash: text('previous_hash'),
    hash: text('hash'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('pairing_versions_number').on(t.workspaceId, t.pairingId, t.number),
    foreignKey({
      name: 'pairing_versions_pairing',
      columns: [t.workspaceId, t.pairingId],
      foreignColumns: [pairings.workspaceId, pairings.id],
    }),
    foreignKey({
      name: 'pairing_versions_terms',
      columns: [t.workspaceId, t.termsId],
      foreignColumns: [termsVersions.workspaceId, termsVersions.id],
    }),
    foreignKey({
      name: 'pairing_versions_by',
      columns: [t.workspaceId, t.proposedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('pairing_versions'),
  ],
);

export const pairingDecisions = pgTable(
  'pairing_decisions',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    pairingVersionId: uuid('pairing_version_id').$type<PairingVersionId>().notNull(),
    partyId: uuid('party_id').$type<PartyId>().notNull(),
    decision: text('decision').$type<'agreed' | 'change_asked'>().notNull(),
    comment: text('comment').notNull().default(''),
    decidedBy: uuid('decided_by').$type<MemberId>().notNull(),
    decidedAt: moment('decided_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('pairing_decisions_version').on(t.workspaceId, t.pairingVersionId, t.decidedAt),
    foreignKey({
      name: 'pairing_decisions_version_fk',
      columns: [t.workspaceId, t.pairingVersionId],
      foreignColumns: [pairingVersions.workspaceId, pairingVersions.id],
    }),
    foreignKey({
      name: 'pairing_decisions_party',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'pairing_decisions_by',
      columns: [t.workspaceId, t.decidedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('pairing_decisions'),
  ],
);

/** What was seen of a pairing in the room. Rows are only added; a wrong one is marked as retracted. */
export const pairingEvents = pgTable(
  'pairing_events',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    pairingId: uuid('pairing_id').$type<PairingId>().notNull(),
    kind: text('kind').$type<PairingEventKind>().notNull(),
    seenOn: day('seen_on').notNull(),
    minutes: integer('minutes'),
    note: text('note').notNull().default(''),
    recordedBy: uuid('recorded_by').$type<MemberId>().notNull(),
    recordedAt: moment('recorded_at').notNull().defaultNow(),
    retractedAt: moment('retracted_at'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('pairing_events_pairing').on(t.workspaceId, t.pairingId, t.seenOn),
    foreignKey({
      name: 'pairing_events_pairing_fk',
      columns: [t.workspaceId, t.pairingId],
      foreignColumns: [pairings.workspaceId, pairings.id],
    }),
    foreignKey({
      name: 'pairing_events_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('pairing_events'),
  ],
);

export const clutches = pgTable(
  'clutches',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<ClutchId>().notNull().defaultRandom(),
    code: text('code').notNull(),
    pairingId: uuid('pairing_id').$type<PairingId>().notNull(),
    projectId: uuid('project_id').$type<ProjectId>().notNull(),
    /** The terms in force on the day of laying; what is born of the clutch keeps them. */
    termsId: uuid('terms_id').$type<TermsId>().notNull(),
    laidOn: day('laid_on').notNull(),
    eggs: smallint('eggs').notNull(),
    slugs: smallint('slugs').notNull().default(0),
    clutchGrams: integer('clutch_grams'),
    incubatorLabel: text('incubator_label').notNull().default(''),
    /** Tenths of a degree Celsius. */
    incubationDecicelsius: integer('incubation_decicelsius'),
    hatchedOn: day('hatched_on'),
    note: text('note').notNull().default(''),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('clutches_code').on(t.workspaceId, t.code),
    index('clutches_pairing').on(t.workspaceId, t.pairingId),
    foreignKey({
      name: 'clutches_pairing_fk',
      columns: [t.workspaceId, t.pairingId],
      foreignColumns: [pairings.workspaceId, pairings.id],
    }),
    foreignKey({
      name: 'clutches_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'clutches_terms',
      columns: [t.workspaceId, t.termsId],
      foreignColumns: [termsVersions.workspaceId, termsVersions.id],
    }),
    check('clutches_counts', sql`${t.eggs} >= 0 and ${t.slugs} >= 0 and ${t.eggs} + ${t.slugs} > 0`),
    tenantPolicy('clutches'),
  ],
);
