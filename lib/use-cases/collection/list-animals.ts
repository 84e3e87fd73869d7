import 'server-only';
import { countVisibleAnimals, loadRowExtras } from '@/db/queries/animals';
import { listAnimals } from '@/lib/contracts/animal-list';
import { workspaceUseCase } from '../world';
import { findAnimals } from './find-animals';
import { groupBy } from '../genetics/group-by';

/** A member looks through the animals they may see. */
export const listAnimalsUseCase = workspaceUseCase(listAnimals, async (world, { query }) => {
  const { tx, sees } = world;
  const { offset, limit, ...filter } = query;
  const found = await findAnimals(world, filter);
  const page = found.slice(offset, offset + limit);
  const extras = await loadRowExtras(
    tx,
    sees,
    page.map((row) => row.id),
  );
  const parts = groupBy(extras.parts, (row) => row.animalId);
  const projects = groupBy(extras.projects, (row) => row.animalId);
  const photos = new Map(extras.photos.map((row) => [row.animalId, row.id]));
  const sexes = { male: 0, female: 0, unknown: 0 };
  for (const row of found) sexes[row.sex] += 1;
  return {
    rows: page.map(({ speciesId, speciesName, tubId, tubLabel, ...row }) => ({
      ...row,
      species: { id: speciesId, name: speciesName },
      tub: tubId && tubLabel ? { id: tubId, label: tubLabel } : null,
      owners: (parts.get(row.id) ?? []).map(({ partyId, parts: held }) => ({ partyId, parts: held })),
      projects: (projects.get(row.id) ?? []).map(({ id, name }) => ({ id, name })),
      photoId: photos.get(row.id) ?? null,
    })),
    total: found.length,
    sexes,
    ofAll: await countVisibleAnimals(tx, sees),
  };
});
