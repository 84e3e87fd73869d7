import 'server-only';
import { listListingRecords } from '@/db/queries/listings';
import { listListings } from '@/lib/contracts/invoice';
import { workspaceUseCase } from '../world';
import { presentListings } from './present-listing';

/** A member looks through what is for sale or could be. */
export const listListingsUseCase = workspaceUseCase(listListings, async (world, { query }) => {
  const { offset, limit, ...filter } = query;
  const { rows, total } = await listListingRecords(world.tx, world.sees, filter, { offset, limit });
  return { rows: await presentListings(world, rows), total };
});
