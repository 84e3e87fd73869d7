import 'server-only';
import type { ListingRecord } from '@/db/queries/listings';
import type { ListingRow } from '@/lib/contracts/invoice';
import { describeAnimals } from '../genetics/describe-animals';
import type { WorkspaceWorld } from '../world';

/** Listings as they cross the wire, each with what the animal looks like and carries. */
export async function presentListings(
  { tx }: Pick<WorkspaceWorld, 'tx'>,
  records: ListingRecord[],
): Promise<ListingRow[]> {
  const describe = await describeAnimals(
    tx,
    records.map(({ animalId, speciesId }) => ({ id: animalId, speciesId })),
  );
  return records.map((record) => ({
    animalId: record.animalId,
    code: record.code,
    description: describe(record.animalId),
    sex: record.sex,
    hatchedOn: record.hatchedOn,
    project:
      record.projectId && record.projectName ? { id: record.projectId, name: record.projectName } : null,
    state: record.state,
    price: record.price,
    headline: record.headline,
    heldFor:
      record.heldForId && record.heldForName ? { id: record.heldForId, name: record.heldForName } : null,
    heldUntil: record.heldUntil?.toISOString() ?? null,
    photoId: record.photoId,
    version: record.version,
  }));
}
