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
import type { AnimalId, MemberId, PartyId, ProjectId, SpeciesId, TermsId } from '@/lib/contracts/ids';
import type { TermsContent } from '@/lib/contracts/terms-content';
import { animals } from './collection';
import { createdAt, day, moment, tenantPolicy, versionColumn, workspaceColumn } from './columns';
import { species } from './genetics';
import { members, parties, workspaces } from './workspace';

export const projects = pgTable(
  'projects',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<ProjectId>().notNull().defaultRandom(),
    name: text('name').notNull(),
    purpose: text('purpose').notNull().default(''),
    speciesId: uuid('species_id').$type<SpeciesId>().notNull(),
    startedOn: day('started_on').notNull(),
    endedOn: day('ended_on'),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('projects_name').on(t.workspaceId, t.name),
    foreignKey({
      name: 'projects_species',
      columns: [t.workspaceId, t.speciesId],
      foreignColumns: [species.workspaceId, species.id],
    }),
    tenantPolicy('projects'),
  ],
);

export const projectParties = pgTable(
  'project_parties',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    projectId: uuid('project_id').$type<ProjectId>().notNull(),
    partyId: uuid('party_id').$type<PartyId>().notNull(),
    /** Order of the partners wherever they are drawn, and the rank that takes an odd cent first. */
    rank: smallint('rank').notNull(),
    joinedOn: day('joined_on').notNull(),
    leftOn: day('left_on'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.projectId, t.partyId] }),
    index('project_parties_party').on(t.workspaceId, t.partyId),
    foreignKey({
      name: 'project_parties_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'project_parties_party_fk',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    tenantPolicy('project_parties'),
  ],
);

export const projectAnimals = pgTable(
  'project_animals',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    projectId: uuid('project_id').$type<ProjectId>().notNull(),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    addedOn: day('added_on').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.projectId, t.animalId] }),
    index('project_animals_animal').on(t.workspaceId, t.animalId),
    foreignKey({
      name: 'project_animals_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'project_animals_animal_fk',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    tenantPolicy('project_animals'),
  ],
);

/**
 * A version of a project's terms. Locked once every party has agreed; from then on the row can't be changed
 * (a trigger refuses), and `hash` chains it to the version before.
 */
export const termsVersions = pgTable(
  'terms_versions',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<TermsId>().notNull().defaultRandom(),
    projectId: uuid('project_id').$type<ProjectId>().notNull(),
    number: integer('number').notNull(),
    status: text('status').$type<'draft' | 'proposed' | 'agreed' | 'withdrawn'>().notNull(),
    content: jsonb('content').$type<TermsContent>().notNull(),
    inForceFrom: day('in_force_from').notNull(),
    note: text('note').notNull().default(''),
    proposedBy: uuid('proposed_by').$type<MemberId>().notNull(),
    proposedAt: moment('proposed_at'),
    lockedAt: moment('locked_at'),
    previousHash: text('previous_hash'),
    hash: text('hash'),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('terms_versions_number').on(t.workspaceId, t.projectId, t.number),
    uniqueIndex('terms_versions_one_open')
      .on(t.workspaceId, t.projectId)
      .where(sql`status in ('draft', 'proposed')`),
    foreignKey({
      name: 'terms_versions_project',
      columns: [t.workspaceId, t.projectId],
      foreignColumns: [projects.workspaceId, projects.id],
    }),
    foreignKey({
      name: 'terms_versions_proposed_by',
      columns: [t.workspaceId, t.proposedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('terms_versions_locked', sql`(${t.status} = 'agreed') = (${t.lockedAt} is not null)`),
    tenantPolicy('terms_versions'),
  ],
);

export const termsDecisions = pgTable(
  'terms_decisions',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    termsId: uuid('terms_id').$type<TermsId>().notNull(),
    partyId: uuid('party_id').$type<PartyId>().notNull(),
    decision: text('decision').$type<'agreed' | 'change_asked'>().notNull(),
    comment: text('comment').notNull().default(''),
    decidedBy: uuid('decided_by').$type<MemberId>().notNull(),
    decidedAt: moment('decided_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('terms_decisions_terms').on(t.workspaceId, t.termsId, t.decidedAt),
    foreignKey({
      name: 'terms_decisions_terms_fk',
      columns: [t.workspaceId, t.termsId],
      foreignColumns: [termsVersions.workspaceId, termsVersions.id],
    }),
    foreignKey({
      name: 'terms_decisions_party',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    foreignKey({
      name: 'terms_decisions_by',
      columns: [t.workspaceId, t.decidedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('terms_decisions'),
  ],
);
