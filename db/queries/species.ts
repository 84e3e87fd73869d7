import 'server-only';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { CombinationId, SpeciesId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals } from '../schema/collection';
import { combinations, loci, species } from '../schema/genetics';

/** The workspace's species by name, with how many loci each has. What is known of a species is open to every member. */
export async function listSpecies(tx: Transaction) {
  return tx
    .select({
      id: species.id,
      name: species.name,
      scientificName: species.scientificName,
      sexSystem: species.sexSystem,
      codePrefix: species.codePrefix,
      profile: species.profile,
      version: species.version,
      lociCount: sql<number>`(select count(*)::int from ${loci} l where l.workspace_id = ${species.workspaceId} and l.species_id = ${species.id})`,
    })
    .from(species)
    .orderBy(asc(species.name));
}

export async function findSpecies(tx: Transaction, id: SpeciesId) {
  const [row] = await tx.select().from(species).where(eq(species.id, id));
  return row ?? null;
}

export async function insertSpecies(
  tx: Transaction,
  row: typeof species.$inferInsert & { id: SpeciesId },
): Promise<void> {
  await tx.insert(species).values(row);
}

/** @returns whether the row still had the version that was seen */
export async function updateSpecies(
  tx: Transaction,
  id: SpeciesId,
  seen: number,
  change: Partial<typeof species.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(species)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(species.id, id), eq(species.version, seen)))
    .returning({ id: species.id });
  return rows.length === 1;
}

/** Whether any animal of the species is recorded: then its way of sex determination is fixed. */
export async function hasAnimals(tx: Transaction, id: SpeciesId): Promise<boolean> {
  const [row] = await tx.select({ id: animals.id }).from(animals).where(eq(animals.speciesId, id)).limit(1);
  return row !== undefined;
}

export async function listCombinations(tx: Transaction, speciesId: SpeciesId) {
  return tx
    .select({ id: combinations.id, name: combinations.name, phenotypes: combinations.phenotypes })
    .from(combinations)
    .where(eq(combinations.speciesId, speciesId))
    .orderBy(asc(combinations.name));
}

export async function findCombination(tx: Transaction, id: CombinationId) {
  const [row] = await tx.select().from(combinations).where(eq(combinations.id, id));
  return row ?? null;
}

export async function insertCombination(
  tx: Transaction,
  row: typeof combinations.$inferInsert & { id: CombinationId },
): Promise<void> {
  await tx.insert(combinations).values(row);
}

export async function deleteCombination(tx: Transaction, id: CombinationId): Promise<void> {
  await tx.delete(combinations).where(eq(combinations.id, id));
}
