import 'server-only';
import { findAnimals as findRows, listPossibleSires, listWeights, loadRowExtras } from '@/db/queries/animals';
import { loadClaims } from '@/db/queries/lineage';
import { listOwnership, listPartyMarks } from '@/db/queries/ownership';
import { exportAnimals } from '@/lib/contracts/animal-list';
import { importFields, type ImportField } from '@/lib/contracts/animal-import';
import { animalId, type AnimalId } from '@/lib/contracts/ids';
import { invalid } from '../refusal';
import { workspaceUseCase } from '../world';
import { knownDate } from './animal-rules';
import { claimToText } from './claim-text';
import { writeCsv } from './csv-text';
import { beliefsOf, findAnimals } from './find-animals';
import { groupBy } from '../genetics/group-by';

/** A member takes animals away as a CSV file that can be imported again. Relatives that they may not see are left out. */
export const exportAnimalsUseCase = workspaceUseCase(exportAnimals, async (world, { query }) => {
  const { tx, sees, today } = world;
  const { ids: idText, ...filter } = query;
  const ids = idText?.split(',').filter(Boolean);
  if (ids?.some((id) => !animalId.safeParse(id).success))
    throw invalid('ids', 'These are no ids of animals.');
  const found = await findAnimals(world, filter, ids as AnimalId[] | undefined);
  const rows = new Map(
    (
      await findRows(
        tx,
        sees,
        found.map((row) => row.id),
      )
    ).map((row) => [row.id, row]),
  );
  const parents = await findRows(
    tx,
    sees,
    [...rows.values()].flatMap((row) => [row.sireId, row.damId]).filter((id) => id !== null),
  );
  const codes = new Map([...parents, ...rows.values()].map((row) => [row.id, row.code]));
  const names = new Map((await listPartyMarks(tx)).map(({ id, name }) => [id, name]));
  const extras = await loadRowExtras(tx, sees, [...rows.keys()]);
  const projects = groupBy(extras.projects, (row) => row.animalId);
  const beliefs = await beliefsOf(
    world,
    found.map((row) => row.speciesId),
  );
  const claims = new Map<AnimalId, string[]>();
  for (const [speciesId, of] of beliefs) {
    const nameOf = new Map(of.loci.map(({ id, name }) => [id, name]));
    for (const row of await loadClaims(tx, speciesId)) {
      claims.set(row.animalId, [
        ...(claims.get(row.animalId) ?? []),
        claimToText(nameOf.get(row.locusId) ?? '', row.claim),
      ]);
    }
  }

  const lines: string[][] = [];
  for (const { id, speciesName, tubLabel } of found) {
    const row = rows.get(id);
    if (!row) continue;
    const held = (await listOwnership(tx, id)).find((set) => set.untilDay === null);
    const possible = await listPossibleSires(tx, id);
    for (const sire of await findRows(
      tx,
      sees,
      possible.map(({ sireId }) => sireId),
    ))
      codes.set(sire.id, sire.code);
    const cells: Record<ImportField, string> = {
      code: row.code,
      name: row.name,
      species: speciesName,
      sex: row.sex,
      'sexed by': row.sexedBy ?? '',
      hatched: row.hatchedOn ? knownDate(row.hatchedOn, row.hatchedPrecision) : '',
      origin: row.origin,
      status: row.status,
      'status since': row.statusSince ?? '',
      'held back': row.heldBack ? 'yes' : '',
      sire: (row.sireId && codes.get(row.sireId)) ?? '',
      dam: (row.damId && codes.get(row.damId)) ?? '',
      'possible sires': possible
        .filter(({ sireId }) => codes.has(sireId))
        .map(({ sireId, weight }) => `${codes.get(sireId)} ${weight}`)
        .join('; '),
      loci: (claims.get(id) ?? []).sort().join(' | '),
      owners: (held?.parts ?? [])
        .map(({ partyId, parts }) => `${names.get(partyId) ?? ''} ${parts}`)
        .sort()
        .join('; '),
      'owned from': held?.fromDay ?? '',
      place: tubLabel ?? '',
      weights: (await listWeights(tx, id))
        .map(({ weighedOn, grams }) => `${weighedOn} ${grams}`)
        .sort()
        .join('; '),
      projects: (projects.get(id) ?? []).map(({ name }) => name).join('; '),
      notes: row.notes,
    };
    lines.push(importFields.map((field) => cells[field]));
  }
  return {
    body: writeCsv(importFields, lines),
    contentType: 'text/csv; charset=utf-8',
    fileName: `animals-${today}.csv`,
  };
});
