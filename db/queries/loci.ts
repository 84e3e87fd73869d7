import 'server-only';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { LocusId, SpeciesId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animalLoci } from '../schema/collection';
import { loci } from '../schema/genetics';

const recorded = sql<number>`(select count(*)::int from ${animalLoci} r where r.workspace_id = ${loci.workspaceId} and r.locus_id = ${loci.id})`;

/** The loci of a species by name, with how many animals something is recorded of there. */
export async function listLoci(tx: Transaction, speciesId: SpeciesId) {
  return tx
    .select({
      id: loci.id,
      speciesId: loci.speciesId,
      name: loci.name,
      definition: loci.definition,
      version: loci.version,
      recorded,
    })
    .from(loci)
    .where(eq(loci.speciesId, speciesId))
    .orderBy(asc(loci.name));
}

export async function findLocus(tx: Transaction, id: LocusId) {
  const [row] = await tx
    .select({
      id: loci.id,
      speciesId: loci.speciesId,
      name: loci.name,
      definition: loci.definition,
      version: loci.version,
      recorded,
    })
    .from(loci)
    .where(eq(loci.id, id));
  return row ?? null;
}

/** What is recorded of animals at a locus, to see whether a changed locus still knows it. */
export async function listClaimsAt(tx: Transaction, id: LocusId) {
  return tx
    .select({ animalId: animalLoci.animalId, claim: animalLoci.claim })
    .from(animalLoci)
    .where(eq(animalLoci.locusId, id));
}

export async function insertLocus(
  tx: Transaction,
  row: typeof loci.$inferInsert & { id: LocusId },
): Promise<void> {
  await tx.insert(loci).values(row);
}

/** @returns whether the row still had the version that was seen */
export async function updateLocus(
  tx: Transaction,
  id: LocusId,
  seen: number,
  change: Partial<typeof loci.$inferInsert>,
): Promise<boolean> {
  const rows = await tx
    .update(loci)
    .set({ ...change, version: seen + 1 })
    .where(and(eq(loci.id, id), eq(loci.version, seen)))
    .returning({ id: loci.id });
  return rows.length === 1;
}

export async function deleteLocus(tx: Transaction, id: LocusId): Promise<void> {
  await tx.delete(loci).where(eq(loci.id, id));
}
