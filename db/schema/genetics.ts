import { foreignKey, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core';
import type { CombinationId, LocusId, SpeciesId } from '@/lib/contracts/ids';
import type { SpeciesProfile } from '@/lib/contracts/species';
import type { LocusDefinition, SexSystem } from '@/lib/genetics/locus';
import { createdAt, tenantPolicy, versionColumn, workspaceColumn } from './columns';
import { workspaces } from './workspace';

export const species = pgTable(
  'species',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<SpeciesId>().notNull().defaultRandom(),
    name: text('name').notNull(),
    scientificName: text('scientific_name').notNull().default(''),
    sexSystem: text('sex_system').$type<SexSystem>().notNull(),
    /** First part of the codes proposed for animals of this species, such as "BP". */
    codePrefix: text('code_prefix').notNull(),
    /** Clutch size, hatch rate, days between phases, breeding limits; each with its source or "common practice". */
    profile: jsonb('profile').$type<SpeciesProfile>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('species_name').on(t.workspaceId, t.name),
    unique('species_code_prefix').on(t.workspaceId, t.codePrefix),
    tenantPolicy('species'),
  ],
);

/** A locus as data: nothing in the code knows a gene by name. */
export const loci = pgTable(
  'loci',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<LocusId>().notNull().defaultRandom(),
    speciesId: uuid('species_id').$type<SpeciesId>().notNull(),
    name: text('name').notNull(),
    definition: jsonb('definition').$type<LocusDefinition>().notNull(),
    version: versionColumn(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('loci_name').on(t.workspaceId, t.speciesId, t.name),
    foreignKey({
      name: 'loci_species',
      columns: [t.workspaceId, t.speciesId],
      foreignColumns: [species.workspaceId, species.id],
    }),
    tenantPolicy('loci'),
  ],
);

/** The trade's name for a set of phenotypes over several loci. */
export const combinations = pgTable(
  'combinations',
  {
    workspaceId: workspaceColumn().references(() => workspaces.id),
    id: uuid('id').$type<CombinationId>().notNull().defaultRandom(),
    speciesId: uuid('species_id').$type<SpeciesId>().notNull(),
    name: text('name').notNull(),
    /** Phenotype by locus that together carry the name. */
    phenotypes: jsonb('phenotypes').$type<Record<LocusId, string>>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.workspaceId, t.id] }),
    unique('combinations_name').on(t.workspaceId, t.speciesId, t.name),
    foreignKey({
      name: 'combinations_species',
      columns: [t.workspaceId, t.speciesId],
      foreignColumns: [species.workspaceId, species.id],
    }),
    tenantPolicy('combinations'),
  ],
);
