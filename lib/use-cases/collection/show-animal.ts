import 'server-only';
import {
  findAnimal,
  findClutchCode,
  listClaims,
  listPairingsOf,
  listPossibleSires,
  listProjectsOf,
  listWeights,
  listYoungOf,
} from '@/db/queries/animals';
import { listDocuments } from '@/db/queries/documents';
import { findSpecies } from '@/db/queries/species';
import { listPhotos } from '@/db/queries/photos';
import { findTub } from '@/db/queries/tubs';
import { showAnimal } from '@/lib/contracts/animal-record';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { reachOf } from '../permissions';
import { presentLoci } from './present-loci';
import { presentOwnership } from './present-ownership';
import { loadRelatives } from './relatives';

/** A member opens the record of an animal. */
export const showAnimalUseCase = workspaceUseCase(showAnimal, async (world, { params }) => {
  const { tx, sees, actor } = world;
  const animal = await findAnimal(tx, sees, params.animal);
  if (!animal) throw notFound('animal');
  const species = await findSpecies(tx, animal.speciesId);
  if (!species) throw notFound('species');
  const beliefs = await loadBeliefs(tx, animal.speciesId);
  const claims = await listClaims(tx, animal.id);
  const possible = await listPossibleSires(tx, animal.id);
  const young = await listYoungOf(tx, sees, animal.id);
  const seesPairings = reachOf(actor.role, 'pairing.see') !== 'no';
  const { paired, laid } = seesPairings
    ? await listPairingsOf(tx, sees, animal.id)
    : { paired: [], laid: [] };
  const mateOf = (pair: { sireId: typeof animal.id; damId: typeof animal.id }) =>
    pair.sireId === animal.id ? pair.damId : pair.sireId;
  const sideOf = (pair: { sireId: typeof animal.id }) =>
    pair.sireId === animal.id ? ('sire' as const) : ('dam' as const);
  const relative = await loadRelatives(world, beliefs, [
    animal.sireId,
    animal.damId,
    ...possible.map(({ sireId }) => sireId),
    ...young.map(({ id }) => id),
    ...paired.map(mateOf),
  ]);
  const tub = animal.tubId ? await findTub(tx, animal.tubId) : null;
  return {
    id: animal.id,
    code: animal.code,
    name: animal.name,
    species: {
      id: species.id,
      name: species.name,
      scientificName: species.scientificName,
      sexSystem: species.sexSystem,
    },
    sex: animal.sex,
    sexedBy: animal.sexedBy,
    hatchedOn: animal.hatchedOn,
    hatchedPrecision: animal.hatchedPrecision,
    origin: animal.origin,
    status: animal.status,
    statusSince: animal.statusSince,
    heldBack: animal.heldBack,
    notes: animal.notes,
    version: animal.version,
    description: beliefs.describe(animal.id),
    tub: tub ? { id: tub.id, label: tub.label, room: tub.room, rack: tub.rack } : null,
    sire: animal.sireId ? relative(animal.sireId) : null,
    dam: animal.damId ? relative(animal.damId) : null,
    possibleSires: possible.map(({ sireId, weight }) => ({ sire: relative(sireId), weight })),
    young: young.map(({ id }) => relative(id)),
    loci: presentLoci(beliefs, animal, claims),
    ...(await presentOwnership(world, animal.id)),
    weights: await listWeights(tx, animal.id),
    photos: await listPhotos(tx, animal.id),
    documents: (await listDocuments(tx, animal.id)).map((row) => ({
      ...row,
      createdAt: row.createdAt.toISOString(),
    })),
    projects: await listProjectsOf(tx, sees, animal.id),
    pairings: paired.map((pair) => ({
      id: pair.id,
      season: pair.season,
      status: pair.status,
      as: sideOf(pair),
      mate: relative(mateOf(pair)),
    })),
    clutches: laid.map((clutch) => ({
      id: clutch.id,
      code: clutch.code,
      laidOn: clutch.laidOn,
      as: sideOf(clutch),
    })),
    hatchedFrom: animal.clutchId && seesPairings ? await findClutchCode(tx, sees, animal.clutchId) : null,
  };
});
