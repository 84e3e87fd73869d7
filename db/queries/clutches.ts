import 'server-only';
import {
  and,
  asc,
  count,
  desc,
  eq,
  gte,
  ilike,
  isNotNull,
  isNull,
  like,
  lt,
  or,
  sql,
  type SQL,
} from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { AnimalId, ClutchId, ProjectId, TermsId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals, ownershipParts, ownerships, weights } from '../schema/collection';
import { species } from '../schema/genetics';
import { projects, termsVersions } from '../schema/projects';
import { clutches, pairings } from '../schema/season';
import { inVisibleProject, type Visibility } from './visibility';

const sires = alias(animals, 'sires');
const dams = alias(animals, 'dams');
const young = sql<number>`(select count(*)::int from animals y where y.workspace_id = ${clutches.workspaceId} and y.clutch_id = ${clutches.id})`;

/** The first day on which an egg may pip. */
const pipsFrom = sql`(${clutches.laidOn} + (select (s.profile->'intervals'->'incubation'->>'from')::int from species s where s.workspace_id = ${dams.workspaceId} and s.id = ${dams.speciesId}))`;

const columns = {
  id: clutches.id,
  code: clutches.code,
  pairingId: clutches.pairingId,
  projectId: clutches.projectId,
  projectName: projects.name,
  termsId: clutches.termsId,
  laidOn: clutches.laidOn,
  eggs: clutches.eggs,
  slugs: clutches.slugs,
  clutchGrams: clutches.clutchGrams,
  incubatorLabel: clutches.incubatorLabel,
  incubationDecicelsius: clutches.incubationDecicelsius,
  hatchedOn: clutches.hatchedOn,
  note: clutches.note,
  version: clutches.version,
  hatchlings: young,
  sireId: sires.id,
  sireCode: sires.code,
  damId: dams.id,
  damCode: dams.code,
  speciesId: dams.speciesId,
  codePrefix: species.codePrefix,
  profile: species.profile,
};

function selectClutches(tx: Transaction) {
  return tx
    .select(columns)
    .from(clutches)
    .innerJoin(
      pairings,
      and(eq(pairings.workspaceId, clutches.workspaceId), eq(pairings.id, clutches.pairingId)),
    )
    .innerJoin(
      projects,
      and(eq(projects.workspaceId, clutches.workspaceId), eq(projects.id, clutches.projectId)),
    )
    .innerJoin(sires, and(eq(sires.workspaceId, pairings.workspaceId), eq(sires.id, pairings.sireId)))
    .innerJoin(dams, and(eq(dams.workspaceId, pairings.workspaceId), eq(dams.id, pairings.damId)))
    .innerJoin(species, and(eq(species.workspaceId, dams.workspaceId), eq(species.id, dams.speciesId)));
}
export type ClutchRecord = Awaited<ReturnType<typeof findClutch>> & object;

export interface ClutchFilter {
  search?: string;
  state?: 'incubating' | 'hatching' | 'hatched' | 'lost';
  project?: ProjectId;
  season?: number;
  /** Tells incubating from hatching. */
  today: string;
}

function matches(filter: ClutchFilter): (SQL | undefined)[] {
  const { search, state, project, season, today } = filter;
  const text = search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null;
  return [
    text ? or(ilike(clutches.code, text), ilike(sires.code, text), ilike(dams.code, text)) : undefined,
    state === 'hatched' ? isNotNull(clutches.hatchedOn) : undefined,
    state === 'incubating'
      ? and(isNull(clutches.hatchedOn), sql`${clutches.eggs} > 0 and ${pipsFrom} > ${today}::date`)
      : undefined,
    state === 'hatching'
      ? and(isNull(clutches.hatchedOn), sql`${clutches.eggs} > 0 and ${pipsFrom} <= ${today}::date`)
      : undefined,
    state === 'lost' ? and(isNull(clutches.hatchedOn), sql`${clutches.eggs} = 0`) : undefined,
    project ? eq(clutches.projectId, project) : undefined,
    season
      ? and(gte(clutches.laidOn, `${season}-01-01`), lt(clutches.laidOn, `${season + 1}-01-01`))
      : undefined,
  ];
}

/** Clutches that are seen and match, newest first, and how many match in all. */
export async function listClutchRecords(
  tx: Transaction,
  sees: Visibility,
  filter: ClutchFilter,
  page: { offset: number; limit: number },
) {
  const where = and(inVisibleProject(sees, clutches.projectId), ...matches(filter));
  const rows = await selectClutches(tx)
    .where(where)
    .orderBy(desc(clutches.laidOn), asc(clutches.code))
    .limit(page.limit)
    .offset(page.offset);
  const [total] = await tx
    .select({ total: count() })
    .from(clutches)
    .innerJoin(
      pairings,
      and(eq(pairings.workspaceId, clutches.workspaceId), eq(pairings.id, clutches.pairingId)),
    )
    .innerJoin(sires, and(eq(sires.workspaceId, pairings.workspaceId), eq(sires.id, pairings.sireId)))
    .innerJoin(dams, and(eq(dams.workspaceId, pairings.workspaceId), eq(dams.id, pairings.damId)))
    .where(where);
  return { rows, total: total?.total ?? 0 };
}

export async function findClutch(tx: Transaction, sees: Visibility, id: ClutchId) {
  const [row] = await selectClutches(tx).where(
    and(eq(clutches.id, id), inVisibleProject(sees, clutches.projectId)),
  );
  return row ?? null;
}

/** Locks the clutch for the rest of the transaction, so that its young are logged by one at a time. */
export async function lockClutch(tx: Transaction, id: ClutchId): Promise<void> {
  await tx.select({ id: clutches.id }).from(clutches).where(eq(clutches.id, id)).for('update');
}

export async function insertClutch(tx: Transaction, row: typeof clutches.$inferInsert): Promise<ClutchId> {
  const id = crypto.randomUUID() as ClutchId;
  await tx.insert(clutches).values({ ...row, id });
  return id;
}

/** @returns whether the row still had the version that was seen */
export async function updateClutch(
  tx: Transaction,
  id: ClutchId,
  seen: number,
  change: Partial<typeof clutches.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(clutches)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(clutches.id, id), eq(clutches.version, seen)))
    .returning({ id: clutches.id });
  return rows.length === 1;
}

export async function setHatched(tx: Transaction, id: ClutchId, hatchedOn: string): Promise<void> {
  await tx
    .update(clutches)
    .set({
      hatchedOn: sql`least(coalesce(${clutches.hatchedOn}, ${hatchedOn}::date), ${hatchedOn}::date)`,
      version: sql`${clutches.version} + 1`,
    })
    .where(eq(clutches.id, id));
}

/** The terms of a project in force on a day: the newest agreed version whose day has come. */
export async function findTermsInForce(tx: Transaction, projectId: ProjectId, onDay: string) {
  const [row] = await tx
    .select({
      id: termsVersions.id,
      number: termsVersions.number,
      content: termsVersions.content,
      inForceFrom: termsVersions.inForceFrom,
    })
    .from(termsVersions)
    .where(
      and(
        eq(termsVersions.projectId, projectId),
        eq(termsVersions.status, 'agreed'),
        sql`${termsVersions.inForceFrom} <= ${onDay}::date`,
      ),
    )
    .orderBy(desc(termsVersions.inForceFrom), desc(termsVersions.number))
    .limit(1);
  return row ?? null;
}

export async function findTermsById(tx: Transaction, id: TermsId) {
  const [row] = await tx
    .select({
      id: termsVersions.id,
      number: termsVersions.number,
      content: termsVersions.content,
      inForceFrom: termsVersions.inForceFrom,
    })
    .from(termsVersions)
    .where(eq(termsVersions.id, id));
  return row ?? null;
}

/** The parts in which an animal was owned on a day; empty when nothing is recorded for it. */
export async function partsOn(tx: Transaction, animalId: AnimalId, onDay: string) {
  return tx
    .select({ partyId: ownershipParts.partyId, parts: ownershipParts.parts })
    .from(ownerships)
    .innerJoin(
      ownershipParts,
      and(
        eq(ownershipParts.workspaceId, ownerships.workspaceId),
        eq(ownershipParts.ownershipId, ownerships.id),
      ),
    )
    .where(
      and(
        eq(ownerships.animalId, animalId),
        sql`${ownerships.fromDay} <= ${onDay}::date and (${ownerships.untilDay} is null or ${ownerships.untilDay} > ${onDay}::date)`,
      ),
    )
    .orderBy(asc(ownershipParts.partyId));
}

/** The young of a clutch with their newest weight and present parts, in the order of hatching. */
export async function listYoung(tx: Transaction, clutchId: ClutchId) {
  const rows = await tx
    .select({
      id: animals.id,
      code: animals.code,
      hatchNumber: animals.hatchNumber,
      sex: animals.sex,
      status: animals.status,
      note: animals.notes,
      grams: sql<
        number | null
      >`(select w.grams from ${weights} w where w.workspace_id = animals.workspace_id and w.animal_id = animals.id order by w.weighed_on desc, w.id limit 1)`,
    })
    .from(animals)
    .where(eq(animals.clutchId, clutchId))
    .orderBy(asc(animals.hatchNumber), asc(animals.code));
  const parts = await tx
    .select({ animalId: ownerships.animalId, partyId: ownershipParts.partyId, parts: ownershipParts.parts })
    .from(ownerships)
    .innerJoin(
      ownershipParts,
      and(
        eq(ownershipParts.workspaceId, ownerships.workspaceId),
        eq(ownershipParts.ownershipId, ownerships.id),
      ),
    )
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, ownerships.workspaceId), eq(animals.id, ownerships.animalId)),
    )
    .where(and(eq(animals.clutchId, clutchId), isNull(ownerships.untilDay)));
  return rows.map((row) => ({
    ...row,
    parts: parts
      .filter(({ animalId }) => animalId === row.id)
      .map(({ partyId, parts: held }) => ({ partyId, parts: held })),
  }));
}

/** Codes of a species' animals that start with a text, to find the next free one. */
export async function codesStartingWith(tx: Transaction, start: string): Promise<string[]> {
  const rows = await tx
    .select({ code: animals.code })
    .from(animals)
    .where(like(animals.code, `${start.replace(/[%_\\]/g, '\\$&')}%`));
  return rows.map((row) => row.code);
}

/** Clutch codes of a year, to find the next free one. */
export async function clutchCodesStartingWith(tx: Transaction, start: string): Promise<string[]> {
  const rows = await tx
    .select({ code: clutches.code })
    .from(clutches)
    .where(like(clutches.code, `${start.replace(/[%_\\]/g, '\\$&')}%`));
  return rows.map((row) => row.code);
}
