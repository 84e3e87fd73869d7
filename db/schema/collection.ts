import { sql } from 'drizzle-orm';
import {
  boolean,
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
  type AnyPgColumn,
} from 'drizzle-orm/pg-core';
import type {
  AnimalId,
  ClutchId,
  DocumentId,
  LocusId,
  MemberId,
  PartyId,
  PhotoId,
  SpeciesId,
  TubId,
} from '@/lib/contracts/ids';
import type { AnimalOrigin, AnimalStatus, LocusClaim, OwnershipReason, Sex } from '@/lib/contracts/animal';
import { createdAt, day, minorUnits, moment, tenantPolicy, versionColumn, workspaceColumn } from './columns';
import { loci, species } from './genetics';
import { members, parties, workspaces } from './workspace';

/** A place an animal lives in: a tub of a rack in a room. */
export const tubs = pgTable(
  'tubs',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<TubId>().notNull().defaultRandom(),
    room: text('room').notNull(),
    rack: text('rack').notNull(),
    label: text('label').notNull(),
    rowNumber: smallint('row_number').notNull(),
    columnNumber: smallint('column_number').notNull(),
    purpose: text('purpose')
      .$type<'adult' | 'grower' | 'hatchling' | 'incubator' | 'quarantine'>()
      .notNull()
      .default('adult'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('tubs_label').on(t.workspaceId, t.label),
    unique('tubs_position').on(t.workspaceId, t.room, t.rack, t.rowNumber, t.columnNumber),
    tenantPolicy('tubs'),
  ],
);

export const animals = pgTable(
  'animals',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<AnimalId>().notNull().defaultRandom(),
    code: text('code').notNull(),
    name: text('name').notNull().default(''),
    speciesId: uuid('species_id').$type<SpeciesId>().notNull(),
    sex: text('sex').$type<Sex>().notNull().default('unknown'),
    sexedBy: text('sexed_by').$type<'probed' | 'popped' | 'visible' | 'stated' | 'proven'>(),
    hatchedOn: day('hatched_on'),
    hatchedPrecision: text('hatched_precision').$type<'day' | 'month' | 'year'>().notNull().default('day'),
    origin: text('origin').$type<AnimalOrigin>().notNull().default('unknown'),
    status: text('status').$type<AnimalStatus>().notNull().default('here'),
    statusSince: day('status_since'),
    notes: text('notes').notNull().default(''),
    damId: uuid('dam_id').$type<AnimalId>(),
    /** The sire if he is known; several possible ones stand in `possible_sires`. */
    sireId: uuid('sire_id').$type<AnimalId>(),
    /** The clutch it hatched from, if that was logged here. */
    clutchId: uuid('clutch_id').$type<ClutchId>(),
    hatchNumber: smallint('hatch_number'),
    tubId: uuid('tub_id').$type<TubId>(),
    heldBack: boolean('held_back').notNull().default(false),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('animals_code').on(t.workspaceId, t.code),
    index('animals_species').on(t.workspaceId, t.speciesId),
    index('animals_dam').on(t.workspaceId, t.damId),
    index('animals_sire').on(t.workspaceId, t.sireId),
    index('animals_clutch').on(t.workspaceId, t.clutchId),
    foreignKey({
      name: 'animals_species_fk',
      columns: [t.workspaceId, t.speciesId],
      foreignColumns: [species.workspaceId, species.id],
    }),
    foreignKey({
      name: 'animals_dam_fk',
      columns: [t.workspaceId, t.damId],
      foreignColumns: [t.workspaceId, t.id] as [AnyPgColumn, AnyPgColumn],
    }),
    foreignKey({
      name: 'animals_sire_fk',
      columns: [t.workspaceId, t.sireId],
      foreignColumns: [t.workspaceId, t.id] as [AnyPgColumn, AnyPgColumn],
    }),
    foreignKey({
      name: 'animals_tub_fk',
      columns: [t.workspaceId, t.tubId],
      foreignColumns: [tubs.workspaceId, tubs.id],
    }),
    check('animals_sex', sql`${t.sex} in ('male', 'female', 'unknown')`),
    check(
      'animals_not_own_parent',
      sql`${t.damId} is distinct from ${t.id} and ${t.sireId} is distinct from ${t.id}`,
    ),
    tenantPolicy('animals'),
  ],
);

export const possibleSires = pgTable(
  'possible_sires',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    sireId: uuid('sire_id').$type<AnimalId>().notNull(),
    /** Prior odds in proportion to the others', a positive integer. */
    weight: integer('weight').notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.animalId, t.sireId] }),
    foreignKey({
      name: 'possible_sires_animal',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'possible_sires_sire',
      columns: [t.workspaceId, t.sireId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    check('possible_sires_weight', sql`${t.weight} > 0`),
    tenantPolicy('possible_sires'),
  ],
);

/** What is recorded of an animal at a locus: what it shows, and what it is known or said to carry. */
export const animalLoci = pgTable(
  'animal_loci',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    locusId: uuid('locus_id').$type<LocusId>().notNull(),
    claim: jsonb('claim').$type<LocusClaim>().notNull(),
    recordedOn: day('recorded_on'),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.animalId, t.locusId] }),
    foreignKey({
      name: 'animal_loci_animal',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'animal_loci_locus',
      columns: [t.workspaceId, t.locusId],
      foreignColumns: [loci.workspaceId, loci.id],
    }),
    tenantPolicy('animal_loci'),
  ],
);

/** Who owned an animal from a day until the next change: one set of parts per animal and instant, days half-open. */
export const ownerships = pgTable(
  'ownerships',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    fromDay: day('from_day').notNull(),
    /** The first day on which it no longer holds; null while in force. */
    untilDay: day('until_day'),
    reason: text('reason').$type<OwnershipReason>().notNull(),
    /** Price of a buy-in or transfer, if one was paid. */
    price: minorUnits('price'),
    note: text('note').notNull().default(''),
    /** How the parts followed from the parents' and the terms, for a hatchling. */
    derivation: jsonb('derivation').$type<readonly string[]>(),
    recordedBy: uuid('recorded_by').$type<MemberId>(),
    recordedAt: moment('recorded_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    uniqueIndex('ownerships_one_in_force')
      .on(t.workspaceId, t.animalId)
      .where(sql`until_day is null`),
    index('ownerships_animal').on(t.workspaceId, t.animalId, t.fromDay),
    foreignKey({
      name: 'ownerships_animal_fk',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'ownerships_recorded_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('ownerships_order', sql`${t.untilDay} is null or ${t.untilDay} >= ${t.fromDay}`),
    tenantPolicy('ownerships'),
  ],
);

export const ownershipParts = pgTable(
  'ownership_parts',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    ownershipId: uuid('ownership_id').notNull(),
    partyId: uuid('party_id').$type<PartyId>().notNull(),
    parts: integer('parts').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.ownershipId, t.partyId] }),
    index('ownership_parts_party').on(t.workspaceId, t.partyId),
    foreignKey({
      name: 'ownership_parts_ownership',
      columns: [t.workspaceId, t.ownershipId],
      foreignColumns: [ownerships.workspaceId, ownerships.id],
    }),
    foreignKey({
      name: 'ownership_parts_party_fk',
      columns: [t.workspaceId, t.partyId],
      foreignColumns: [parties.workspaceId, parties.id],
    }),
    check('ownership_parts_positive', sql`${t.parts} > 0`),
    tenantPolicy('ownership_parts'),
  ],
);

export const weights = pgTable(
  'weights',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').notNull().defaultRandom(),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    weighedOn: day('weighed_on').notNull(),
    grams: integer('grams').notNull(),
    recordedBy: uuid('recorded_by').$type<MemberId>(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('weights_animal').on(t.workspaceId, t.animalId, t.weighedOn),
    foreignKey({
      name: 'weights_animal_fk',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    foreignKey({
      name: 'weights_recorded_by',
      columns: [t.workspaceId, t.recordedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    check('weights_positive', sql`${t.grams} > 0`),
    tenantPolicy('weights'),
  ],
);

export const photos = pgTable(
  'photos',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<PhotoId>().notNull().defaultRandom(),
    animalId: uuid('animal_id').$type<AnimalId>().notNull(),
    /** Key in the file storage; a "-small" sibling holds the thumbnail. */
    storageKey: text('storage_key').notNull(),
    contentType: text('content_type').notNull(),
    width: integer('width').notNull(),
    height: integer('height').notNull(),
    sha256: text('sha256').notNull(),
    caption: text('caption').notNull().default(''),
    takenOn: day('taken_on'),
    position: smallint('position').notNull().default(0),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('photos_animal').on(t.workspaceId, t.animalId, t.position),
    foreignKey({
      name: 'photos_animal_fk',
      columns: [t.workspaceId, t.animalId],
      foreignColumns: [animals.workspaceId, animals.id],
    }),
    tenantPolicy('photos'),
  ],
);

/** A file kept with an animal, a contact or an expense. */
export const documents = pgTable(
  'documents',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<DocumentId>().notNull().defaultRandom(),
    subjectKind: text('subject_kind').$type<'animal' | 'contact' | 'expense'>().notNull(),
    subjectId: uuid('subject_id').notNull(),
    name: text('name').notNull(),
    storageKey: text('storage_key').notNull(),
    contentType: text('content_type').notNull(),
    bytes: integer('bytes').notNull(),
    sha256: text('sha256').notNull(),
    uploadedBy: uuid('uploaded_by').$type<MemberId>(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    index('documents_subject').on(t.workspaceId, t.subjectKind, t.subjectId),
    foreignKey({
      name: 'documents_uploaded_by',
      columns: [t.workspaceId, t.uploadedBy],
      foreignColumns: [members.workspaceId, members.id],
    }),
    tenantPolicy('documents'),
  ],
);
